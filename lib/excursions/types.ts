import type { LimitSet } from '@/lib/control/limit-set';
import type { Target } from '@/lib/physics/target';
import type { ExcursionFamily, LinePoint } from './line';
import type { SubgroupWord } from './subgroup-label';

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
export interface BoardPoint extends Pick<ChartedFigures, 'level' | 'within'> {
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

/** Wafers to measure again as their page lists them. */
export interface MeasureAgainList {
  wafers: (WaferToMeasure & {
    stream: Pick<BoardStream, 'slug' | 'name'>;
    gauge: string | null;
    goodSites: number;
    /** Sites inside the edge exclusion. */
    countedSites: number;
  })[];
  /** The streams that have any, and how many. */
  streams: { slug: string; name: string; count: number }[];
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
  /** The target that the newest charted subgroup was measured against. */
  target: { id: string; target: Target } | null;
  /** Oldest first. */
  points: BoardPoint[];
  /** The first revision, those that judged the points and the worst case, and last the one in force now. */
  limits: BoardLimits[];
  newest: { id: string; wafer: string; runOrLot: string; measuredAt: Date } | null;
  /** What was expected of the newest charted subgroup; `expected` is null where its wafers differ in it. */
  charted: { expected: number | null; uncertaintyPercent: number; ingotFraction: number | null } | null;
  /** Of its `openCases`: out of specification before others, unanswered before answered, then the newest. */
  worst: BoardCase | null;
  openCases: number;
  unansweredCases: number;
  oldestUnansweredAt: Date | null;
  toMeasureAgain: WaferToMeasure[];
}

/** The stream of a case, as far as its page speaks of it. */
export interface CaseStream {
  id: string;
  slug: string;
  name: string;
  subgroup: SubgroupWord;
  quantity: Target['quantity'];
  chartedValue: 'statistic' | 'relative';
}

/** An excursion as a list shows it. */
export interface ListedExcursion {
  id: string;
  stream: Pick<CaseStream, 'slug' | 'name' | 'subgroup'>;
  chart: string;
  family: ExcursionFamily;
  side: Side;
  state: ExcursionState;
  openedAt: Date;
  acknowledgedBy: string | null;
  closedAt: Date | null;
  closedBy: string | null;
  cause: string | null;
  first: { key: string; at: Date };
  last: { key: string; at: Date };
  /** The newest that holds; null when all were withdrawn. */
  signal: SignalWords | null;
  signals: number;
}

/** What a list of excursions is asked for. `unclosed` are all that are not closed. */
export type ExcursionFilter = ExcursionState | 'unclosed' | 'all';

export interface ExcursionList {
  excursions: ListedExcursion[];
  /** Of the asked stream, or of all. */
  counts: Record<ExcursionState, number>;
  /** The streams that have excursions. */
  streams: { slug: string; name: string }[];
}

/** A subgroup that a signal names, with its wafers. */
export interface NamedSubgroup {
  id: string;
  key: string;
  at: Date;
  wafers: { id: string; wafer: string; runOrLot: string }[];
}

export interface CaseSignal extends SignalWords {
  id: string;
  /** The subgroup that completed the pattern first, those that took part then, the last that went on with it. */
  first: NamedSubgroup;
  participants: NamedSubgroup[];
  last: NamedSubgroup;
  limitsRevision: number | null;
  raisedAt: Date;
  withdrawnAt: Date | null;
  withdrawnReason: string | null;
}

export interface CaseEntry {
  id: string;
  at: Date;
  actor: string;
  action: 'opened' | 'joined' | 'acknowledged' | 'investigating' | 'noted' | 'closed';
  note: string;
}

/** A subgroup about a case. */
export interface CasePoint extends ChartedFigures {
  id: string;
  key: string;
  at: Date;
  state: LinePoint['state'];
  limitsId: string | null;
  completions: string[];
  outOfSpecification: boolean;
  /** How many of its wafers count. */
  wafers: number;
  firstWaferId: string | null;
}

/** A revision of the specification, as far as charts draw it. */
export interface CaseSpecification {
  revision: number;
  effectiveFrom: Date;
  meanLower: number | null;
  meanUpper: number | null;
  nonuniformityMetric: string | null;
  nonuniformityUpper: number | null;
}

export interface CaseLimits {
  id: string;
  revision: number;
  state: 'provisional' | 'approved';
  limits: LimitSet;
}

/** One excursion with all that its page tells. */
export interface ExcursionCase extends Omit<
  ListedExcursion,
  'stream' | 'signals' | 'signal' | 'first' | 'last'
> {
  stream: CaseStream;
  first: NamedSubgroup;
  last: NamedSubgroup;
  acknowledgedAt: Date | null;
  /** Newest first; withdrawn ones are among them. */
  signals: CaseSignal[];
  /** In the order they were written. */
  entries: CaseEntry[];
  /** From some subgroups before the first that took part to some after the last, in order. */
  points: CasePoint[];
  /** Those that judged the points. */
  limits: CaseLimits[];
  events: { at: Date; kind: string; text: string }[];
  /** Every revision of the stream's. */
  specifications: CaseSpecification[];
}
