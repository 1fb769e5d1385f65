import { describe, expect, it } from 'vitest';
import { add, emptyLine, keyed } from './line-store';
import { above, revision, wafers } from './streams';

const setting = { subgroupSize: 1, limits: [revision(1, 0)], restarts: [] };

describe('a subgroup that still waits for wafers', () => {
  const runs = { subgroupSize: 3 };
  const run = (key: string, levels: readonly (number | null)[], since: number) =>
    wafers(levels, since).map((wafer) => ({ ...wafer, key, specification: ['site:above'] }));

  it('is not judged until it is complete, but what is out of specification is said at once', () => {
    const line = emptyLine({ ...setting, ...runs });
    add(line, run('a', [9, 9], 0));
    expect(line.points).toMatchObject([{ state: 'open', limits: null, movingRange: null, completions: [] }]);
    expect(keyed(line)).toEqual([['specification site above', 'a', 'a', 1]]);
    add(line, run('a', [9], 2));
    expect(line.points[0]).toMatchObject({ state: 'judged', completions: ['level:beyond-3-sigma:above'] });
    expect(line.signals).toHaveLength(2);
  });

  it('is judged as it is once another follows', () => {
    const line = emptyLine({ ...setting, ...runs });
    add(line, run('a', [9, 9], 0));
    const { points } = add(line, run('b', [0], 2));
    expect(line.points.map(({ state }) => state)).toEqual(['judged', 'open']);
    expect(points).toEqual(line.points);
  });

  it('waits again when the one that followed turns out to be earlier', () => {
    const line = emptyLine({ ...setting, ...runs });
    add(line, run('a', [9, 9], 1));
    add(line, run('b', [0], 4));
    add(
      line,
      run('b', [0, 0], 0).map((wafer) => ({ ...wafer, at: wafer.at - 5 })),
    );
    expect(line.points.map(({ key, state }) => [key, state])).toEqual([
      ['b', 'judged'],
      ['a', 'open'],
    ]);
    expect(keyed(line).map(([what]) => what)).toEqual(['specification site above']);
  });

  it('counts a wafer that is not judged as there, but not for the spread between wafers', () => {
    const line = emptyLine({ ...setting, ...runs });
    // Two wafers 2.2 apart: s = 2.2/√2 = 1.556, inside the limit of three wafers (2) and beyond no limit of two either.
    add(line, run('a', [0, 2.2, null], 0));
    expect(line.points[0]).toMatchObject({ state: 'judged', level: 1.1 });
    expect(line.points[0]?.between).toBeCloseTo(1.5556, 4);
    expect(line.points[0]?.completions).toEqual([]);
    // Two wafers 3.2 apart, s = 2.263: beyond the limit of three wafers, inside that of two (2.33).
    add(line, run('b', [-1.6, 1.6, null], 3));
    expect(line.points[1]?.completions).toEqual([]);
    add(line, run('c', [-1.6, 0, 2.6], 6));
    expect(line.points[2]?.completions).toEqual(['between:beyond-limit:above']);
  });

  it('is not judged while none of its wafers is, and breaks no run', () => {
    const line = emptyLine(setting);
    add(line, wafers([...above(4), null, ...above(4)]));
    expect(line.points[4]).toMatchObject({ state: 'not-judged', level: null, limits: null });
    expect(keyed(line)).toEqual([['level eight-on-one-side above', 'k0008', 'k0008', 1]]);
  });
});
