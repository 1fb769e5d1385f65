import type { LimitSet } from '@/lib/control/limit-set';
import type { Target } from '@/lib/physics/target';
import type { ExcursionFamily, LinePoint } from './line';

export type ExcursionState = 'open' | 'acknowledged' | 'under-investigation' | 'closed';
export type Side = 'above' | 'below';

/** A signal as sentences are made of it. */
export interface SignalWords {
  chart: string;
  rule: string;
  side: Side;
  participantIds: readonly string[];
  completions: number;
}

/** The charted figures of one subgroup. */
export interface ChartedFigures {
  level: number | null;
  movingRange: number | null;
  within: number | null;
  between: number | null;
}

/** A limit revision as the board knows it. */
export interface BoardLimits {
  id: string;
  state: 'provisional' | 'approved';
  inherited: boolean;
  limits: LimitSet;
}

/** One subgroup on the board. */
export interface BoardPoint extends ChartedFigures {
  state: LinePoint['state'];
  limitsId: string | null;
  /** It completes a rule on the level chart, or is out of the specification of mean or site. */
  levelCalls: boolean;
  /** It completes a rule on the within-wafer chart, or is less even than specified. */
  withinCalls: boolean;
}

/** A case that is not closed, with the newest of its signals that holds; `at` are the figures where that stands now. */
export interface BoardCase {
  id: string;
  chart: string;
  family: ExcursionFamily;
  state: ExcursionState;
  openedAt: Date;
  acknowledgedBy: string | null;
  signal: SignalWords | null;
  at: (ChartedFigures & { limits: LimitSet | null }) | null;
}

/** A wafer that was recorded but not judged, and has not been measured again since. */
export interface WaferToMeasure {
  id: string;
  wafer: string;
  runOrLot: string;
  measuredAt: Date;
  reason: string;
}

/** A stream as the board reads it: its last 30 subgroups and nothing that grows with its history. */
export interface BoardStream {
  id: string;
  slug: string;
  name: string;
  step: string;
  tool: string;
  chamber: string;
  recipe: string;
  diameterMm: number;
  chartedValue: 'statistic' | 'relative';
  /** The latest target in force. */
  target: { id: string; target: Target } | null;
  /** Oldest first. */
  points: BoardPoint[];
  /** The first revision, those that judged the points, and last the one in force now. */
  limits: BoardLimits[];
  newest: { id: string; wafer: string; runOrLot: string; measuredAt: Date } | null;
  /** What the newest charted subgroup was measured against, averaged over its wafers. */
  charted: { expected: number | null; targetId: string | null; ingotFraction: number | null } | null;
  /** The worst cases first, a few of them; `openCases` counts all that are not closed. */
  cases: BoardCase[];
  openCases: number;
  unansweredCases: number;
  oldestUnansweredAt: Date | null;
  toMeasureAgain: WaferToMeasure[];
}
