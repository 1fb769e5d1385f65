import { compensatedDoping, isCompensated } from '@/lib/physics/compensated-target';
import { conductionResistivity, type Doping, type MobilityModel } from '@/lib/physics/conduction-resistivity';
import { modelSpreadPercent } from '@/lib/physics/model-spread';
import type { Target } from '@/lib/physics/target';
import { standardBoundPercent } from '@/lib/physics/standard-bound';
import { standardResistivity300K } from '@/lib/physics/standard-conversion-300k';
import { standardResistivity } from '@/lib/physics/standard-resistivity';

/** One way from doping to resistivity, at the doping in question. */
export interface ModelRow {
  model: string;
  source: string;
  temperature: string;
  /** Null outside the model's range. */
  resistivityOhmCm: number | null;
  /** A bound: the standard's self-consistency, or how far a model strays from it over 1e13…1e20. */
  boundPercent: number | null;
}

const MODELS: readonly [MobilityModel, string, string][] = [
  ['masetti', 'Masetti', 'Masetti, Severi, Solmi, IEEE T-ED 30, 764 (1983)'],
  ['arora', 'Arora', 'Arora, Hauser, Roulston, IEEE T-ED 29, 292 (1982)'],
  ['klaassen', 'Klaassen', 'Klaassen, Solid-State Electron. 35, 953 and 961 (1992)'],
];

/** Every published way to the resistivity of uniform silicon of this doping, the standard first. Never mixed with each other. */
export function modelRows(target: Target, densityPerCm3: number, ingotFraction: number | null): ModelRow[] {
  const { dopant } = target;
  const isMixed = isCompensated(target);
  const doping: Doping = isMixed
    ? compensatedDoping(target, densityPerCm3, { ingotFraction })
    : dopant === 'boron'
      ? { donor: 'phosphorus', donorsPerCm3: 0, acceptorsPerCm3: densityPerCm3 }
      : { donor: dopant, donorsPerCm3: densityPerCm3, acceptorsPerCm3: 0 };
  const fit = dopant === 'boron' ? 'boron' : 'phosphorus';
  const standard: ModelRow[] = [
    {
      model: 'standard',
      source: 'ASTM F723 / SEMI MF723, after NBS SP 400-64 (1981)',
      temperature: '23 °C',
      resistivityOhmCm: orNull(() => standardResistivity(dopant, densityPerCm3)),
      boundPercent: standardBoundPercent(dopant),
    },
    {
      model: `the same, ${fit} at 300 K`,
      source: 'NBS SP 400-64 (1981)',
      temperature: '300 K',
      resistivityOhmCm: orNull(() => standardResistivity300K(fit, densityPerCm3)),
      boundPercent: standardBoundPercent(dopant),
    },
  ];
  const models = MODELS.map(([model, name, source]) => ({
    model: name,
    source,
    temperature: '300 K',
    resistivityOhmCm: orNull(() => conductionResistivity(model, doping, 300)),
    boundPercent: modelSpreadPercent(model, dopant),
  }));
  return isMixed ? models : [...standard, ...models];
}

function orNull(work: () => number): number | null {
  try {
    return work();
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
