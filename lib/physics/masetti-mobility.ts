import type { Dopant } from './dopant';

interface Parameters {
  low: number;
  max: number;
  drop: number;
  reference: number;
  heavy: number;
  alpha: number;
  beta: number;
  holes: number;
}

const PARAMETERS: Readonly<Record<'boron' | 'phosphorus' | 'arsenic', Parameters>> = {
  phosphorus: {
    low: 68.5,
    max: 1414,
    drop: 56.1,
    reference: 9.2e16,
    heavy: 3.41e20,
    alpha: 0.711,
    beta: 1.98,
    holes: 0,
  },
  arsenic: {
    low: 52.2,
    max: 1417,
    drop: 43.4,
    reference: 9.68e16,
    heavy: 3.43e20,
    alpha: 0.68,
    beta: 2,
    holes: 0,
  },
  boron: {
    low: 44.9,
    max: 470.5,
    drop: 29,
    reference: 2.23e17,
    heavy: 6.1e20,
    alpha: 0.719,
    beta: 2,
    holes: 9.23e16,
  },
};

/**
 * The mobility, in cm²/(V·s) at 300 K, of the majority carriers of doped silicon: electrons for phosphorus and
 * arsenic, holes for boron. `densityPerCm3` is the carrier density, or the total impurity density in compensated
 * silicon.
 *
 * Source: Masetti, Severi and Solmi, IEEE Trans. Electron Devices 30, 764 (1983); phosphorus 1e13…5e21, arsenic
 * 1e13…4e21, boron 1e14…1.2e21. Lighter doping is on the plateau and is taken. Throws RangeError above the range,
 * for a density that is not positive, and for antimony, which has no published set.
 *
 * @example masettiMobility('phosphorus', 1e17) // 721.3
 */
export function masettiMobility(dopant: Dopant, densityPerCm3: number): number {
  if (dopant === 'antimony') throw new RangeError('The Masetti model has no set for antimony.');
  const upper = { boron: 1.2e21, phosphorus: 5e21, arsenic: 4e21 }[dopant];
  if (!(densityPerCm3 > 0 && densityPerCm3 <= upper)) {
    throw new RangeError(`The Masetti model takes ${dopant} up to ${upper} per cm³, not ${densityPerCm3}.`);
  }
  const p = PARAMETERS[dopant];
  const first = dopant === 'boron' ? p.low * Math.exp(-p.holes / densityPerCm3) : p.low;
  const span = dopant === 'boron' ? p.max : p.max - p.low;
  return (
    first +
    span / (1 + (densityPerCm3 / p.reference) ** p.alpha) -
    p.drop / (1 + (p.heavy / densityPerCm3) ** p.beta)
  );
}
