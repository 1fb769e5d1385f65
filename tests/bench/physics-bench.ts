import { conductionResistivity } from '@/lib/physics/conduction-resistivity';
import { expectedValue } from '@/lib/physics/expected-value';
import { modelValue } from '@/lib/physics/model-value';
import type { Target } from '@/lib/physics/target';
import { mapAt23C } from '@/lib/probe/map-at-23c';
import { polarSites } from '@/lib/wafer/polar-sites';
import type { Figure } from './figure';
import { microseconds } from './microseconds';

const BORON: Target = {
  quantity: 'resistivity',
  dopant: 'boron',
  densityPerCm3: 1e15,
  tolerancePercent: null,
  alongCrystal: false,
  profile: 'uniform',
  lengthUm: null,
  backgroundDopant: null,
  backgroundDensityPerCm3: null,
  calibrationFactor: null,
  calibrationPercent: null,
};
const ON_N: Target = {
  ...BORON,
  quantity: 'sheet_resistance',
  densityPerCm3: 5e18,
  lengthUm: 0.5,
  backgroundDopant: 'phosphorus',
  backgroundDensityPerCm3: 1e15,
};
const depths = Array.from({ length: 100 }, (_, i) => i / 66);

const layers: [string, Target][] = [
  ['gaussian', { ...ON_N, profile: 'gaussian' }],
  ['erfc', { ...ON_N, profile: 'erfc' }],
  [
    'implant driven in',
    { ...ON_N, profile: 'implant', rangeUm: 0.1, lengthUm: 0.04, driveInC: 1000, driveInMin: 30 },
  ],
  [
    'profile of 100 depths',
    {
      ...ON_N,
      profile: 'pairs',
      pairs: depths.map((depthUm) => ({ depthUm, densityPerCm3: 5e18 * Math.exp(-4 * depthUm ** 2) })),
    },
  ],
];

/** What one expected value, one layer and one map corrected for its sites cost, in processor time; no database. */
export function physicsBench(): Figure[] {
  const density = (i: number): number => 1e14 * 1.0001 ** (i % 90_000);
  const bulk = microseconds(50_000, (i) => expectedValue({ ...BORON, densityPerCm3: density(i) }));
  const donors = microseconds(50_000, (i) =>
    expectedValue({ ...BORON, dopant: 'phosphorus', densityPerCm3: density(i) }),
  );
  const klaassen = microseconds(20_000, (i) =>
    conductionResistivity(
      'klaassen',
      { donor: 'phosphorus', donorsPerCm3: density(i), acceptorsPerCm3: 3e16 },
      296.15,
    ),
  );
  const sites = polarSites(5, 95);
  const resistances = sites.map((_, i) => 30 + i / 100);
  const probe = { spacingMm: 1, innerSpacingMm: 0.99, angleRadians: null, diameterMm: 200, thicknessUm: 725 };
  const map = microseconds(200, () => mapAt23C(BORON, sites, resistances, probe, 24.5));
  return [
    { name: 'expected value, boron by the standard', value: bulk, unit: 'µs', atMost: 2 },
    { name: 'expected value, phosphorus by the standard', value: donors, unit: 'µs', atMost: 2 },
    { name: 'Klaassen with neutrality, compensated', value: klaassen, unit: 'µs', atMost: 20 },
    ...layers.map(([name, target]) => ({
      name: `sheet resistance, ${name}`,
      value: microseconds(60, (i) => modelValue(target, target.densityPerCm3 * (1 + i / 1000))) / 1000,
      unit: 'ms',
      atMost: 1,
    })),
    { name: 'map of 121 sites of V/I to 23 °C, each by its place', value: map / 1000, unit: 'ms', atMost: 1 },
  ];
}
