import type { DemoStream } from './demo-stream';
import { polarPlan } from './site-plans';
import { cause, NO_CAUSE, plainTarget } from './stream-parts';

const boron: DemoStream = {
  slug: 'boron-crystal',
  name: 'Boron crystals, 200 mm',
  kind: 'crystal',
  step: 'Crystal growth',
  tool: 'Puller 1',
  chamber: '',
  recipe: 'P-200-13',
  quantity: 'resistivity',
  subgroup: 'ingot',
  subgroupSize: 5,
  chartedValue: 'relative',
  ...polarPlan(200, 5, 3),
  target: plainTarget({ dopant: 'boron', densityPerCm3: 1e15, tolerancePercent: 8, alongCrystal: true }),
  specification: {
    meanLower: 8,
    meanUpper: 15,
    siteLower: 7.5,
    siteUpper: 16,
    nonuniformityMetric: 'relativeStandardDeviationPercent',
    nonuniformityUpper: 3,
  },
  quiet: false,
  subgroupsPerDay: 2 / 3,
  fractions: [0.05, 0.25, 0.45, 0.65, 0.85],
  slots: [],
  making: {
    dopingPercent: cause(1.2, 0.35, { bowl: -1.6, tilt: 0.4, tiltDegrees: 70 }),
    lengthPercent: NO_CAUSE,
    temperatureC: NO_CAUSE,
    setPointC: null,
    patternVariation: 0.12,
    trueOverModel: 1.006,
  },
  probing: { gauge: 'Gauge 1', repeatabilityPercent: 0.12, occasionPercent: 0.06, thicknessPercent: 0 },
};

const phosphorus: DemoStream = {
  ...boron,
  slug: 'phosphorus-crystal',
  name: 'Phosphorus crystals, 150 mm',
  tool: 'Puller 2',
  recipe: 'N-150-4',
  subgroupSize: 4,
  ...polarPlan(150, 5, 1),
  target: plainTarget({
    dopant: 'phosphorus',
    densityPerCm3: 1e15,
    tolerancePercent: 10,
    alongCrystal: true,
  }),
  specification: {
    meanLower: 1.4,
    meanUpper: 5,
    siteLower: 1.3,
    siteUpper: 5.3,
    nonuniformityMetric: 'relativeStandardDeviationPercent',
    nonuniformityUpper: 5,
  },
  subgroupsPerDay: 1,
  fractions: [0.05, 0.3, 0.55, 0.8],
  making: {
    ...boron.making,
    dopingPercent: cause(1.6, 0.5, { bowl: -3.2, tilt: 0.5, tiltDegrees: 200 }),
    trueOverModel: 0.992,
  },
};

/** Substrates measured along their crystals: each ingot a subgroup, charted against Scheil's law. */
export const CRYSTAL_STREAMS: readonly DemoStream[] = [boron, phosphorus];
