import { UsageError } from '@/lib/command/verb';
import type { MobilityModel } from '@/lib/physics/conduction-resistivity';
import { conductionType, type Dopant } from '@/lib/physics/dopant';
import { number, pair, word, type Flags } from './expect-flags';

/** A question about silicon of one doping, as the flags ask it. */
export interface BulkQuestion {
  dopant: Dopant;
  densityPerCm3: number | null;
  resistivityOhmCm: number | null;
  inverse: 'numeric' | 'direct';
  /** Which fits of the standard: those at 23 °C, or those at 300 K. */
  conversion: '23c' | '300k';
  temperatureC: number;
  model: 'standard' | MobilityModel;
  counter: { dopant: Dopant; densityPerCm3: number } | null;
  fraction: number | null;
}

/** The doping or the resistivity that is given, and the inverse asked for. Throws `UsageError` unless it is one. */
export function given(flags: Flags): Pick<BulkQuestion, 'densityPerCm3' | 'resistivityOhmCm' | 'inverse'> {
  const densityPerCm3 = number(flags, 'density');
  const resistivityOhmCm = number(flags, 'resistivity');
  if ((densityPerCm3 === null) === (resistivityOhmCm === null)) {
    throw new UsageError('give --density or --resistivity, one of the two');
  }
  const inverse = word(flags, 'inverse', ['numeric', 'direct']);
  if (inverse !== null && resistivityOhmCm === null) {
    throw new UsageError('--inverse goes with --resistivity');
  }
  return { densityPerCm3, resistivityOhmCm, inverse: inverse ?? 'numeric' };
}

function counterOf(flags: Flags, dopant: Dopant): BulkQuestion['counter'] {
  const counter = pair(flags, 'counter');
  if (counter !== null && conductionType(counter.dopant) === conductionType(dopant)) {
    throw new UsageError(
      `--counter-dopant ${counter.dopant} does not counter ${dopant}: both give the same type`,
    );
  }
  return counter;
}

function modelOf(flags: Flags, isCompensated: boolean): BulkQuestion['model'] {
  const asked = word(flags, 'model', ['standard', 'masetti', 'arora', 'klaassen']);
  if (asked === 'standard' && isCompensated) {
    throw new UsageError(
      '--model standard knows one dopant; with a counter dopant choose masetti, arora or klaassen',
    );
  }
  return asked ?? (isCompensated ? 'masetti' : 'standard');
}

/** Reads a question about silicon of one doping; throws `UsageError` for what does not go together. */
export function bulkQuestion(flags: Flags, dopant: Dopant): BulkQuestion {
  const counter = counterOf(flags, dopant);
  const model = modelOf(flags, counter !== null);
  const asked = given(flags);
  if (asked.inverse === 'direct' && model !== 'standard') {
    throw new UsageError('--inverse direct is a fit of the standard');
  }
  const conversion = word(flags, 'conversion', ['23c', '300k']) ?? '23c';
  const temperatureC = number(flags, 'temperature-c') ?? (conversion === '300k' ? 26.85 : 23);
  if (conversion === '300k' && (model !== 'standard' || temperatureC !== 26.85)) {
    throw new UsageError('--conversion 300k is the standard’s at 26.85 °C; leave model and temperature out');
  }
  return { dopant, ...asked, conversion, temperatureC, model, counter, fraction: number(flags, 'fraction') };
}
