import type { LimitSet } from '@/lib/control/limit-set';
import type { BoardCase, BoardLimits, BoardPoint, BoardStream } from '@/lib/excursions/types';

/** Limits of level 10 ± 3 with σ = 1; moving range below 4, within 0.5 to 2 %. */
export const LIMITS: LimitSet = {
  n: 120,
  level: { centre: 10, sigma: 1, lower: 7, upper: 13 },
  movingRange: { centre: 1.128, upper: 4 },
  within: { logMean: 0, logSigma: Math.LN2 / 3, lower: 0.5, centre: 1, upper: 2 },
  between: { centre: 0.5, upper: 1.5 },
};

export function boardLimits(change: Partial<BoardLimits> = {}): BoardLimits {
  return { id: '1', state: 'approved', inherited: false, limits: LIMITS, ...change };
}

export function boardPoint(level: number | null, change: Partial<BoardPoint> = {}): BoardPoint {
  return {
    state: level === null ? 'not-judged' : 'judged',
    level,
    within: level === null ? null : 1,
    limitsId: '1',
    levelCalls: false,
    withinCalls: false,
    ...change,
  };
}

export function boardCase(change: Partial<BoardCase> = {}): BoardCase {
  return {
    id: '41',
    chart: 'level',
    family: 'instability',
    state: 'open',
    openedAt: new Date('2031-03-04T05:00:00Z'),
    acknowledgedBy: null,
    signal: { chart: 'level', rule: 'beyond-3-sigma', side: 'above', participantIds: ['7'], completions: 1 },
    at: { level: 14, movingRange: 4, within: 1, between: null, limits: LIMITS },
    ...change,
  };
}

/** A steady stream of established limits; its worst case counts itself. */
export function boardStream(change: Partial<BoardStream> = {}): BoardStream {
  const worst = change.worst ?? null;
  const isUnanswered = worst?.state === 'open';
  return {
    id: '1',
    slug: 'a',
    name: 'A',
    step: 'Epitaxy',
    tool: 'Reactor 1',
    chamber: 'left',
    recipe: 'N-5',
    diameterMm: 200,
    chartedValue: 'statistic',
    target: null,
    points: [boardPoint(10), boardPoint(11)],
    limits: [boardLimits()],
    newest: { id: '9', wafer: '03', runOrLot: 'R1', measuredAt: new Date('2031-03-04T06:00:00Z') },
    charted: null,
    worst,
    openCases: worst === null ? 0 : 1,
    unansweredCases: isUnanswered ? 1 : 0,
    oldestUnansweredAt: isUnanswered ? worst.openedAt : null,
    toMeasureAgain: [],
    ...change,
  };
}
