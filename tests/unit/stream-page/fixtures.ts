import type { SpanPoint } from '@/lib/excursions/span-points';
import type { SpanWafer } from '@/lib/excursions/span-wafers';
import type { StandingLimits } from '@/lib/excursions/stream-standing';
import type { Target } from '@/lib/physics/target';

export const MINUTE = 60_000;

export function spanPoint(nth: number, over: Partial<SpanPoint> = {}): SpanPoint {
  return {
    id: String(nth + 1),
    key: `M0001/${nth}/2031-04-05T06:07:00.000Z`,
    at: Date.parse('2031-04-05T06:00:00Z') + nth * MINUTE,
    state: 'judged',
    level: 10,
    movingRange: nth === 0 ? null : 0,
    within: 1,
    between: null,
    limitsId: null,
    completions: [],
    outOfSpecification: false,
    wafers: 1,
    ...over,
  };
}

export function spanWafer(subgroupId: string, over: Partial<SpanWafer> = {}): SpanWafer {
  return {
    id: `w${subgroupId}`,
    subgroupId,
    wafer: '07',
    runOrLot: 'M0001',
    lot: 'M0001',
    gauge: 'Gauge 2',
    measuredAt: 0,
    recordedAt: 0,
    history: false,
    value: 10,
    level: 10,
    within: 1,
    sites: 49,
    badSites: 0,
    notJudgedReason: null,
    outOfSpecification: false,
    targetId: 't1',
    expected: 13.306,
    expectedUncertaintyPercent: 2,
    ingotFraction: null,
    isMeasuredAgain: false,
    ...over,
  };
}

export const BORON: Target = {
  quantity: 'resistivity',
  dopant: 'boron',
  densityPerCm3: 1e15,
  tolerancePercent: 5,
  alongCrystal: false,
  profile: 'uniform',
  lengthUm: null,
  backgroundDopant: null,
  backgroundDensityPerCm3: null,
  calibrationFactor: null,
  calibrationPercent: null,
};

export function standingLimits(id: string, over: Partial<StandingLimits> = {}, n = 25): StandingLimits {
  return {
    id,
    revision: Number(id),
    state: 'approved',
    origin: 'chosen-span',
    effectiveFrom: new Date('2031-04-01T00:00:00Z'),
    supersededFrom: null,
    limits: {
      n,
      level: { centre: 10, sigma: 0.1, lower: 9.7, upper: 10.3 },
      movingRange: { centre: 0.11, upper: 0.42 },
      within: { logMean: 0, logSigma: 0.1, lower: 0.7, centre: 1, upper: 1.4 },
      between: null,
    },
    author: 'process owner',
    draftedAt: new Date('2031-04-01T00:00:00Z'),
    approvedBy: null,
    approvedAt: null,
    ...over,
  };
}
