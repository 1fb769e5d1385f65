import { carriers, type Carriers } from '@/lib/physics/carriers';
import { conductionResistivity, type Doping, type MobilityModel } from '@/lib/physics/conduction-resistivity';
import { conductionType } from '@/lib/physics/dopant';
import { ionizedFraction } from '@/lib/physics/ionized-fraction';
import { modelUncertaintyPercent } from '@/lib/physics/model-uncertainty';
import { monotoneRoot } from '@/lib/physics/monotone-root';
import { resistivityAtTemperature } from '@/lib/physics/resistivity-at-temperature';
import { scheilDensity } from '@/lib/physics/scheil-density';
import { standardDensity } from '@/lib/physics/standard-density';
import { standardNotes } from '@/lib/physics/standard-notes';
import { standardResistivity } from '@/lib/physics/standard-resistivity';
import { standardUncertaintyPercent } from '@/lib/physics/standard-uncertainty';
import { resistivityAt23C } from '@/lib/physics/temperature-coefficient';
import type { BulkQuestion } from './expect-question';

/** The answer of `expect`, as `--json` prints it. */
export interface ExpectAnswer {
  type: 'n' | 'p' | 'intrinsic';
  densityPerCm3: number;
  resistivityOhmCm: number;
  temperatureC: number;
  model: string;
  uncertaintyPercent: number;
  carriers: Carriers;
  notes: string[];
}

function doping(question: BulkQuestion, densityPerCm3: number): Doping {
  const counter = question.counter?.densityPerCm3 ?? 0;
  const donor = question.dopant === 'boron' ? (question.counter?.dopant ?? 'phosphorus') : question.dopant;
  const isAcceptor = question.dopant === 'boron';
  return {
    donor: donor === 'boron' ? 'phosphorus' : donor,
    donorsPerCm3: isAcceptor ? counter : densityPerCm3,
    acceptorsPerCm3: isAcceptor ? densityPerCm3 : counter,
  };
}

function modelResistivity(model: MobilityModel, mixed: Doping, temperatureC: number): number {
  const temperatureK = temperatureC + 273.15;
  if (model !== 'masetti' || temperatureK === 300) return conductionResistivity(model, mixed, temperatureK);
  // The Masetti model holds at 300 K: the Arora model carries it to the temperature asked for.
  const ratio =
    conductionResistivity('arora', mixed, temperatureK) / conductionResistivity('arora', mixed, 300);
  return conductionResistivity('masetti', mixed, 300) * ratio;
}

function resistivityOf(question: BulkQuestion, densityPerCm3: number): number {
  const { model, dopant, temperatureC } = question;
  if (!(densityPerCm3 > 0))
    throw new RangeError(`A dopant density is positive, not ${densityPerCm3} per cm³.`);
  if (model !== 'standard') return modelResistivity(model, doping(question, densityPerCm3), temperatureC);
  const at23C = standardResistivity(dopant, densityPerCm3);
  return resistivityAtTemperature(dopant, densityPerCm3, at23C, temperatureC);
}

/** The density of the dopant that gives a resistivity at the temperature asked for. */
function densityOf(question: BulkQuestion, resistivityOhmCm: number): number {
  const { model, dopant, temperatureC, inverse } = question;
  if (!(resistivityOhmCm > 0))
    throw new RangeError(`A resistivity is positive, not ${resistivityOhmCm} Ω·cm.`);
  if (model === 'standard') {
    const at23C =
      temperatureC === 23
        ? resistivityOhmCm
        : resistivityAt23C(conductionType(dopant), resistivityOhmCm, temperatureC);
    return standardDensity(dopant, at23C, inverse);
  }
  // With a counter dopant the same resistivity is met on both sides of compensation: ours is the heavier one.
  const from = Math.max(1e10, (question.counter?.densityPerCm3 ?? 0) * 1.000001);
  const excess = (ln: number): number => Math.log(resistivityOf(question, Math.exp(ln)) / resistivityOhmCm);
  const root = monotoneRoot(excess, Math.log(from), Math.log(1e21), 1e-12);
  if (root === null)
    throw new RangeError(`No ${dopant} density of the ${model} model gives ${resistivityOhmCm} Ω·cm.`);
  return Math.exp(root);
}

function bulkNotes(question: BulkQuestion, densityPerCm3: number, uncertaintyPercent: number): string[] {
  const { model, dopant, temperatureC } = question;
  const notes = model === 'standard' ? standardNotes(dopant, densityPerCm3) : [];
  if (model !== 'standard') {
    notes.push(
      `The ${model} model stands in for the standard conversion; the uncertainty is its spread against it, and every dopant counts as ionized.`,
    );
  }
  if (model === 'masetti' && temperatureC + 273.15 !== 300) {
    notes.push(
      'The Masetti model holds at 300 K (26.85 °C) and is moved by the temperature ratio of the Arora model.',
    );
  }
  if (question.counter !== null)
    notes.push('Compensated: mobility at the total of both dopants, carriers from both.');
  if (model === 'standard' && (temperatureC < 18 || temperatureC > 28)) {
    notes.push(
      'Outside 18 to 28 °C the value at 23 °C is moved by the temperature ratio of the Arora model.',
    );
  }
  const ionized = question.counter === null ? ionizedFraction(dopant, densityPerCm3, 300) : null;
  if (model === 'standard' && ionized !== null && ionized < 0.99) {
    notes.push(
      `Carriers count every dopant as ionized; at 300 K about ${(100 * ionized).toFixed(0)} % are (Altermatt and others, 2006). The conversion holds that already.`,
    );
  }
  if (question.fraction !== null) {
    notes.push('The doping given is the seed end’s; Scheil’s law leads to the fraction asked for.');
  }
  if (question.resistivityOhmCm !== null) {
    const step = resistivityOf(question, densityPerCm3 * 0.999) / resistivityOf(question, densityPerCm3);
    const inDoping = (uncertaintyPercent * Math.log(1 / 0.999)) / Math.log(step);
    notes.push(
      `${question.inverse === 'direct' ? 'Direct fit' : 'Numeric inverse'}; in doping the uncertainty is ${inDoping.toFixed(1)} %.`,
    );
  }
  return notes;
}

/**
 * Answers `expect` for silicon of one doping, maybe compensated, at a temperature, maybe along a crystal.
 *
 * Throws RangeError where the conversion or model ends.
 */
export function expectBulk(question: BulkQuestion): ExpectAnswer {
  const given = question.densityPerCm3 ?? densityOf(question, question.resistivityOhmCm ?? Number.NaN);
  const densityPerCm3 =
    question.fraction === null ? given : scheilDensity(question.dopant, given, question.fraction);
  const uncertaintyPercent =
    question.model === 'standard'
      ? standardUncertaintyPercent(question.dopant)
      : modelUncertaintyPercent(question.model, question.dopant);
  const mixed = doping(question, densityPerCm3);
  const net = mixed.donorsPerCm3 - mixed.acceptorsPerCm3;
  const asGiven = question.fraction === null ? question.resistivityOhmCm : null;
  return {
    type: net === 0 ? 'intrinsic' : net > 0 ? 'n' : 'p',
    densityPerCm3,
    resistivityOhmCm: asGiven ?? resistivityOf(question, densityPerCm3),
    temperatureC: question.temperatureC,
    model: question.model,
    uncertaintyPercent,
    carriers: carriers(mixed.donorsPerCm3, mixed.acceptorsPerCm3, question.temperatureC + 273.15),
    notes: bulkNotes(question, densityPerCm3, uncertaintyPercent),
  };
}
