import type { LayerShape } from './layer';
import { normalShare } from './normal-share';

const SHARE = { box: 1, gaussian: Math.sqrt(Math.PI) / 2, erfc: 1 / Math.sqrt(Math.PI) } as const;

/** Depth in µm that a layer of the peak density would need to hold the shape's dopant. */
function depthOfPeakUm(shape: LayerShape): number {
  if (shape.profile === 'implant') {
    // The drive-in loses nothing; the implant lost what would have lain above the surface.
    return Math.sqrt(2 * Math.PI) * shape.lengthUm * normalShare(shape.rangeUm / shape.lengthUm);
  }
  if (shape.profile !== 'pairs') return shape.lengthUm * SHARE[shape.profile];
  let [sum, before] = [0, shape.steps[0]];
  if (before !== undefined) sum = before.depthUm * Math.exp(before.lnShare);
  for (const step of shape.steps.slice(1)) {
    if (before === undefined) break;
    const rise = step.lnShare - before.lnShare;
    const mean = rise === 0 ? Math.exp(step.lnShare) : (Math.exp(before.lnShare) * Math.expm1(rise)) / rise;
    sum += mean * (step.depthUm - before.depthUm);
    before = step;
  }
  return sum;
}

/**
 * The layer's dopant atoms per cm² of wafer, from the surface down without end: peak·L·√π/2 for a gaussian,
 * peak·L/√π for an erfc, peak·thickness for a box, peak·√(2π)·straggle less what lies above the surface for an implant,
 * piece by piece for a profile of pairs (the integrals of the shapes).
 *
 * @example layerDose({ profile: 'gaussian', peakDensityPerCm3: 1e19, lengthUm: 0.5 }) // 4.431e14
 */
export function layerDose(layer: LayerShape & { peakDensityPerCm3: number }): number {
  return layer.peakDensityPerCm3 * depthOfPeakUm(layer) * 1e-4;
}

/**
 * The peak density, per cm³, that a dose in atoms per cm² makes of a shape; of an implant the peak as implanted,
 * dose/(√(2π)·straggle), the dose being what the implanter counted. Throws RangeError unless the dose is positive.
 *
 * @example peakOfDose({ profile: 'box', lengthUm: 0.3 }, 3e14) // 1e19
 */
export function peakOfDose(shape: LayerShape, dosePerCm2: number): number {
  if (!(dosePerCm2 > 0 && Number.isFinite(dosePerCm2))) {
    throw new RangeError(`A dose is a positive number per cm², not ${dosePerCm2}.`);
  }
  const depthUm =
    shape.profile === 'implant' ? Math.sqrt(2 * Math.PI) * shape.lengthUm : depthOfPeakUm(shape);
  return dosePerCm2 / (depthUm * 1e-4);
}
