import { describe, expect, it } from 'vitest';
import { add, emptyLine, LineStore, outcome, trim } from './line-store';
import { quiet, revision, wafers } from './streams';

const setting = { subgroupSize: 1, limits: [revision(1, 0)], restarts: [] };

/** Levels of a gauge that is stuck. */
const alike = (count: number): number[] => Array.from({ length: count }, () => 1);

describe('the first limits', () => {
  it('are proposed by the first 25 subgroups and judge what comes after them', () => {
    const line = emptyLine({ ...setting, limits: [] });
    expect(add(line, wafers(quiet(24))).limits).toBeNull();
    const { limits } = add(line, wafers([0.5], 24));
    // Mean of 13 × 0.5 and 12 × −0.5; σ = mean moving range / d2(2), 1/1.128 (ASTM MNL7).
    expect(limits).toMatchObject({ revision: 1, effectiveFrom: 250, limits: { n: 25 } });
    expect(limits?.limits.level.centre).toBeCloseTo(0.02, 12);
    expect(limits?.limits.level.sigma).toBeCloseTo(1 / 1.128, 3);
    expect(line.points.every((point) => point.limits === null)).toBe(true);
    add(line, wafers([9], 25));
    expect(line.points[25]).toMatchObject({
      limits,
      completions: ['level:beyond-3-sigma:above'],
    });
    expect(add(line, wafers(quiet(30), 26)).limits).toBeNull();
  });

  it('are proposed as well where a long stretch of wafers that could not be judged came before', () => {
    const store = new LineStore({ ...setting, limits: [] });
    const wafersSent = wafers([...Array.from({ length: 100 }, () => null), ...quiet(26)]);
    for (const one of wafersSent) store.record(store.load(one.at), [one]);
    const { limits, points } = store.load(-Infinity);
    expect(limits).toMatchObject([{ revision: 1, baselineIds: points.slice(100, 125).map(({ id }) => id) }]);
    expect(points.at(-1)?.limits).toBe(limits[0]);
  });

  it('are not proposed by subgroups that do not vary, or in their last bits only, nor beside others', () => {
    const line = emptyLine({ ...setting, limits: [] });
    expect(
      add(line, wafers(Array.from({ length: 30 }, (_, i) => 10 * (1 + (i % 2) * 2e-16)))).limits,
    ).toBeNull();
    expect(add(emptyLine(setting), wafers(quiet(30))).limits).toBeNull();
  });

  it('come of the first 25 as ever where only some of these are equal', () => {
    const line = emptyLine({ ...setting, limits: [] });
    const { limits } = add(line, wafers([...alike(24), ...quiet(40)]));
    expect(limits).toMatchObject({ effectiveFrom: 250, limits: { n: 25 } });
  });

  it('come, where the first 25 are all equal, of the 25 that begin with the last of the equal ones', () => {
    const levels = [...alike(100), ...quiet(40)];
    const atOnce = emptyLine({ ...setting, limits: [] });
    const { limits } = add(atOnce, wafers(levels));
    expect(limits?.baselineIds).toEqual(atOnce.points.slice(99, 124).map(({ id }) => id));
    expect(limits?.effectiveFrom).toBe(1240);
    const store = new LineStore({ ...setting, limits: [] });
    let line = emptyLine(store.setting);
    for (const one of wafers(levels)) {
      line = store.record(line, [one]);
      trim(line);
    }
    expect(outcome(store.load(-Infinity))).toEqual(outcome(atOnce));
  });

  it('are waited for without ever loading the whole stream while its levels stay equal', () => {
    const store = new LineStore({ ...setting, limits: [] });
    const record = (levels: readonly number[], since: number) => {
      for (const one of wafers(levels, since)) store.record(store.load(one.at), [one]);
    };
    record(alike(300), 0);
    expect(store.wholeLoads).toBe(0);
    record(quiet(60), 300);
    expect(store.setting.limits).toHaveLength(1);
    expect(store.wholeLoads).toBeLessThanOrEqual(25);
  });
});
