import type { DemoStream } from './demo-stream';
import { polarPlan, type PlannedSites } from './site-plans';
import { cause, NO_CAUSE, plainTarget, specificationAround } from './stream-parts';

interface ImplantPart {
  slug: string;
  name: string;
  tool: string;
  recipe: string;
  dopant: 'boron' | 'arsenic';
  peakDensityPerCm3: number;
  lengthUm: number;
  trueOverModel: number;
  doseRunPercent: number;
  tiltDegrees: number;
  perDay: number;
  gauge: string;
  plan: PlannedSites;
  quiet?: boolean;
}

function implant(part: ImplantPart): DemoStream {
  const stream: Omit<DemoStream, 'specification'> = {
    slug: part.slug,
    name: part.name,
    kind: 'implant',
    step: 'Implant and anneal',
    tool: part.tool,
    chamber: '',
    recipe: part.recipe,
    quantity: 'sheet_resistance',
    subgroup: 'wafer',
    subgroupSize: 1,
    chartedValue: 'statistic',
    ...part.plan,
    target: plainTarget({
      quantity: 'sheet_resistance',
      dopant: part.dopant,
      densityPerCm3: part.peakDensityPerCm3,
      tolerancePercent: 3,
      profile: 'gaussian',
      lengthUm: part.lengthUm,
      backgroundDopant: part.dopant === 'boron' ? 'phosphorus' : 'boron',
      backgroundDensityPerCm3: 1e15,
    }),
    quiet: part.quiet ?? false,
    subgroupsPerDay: part.perDay,
    fractions: [],
    slots: [],
    making: {
      dopingPercent: cause(part.doseRunPercent, 0, { bowl: 0.5, tilt: 0.6, tiltDegrees: part.tiltDegrees }),
      lengthPercent: cause(0.12, 0, { bowl: -0.3, rim: 0.4 }),
      temperatureC: NO_CAUSE,
      setPointC: null,
      patternVariation: 0.08,
      trueOverModel: part.trueOverModel,
    },
    probing: { gauge: part.gauge, repeatabilityPercent: 0.12, occasionPercent: 0.05, thicknessPercent: 0 },
  };
  return { ...stream, specification: specificationAround(stream, 4, 6, 1.5) };
}

/** Implant monitors, annealed and probed: every wafer a subgroup. */
export const IMPLANT_STREAMS: readonly DemoStream[] = [
  implant({
    slug: 'boron-implant-1',
    name: 'Boron monitors, Implanter 1',
    tool: 'Implanter 1',
    recipe: 'B-5E14',
    dopant: 'boron',
    peakDensityPerCm3: 5e19,
    lengthUm: 0.12,
    trueOverModel: 1.09,
    doseRunPercent: 0.28,
    tiltDegrees: 90,
    perDay: 2,
    gauge: 'Gauge 1',
    plan: polarPlan(200, 5, 3),
  }),
  implant({
    slug: 'boron-implant-2',
    name: 'Boron monitors, Implanter 2',
    tool: 'Implanter 2',
    recipe: 'B-1E15',
    dopant: 'boron',
    peakDensityPerCm3: 8e19,
    lengthUm: 0.14,
    trueOverModel: 1.12,
    doseRunPercent: 0.25,
    tiltDegrees: 0,
    perDay: 2,
    gauge: 'Gauge 3',
    plan: polarPlan(300, 3, 5),
  }),
  implant({
    slug: 'boron-implant-3',
    name: 'Boron monitors, Implanter 3',
    tool: 'Implanter 3',
    recipe: 'B-2E13',
    dopant: 'boron',
    peakDensityPerCm3: 1e18,
    lengthUm: 0.25,
    trueOverModel: 1.05,
    doseRunPercent: 0.35,
    tiltDegrees: 45,
    perDay: 4 / 3,
    gauge: 'Gauge 2',
    plan: polarPlan(200, 5, 1),
    quiet: true,
  }),
  implant({
    slug: 'arsenic-implant-1',
    name: 'Arsenic monitors, Implanter 1',
    tool: 'Implanter 1',
    recipe: 'AS-1E15',
    dopant: 'arsenic',
    peakDensityPerCm3: 1.5e20,
    lengthUm: 0.08,
    trueOverModel: 1.14,
    doseRunPercent: 0.3,
    tiltDegrees: 90,
    perDay: 2,
    gauge: 'Gauge 1',
    plan: polarPlan(200, 5, 3),
  }),
  implant({
    slug: 'arsenic-implant-2',
    name: 'Arsenic monitors, Implanter 2',
    tool: 'Implanter 2',
    recipe: 'AS-3E15',
    dopant: 'arsenic',
    peakDensityPerCm3: 3e20,
    lengthUm: 0.11,
    trueOverModel: 1.17,
    doseRunPercent: 0.28,
    tiltDegrees: 0,
    perDay: 4,
    gauge: 'Gauge 4',
    plan: polarPlan(300, 3, 3),
  }),
];
