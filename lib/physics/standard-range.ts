import type { Dopant } from './dopant';

/** Dopant densities, per cm³, over which one fit of the standard conversion holds; both ends belong to it. */
export interface StandardRange {
  fit: 'boron' | 'phosphorus' | 'arsenic';
  lowerPerCm3: number;
  upperPerCm3: number;
}

const boron: StandardRange = { fit: 'boron', lowerPerCm3: 1e12, upperPerCm3: 1e21 };
const phosphorus: StandardRange = { fit: 'phosphorus', lowerPerCm3: 1e12, upperPerCm3: 5e20 };
const arsenic: StandardRange = { fit: 'arsenic', lowerPerCm3: 1e19, upperPerCm3: 6e20 };
const phosphorusForAntimony: StandardRange = { ...phosphorus, upperPerCm3: 1e19 };
/** Up to the last number below 1e19, where arsenic's own fit takes over. */
const phosphorusForArsenic: StandardRange = { ...phosphorus, upperPerCm3: 9.999999999999998e18 };

/**
 * The fits of ASTM F723 / SEMI MF723 that serve a dopant, the heaviest doping first.
 *
 * Boron and phosphorus have one each. Arsenic has a polynomial of its own from 1e19 to 6e20; below it the
 * standard lets the phosphorus data serve arsenic and antimony without having established how well. The two
 * do not meet at 1e19: the step, near 4 %, is left standing. Antimony above 1e19 has no fit at all.
 */
export function standardRanges(dopant: Dopant): readonly StandardRange[] {
  if (dopant === 'boron') return [boron];
  if (dopant === 'phosphorus') return [phosphorus];
  return dopant === 'arsenic' ? [arsenic, phosphorusForArsenic] : [phosphorusForAntimony];
}

/**
 * The fit that serves a density, or null where none does.
 *
 * @example standardRange('arsenic', 1e18)?.fit // 'phosphorus'
 */
export function standardRange(dopant: Dopant, densityPerCm3: number): StandardRange | null {
  return (
    standardRanges(dopant).find((r) => densityPerCm3 >= r.lowerPerCm3 && densityPerCm3 <= r.upperPerCm3) ??
    null
  );
}
