import { formatPercent, formatSignedPercent } from '@/lib/format';
import type { chartedShift } from '@/lib/physics/charted-shift';

/** Shifts of wafers that differ by less, in percent, are told as one. */
const ALIKE_PERCENT = 0.05;
/** A shift that is written 0.00 % is none. */
const NONE_PERCENT = 0.005;

/** What a shift of the charted value does to wafers that are made as before: "would read 2.30 % lower". */
export function shiftWords({ least, most }: NonNullable<ReturnType<typeof chartedShift>>): string {
  if (most - least < ALIKE_PERCENT) {
    const shift = (least + most) / 2;
    if (Math.abs(shift) < NONE_PERCENT) return 'would read as before';
    return `would read ${formatPercent(Math.abs(shift))} ${shift < 0 ? 'lower' : 'higher'}`;
  }
  return `would read differently, by ${formatSignedPercent(least, 2)} to ${formatSignedPercent(most, 2)}`;
}
