const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;

/** A cell as a number; null when it is empty, NaN when it is no finite number in decimal notation. */
export function readNumber(cell: string): number | null {
  if (NUMBER.test(cell)) return finite(Number(cell));
  const trimmed = cell.trim();
  if (trimmed === '') return null;
  return NUMBER.test(trimmed) ? finite(Number(trimmed)) : NaN;
}

function finite(value: number): number {
  return Number.isFinite(value) ? value : NaN;
}
