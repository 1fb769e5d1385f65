import { typeChangeFraction, type CodopedPlace, type MeltDopant } from '@/lib/physics/codoped-crystal';
import { ionizedFraction } from '@/lib/physics/ionized-fraction';
import { mobilityNotes } from '@/lib/physics/mobility-notes';
import { temperatureStepPercent } from '@/lib/physics/resistivity-at-temperature';
import { standardNotes } from '@/lib/physics/standard-notes';
import { standardResistivity, standardSensitivity } from '@/lib/physics/standard-resistivity';
import { isNear23C } from '@/lib/physics/temperature-coefficient';
import type { BulkQuestion } from './expect-bulk-question';

/** What was worked out of a question about silicon of one doping. */
interface Worked {
  melt: readonly MeltDopant[];
  place: CodopedPlace;
  uncertaintyPercent: number;
}

function standardWords(question: BulkQuestion, density: number, uncertaintyPercent: number): string[] {
  const { dopant, temperatureC, conversion } = question;
  const notes = standardNotes(dopant, density);
  if (conversion === '300k')
    notes.push('By the fits made at 300 K (NBS Special Publication 400-64), not those at 23 °C.');
  else if (!isNear23C(temperatureC)) {
    const edgeC = temperatureC < 18 ? 18 : 28;
    const step = temperatureStepPercent(dopant, density, standardResistivity(dopant, density), edgeC);
    const words =
      step === null ? '' : ` At ${edgeC} °C it lies ${step.toFixed(2)} % above the measured coefficient.`;
    notes.push(
      `Outside 18 to 28 °C the value at 23 °C is moved by the temperature ratio of the Arora model.${words}`,
    );
  }
  const ionized = ionizedFraction(dopant, density, temperatureC + 273.15);
  if (ionized !== null && ionized < 0.99) {
    notes.push(
      `About ${(100 * ionized).toFixed(0)} % of the dopant is ionized (Altermatt and others, 2006). The conversion holds that already.`,
    );
  }
  if (question.resistivityOhmCm !== null) {
    const inDoping = uncertaintyPercent / Math.abs(standardSensitivity(dopant, density));
    notes.push(
      `${question.inverse === 'direct' ? 'Direct fit' : 'Numeric inverse'}; in doping the uncertainty is ${inDoping.toFixed(1)} %.`,
    );
  }
  return notes;
}

function crystalWords(question: BulkQuestion, { melt, place }: Worked): string[] {
  if (question.fraction === null) return [];
  const notes = ['The doping given is the seed end’s; Scheil’s law leads to the fraction asked for.'];
  if (melt.length > 1) {
    const [donors, acceptors] = [place.donorsPerCm3, place.acceptorsPerCm3].map((d) => d.toExponential(3));
    notes.push(`There it holds ${donors} donors and ${acceptors} acceptors per cm³.`);
  }
  const turn = typeChangeFraction(melt);
  if (turn !== null) notes.push(`The crystal changes from p- to n-type at the fraction ${turn.toFixed(4)}.`);
  return notes;
}

/** What a person should know about the answer, in whole sentences. */
export function bulkNotes(question: BulkQuestion, worked: Worked): string[] {
  const { place, uncertaintyPercent } = worked;
  const { model, dopant, temperatureC } = question;
  const density = dopant === 'boron' ? place.acceptorsPerCm3 : place.donorsPerCm3;
  const notes =
    model === 'standard' ? standardWords(question, density, uncertaintyPercent) : mobilityNotes(model, place);
  if (model === 'masetti' && temperatureC + 273.15 !== 300) {
    notes.push(
      'The Masetti model holds at 300 K (26.85 °C) and is moved by the temperature ratio of the Arora model.',
    );
  }
  return [...notes, ...crystalWords(question, worked)];
}
