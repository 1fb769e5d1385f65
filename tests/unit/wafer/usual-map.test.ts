import { describe, expect, it } from 'vitest';
import { measureWafer } from '@/lib/wafer/measure-wafer';
import { planGeometry } from '@/lib/wafer/plan-geometry';
import { polarSites } from '@/lib/wafer/polar-sites';
import { shapeFamily, shapeHabits, usualReaches } from '@/lib/wafer/shape-habits';
import { usualMap } from '@/lib/wafer/usual-map';
import { seededRandom } from '@/lib/stats/seeded-random';

const sites = polarSites(3, 97);
const geometry = planGeometry(sites, { diameterMm: 200, edgeExclusionMm: 3 });
const random = seededRandom('usual wafers');

/** A wafer with a bowl and a tilt in percent, at some level, with gauge noise of 0.1 %. */
function wafer(bowl: number, tilt: number, level = 10, noise = 0.1): number[] {
  return sites.map(({ xMm, yMm }) => {
    const squared = (xMm ** 2 + yMm ** 2) / 97 ** 2;
    return level * (1 + (bowl * (2 * squared - 1) + (tilt * xMm) / 97 + noise * random.normal()) / 100);
  });
}

const past = (count: number): { values: number[]; badSites: number[] }[] =>
  Array.from({ length: count }, (_, i) => ({
    values: wafer(1 + 0.05 * random.normal(), 0.3, 8 + i),
    badSites: [],
  }));
const shapeOf = (values: number[]) => measureWafer(values, geometry, { screen: 'off', shape: true }).shape;

describe('the usual map', () => {
  it('needs five wafers, and forgets their levels', () => {
    expect(usualMap(past(4), geometry)).toBeNull();
    const usual = usualMap(past(6), geometry)!;
    expect(usual.wafers).toBe(6);
    const mean = usual.ratios.reduce<number>((sum, ratio) => sum + ratio!, 0) / sites.length;
    expect(mean).toBeCloseTo(1, 9);
    expect(usual.shapes.find(({ name }) => name === 'bowl')!.percent).toBeCloseTo(1, 1);
  });

  it('leaves bad readings out, site by site', () => {
    const wafers = past(5);
    for (const one of wafers) {
      one.values[3] = 0;
      one.badSites = [3];
    }
    const usual = usualMap(wafers, geometry)!;
    expect(usual.ratios[3]).toBeNull();
    expect(usual.ratios.filter((ratio) => ratio === null)).toHaveLength(1);
  });

  it('does not change when every wafer is scaled', () => {
    const wafers = past(5);
    const scaled = wafers.map((one) => ({ ...one, values: one.values.map((value) => 1e4 * value) }));
    const [a, b] = [usualMap(wafers, geometry)!, usualMap(scaled, geometry)!];
    a.ratios.forEach((ratio, i) => expect(b.ratios[i]!).toBeCloseTo(ratio!, 12));
  });

  it('passes over wafers without a good reading and refuses another plan’s', () => {
    const empty = { values: sites.map(() => null), badSites: [] };
    expect(usualMap([...past(4), empty], geometry)).toBeNull();
    expect(() => usualMap([{ values: [1, 2], badSites: [] }], geometry)).toThrow(RangeError);
  });
});

describe('shapes against habit', () => {
  const usual = usualMap(past(40), geometry);

  it('finds a wafer like the others usual, and names what it has', () => {
    const habits = shapeHabits(shapeOf(wafer(1, 0.3)), usual);
    expect(habits.every(({ isUnusual }) => isUnusual === false)).toBe(true);
    expect(
      habits
        .filter(({ isSeen }) => isSeen)
        .map(({ name }) => name)
        .slice(0, 2),
    ).toEqual(['bowl', 'tilt']);
  });

  it('finds a tilt three times as large unusual, and the bowl not', () => {
    const habits = shapeHabits(shapeOf(wafer(1, 1)), usual);
    expect(habits.find(({ name }) => name === 'tilt')!.isUnusual).toBe(true);
    expect(habits.find(({ name }) => name === 'bowl')!.isUnusual).toBe(false);
  });

  it('calls few of many usual wafers unusual', () => {
    let unusual = 0;
    for (let i = 0; i < 200; i += 1) {
      const habits = shapeHabits(shapeOf(wafer(1 + 0.05 * random.normal(), 0.3)), usual);
      if (habits.some((habit) => habit.isUnusual)) unusual += 1;
    }
    expect(unusual).toBeLessThan(25);
  });

  it('says nothing from fewer than fifteen wafers, or from none', () => {
    const shape = shapeOf(wafer(1, 3));
    expect(usualReaches(shape, usualMap(past(14), geometry)!).size).toBe(0);
    expect(
      shapeHabits(shape, usualMap(past(14), geometry)).every(({ isUnusual }) => isUnusual === null),
    ).toBe(true);
    expect(shapeHabits(shape, null).every(({ isUnusual }) => isUnusual === null)).toBe(true);
    expect(shapeHabits({ terms: [], residualPercent: null }, usual)).toEqual([]);
  });

  it('takes the two orientations of a shape together', () => {
    expect(
      ['tilt along x', 'saddle on the diagonals', 'four-fold between the axes', 'bowl'].map(shapeFamily),
    ).toEqual(['tilt', 'saddle', 'four-fold', 'bowl']);
  });
});
