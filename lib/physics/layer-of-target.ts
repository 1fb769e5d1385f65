import { driveIn, type DriveIn } from './drive-in-spread';
import { isUniform } from './is-uniform';
import type { Layer, LayerShape } from './layer';
import { pairsShape } from './pairs-shape';
import type { ExpectedWafer, Target } from './target';

/** The drive-in of a target at a peak density, or null where it has none. Throws RangeError for half a drive-in. */
export function targetDriveIn(target: Target, densityPerCm3: number): DriveIn | null {
  const [temperatureC, minutes] = [target.driveInC ?? null, target.driveInMin ?? null];
  if (temperatureC === null && minutes === null) return null;
  if (temperatureC === null || minutes === null) {
    throw new RangeError('A drive-in needs both its temperature and its time.');
  }
  if (target.profile !== 'implant') throw new RangeError('A drive-in belongs to an implant.');
  return driveIn(target.dopant, densityPerCm3, temperatureC, minutes);
}

/**
 * The thickness or length in µm that counts for a wafer: its own where the layer is uniform or a box and it brings one,
 * else the target's; null where neither has one. Throws RangeError for one that is not positive.
 */
export function targetLengthUm(target: Target, wafer: ExpectedWafer): number | null {
  const lengthUm = (isUniform(target) ? wafer.layerThicknessUm : null) ?? target.lengthUm;
  if (lengthUm !== null && !(lengthUm > 0 && Number.isFinite(lengthUm))) {
    throw new RangeError(`A layer thickness is a positive number of µm, not ${lengthUm}.`);
  }
  return lengthUm;
}

function shapeOf(target: Target, densityPerCm3: number, wafer: ExpectedWafer): LayerShape {
  if (target.profile === 'pairs') {
    if (!target.pairs) throw new RangeError('A profile of pairs needs its depths and densities.');
    return pairsShape(target.pairs).shape;
  }
  const lengthUm = targetLengthUm(target, wafer);
  if (lengthUm === null) throw new RangeError('A sheet resistance needs the layer thickness.');
  if (target.profile === 'implant') {
    const rangeUm = target.rangeUm ?? null;
    if (rangeUm === null) throw new RangeError('An implant needs its projected range.');
    const spreadUm2 = targetDriveIn(target, densityPerCm3)?.spreadUm2 ?? 0;
    return { profile: 'implant', rangeUm, lengthUm, spreadUm2 };
  }
  return { profile: target.profile === 'uniform' ? 'box' : target.profile, lengthUm };
}

/**
 * The layer that a target makes of a wafer whose peak density is `densityPerCm3`; of a uniform one its whole thickness,
 * as a box. Throws RangeError where the target lacks what its profile needs.
 */
export function layerOfTarget(target: Target, densityPerCm3: number, wafer: ExpectedWafer = {}): Layer {
  return {
    ...shapeOf(target, densityPerCm3, wafer),
    dopant: target.dopant,
    peakDensityPerCm3: densityPerCm3,
    backgroundDopant: target.backgroundDopant,
    backgroundDensityPerCm3: target.backgroundDensityPerCm3,
  };
}
