import type { DemoStream } from './demo-stream';
import { polarPlan } from './site-plans';
import { cause, NO_CAUSE, plainTarget, specificationAround } from './stream-parts';

const furnaceC: Omit<DemoStream, 'specification'> = {
  slug: 'phosphorus-furnace-c',
  name: 'Phosphorus diffusion, Furnace C',
  kind: 'diffusion',
  step: 'Phosphorus diffusion',
  tool: 'Furnace C',
  chamber: 'Tube 2',
  recipe: 'DIF-900-30',
  quantity: 'sheet_resistance',
  subgroup: 'run',
  subgroupSize: 3,
  chartedValue: 'statistic',
  ...polarPlan(200, 5, 3),
  target: plainTarget({
    quantity: 'sheet_resistance',
    dopant: 'phosphorus',
    densityPerCm3: 2e20,
    tolerancePercent: 6,
    profile: 'erfc',
    lengthUm: 0.25,
    backgroundDopant: 'boron',
    backgroundDensityPerCm3: 1e15,
  }),
  quiet: false,
  subgroupsPerDay: 4 / 3,
  fractions: [],
  slots: [5, 25, 45],
  making: {
    dopingPercent: cause(0.2, 0.25, { bowl: 0.3 }),
    lengthPercent: NO_CAUSE,
    temperatureC: cause(0.2, 0.12, { bowl: 0.5, rim: 0.5, tilt: 0.2, tiltDegrees: 300 }),
    setPointC: 900,
    patternVariation: 0.06,
    trueOverModel: 0.91,
  },
  probing: { gauge: 'Gauge 1', repeatabilityPercent: 0.12, occasionPercent: 0.06, thicknessPercent: 0 },
};

const furnaceA: Omit<DemoStream, 'specification'> = {
  ...furnaceC,
  slug: 'phosphorus-furnace-a',
  name: 'Phosphorus diffusion, Furnace A',
  tool: 'Furnace A',
  chamber: 'Tube 1',
  recipe: 'DIF-950-60',
  ...polarPlan(150, 5, 1),
  target: { ...furnaceC.target, densityPerCm3: 1e20, lengthUm: 0.6 },
  quiet: true,
  subgroupsPerDay: 1,
  making: {
    ...furnaceC.making,
    temperatureC: cause(0.25, 0.15, { bowl: 0.8, tilt: 0.3, tiltDegrees: 60 }),
    setPointC: 950,
    trueOverModel: 0.94,
  },
};

/** Phosphorus diffusions: one run of a furnace a subgroup, monitors at both ends and the middle of the boat. */
export const FURNACE_STREAMS: readonly DemoStream[] = [
  { ...furnaceC, specification: specificationAround(furnaceC, 8, 12, 3) },
  { ...furnaceA, specification: specificationAround(furnaceA, 8, 12, 4) },
];
