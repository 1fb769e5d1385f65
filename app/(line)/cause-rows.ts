import { formatNumber, formatWithUncertainty } from '@/lib/format';
import { isImplantedOrDiffused } from '@/lib/physics/is-implanted-or-diffused';
import { possibleCauses, type PossibleCause } from '@/lib/physics/possible-causes';
import { sensitivities } from '@/lib/physics/sensitivities';
import type { ExpectedWafer, Target } from '@/lib/physics/target';

/** One cause in words: what it is, what it would take, what is usual. */
export interface CauseRow {
  cause: string;
  takes: string;
  usual: string;
  times: string;
}

/**
 * What would explain a difference by itself, the least extraordinary first. `ratio` is measured over expected,
 * `uncertaintyPercent` the standard uncertainty of the difference. Empty where the target has no slopes to tell by.
 */
export function causeRows(
  target: Target,
  wafer: ExpectedWafer,
  ratio: number,
  uncertaintyPercent: number,
): CauseRow[] {
  return foundCauses(target, wafer, ratio, uncertaintyPercent).map((found) => ({
    cause: causeWords(found.cause, target),
    takes: found.isOnSlope ? sizeWords(found) : `a great deal, beyond the slope (${sizeWords(found)})`,
    usual: `${formatNumber(found.usual, 2)}\u00a0${found.unit}`,
    times: formatNumber(found.timesUsual, 2),
  }));
}

function foundCauses(target: Target, wafer: ExpectedWafer, ratio: number, percent: number): PossibleCause[] {
  try {
    return possibleCauses(ratio, percent, sensitivities(target, wafer));
  } catch (error) {
    if (error instanceof RangeError) return [];
    throw error;
  }
}

/** "+2.1 ± 0.5 %": more of it is positive. */
function sizeWords({ size, uncertainty, unit }: PossibleCause): string {
  const text = formatWithUncertainty(size, uncertainty, unit);
  return size > 0 ? `+${text}` : text;
}

function causeWords(cause: PossibleCause['cause'], target: Target): string {
  switch (cause) {
    case 'dopant':
      return isImplantedOrDiffused(target) ? 'dose' : 'doping';
    case 'measurement-temperature':
      return 'temperature of the wafer while it is measured';
    case 'thickness':
      return target.quantity === 'resistivity' ? 'thickness entered for the wafer' : 'thickness of the layer';
    case 'drive-in-temperature':
      return 'temperature of the drive-in';
  }
}
