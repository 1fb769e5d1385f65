import type { Target } from '@/lib/physics/target';
import { type LimitRow, limitSetOf } from './line-rows';
import type { BoardCase, BoardLimits, BoardPoint, BoardStream, ChartedFigures } from './types';

type LimitsJson = Omit<
  LimitRow,
  'streamId' | 'revision' | 'effectiveFrom' | 'supersededFrom' | 'baselineIds'
> & {
  state: BoardLimits['state'];
  origin: string;
};

type CaseJson = Omit<BoardCase, 'openedAt' | 'at'> & {
  openedAt: string;
  at: ChartedFigures | null;
  limitsId: string | null;
};

/** state, level, within, limit revision, completions if any, specification faults if any */
type PointJson = [
  BoardPoint['state'],
  number | null,
  number | null,
  string | null,
  string[] | null,
  string[] | null,
];

/** A stream as the board's statement gives it; times within JSON are texts. */
export interface BoardStreamRow {
  id: string;
  slug: string;
  name: string;
  step: string;
  tool: string;
  chamber: string;
  recipe: string;
  quantity: Target['quantity'];
  charted_value: BoardStream['chartedValue'];
  diameter_mm: number;
  points: PointJson[] | null;
  newest: [id: string, wafer: string, runOrLot: string, measuredAt: string] | null;
  charted: [expected: number | null, uncertaintyPercent: number, ingotFraction: number | null] | null;
  again: [id: string, wafer: string, runOrLot: string, measuredAt: string, reason: string][] | null;
  target: (Omit<Target, 'quantity'> & { id: string }) | null;
  limits: LimitsJson[] | null;
  worst: CaseJson | null;
  open_cases: number;
  unanswered_cases: number;
  oldest_unanswered_at: Date | null;
}

export function boardStreamOf(row: BoardStreamRow): BoardStream {
  const { id, slug, name, step, tool, chamber, recipe, newest, charted } = row;
  const limits = (row.limits ?? []).map(boardLimitsOf);
  return {
    id,
    slug,
    name,
    step,
    tool,
    chamber,
    recipe,
    diameterMm: row.diameter_mm,
    chartedValue: row.charted_value,
    target: row.target === null ? null : targetOf(row.target, row.quantity),
    points: (row.points ?? []).map(pointOf),
    limits,
    newest: newest && {
      id: newest[0],
      wafer: newest[1],
      runOrLot: newest[2],
      measuredAt: new Date(newest[3]),
    },
    charted: charted && { expected: charted[0], uncertaintyPercent: charted[1], ingotFraction: charted[2] },
    worst: row.worst && caseOf(row.worst, limits),
    openCases: row.open_cases,
    unansweredCases: row.unanswered_cases,
    oldestUnansweredAt: row.oldest_unanswered_at,
    toMeasureAgain: (row.again ?? []).map(([waferId, wafer, runOrLot, measuredAt, reason]) => ({
      id: waferId,
      wafer,
      runOrLot,
      measuredAt: new Date(measuredAt),
      reason,
    })),
  };
}

function targetOf(
  { id, ...target }: Omit<Target, 'quantity'> & { id: string },
  quantity: Target['quantity'],
) {
  return { id, target: { quantity, ...target } };
}

function pointOf(row: PointJson): BoardPoint {
  const [state, level, within, limitsId, completions, faults] = row;
  const isUneven = (fault: string) => fault.includes(':nonuniformity:');
  const levelCalls = faults?.some((fault) => !isUneven(fault)) || completes(completions, 'level');
  const withinCalls = faults?.some(isUneven) || completes(completions, 'within');
  return { state, level, within, limitsId, levelCalls, withinCalls };
}

function completes(completions: readonly string[] | null, chart: string): boolean {
  return completions?.some((completion) => completion.startsWith(`${chart}:`)) ?? false;
}

function boardLimitsOf(row: LimitsJson): BoardLimits {
  return { id: row.id, state: row.state, inherited: row.origin === 'inherited', limits: limitSetOf(row) };
}

function caseOf({ openedAt, at, limitsId, ...rest }: CaseJson, limits: readonly BoardLimits[]): BoardCase {
  const judgedBy = limits.find((revision) => revision.id === limitsId)?.limits ?? null;
  return { ...rest, openedAt: new Date(openedAt), at: at && { ...at, limits: judgedBy } };
}
