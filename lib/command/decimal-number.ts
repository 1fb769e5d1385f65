/**
 * The number that a cell's text stands for, or null when it is none: a plain decimal with a point and maybe an
 * exponent. "1,5", "0x1F", "Infinity" and an empty cell are no numbers.
 *
 * @example decimalNumber('1.5e3') // 1500
 */
export function decimalNumber(text: string): number | null {
  if (!/^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/.test(text)) return null;
  const value = Number(text);
  return Number.isFinite(value) ? value : null;
}
