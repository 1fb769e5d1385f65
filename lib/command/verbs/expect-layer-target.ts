import { decimalNumber } from '@/lib/command/decimal-number';
import { readColumns } from '@/lib/command/read-columns';
import { UsageError } from '@/lib/command/verb';
import type { Dopant } from '@/lib/physics/dopant';
import { peakOfDose } from '@/lib/physics/layer-dose';
import { pairsShape, type DepthDensity } from '@/lib/physics/pairs-shape';
import { standardDensity } from '@/lib/physics/standard-density';
import type { Target } from '@/lib/physics/target';
import { given } from './expect-bulk-question';
import { number, pair, refuse, word, type Flags } from './expect-flags';
import { plainTarget } from './expect-plain-target';

const OF_BULK = [
  'density',
  'resistivity',
  'inverse',
  'conversion',
  'counter-dopant',
  'counter-density',
  'fraction',
  'thickness-um',
  'substrate-dopant',
  'substrate-density',
  'method',
] as const;

const OF_PROFILE: Readonly<Record<Exclude<Target['profile'], 'uniform'>, readonly (keyof Flags)[]>> = {
  box: ['peak-density', 'dose-per-cm2', 'length-um'],
  gaussian: ['peak-density', 'dose-per-cm2', 'length-um'],
  erfc: ['peak-density', 'dose-per-cm2', 'length-um'],
  implant: ['peak-density', 'dose-per-cm2', 'range-um', 'straggle-um', 'drive-in-c', 'drive-in-min'],
  pairs: ['pairs-file'],
};

function plain(dopant: Dopant, densityPerCm3: number, under: ReturnType<typeof pair>): Target {
  return {
    ...plainTarget('sheet_resistance', dopant, densityPerCm3),
    backgroundDopant: under?.dopant ?? null,
    backgroundDensityPerCm3: under?.densityPerCm3 ?? null,
  };
}

function standardOnly(flags: Flags): void {
  if ((word(flags, 'model', ['standard', 'masetti', 'arora', 'klaassen']) ?? 'standard') !== 'standard') {
    throw new UsageError('a layer is computed with --model standard only');
  }
}

async function pairsOf(flags: Flags): Promise<DepthDensity[]> {
  const file = flags['pairs-file'];
  if (file === undefined) throw new UsageError('--profile pairs needs --pairs-file');
  const read = await readColumns(file, ['depth_um', 'density_per_cm3']);
  const [fault] = read.ok ? [] : read.faults;
  if (!read.ok) throw new RangeError(`${file}:${fault?.line}:${fault?.column} ${fault?.reason}`);
  return read.rows.map(([depth, density]) => {
    const [depthUm, densityPerCm3] = [decimalNumber(depth?.text ?? ''), decimalNumber(density?.text ?? '')];
    if (depthUm === null || densityPerCm3 === null) {
      const cell = depthUm === null ? depth : density;
      throw new RangeError(`${file}:${cell?.line}:${cell?.column} no number: "${cell?.text}"`);
    }
    return { depthUm, densityPerCm3 };
  });
}

function needed(flags: Flags, name: Parameters<typeof number>[1], why: string): number {
  const value = number(flags, name);
  if (value === null) throw new UsageError(`${why} needs --${name}`);
  return value;
}

/** The layer that `--profile` and its flags describe, as a target. Throws `UsageError`, RangeError for a bad file. */
export async function layerTarget(
  flags: Flags,
  dopant: Dopant,
  profile: Exclude<Target['profile'], 'uniform'>,
): Promise<Target> {
  refuse(flags, OF_BULK, 'does not go with --profile');
  const strange = Object.values(OF_PROFILE)
    .flat()
    .find((name) => flags[name] !== undefined && !OF_PROFILE[profile].includes(name));
  if (strange !== undefined) throw new UsageError(`--${strange} does not go with a ${profile} layer`);
  standardOnly(flags);
  const background = pair(flags, 'background');
  if (background === null && profile !== 'box' && profile !== 'pairs') {
    throw new UsageError(`a layer of ${profile} shape needs --background-dopant and --background-density`);
  }
  if (profile === 'pairs') {
    const pairs = await pairsOf(flags);
    return { ...plain(dopant, pairsShape(pairs).peakDensityPerCm3, background), profile, pairs };
  }
  const lengthUm = needed(flags, profile === 'implant' ? 'straggle-um' : 'length-um', `a ${profile} layer`);
  const [peak, dose] = [number(flags, 'peak-density'), number(flags, 'dose-per-cm2')];
  if ((peak === null) === (dose === null)) {
    throw new UsageError('a layer needs --peak-density or --dose-per-cm2, one of the two');
  }
  const implant = {
    rangeUm: 0,
    driveInC: number(flags, 'drive-in-c'),
    driveInMin: number(flags, 'drive-in-min'),
  };
  if (profile === 'implant') implant.rangeUm = needed(flags, 'range-um', 'an implant');
  const shape =
    profile === 'implant'
      ? { profile, lengthUm, rangeUm: implant.rangeUm, spreadUm2: 0 }
      : { profile, lengthUm };
  const densityPerCm3 = peak ?? peakOfDose(shape, dose ?? Number.NaN);
  const target = { ...plain(dopant, densityPerCm3, background), profile, lengthUm };
  if (profile !== 'implant') return target;
  if ((implant.driveInC === null) !== (implant.driveInMin === null)) {
    throw new UsageError('--drive-in-c and --drive-in-min go together');
  }
  return { ...target, ...implant };
}

/** A grown layer of one doping and thickness on its substrate. Throws `UsageError`, RangeError beyond the conversion. */
export function epiTarget(flags: Flags, dopant: Dopant): Target {
  refuse(
    flags,
    ['counter-dopant', 'counter-density', 'fraction', 'conversion'],
    'does not go with --thickness-um',
  );
  standardOnly(flags);
  const { densityPerCm3, resistivityOhmCm, inverse } = given(flags);
  const density = densityPerCm3 ?? standardDensity(dopant, resistivityOhmCm ?? Number.NaN, inverse);
  return {
    ...plain(dopant, density, pair(flags, 'substrate')),
    lengthUm: number(flags, 'thickness-um'),
    method: word(flags, 'method', ['four-point', 'other']),
  };
}
