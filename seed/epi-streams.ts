import type { DemoStream, Making } from './demo-stream';
import { polarPlan } from './site-plans';
import { cause, NO_CAUSE, plainTarget, specificationAround } from './stream-parts';

/** Autodoping from the substrate moves the junction up: beyond what it depletes, layers end a few percent early. */
const making: Making = {
  dopingPercent: cause(0.7, 0.2, { bowl: 1.2, rim: 0.8, tilt: 0.7, tiltDegrees: 20 }),
  lengthPercent: cause(0.35, 0.15, { bowl: -0.6, rim: 0.5 }),
  temperatureC: NO_CAUSE,
  setPointC: null,
  patternVariation: 0.07,
  trueOverModel: 1.04,
};

function epi(part: Omit<DemoStream, 'kind' | 'step' | 'specification' | 'quiet' | 'fractions'>): DemoStream {
  const specification = specificationAround(part, 8, 12, 3);
  return { ...part, kind: 'epi', step: 'Epitaxy', specification, quiet: false, fractions: [] };
}

const probing = { repeatabilityPercent: 0.14, occasionPercent: 0.06, thicknessPercent: 0.2 };

/** Epitaxial layers on substrates of the other type, without which a probe would measure the substrate. */
export const EPI_STREAMS: readonly DemoStream[] = [
  epi({
    slug: 'n-epi-on-p',
    name: 'N-epi on p, 200 mm',
    tool: 'Reactor 1',
    chamber: '',
    recipe: 'N-12-4',
    quantity: 'resistivity',
    subgroup: 'wafer',
    subgroupSize: 1,
    chartedValue: 'statistic',
    ...polarPlan(200, 5, 3),
    target: plainTarget({
      dopant: 'phosphorus',
      densityPerCm3: 1e15,
      tolerancePercent: 5,
      lengthUm: 12,
      backgroundDopant: 'boron',
      backgroundDensityPerCm3: 1e15,
    }),
    subgroupsPerDay: 3,
    slots: [],
    making,
    probing: { gauge: 'Gauge 2', ...probing },
  }),
  epi({
    slug: 'n-epi-on-p-300',
    name: 'N-epi on p, 300 mm',
    tool: 'Reactor 2',
    chamber: 'A',
    recipe: 'N-4-08',
    quantity: 'sheet_resistance',
    subgroup: 'lot',
    subgroupSize: 3,
    chartedValue: 'relative',
    ...polarPlan(300, 3, 5),
    target: plainTarget({
      quantity: 'sheet_resistance',
      dopant: 'phosphorus',
      densityPerCm3: 8e15,
      tolerancePercent: 5,
      lengthUm: 4,
      backgroundDopant: 'boron',
      backgroundDensityPerCm3: 1e15,
    }),
    subgroupsPerDay: 1,
    slots: [2, 13, 24],
    making: {
      ...making,
      dopingPercent: cause(0.6, 0.3, { bowl: 0.9, rim: 1.1, tilt: 0.4, tiltDegrees: 250 }),
    },
    probing: { gauge: 'Gauge 3', ...probing },
  }),
  epi({
    slug: 'p-epi-on-n',
    name: 'P-epi on n, 200 mm',
    tool: 'Reactor 3',
    chamber: '',
    recipe: 'P-10-13',
    quantity: 'sheet_resistance',
    subgroup: 'wafer',
    subgroupSize: 1,
    chartedValue: 'relative',
    ...polarPlan(200, 5, 3),
    target: plainTarget({
      quantity: 'sheet_resistance',
      dopant: 'boron',
      densityPerCm3: 1e15,
      tolerancePercent: 5,
      lengthUm: 10,
      backgroundDopant: 'phosphorus',
      backgroundDensityPerCm3: 1e15,
    }),
    subgroupsPerDay: 3,
    slots: [],
    making: {
      ...making,
      dopingPercent: cause(0.8, 0.2, { bowl: 1.5, rim: 0.6, tilt: 0.5, tiltDegrees: 130 }),
    },
    probing: { gauge: 'Gauge 2', ...probing },
  }),
];
