import { modelValue } from '@/lib/physics/model-value';
import type { Target } from '@/lib/physics/target';

/** Half-width and step of the table of a graded layer, in ln of the density. */
const HALF_WIDTH = 0.4;
const STEP = 0.005;

/**
 * The true reading, by the model of a target, as a function of the wafer's density and of ln(length/target length).
 *
 * A sheet resistance goes as one over the length exactly: the shape only stretches. Uniform layers and boxes are
 * computed outright; a graded layer is read off a table of its own integral (steps of 0.5 % in density, straight
 * between, which is within 1e-5), for a simulator asks 200 000 times.
 */
export function valueAt(target: Target): (densityPerCm3: number, lnLength: number) => number {
  const stretch = target.quantity === 'sheet_resistance' ? 1 : 0;
  if (target.profile === 'uniform' || target.profile === 'box') {
    return (density, lnLength) => modelValue(target, density) * Math.exp(-stretch * lnLength);
  }
  const count = Math.round(HALF_WIDTH / STEP);
  const table = Array.from({ length: 2 * count + 1 }, (_, i) =>
    Math.log(modelValue(target, target.densityPerCm3 * Math.exp((i - count) * STEP))),
  );
  return (density, lnLength) => {
    const place = Math.log(density / target.densityPerCm3) / STEP + count;
    const below = Math.floor(place);
    const [lower, upper] = [table[below], table[below + 1]];
    if (lower === undefined || upper === undefined) throw new RangeError('The density lies off the table.');
    return Math.exp(lower + (place - below) * (upper - lower) - stretch * lnLength);
  };
}
