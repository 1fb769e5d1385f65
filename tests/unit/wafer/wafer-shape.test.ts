import { describe, expect, it } from 'vitest';
import { measureWafer } from '@/lib/wafer/measure-wafer';
import { planGeometry } from '@/lib/wafer/plan-geometry';
import { polarSites } from '@/lib/wafer/polar-sites';
import { soundWafer } from '../../support/sound-wafer';

const diameterMm = 200;
const plan = (rings: number) => planGeometry(polarSites(rings, 97), { diameterMm, edgeExclusionMm: 3 });
const fortyNine = plan(3);

describe('shape', () => {
  const percentOf = (values: number[], geometry = fortyNine) =>
    Object.fromEntries(
      measureWafer(values, geometry, { screen: 'outliers' }).shape.terms.map(({ name, percent }) => [
        name,
        percent,
      ]),
    );

  it('gives back the shapes a wafer was made of', () => {
    const u = fortyNine.sites.map(({ xMm, yMm }) => [xMm / 97, yMm / 97] as const);
    const terms = percentOf(
      u.map(
        ([x, y]) =>
          50 * (1 + 0.01 * (2 * (x * x + y * y) - 1) + 0.02 * x - 0.005 * y + 0.003 * (x * x - y * y)),
      ),
    );
    const scale = (terms['level'] ?? 0) / 100;
    expect(terms['bowl']! / scale).toBeCloseTo(1, 9);
    expect(terms['tilt along x']! / scale).toBeCloseTo(2, 9);
    expect(terms['tilt along y']! / scale).toBeCloseTo(-0.5, 9);
    expect(terms['saddle on the axes']! / scale).toBeCloseTo(0.3, 9);
    expect(terms['ring']).toBeCloseTo(0, 9);
  });

  it('takes up a third of the sites at most', () => {
    const count = (rings: number) =>
      measureWafer(soundWafer(plan(rings).sites), plan(rings), { screen: 'off' }).shape.terms.length;
    expect([count(1), count(2), count(3)]).toEqual([3, 7, 15]);
  });

  it('has standard errors that hold: repeated noise scatters the terms as much as they say', () => {
    let seed = 20;
    const uniform = () => (seed = (seed * 16807) % 2147483647) / 2147483647;
    const gauss = () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
    const runs = Array.from({ length: 400 }, () => {
      const { shape } = measureWafer(
        fortyNine.sites.map(() => 100 + gauss()),
        fortyNine,
        { screen: 'off' },
      );
      return shape.terms.find(({ name }) => name === 'bowl')!;
    });
    const scatter = Math.sqrt(runs.reduce((sum, { percent }) => sum + percent ** 2, 0) / runs.length);
    const said = Math.sqrt(
      runs.reduce((sum, { standardError }) => sum + standardError! ** 2, 0) / runs.length,
    );
    expect(Math.abs(scatter / said - 1)).toBeLessThan(3.5 / Math.sqrt(2 * runs.length));
  });
});
