/** The powers of ten that double precision holds exactly. */
const TENS = Float64Array.from({ length: 23 }, (_, power) => Number(`1e${power}`));

/** A whole number of so many digits is held exactly too. */
const EXACT_DIGITS = 15;

/** Beyond this size the square of a number is infinite, and no figure can be worked out of it. */
const LARGEST = 1e150;

const [PLUS, MINUS, POINT, SPACE, SMALL_E] = [43, 45, 46, 32, 101];

/**
 * Reads one number in decimal notation, spaces about it or not, that stands in `text` from `from` on, and puts it into
 * `into[at]`. Returns where the text behind it begins; −1 where something else stands there, or a number beyond 1e150.
 *
 * Digits and power of ten that are both exact make the nearest number by one multiplication or division (Clinger, How
 * to read floating point numbers accurately, PLDI 1990, from memory); others are left to `Number`. Both agree to the
 * last bit, and a long file has millions of them.
 */
export function plainNumber(text: string, from: number, into: Float64Array, at: number): number {
  let i = from;
  while (text.charCodeAt(i) === SPACE) i += 1;
  const start = i;
  let code = text.charCodeAt(i);
  const isNegative = code === MINUS;
  if (isNegative || code === PLUS) code = text.charCodeAt(++i);
  let whole = 0;
  let digits = 0;
  let decimals = 0;
  for (; code >= 48 && code <= 57; code = text.charCodeAt(++i)) {
    whole = 10 * whole + code - 48;
    digits += 1;
  }
  if (code === POINT) {
    for (code = text.charCodeAt(++i); code >= 48 && code <= 57; code = text.charCodeAt(++i)) {
      whole = 10 * whole + code - 48;
      decimals += 1;
    }
  }
  if (digits + decimals === 0) return -1;
  let power = 0;
  if ((code | 32) === SMALL_E) {
    code = text.charCodeAt(++i);
    const isSmall = code === MINUS;
    if (isSmall || code === PLUS) code = text.charCodeAt(++i);
    if (!(code >= 48 && code <= 57)) return -1;
    for (; code >= 48 && code <= 57; code = text.charCodeAt(++i)) power = 10 * power + code - 48;
    if (isSmall) power = -power;
  }
  power -= decimals;
  let value: number;
  if (digits + decimals <= EXACT_DIGITS && Math.abs(power) < TENS.length) {
    const size = power < 0 ? whole / (TENS[-power] as number) : whole * (TENS[power] as number);
    value = isNegative ? -size : size;
  } else value = Number(text.slice(start, i));
  if (!(Math.abs(value) <= LARGEST)) return -1;
  into[at] = value;
  while (text.charCodeAt(i) === SPACE) i += 1;
  return i;
}
