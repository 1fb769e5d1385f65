import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type ThinnablePoint, thinned } from '@/app/_charts/thinned';

const point = (level: number | null, more: Partial<ThinnablePoint> = {}): ThinnablePoint => ({
  level,
  movingRange: null,
  within: null,
  between: null,
  completions: [],
  outOfSpecification: false,
  ...more,
});

const stream = fc.array(
  fc
    .record({
      level: fc.option(fc.double({ min: -5, max: 5, noNaN: true }), { freq: 20 }),
      within: fc.option(fc.double({ min: 0, max: 5, noNaN: true })),
      signal: fc.integer({ min: 0, max: 40 }).map((n) => n === 0),
      outOfSpecification: fc.integer({ min: 0, max: 60 }).map((n) => n === 0),
    })
    .map(({ level, within, signal, outOfSpecification }) =>
      point(level, { within, completions: signal ? ['level:beyond-3-sigma:above'] : [], outOfSpecification }),
    ),
  { maxLength: 400 },
);

describe('thinned', () => {
  it('leaves none, one, two and any number within the limit as they are', () => {
    for (const count of [0, 1, 2, 40]) {
      const points = Array.from({ length: count }, (_, at) => point(at));
      expect(thinned(points, 40)).toEqual(points);
    }
  });

  it('keeps the order and adds nothing that was not measured', () => {
    fc.assert(
      fc.property(stream, fc.integer({ min: 2, max: 120 }), (points, most) => {
        const places = thinned(points, most).map((kept) => points.indexOf(kept));
        expect(places).toEqual([...new Set(places)].sort((a, b) => a - b));
        expect(places).not.toContain(-1);
      }),
    );
  });

  it('keeps every signal and everything out of specification, even beyond the limit', () => {
    fc.assert(
      fc.property(stream, fc.integer({ min: 2, max: 120 }), (points, most) => {
        const kept = new Set(thinned(points, most));
        for (const one of points) {
          if (one.completions.length > 0 || one.outOfSpecification) expect(kept.has(one)).toBe(true);
        }
      }),
    );
  });

  it('keeps the lowest and the highest of every series', () => {
    fc.assert(
      fc.property(stream, fc.integer({ min: 2, max: 120 }), (points, most) => {
        const kept = thinned(points, most);
        for (const name of ['level', 'within'] as const) {
          const of = (some: ThinnablePoint[]) =>
            some.map((one) => one[name]).filter((value) => value !== null);
          if (of(points).length === 0) continue;
          expect(Math.min(...of(kept))).toBe(Math.min(...of(points)));
          expect(Math.max(...of(kept))).toBe(Math.max(...of(points)));
        }
      }),
    );
  });

  it('stays within the limit where signals and gaps are few', () => {
    const points = Array.from({ length: 100_000 }, (_, at) => point(Math.sin(at), { within: Math.cos(at) }));
    const kept = thinned(points, 600);
    expect(kept.length).toBeLessThanOrEqual(600);
    expect(kept.length).toBeGreaterThan(550);
  });

  it('shows a single outlier in a long quiet stream', () => {
    const points = Array.from({ length: 5000 }, (_, at) => point(at === 3217 ? 9 : 0));
    expect(thinned(points, 50).some((one) => one.level === 9)).toBe(true);
  });

  it('keeps a gap a gap', () => {
    const points = Array.from({ length: 500 }, (_, at) => point(at > 200 && at < 210 ? null : 1));
    const levels = thinned(points, 40).map((one) => one.level);
    expect(levels.filter((level) => level === null)).toHaveLength(1);
  });

  it('refuses a limit that could not hold a line', () => {
    for (const most of [1, 0, 2.5, Number.NaN]) expect(() => thinned([point(1)], most)).toThrow(RangeError);
  });
});
