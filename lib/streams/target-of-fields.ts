import { layerExtent } from '@/lib/physics/layer-extent';
import { layerOfTarget } from '@/lib/physics/layer-of-target';
import { peakOfDose } from '@/lib/physics/layer-dose';
import { pairsShape } from '@/lib/physics/pairs-shape';
import { standardDensity } from '@/lib/physics/standard-density';
import type { Target } from '@/lib/physics/target';
import { furtherTarget } from './further-target';
import type { TargetFields } from './target-fields';
import type { TargetFault } from './target-fault';

/** The field in which a person said how much dopant there is. */
export const GIVEN_FIELD = {
  density: 'densityPerCm3',
  resistivity: 'resistivityOhmCm',
  dose: 'dosePerCm2',
} as const;

/**
 * The target that a form's fields make: a density found from a resistivity (numeric inverse of the standard conversion)
 * or a dose, a length from the depth of the junction. Or what stands in the way.
 */
export function targetOfFields(quantity: Target['quantity'], fields: TargetFields): Target | TargetFault {
  const density = found(GIVEN_FIELD[fields.given], () => densityOf(fields));
  if (typeof density !== 'number') return density;
  const target: Target = {
    quantity,
    dopant: fields.dopant,
    densityPerCm3: density,
    tolerancePercent: fields.tolerancePercent,
    alongCrystal: fields.alongCrystal,
    profile: fields.profile,
    lengthUm: fields.profile === 'pairs' ? null : fields.lengthUm,
    backgroundDopant: fields.backgroundDopant,
    backgroundDensityPerCm3: fields.backgroundDensityPerCm3,
    calibrationFactor: fields.calibrationFactor,
    calibrationPercent: fields.calibrationPercent,
    ...furtherTarget({ ...fields, pairs: fields.profile === 'pairs' ? fields.pairs : null }),
  };
  const isGraded = fields.profile === 'gaussian' || fields.profile === 'erfc';
  if (fields.lengthGiven === 'length' || !isGraded) return target;
  const lengthUm = found('junctionUm', () => lengthOfJunction(target, fields.junctionUm));
  return typeof lengthUm === 'number' ? { ...target, lengthUm } : lengthUm;
}

/** What work gives; where it throws a RangeError, that as the fault of a field. */
function found(field: TargetFault['field'], work: () => number): number | TargetFault {
  try {
    return work();
  } catch (error) {
    if (error instanceof RangeError) return { field, reason: error.message };
    throw error;
  }
}

function densityOf(fields: TargetFields): number {
  const { given, dopant, profile, pairs } = fields;
  if (given === 'resistivity') {
    if (profile !== 'uniform' && profile !== 'box')
      throw new RangeError('A graded layer has no single resistivity.');
    if (fields.counterDopant !== null) {
      throw new RangeError('One resistivity does not tell two dopants apart: give the density.');
    }
    return standardDensity(
      dopant,
      needed(fields.resistivityOhmCm, 'Give a resistivity above 0 Ω·cm.'),
      'numeric',
    );
  }
  if (given === 'density') {
    if (fields.densityPerCm3 === null && profile === 'pairs' && pairs !== null) {
      return pairsShape(pairs).peakDensityPerCm3;
    }
    return needed(fields.densityPerCm3, 'Give a density above 0, such as 1e15.');
  }
  const dose = needed(fields.dosePerCm2, 'Give a dose above 0, such as 3e14.');
  if (profile === 'uniform') throw new RangeError('A dose belongs to a layer: choose its profile.');
  if (profile === 'pairs') return peakOfDose(pairsShape(pairs ?? []).shape, dose);
  if (fields.lengthGiven === 'junction' && profile !== 'box' && profile !== 'implant') {
    throw new RangeError('A dose and a junction do not give the profile at once: give the length.');
  }
  const lengthUm = needed(fields.lengthUm, 'A dose needs the length over which it is spread.');
  if (profile !== 'implant') return peakOfDose({ profile, lengthUm }, dose);
  return peakOfDose({ profile, lengthUm, rangeUm: 0, spreadUm2: 0 }, dose);
}

/** A junction lies in proportion to the length. */
function lengthOfJunction(target: Target, junctionUm: number | null): number {
  const depthUm = needed(junctionUm, 'Give the depth of the junction, above 0 µm.');
  if (target.backgroundDopant === null)
    throw new RangeError('A junction lies where the silicon underneath begins: say what it is.');
  return depthUm / layerExtent(layerOfTarget({ ...target, lengthUm: 1 }, target.densityPerCm3)).junctionUm;
}

function needed(value: number | null, reason: string): number {
  if (value === null) throw new RangeError(reason);
  return value;
}
