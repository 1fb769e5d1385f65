import { describe, expect, it } from 'vitest';
import { judgedLine } from '@/lib/excursions/judged-line';
import { summarise } from '@/lib/excursions/joined-members';
import type { Line, LinePoint } from '@/lib/excursions/line';
import { add, emptyLine, keyed, LineStore, outcome, trim } from './line-store';
import { above, revision, wafers } from './streams';

const setting = { subgroupSize: 1, limits: [revision(1, 0)], restarts: [] as number[] };

function lineOf(levels: readonly (number | null)[], over: Partial<typeof setting> = {}): Line {
  const line = emptyLine({ ...setting, ...over });
  add(line, wafers(levels));
  return line;
}

/** Takes a wafer out of its point, as an exclusion does, and judges again from there. */
function exclude(line: Line, index: number, why = 'excluded') {
  const point = line.points[index] as LinePoint;
  for (const member of point.members) Object.assign(member, { level: null, within: null });
  summarise(point);
  return judgedLine(line, new Set([point]), index, why);
}

describe('a line with nothing in it', () => {
  it('has nothing to judge', () => {
    const line = emptyLine(setting);
    expect(judgedLine(line, new Set(), 0, '')).toEqual({
      points: [],
      signals: [],
      excursions: [],
      limits: null,
    });
  });

  it('takes one wafer without a moving range, and a second with one', () => {
    const line = lineOf([1]);
    expect(line.points).toMatchObject([{ state: 'judged', movingRange: null }]);
    add(line, wafers([3], 1));
    expect(line.points[1]).toMatchObject({ state: 'judged', movingRange: 2 });
  });
});

describe('a run that goes on', () => {
  it('extends its one signal', () => {
    const line = lineOf(above(8));
    expect(keyed(line)).toEqual([['level eight-on-one-side above', 'k0007', 'k0007', 1]]);
    const { signals } = add(line, wafers(above(4), 8));
    expect(keyed(line)).toEqual([['level eight-on-one-side above', 'k0007', 'k0011', 5]]);
    expect(signals).toEqual(line.signals);
    expect(outcome(line).signals[0]?.participants).toEqual([
      'k0000',
      'k0001',
      'k0002',
      'k0003',
      'k0004',
      'k0005',
      'k0006',
      'k0007',
    ]);
  });

  it('extends its signal when its beginning is no longer loaded, also where a late wafer falls into it', () => {
    const store = new LineStore(setting);
    let line = emptyLine(setting);
    for (const wafer of wafers(above(300))) {
      line = store.record(line, [wafer]);
      trim(line);
    }
    const [late] = wafers([-0.5], 900);
    store.record(store.load(2955), [{ ...late!, at: 2955 }]);
    expect(keyed(store.load(-Infinity))).toEqual([['level eight-on-one-side above', 'k0007', 'k0294', 288]]);
    store.record(store.load(2956), [{ ...wafers([0.5], 901)[0]!, at: 2956 }]);
    expect(store.wholeLoads).toBe(0);
    expect(store.signals.size).toBe(1);
  });
});

describe('no rule looks across', () => {
  it('a limit revision', () => {
    const limits = [revision(1, 0), revision(2, 45)];
    expect(keyed(lineOf(above(11), { limits }))).toEqual([]);
    expect(keyed(lineOf(above(12), { limits }))).toEqual([
      ['level eight-on-one-side above', 'k0011', 'k0011', 1],
    ]);
    expect(lineOf(above(6), { limits }).points.map((point) => point.limits?.revision)).toEqual([
      1, 1, 1, 1, 2, 2,
    ]);
  });

  it('a restart, and no moving range is taken across it', () => {
    const line = lineOf([...above(7), 2.5, ...above(6)], { restarts: [75] });
    expect(keyed(line)).toEqual([]);
    expect(line.points[7]?.movingRange).toBeNull();
    expect(line.points[8]?.movingRange).toBe(2);
  });

  it('a restart, also where the run went on before: another signal begins', () => {
    expect(keyed(lineOf(above(20), { restarts: [100] }))).toEqual([
      ['level eight-on-one-side above', 'k0007', 'k0008', 2],
      ['level eight-on-one-side above', 'k0016', 'k0019', 4],
    ]);
    expect(
      keyed(lineOf([5, 5, 5, 5], { restarts: [25] })).filter(([what]) => /3-sigma/.test(String(what))),
    ).toEqual([
      ['level beyond-3-sigma above', 'k0000', 'k0001', 2],
      ['level beyond-3-sigma above', 'k0002', 'k0003', 2],
    ]);
  });
});

describe('a signal that no longer holds', () => {
  it('is withdrawn with its reason and not deleted, and reinstated when it holds again', () => {
    const line = lineOf([...above(4), ...above(4)]);
    const [signal] = line.signals;
    const [excursion] = line.excursions;
    const point = line.points[3] as LinePoint;
    const change = exclude(line, 3, 'site 4 taken out');
    expect(change.signals).toEqual([signal]);
    expect(change.excursions).toEqual([]);
    expect(line.signals).toMatchObject([{ withdrawn: 'site 4 taken out', excursion }]);
    expect(line.excursions).toHaveLength(1);

    Object.assign(point.members[0]!, { level: 0.5, within: 1 });
    summarise(point);
    judgedLine(line, new Set([point]), 3, 'put back');
    expect(line.signals).toEqual([signal]);
    expect(line.signals).toMatchObject([{ withdrawn: null, completions: 1, excursion }]);
    expect(line.excursions).toHaveLength(1);
  });

  it('is withdrawn when a late wafer breaks its run, which then counts from the late one on', () => {
    const line = lineOf(above(9));
    add(line, [{ ...wafers([-0.5], 50)[0]!, at: 25 }], 'a late wafer');
    expect(line.signals.map(({ withdrawn }) => withdrawn)).toEqual(['a late wafer']);
    add(line, wafers(above(1), 9));
    expect(keyed(line)).toEqual([['level eight-on-one-side above', 'k0009', 'k0009', 1]]);
  });

  it('keeps its place under limits revised later that it fails as well, and names them', () => {
    const line = lineOf(above(8));
    line.limits.push(revision(2, 0, 0.25));
    const { signals } = judgedLine(line, new Set(), 0, 'limits were revised');
    expect(signals).toEqual(line.signals);
    expect(line.signals).toMatchObject([{ withdrawn: null, limits: { revision: 2 } }]);
    line.limits.push(revision(3, 0, 0.5));
    judgedLine(line, new Set(), 0, 'limits were revised');
    expect(line.signals).toMatchObject([{ withdrawn: 'limits were revised', limits: { revision: 2 } }]);
  });

  it('keeps what is left of it when only its end is undone', () => {
    const line = lineOf(above(12));
    exclude(line, 11);
    expect(keyed(line)).toEqual([['level eight-on-one-side above', 'k0007', 'k0010', 4]]);
    expect(line.signals).toHaveLength(1);
  });

  it('is written again when only the points that took part have changed', () => {
    const line = lineOf([2.5, -0.5, 2.5]);
    expect(outcome(line).signals[0]?.participants).toEqual(['k0000', 'k0002']);
    const { signals } = add(line, [{ ...wafers([2.2], 50)[0]!, at: 25 }]);
    const kept = line.signals.find(
      ({ rule, firstId }) => /two-of/.test(rule) && firstId === line.points[3]?.id,
    );
    expect(kept?.withdrawn).not.toBeNull();
    expect(signals).toContain(kept);
  });
});

describe('a line that does not reach back far enough', () => {
  it('because nearly all its wafers were not judged is judged whole, to the same end', () => {
    const levels = [...above(7), ...Array.from({ length: 100 }, () => null), ...above(5)];
    const store = new LineStore(setting);
    let line = emptyLine(setting);
    for (const wafer of wafers(levels)) {
      line = store.record(line, [wafer]);
      trim(line);
    }
    expect(store.wholeLoads).toBeGreaterThan(0);
    expect(outcome(store.load(-Infinity))).toEqual(outcome(lineOf(levels)));
    expect(keyed(store.load(-Infinity))).toEqual([['level eight-on-one-side above', 'k0107', 'k0111', 5]]);
  });
});
