import { plainNumber } from './plain-number';

const read = new Float64Array(1);

/**
 * A cell as a number; null when it is empty, NaN when it is no finite number in decimal notation.
 *
 * @example readNumber(' 1.5e3') // 1500
 */
export function readNumber(cell: string): number | null {
  if (plainNumber(cell, 0, read, 0) === cell.length) return read[0] as number;
  const trimmed = cell.trim();
  if (trimmed === '') return null;
  return plainNumber(trimmed, 0, read, 0) === trimmed.length ? (read[0] as number) : NaN;
}
