import { scheilDensity } from './scheil-density';
import type { ExpectedWafer, Target } from './target';

/**
 * The dopant density, per cm³, a target sets for one wafer: along a crystal by Scheil's law from the seed end.
 *
 * Throws RangeError when the wafer's place along the crystal is needed and missing (`missingForExpected`).
 */
export function targetDensity(target: Target, wafer: ExpectedWafer = {}): number {
  if (!target.alongCrystal) return target.densityPerCm3;
  const fraction = wafer.ingotFraction ?? null;
  if (fraction === null) throw new RangeError('A wafer along a crystal needs its solidified fraction.');
  return scheilDensity(target.dopant, target.densityPerCm3, fraction);
}
