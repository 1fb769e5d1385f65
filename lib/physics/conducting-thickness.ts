import { depletionWidth } from './depletion-width';
import { conductionType } from './dopant';
import type { Target } from './target';

/** Whether a grown layer lies on a substrate of its own type, with no junction between them. */
function isOnOwnType({ dopant, backgroundDopant }: Target): boolean {
  return backgroundDopant !== null && conductionType(backgroundDopant) === conductionType(dopant);
}

/**
 * Throws RangeError for a grown layer on its own type, of which a four-point probe would measure the substrate, unless
 * the target declares another method.
 */
export function refuseWithoutJunction(target: Target): void {
  if (!isOnOwnType(target) || target.method === 'other') return;
  throw new RangeError(
    'Layer and substrate are of one type: without a junction between them a four-point probe measures the substrate. Declare another method, or name a substrate of the other type.',
  );
}

/**
 * The thickness, in µm, of a uniform layer that conducts: t − w, the junction under it having depleted w
 * (`depletionWidth`). All of it where nothing is named underneath.
 *
 * A four-point probe needs that junction. On a substrate of the layer's own type it measures the substrate: RangeError,
 * unless the target declares another method, for which the whole thickness counts. RangeError too where the layer is
 * depleted through.
 *
 * @example conductingThicknessUm(epi of phosphorus on boron 1e19, 1e15, 10) // 8.96
 */
export function conductingThicknessUm(target: Target, densityPerCm3: number, thicknessUm: number): number {
  const { backgroundDopant, backgroundDensityPerCm3: background } = target;
  if (backgroundDopant === null || background === null) return thicknessUm;
  refuseWithoutJunction(target);
  if (isOnOwnType(target)) return thicknessUm;
  const depletedUm = depletionWidth(densityPerCm3, background);
  if (!(depletedUm < thicknessUm)) {
    throw new RangeError(
      `The junction depletes ${depletedUm.toFixed(2)} µm, the whole layer of ${thicknessUm} µm: nothing of it conducts.`,
    );
  }
  return thicknessUm - depletedUm;
}
