const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;

/** Beyond this size the square of a number is infinite, and no figure can be worked out of it. */
const LARGEST = 1e150;

/**
 * A cell as a number; null when it is empty, NaN when it is no finite number in decimal notation.
 *
 * @example readNumber(' 1.5e3') // 1500
 */
export function readNumber(cell: string): number | null {
  if (NUMBER.test(cell)) return finite(Number(cell));
  const trimmed = cell.trim();
  if (trimmed === '') return null;
  return NUMBER.test(trimmed) ? finite(Number(trimmed)) : NaN;
}

function finite(value: number): number {
  return Math.abs(value) <= LARGEST ? value : NaN;
}
