import { describe, expect, it } from 'vitest';
import { chanceLimits, chanceStream } from '@/lib/control/chance-stream';
import { chartRunLength } from '@/lib/control/chart-run-length';
import { chebyshevSurface } from '@/lib/control/chebyshev-surface';
import { completionsAt, type ChartPoint } from '@/lib/control/completions-at';
import { conditionalRate } from '@/lib/control/conditional-rate';
import { falseCases } from '@/lib/control/false-cases';
import { limitSet, type SubgroupPoint } from '@/lib/control/limit-set';
import { WESTERN_ELECTRIC } from '@/lib/control/rule';
import { ruleRunLength } from '@/lib/control/rule-run-length';
import { falseSignalsPerWeek, wideningFor } from '@/lib/control/widening-for';
import { mean } from '@/lib/stats/mean';
import { seededRandom } from '@/lib/stats/seeded-random';

const FOUR = { kind: 'rules', rules: WESTERN_ELECTRIC } as const;
const THREE_SIGMA = { kind: 'rules', rules: ['beyond-3-sigma'] } as const;

const shape = { within: true, wafers: 3 };

/** Cases counted point by point as the program judges: at a signal on any chart, then the rules begin afresh. */
function judgedCases(baseline: number | null, points: number, draw: () => SubgroupPoint): number {
  const limits =
    baseline === null ? chanceLimits(shape) : limitSet(Array.from({ length: baseline }, () => draw()));
  const line: ChartPoint[] = [];
  let cases = 0;
  for (let i = 0; i < points; i++) {
    const point = draw();
    const before = line.at(-1);
    const movingRange = before ? Math.abs(point.level - before.level) : null;
    line.push({ ...point, movingRange, limits, regime: String(cases) });
    if (completionsAt(line, i).length > 0) cases++;
  }
  return cases;
}

describe('false cases of all charts of a stream together', () => {
  it.each([null, 25])('are counted as the program judges, with a baseline of %s', (baseline) => {
    const effort = { baselines: 2, points: 2000 };
    const { perPoint } = falseCases(WESTERN_ELECTRIC, shape, baseline, seededRandom('cases'), effort);
    const draw = chanceStream(shape, seededRandom('cases'));
    const counts = [judgedCases(baseline, 2000, draw), judgedCases(baseline, 2000, draw)];
    expect(Math.round(perPoint * 4000)).toBe((counts[0] ?? 0) + (counts[1] ?? 0));
    expect(Math.min(...counts)).toBeGreaterThan(10);
  });

  it('are more with estimated limits than with known ones, and differ from baseline to baseline', () => {
    const effort = { baselines: 40, points: 3000 };
    const of = (baseline: number | null) =>
      falseCases(WESTERN_ELECTRIC, shape, baseline, seededRandom('estimated'), effort);
    const [known, few, many] = [of(null), of(25), of(200)];
    expect(few.perPoint).toBeGreaterThan(known.perPoint + 3.5 * few.standardError);
    expect(few.high / few.low).toBeGreaterThan(2 * (many.high / many.low));
    expect(many.low).toBeLessThan(many.perPoint);
    expect(many.high).toBeGreaterThan(many.perPoint);
  });

  it('are refused without a baseline to speak of or too little effort', () => {
    const source = seededRandom('none');
    expect(() => falseCases(WESTERN_ELECTRIC, shape, 1, source)).toThrow(RangeError);
    expect(() => falseCases(WESTERN_ELECTRIC, shape, 25, source, { baselines: 1, points: 1000 })).toThrow(
      RangeError,
    );
    expect(() => falseCases(WESTERN_ELECTRIC, { within: true, wafers: 0 }, 25, source)).toThrow(RangeError);
  });
});

describe('the rate of signals with limits from a baseline', () => {
  it('is the exact one of each baseline, interpolated: to 1 % with the chain solved for each', () => {
    const source = seededRandom('exact');
    const baselines = Array.from({ length: 30 }, () => Array.from({ length: 30 }, () => source.normal()));
    const exact = baselines.map((values) => {
      const { centre, sigma } = limitSet(
        values.map((level) => ({ level, within: null, between: null, wafers: 1 })),
      ).level;
      return 1 / ruleRunLength(WESTERN_ELECTRIC, { shift: -centre / sigma, spread: 1 / sigma });
    });
    const { perPoint } = conditionalRate(FOUR, 30, seededRandom('exact'), { baselines: 30 });
    expect(perPoint / mean(exact)).toBeCloseTo(1, 2);
  });

  it('of an EWMA and a CUSUM grows with estimated limits as that of rules does', () => {
    for (const design of [
      { kind: 'ewma', lambda: 0.2, width: 2.962 },
      { kind: 'cusum', reference: 0.5, decision: 5 },
    ] as const) {
      const { perPoint, low, high } = conditionalRate(design, 50, seededRandom('memory'), { baselines: 200 });
      expect(perPoint).toBeGreaterThan(1.5 / chartRunLength(design));
      expect(low).toBeLessThan(1 / chartRunLength(design));
      expect(high).toBeGreaterThan(perPoint);
    }
  });

  it('tends to that of known limits as the baseline grows, its range with it', () => {
    const rate = (n: number) => conditionalRate(THREE_SIGMA, n, seededRandom('grows'), { baselines: 400 });
    const [small, large] = [rate(25), rate(2500)];
    expect(1 / large.perPoint).toBeGreaterThan(340);
    expect(1 / large.perPoint).toBeLessThan(380);
    expect(small.perPoint).toBeGreaterThan(2 * large.perPoint);
    expect(small.high / small.low).toBeGreaterThan(10 * (large.high / large.low));
  });

  it('sees a shift that its limits may hide', () => {
    const seen = conditionalRate(THREE_SIGMA, 25, seededRandom('shift'), { shift: 2, baselines: 400 });
    // Known limits: 1 in 6.30 points at a shift of 2 σ (NIST/SEMATECH e-Handbook and textbooks, from memory).
    expect(seen.low).toBeLessThan(1 / 6.3);
    expect(seen.high).toBeGreaterThan(1 / 6.3);
    expect(() => conditionalRate(FOUR, 4, seededRandom('shift'))).toThrow(RangeError);
    expect(() => conditionalRate(FOUR, 25, seededRandom('shift'), { shift: NaN })).toThrow(RangeError);
  });
});

describe('limits widened to a budget', () => {
  const charts = [
    { rules: WESTERN_ELECTRIC, pointsPerWeek: 500 },
    { rules: ['beyond-3-sigma'], pointsPerWeek: 200 },
  ];

  it('give just the budgeted false signals a week of all charts together', () => {
    // Champ and Woodall (1987): 91.75 and 370.40 points between false signals.
    expect(falseSignalsPerWeek(charts)).toBeCloseTo(500 / 91.75 + 200 / 370.4, 3);
    const widening = wideningFor(charts, 3.5);
    expect(widening).toBeGreaterThan(1.02);
    expect(falseSignalsPerWeek(charts, widening ?? 1)).toBeCloseTo(3.5, 3);
  });

  it('of three sigma alone lie where the normal distribution has them', () => {
    const alone = [{ rules: ['beyond-3-sigma'], pointsPerWeek: 1000 }];
    // Φ(3.2905) leaves 0.1 % beyond on both sides (Abramowitz and Stegun, table 26.1): one in 1000.
    expect((wideningFor(alone, 1) ?? 0) * 3).toBeCloseTo(3.2905, 3);
  });

  it('stay where they are within the budget, and do not exist where no widening quiets the rules', () => {
    expect(wideningFor(charts, 6)).toBe(1);
    expect(wideningFor([{ rules: ['eight-on-one-side'], pointsPerWeek: 1000 }], 1)).toBeNull();
    expect(() => wideningFor(charts, 0)).toThrow(RangeError);
    expect(() => wideningFor([{ rules: WESTERN_ELECTRIC, pointsPerWeek: -1 }], 1)).toThrow(RangeError);
  });
});

describe('a surface through Chebyshev points', () => {
  it('is exact for polynomials of its degree and close for what is smooth', () => {
    const cubic = (x: number, y: number) => x ** 3 - 2 * x * y ** 2 + 5;
    const through = chebyshevSurface(cubic, [-1, 3], [0, 2], [4, 3]);
    for (const [x, y] of [
      [-1, 0],
      [0.3, 1.7],
      [2.9, 0.01],
    ] as const) {
      expect(through(x, y)).toBeCloseTo(cubic(x, y), 10);
    }
    const smooth = chebyshevSurface((x, y) => Math.exp(x) * Math.cos(y), [0, 1], [0, 1], [9, 9]);
    expect(smooth(0.37, 0.81)).toBeCloseTo(Math.exp(0.37) * Math.cos(0.81), 9);
    expect(() => chebyshevSurface(cubic, [1, 1], [0, 1], [3, 3])).toThrow(RangeError);
  });
});
