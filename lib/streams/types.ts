import type { Target } from '@/lib/physics/target';
import type { Screen } from '@/lib/wafer/measure-wafer';
import type { Site } from '@/lib/wafer/site';

/** Where the probe reads, on wafers of which size. Never changed once it is there: a new plan is a new stream. */
export interface SitePlan {
  id: string;
  name: string;
  diameterMm: number;
  edgeExclusionMm: number;
  orientation: 'notch' | 'flat';
  sites: Site[];
}

export type StreamKind = 'substrate' | 'crystal' | 'epi' | 'implant' | 'diffusion';
export type SubgroupKind = 'wafer' | 'run' | 'lot' | 'ingot';
export type ControlStatistic = 'areaMean' | 'mean' | 'median';

/** One step, tool, chamber, recipe, target and site plan: what one control chart is about. */
export interface Stream {
  id: string;
  slug: string;
  name: string;
  kind: StreamKind;
  step: string;
  tool: string;
  chamber: string;
  recipe: string;
  quantity: Target['quantity'];
  plan: SitePlan;
  /** What is one point of its charts, and of how many wafers that consists. */
  subgroup: SubgroupKind;
  subgroupSize: number;
  controlStatistic: ControlStatistic;
  /** `statistic`: the control statistic itself; `relative`: 100·ln(measured/expected), in percent. */
  chartedValue: 'statistic' | 'relative';
  screening: Screen;
  repeatabilityPercent: number;
  retiredAt: Date | null;
}

/** A revision of what the stream aims at. In force for wafers processed from `effectiveFrom` on. */
export interface TargetRevision {
  id: string;
  revision: number;
  effectiveFrom: Date;
  target: Target;
  calibrationWafers: number | null;
  author: string;
  reason: string;
  createdAt: Date;
}

export type NonuniformityMetric =
  | 'relativeStandardDeviationPercent'
  | 'fullRangeOverMidrangePercent'
  | 'halfRangeOverMidrangePercent'
  | 'halfRangeOverMeanPercent'
  | 'radialVariationPercent';

/** What a customer or the next step accepts; neither the target's tolerance nor the control limits. */
export interface Specification {
  meanLower: number | null;
  meanUpper: number | null;
  siteLower: number | null;
  siteUpper: number | null;
  nonuniformityMetric: NonuniformityMetric | null;
  nonuniformityUpper: number | null;
}

export interface SpecificationRevision {
  id: string;
  revision: number;
  effectiveFrom: Date;
  specification: Specification;
  author: string;
  reason: string;
  createdAt: Date;
}

/** An adjustment or maintenance of the stream's tool. Rules never look across one marked `restart`. */
export interface StreamEvent {
  id: string;
  kind: 'adjustment' | 'maintenance';
  at: Date;
  restart: boolean;
  text: string;
  actor: string;
  recordedAt: Date;
}

/** A change of how readings are screened: wafers processed until `at` are screened the former way. */
export interface ScreeningChange {
  at: Date;
  former: Screen;
  screening: Screen;
  author: string;
  reason: string;
}

/** A stream with everything that decides how its wafers are measured. */
export interface StreamSettings {
  stream: Stream;
  targets: TargetRevision[];
  specifications: SpecificationRevision[];
  /** In the order in which they were made. */
  screenings: ScreeningChange[];
}

/** The unit a stream's readings are in. */
export function unitOf(quantity: Target['quantity']): string {
  return quantity === 'resistivity' ? 'Ω·cm' : 'Ω/□';
}

/** What comes of a write: what it made, or why it was not done. */
export type Result<Value = undefined> = { ok: true; value: Value } | { ok: false; reason: string };
