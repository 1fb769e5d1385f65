import { formatPercent, formatSignedPercent } from '@/lib/format';
import type { chartedShift } from '@/lib/physics/charted-shift';

/** Under this many percent two shifts are written alike. */
const ALIKE_PERCENT = 0.01;

/** What a shift of the charted value does to wafers that are made as before: "would read 2.30 % lower". */
export function shiftWords({ least, most }: NonNullable<ReturnType<typeof chartedShift>>): string {
  if (most - least >= ALIKE_PERCENT) {
    return `would read differently, from ${formatSignedPercent(least, 2)} to ${formatSignedPercent(most, 2)}`;
  }
  if (Math.abs(least) < ALIKE_PERCENT) return 'would read as before';
  return `would read ${formatPercent(Math.abs(least))} ${least < 0 ? 'lower' : 'higher'}`;
}
