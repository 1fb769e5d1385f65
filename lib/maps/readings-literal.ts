/** With so many decimals a number is tried; the fewest that hold it make the shortest text. */
const MOST_DECIMALS = 6;

/** So far a whole number has no more than 15 digits, and no other number of 15 digits is the same in double precision. */
const LARGEST_WHOLE = 1e15;

const [COMMA, MINUS, POINT, ZERO, OPEN, CLOSE] = [44, 45, 46, 48, 123, 125];
const NULL = [78, 85, 76, 76];
const LONGEST_ELEMENT = 26;

let buffer = Buffer.alloc(64 * LONGEST_ELEMENT);

/**
 * Readings as an array literal of the database, each as `String` writes it. Readings have few decimals, and are written
 * digit by digit here: `String` searches the shortest text of any number, which takes ten times as long.
 *
 * @example readingsLiteral([12.5, null]) // '{12.5,NULL}'
 */
export function readingsLiteral(readings: readonly (number | null)[]): string {
  const most = readings.length * LONGEST_ELEMENT + 2;
  if (buffer.length < most) buffer = Buffer.alloc(most);
  const bytes = buffer;
  bytes[0] = OPEN;
  let end = 1;
  for (let i = 0; i < readings.length; i += 1) {
    const reading = readings[i] as number | null;
    if (i > 0) bytes[end++] = COMMA;
    if (reading === null) for (const code of NULL) bytes[end++] = code;
    else end = withNumber(bytes, end, reading);
  }
  bytes[end] = CLOSE;
  return bytes.toString('latin1', 0, end + 1);
}

/** Writes a number from `from` on and returns where it ends. */
function withNumber(bytes: Buffer, from: number, value: number): number {
  const size = Math.abs(value);
  let tens = 1;
  for (let decimals = 0; decimals <= MOST_DECIMALS; decimals += 1, tens *= 10) {
    const whole = Math.round(size * tens);
    if (!(whole < LARGEST_WHOLE)) break;
    if (whole / tens !== size) continue;
    let start = from;
    if (value < 0) bytes[start++] = MINUS;
    return withDigits(bytes, start, whole, decimals);
  }
  return from + bytes.write(String(value), from, 'latin1');
}

/** Writes a whole number with a point before its last `decimals` digits. */
function withDigits(bytes: Buffer, from: number, whole: number, decimals: number): number {
  let digits = 1;
  for (let bound = 10; bound <= whole; bound *= 10) digits += 1;
  const end = from + Math.max(digits, decimals + 1) + (decimals > 0 ? 1 : 0);
  let rest = whole;
  for (let at = end - 1; at >= from; at -= 1) {
    if (decimals > 0 && end - at === decimals + 1) {
      bytes[at] = POINT;
      continue;
    }
    const tenth = Math.floor(rest / 10);
    bytes[at] = ZERO + rest - 10 * tenth;
    rest = tenth;
  }
  return end;
}
