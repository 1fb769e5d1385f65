/** One line of the bench's table: what was measured, the figure, and the bound it is held to, if any. */
export interface Figure {
  name: string;
  value: number;
  unit: string;
  atLeast?: number;
  atMost?: number;
}

/** The middle of several timings: a pause of the machine does not count. */
export function middle(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? NaN;
}

export function holds({ value, atLeast = -Infinity, atMost = Infinity }: Figure): boolean {
  return value >= atLeast && value <= atMost;
}

export function figureLine(figure: Figure): string {
  const { name, value, unit, atLeast, atMost } = figure;
  const bound =
    atLeast !== undefined ? `at least ${atLeast}` : atMost !== undefined ? `at most ${atMost}` : '';
  const verdict = bound === '' ? '' : holds(figure) ? 'holds' : 'MISSED';
  return `${name.padEnd(62)} ${value.toPrecision(3).padStart(9)} ${unit.padEnd(10)} ${bound.padEnd(14)} ${verdict}`;
}
