import { describe, expect, it } from 'vitest';
import { crossingForecast } from '@/lib/control/crossing-forecast';
import { driftForecast } from '@/lib/control/drift-forecast';
import { seededRandom } from '@/lib/stats/seeded-random';
import { standardNormalQuantile } from '@/lib/stats/standard-normal';

const quiet = Array.from({ length: 40 }, (_, i) => standardNormalQuantile((((i * 7) % 40) + 0.5) / 40));
const PLAIN = { centre: 0, sigma: 1, autocorrelation: 0, gapsHours: [2] };
const drifting = quiet.map((x, i) => x + (i < 20 ? 0 : 0.1 * (i - 19)));

describe('how fast and until when', () => {
  it('gives slope, trend, and points and hours until the limit of a plain drift', () => {
    const found = driftForecast(drifting, 20, PLAIN, [5, -5], seededRandom('forecast'));
    expect(found.certain).toBe(true);
    expect(found.slope?.slope).toBeCloseTo(0.1, 1);
    expect(found.trend?.p).toBeLessThan(0.05);
    const [toward, away] = found.crossings;
    const { points, hours } = toward?.forecast ?? { points: null, hours: null };
    expect(points?.low).toBeLessThan(points?.middle ?? 0);
    expect(points?.middle).toBeLessThan(points?.high ?? 0);
    expect(hours?.middle).toBe(2 * (points?.middle ?? 0));
    expect(away?.forecast.points).toMatchObject({ middle: null, high: null });
  });

  it('says only "not before" while the slope may be none', () => {
    const found = driftForecast(quiet, 30, PLAIN, [5], seededRandom('quiet'));
    expect(found.certain).toBe(false);
    expect(found.crossings[0]?.forecast.points).toMatchObject({ middle: null, high: null });
    const two = driftForecast(drifting, 38, PLAIN, [5], seededRandom('two'));
    expect(two.slope).toBeNull();
    expect(two.certain).toBe(false);
  });

  it('does not depend on unit and side', () => {
    const plain = crossingForecast(drifting, PLAIN, 5, seededRandom('unit'));
    const down = crossingForecast(
      drifting.map((x) => 50 - 2 * x),
      { ...PLAIN, centre: 50, sigma: 2 },
      40,
      seededRandom('unit'),
    );
    expect(down).toEqual(plain);
  });

  it('has no hours where none are known, and nothing where the limit is far beyond the horizon', () => {
    const found = crossingForecast(quiet, { ...PLAIN, gapsHours: [] }, 1e9, seededRandom('far'), {
      draws: 50,
    });
    expect(found).toEqual({ points: { low: null, middle: null, high: null }, hours: null });
  });

  it.each([0, 0.5])('holds the true crossing 95 times in 100, with an autocorrelation of %d', (phi) => {
    const random = seededRandom(`crossing ${phi}`);
    const trials = 120;
    const n = 60;
    let held = 0;
    for (let i = 0; i < trials; i++) {
      let noise = random.normal();
      const series = Array.from({ length: 300 }, (_, k) => {
        noise = phi * noise + Math.sqrt(1 - phi * phi) * random.normal();
        return noise + (k < 25 ? 0 : 0.08 * (k - 24));
      });
      const crossed = series.slice(n).findIndex((x) => x > 6) + 1;
      const process = { ...PLAIN, autocorrelation: phi };
      const { points } = crossingForecast(series.slice(0, n), process, 6, random, { draws: 300 });
      if ((points.low ?? Infinity) <= crossed && crossed <= (points.high ?? Infinity)) held++;
    }
    const slack = 0.01 + 3.5 * Math.sqrt((0.05 * 0.95) / trials);
    expect(Math.abs(held / trials - 0.95)).toBeLessThan(slack);
  });

  it('refuses what makes no forecast', () => {
    const random = seededRandom('x');
    expect(() => crossingForecast([1, 2, 3], PLAIN, 5, random)).toThrow(RangeError);
    expect(() => crossingForecast(quiet, PLAIN, 0, random)).toThrow(RangeError);
    expect(() => crossingForecast(quiet, { ...PLAIN, sigma: 0 }, 5, random)).toThrow(RangeError);
    expect(() => crossingForecast(quiet, { ...PLAIN, autocorrelation: 1 }, 5, random)).toThrow(RangeError);
    expect(() => crossingForecast(quiet, { ...PLAIN, gapsHours: [0] }, 5, random)).toThrow(RangeError);
    expect(() => driftForecast(quiet, 40, PLAIN, [5], random)).toThrow(RangeError);
  });
});
