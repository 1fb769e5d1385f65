import { UsageError } from '@/lib/command/verb';
import type { MobilityModel } from '@/lib/physics/conduction-resistivity';
import { conductionType, DOPANTS, type Dopant } from '@/lib/physics/dopant';
import type { Layer } from '@/lib/physics/layer';
import { expectFlags, number, pair, refuse, word, type Flags } from './expect-flags';

/** A question about silicon of one doping, as the flags ask it. */
export interface BulkQuestion {
  dopant: Dopant;
  densityPerCm3: number | null;
  resistivityOhmCm: number | null;
  inverse: 'numeric' | 'direct';
  temperatureC: number;
  model: 'standard' | MobilityModel;
  counter: { dopant: Dopant; densityPerCm3: number } | null;
  fraction: number | null;
}

/** What the flags of `expect` ask. */
export type ExpectQuestion = { json: boolean } & ({ bulk: BulkQuestion } | { layer: Layer });

function layerQuestion(flags: Flags, dopant: Dopant, profile: Layer['profile']): Layer {
  refuse(
    flags,
    ['density', 'resistivity', 'inverse', 'temperature-c', 'counter-dopant', 'counter-density', 'fraction'],
    'does not go with --profile: a layer is given by --peak-density and --length-um, at 23 °C',
  );
  if ((word(flags, 'model', ['standard', 'masetti', 'arora', 'klaassen']) ?? 'standard') !== 'standard') {
    throw new UsageError('a layer is computed with --model standard only');
  }
  const peakDensityPerCm3 = number(flags, 'peak-density');
  const lengthUm = number(flags, 'length-um');
  if (peakDensityPerCm3 === null || lengthUm === null) {
    throw new UsageError('a layer needs --peak-density and --length-um');
  }
  const background = pair(flags, 'background');
  if (background === null && profile !== 'box') {
    throw new UsageError(`a ${profile} layer needs --background-dopant and --background-density`);
  }
  return {
    profile,
    dopant,
    peakDensityPerCm3,
    lengthUm,
    backgroundDopant: background?.dopant ?? null,
    backgroundDensityPerCm3: background?.densityPerCm3 ?? null,
  };
}

function bulkQuestion(flags: Flags, dopant: Dopant): BulkQuestion {
  refuse(
    flags,
    ['peak-density', 'length-um', 'background-dopant', 'background-density'],
    'goes with --profile box, gaussian or erfc',
  );
  const densityPerCm3 = number(flags, 'density');
  const resistivityOhmCm = number(flags, 'resistivity');
  if ((densityPerCm3 === null) === (resistivityOhmCm === null)) {
    throw new UsageError('give --density or --resistivity, one of the two');
  }
  const counter = pair(flags, 'counter');
  if (counter !== null && conductionType(counter.dopant) === conductionType(dopant)) {
    throw new UsageError(
      `--counter-dopant ${counter.dopant} does not counter ${dopant}: both give the same type`,
    );
  }
  const asked = word(flags, 'model', ['standard', 'masetti', 'arora', 'klaassen']);
  if (asked === 'standard' && counter !== null) {
    throw new UsageError(
      '--model standard knows one dopant; with a counter dopant choose masetti, arora or klaassen',
    );
  }
  const model = asked ?? (counter === null ? 'standard' : 'masetti');
  const inverse = word(flags, 'inverse', ['numeric', 'direct']);
  if (inverse !== null && resistivityOhmCm === null)
    throw new UsageError('--inverse goes with --resistivity');
  if (inverse === 'direct' && model !== 'standard')
    throw new UsageError('--inverse direct is a fit of the standard');
  return {
    dopant,
    densityPerCm3,
    resistivityOhmCm,
    inverse: inverse ?? 'numeric',
    temperatureC: number(flags, 'temperature-c') ?? 23,
    model,
    counter,
    fraction: number(flags, 'fraction'),
  };
}

/** Reads the flags of `expect`; throws `UsageError` for what does not go together. */
export function expectQuestion(args: string[]): ExpectQuestion {
  const flags = expectFlags(args);
  const dopant = word(flags, 'dopant', DOPANTS);
  if (dopant === null) throw new UsageError(`--dopant is needed: ${DOPANTS.join(', ')}`);
  const profile = word(flags, 'profile', ['box', 'gaussian', 'erfc']);
  const json = flags.json === true;
  return profile === null
    ? { json, bulk: bulkQuestion(flags, dopant) }
    : { json, layer: layerQuestion(flags, dopant, profile) };
}
