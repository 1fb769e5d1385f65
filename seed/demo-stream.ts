import type { Target } from '@/lib/physics/target';
import type { Site } from '@/lib/wafer/site';

/** How one cause is spread over a wafer, in the unit of the cause; each part is zero on average over the disc. */
export interface SpreadOverWafer {
  /** Rim minus centre of a bowl, r². */
  bowl: number;
  /** What the outermost rim adds, r⁸. */
  rim: number;
  /** Full width across the wafer along `tiltDegrees` against +x. */
  tilt: number;
  tiltDegrees: number;
}

/** One cause: its spread over the wafer, and how it varies from run to run and from wafer to wafer (normal, s). */
export interface Cause {
  spread: SpreadOverWafer;
  runToRun: number;
  waferToWafer: number;
}

/** What makes the wafers of a stream differ. */
export interface Making {
  /** Dopant density, in percent. */
  dopingPercent: Cause;
  /** Layer thickness or profile length, in percent. */
  lengthPercent: Cause;
  /** Furnace temperature at the wafer, in °C about its set point; acts on the profile length. */
  temperatureC: Cause;
  /** Set point of the furnace, °C; null where no furnace makes the profile. */
  setPointC: number | null;
  /** Relative variation of every pattern's strength from wafer to wafer. */
  patternVariation: number;
  /** True value over the model's: activation, depletion and the conversion's own error. */
  trueOverModel: number;
}

/** What the four-point probe adds: percent of the reading, normal. */
export interface Probing {
  gauge: string;
  repeatabilityPercent: number;
  /** From one wafer to the next, all sites together. */
  occasionPercent: number;
  /** Relative error of the thickness that goes with a layer, percent. */
  thicknessPercent: number;
}

/** Specification of a stream, in the unit of its quantity. */
export interface DemoSpecification {
  meanLower: number | null;
  meanUpper: number | null;
  siteLower: number | null;
  siteUpper: number | null;
  nonuniformityMetric: 'relativeStandardDeviationPercent' | null;
  nonuniformityUpper: number | null;
}

/** One process stream of the demonstration line: what the program is told, and how the wafers are truly made. */
export interface DemoStream {
  slug: string;
  name: string;
  kind: 'substrate' | 'crystal' | 'epi' | 'implant' | 'diffusion';
  step: string;
  tool: string;
  chamber: string;
  recipe: string;
  quantity: 'resistivity' | 'sheet_resistance';
  subgroup: 'wafer' | 'run' | 'lot' | 'ingot';
  subgroupSize: number;
  chartedValue: 'statistic' | 'relative';
  diameterMm: number;
  edgeExclusionMm: number;
  sites: readonly Site[];
  sitePlanName: string;
  target: Target;
  specification: DemoSpecification | null;
  /** One of the two streams on which nothing whatever happens. */
  quiet: boolean;
  subgroupsPerDay: number;
  /** Solidified fractions at which an ingot's wafers are cut; empty where no crystal is measured. */
  fractions: readonly number[];
  /** Boat slots or lot positions of a subgroup's wafers; empty where there are none. */
  slots: readonly number[];
  making: Making;
  probing: Probing;
}
