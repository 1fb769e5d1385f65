import { carriers, type Carriers } from '@/lib/physics/carriers';
import { codopedPlace, type MeltDopant } from '@/lib/physics/codoped-crystal';
import type { Doping } from '@/lib/physics/conduction-resistivity';
import { ionizedCarriers, type IonizedCarriers } from '@/lib/physics/ionized-carriers';
import { modelResistivity } from '@/lib/physics/model-resistivity';
import { monotoneRoot } from '@/lib/physics/monotone-root';
import { resistivityAtTemperature } from '@/lib/physics/resistivity-at-temperature';
import { standardDensity300K, standardResistivity300K } from '@/lib/physics/standard-conversion-300k';
import { standardDensity } from '@/lib/physics/standard-density';
import { standardDensityLimits } from '@/lib/physics/standard-density-limits';
import { standardResistivity } from '@/lib/physics/standard-resistivity';
import { isNear23C, resistivityAt23C } from '@/lib/physics/temperature-coefficient';
import { conductionType } from '@/lib/physics/dopant';
import { bulkNotes } from './expect-bulk-notes';
import type { BulkQuestion } from './expect-bulk-question';
import { budgetIn, extras, type Extras } from './expect-extras';
import { plainTarget } from './expect-plain-target';
import type { Circumstances } from './expect-question';

/** The answer of `expect`, as `--json` prints it. */
export interface ExpectAnswer extends Extras {
  type: 'n' | 'p' | 'intrinsic';
  densityPerCm3: number;
  resistivityOhmCm: number;
  temperatureC: number;
  model: string;
  /** Null where only an order of magnitude is known. */
  uncertaintyPercent: number | null;
  /** Every dopant ionized; beside it with the share that is, where that is published. */
  carriers: Carriers;
  ionizedCarriers: IonizedCarriers | null;
  notes: string[];
}

/** The melt, or the piece of silicon, that a density of the main dopant makes. */
function dopants(question: BulkQuestion, densityPerCm3: number): MeltDopant[] {
  const own = { dopant: question.dopant, seedDensityPerCm3: densityPerCm3 };
  if (question.counter === null) return [own];
  return [own, { dopant: question.counter.dopant, seedDensityPerCm3: question.counter.densityPerCm3 }];
}

/** The conversion at 300 K of a dopant: where phosphorus data serve at 23 °C they serve here, and nowhere else. */
function fitAt300K(dopant: BulkQuestion['dopant'], densityPerCm3: number): 'boron' | 'phosphorus' {
  if (dopant === 'boron' || dopant === 'phosphorus') return dopant;
  if (densityPerCm3 < 1e19) return 'phosphorus';
  throw new RangeError(`At 300 K nothing is published for ${dopant} from 1e19 per cm³ on.`);
}

function resistivityOf(question: BulkQuestion, doping: Doping): number {
  const { model, dopant, temperatureC, conversion } = question;
  if (model !== 'standard') return modelResistivity(model, doping, temperatureC);
  const density = doping.donorsPerCm3 + doping.acceptorsPerCm3;
  if (conversion === '300k') return standardResistivity300K(fitAt300K(dopant, density), density);
  return resistivityAtTemperature(dopant, density, standardResistivity(dopant, density), temperatureC);
}

function standardDensityOf(question: BulkQuestion, resistivityOhmCm: number): number {
  const { dopant, temperatureC, inverse, conversion } = question;
  if (conversion === '300k') {
    const density = standardDensity300K(
      dopant === 'boron' ? 'boron' : 'phosphorus',
      resistivityOhmCm,
      inverse,
    );
    fitAt300K(dopant, density);
    return density;
  }
  if (isNear23C(temperatureC)) {
    const isAt23C = temperatureC === 23;
    const at23C = isAt23C
      ? resistivityOhmCm
      : resistivityAt23C(conductionType(dopant), resistivityOhmCm, temperatureC);
    return standardDensity(dopant, at23C, inverse);
  }
  if (inverse === 'direct') throw new RangeError('The direct fit serves from 18 to 28 °C.');
  const { lowerPerCm3, upperPerCm3 } = standardDensityLimits(dopant);
  return rootDensity(question, resistivityOhmCm, lowerPerCm3, upperPerCm3);
}

function rootDensity(question: BulkQuestion, resistivityOhmCm: number, lower: number, upper: number): number {
  const within = (ln: number): number => Math.min(upper, Math.max(lower, Math.exp(ln)));
  const excess = (ln: number): number =>
    Math.log(resistivityOf(question, codopedPlace(dopants(question, within(ln)), 0)) / resistivityOhmCm);
  const root = monotoneRoot(excess, Math.log(lower), Math.log(upper), 1e-12);
  if (root === null) {
    throw new RangeError(
      `No ${question.dopant} density of the ${question.model} model gives ${resistivityOhmCm} Ω·cm.`,
    );
  }
  return within(root);
}

/** The density of the dopant that gives a resistivity at the temperature asked for. */
function densityOf(question: BulkQuestion, resistivityOhmCm: number): number {
  if (!(resistivityOhmCm > 0)) {
    throw new RangeError(`A resistivity is positive, not ${resistivityOhmCm} Ω·cm.`);
  }
  if (question.model === 'standard') return standardDensityOf(question, resistivityOhmCm);
  // With a counter dopant the same resistivity is met on both sides of compensation: ours is the heavier one.
  const from = Math.max(1e10, (question.counter?.densityPerCm3 ?? 0) * 1.000001);
  return rootDensity(question, resistivityOhmCm, from, 1e21);
}

/**
 * Answers `expect` for silicon of one doping, maybe compensated, at a temperature, maybe along a crystal, where each
 * dopant follows its own segregation.
 *
 * Throws RangeError where the conversion or model ends.
 */
export function expectBulk(question: BulkQuestion, circumstances: Circumstances): ExpectAnswer {
  const { model, fraction, temperatureC } = question;
  const seed = question.densityPerCm3 ?? densityOf(question, question.resistivityOhmCm ?? Number.NaN);
  const melt = dopants(question, seed);
  const place = codopedPlace(melt, fraction ?? 0);
  const densityPerCm3 = question.dopant === 'boron' ? place.acceptorsPerCm3 : place.donorsPerCm3;
  const asGiven = fraction === null ? question.resistivityOhmCm : null;
  const resistivityOhmCm = asGiven ?? resistivityOf(question, place);
  const target = plainTarget('resistivity', question.dopant, densityPerCm3);
  const budget = budgetIn(
    target,
    question.conversion === '300k' ? { ...circumstances, temperatureC: 23 } : circumstances,
    model === 'standard' ? null : model,
  );
  const beside: Extras =
    model === 'standard'
      ? extras(target, resistivityOhmCm, circumstances, budget)
      : { sensitivities: null, budget };
  const temperatureK = temperatureC + 273.15;
  return {
    type: place.type,
    densityPerCm3,
    resistivityOhmCm,
    temperatureC,
    model,
    uncertaintyPercent: budget.standardPercent,
    carriers: carriers(place.donorsPerCm3, place.acceptorsPerCm3, temperatureK),
    ionizedCarriers: ionizedCarriers(place, temperatureK),
    notes: bulkNotes(question, { melt, place, uncertaintyPercent: budget.standardPercent }),
    ...beside,
  };
}
