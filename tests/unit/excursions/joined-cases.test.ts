import { describe, expect, it } from 'vitest';
import type { Line } from '@/lib/excursions/line';
import { add, emptyLine } from './line-store';
import { revision, wafers } from './streams';

const setting = { subgroupSize: 1, limits: [revision(1, 0)], restarts: [] };
const quiet = (count: number): number[] =>
  Array.from({ length: count }, (_, i) => (i % 2 === 0 ? -0.5 : 0.5));

function lineOf(levels: readonly number[]): Line {
  const line = emptyLine(setting);
  add(line, wafers(levels));
  return line;
}

/** Closes a case as the database does: the line knows it no longer. */
function close(line: Line): void {
  const [closed] = line.excursions.splice(0, 1);
  for (const signal of line.signals) if (signal.excursion === closed) signal.excursion = null;
}

const ofLevel = (line: Line) => line.excursions.filter(({ chart }) => chart === 'level');

describe('a signal', () => {
  it('opens a case and writes why into its log', () => {
    const line = emptyLine(setting);
    const { excursions } = add(line, wafers([0.5, 4]));
    expect(ofLevel(line)).toMatchObject([
      {
        side: 'above',
        family: 'instability',
        firstId: line.points[1]?.id,
        lastId: line.points[1]?.id,
        entries: [{ action: 'opened', note: 'beyond the upper limit' }],
      },
    ]);
    expect(excursions).toEqual(line.excursions);
  });

  it('joins the open case of its chart, side and family that is 25 subgroups away', () => {
    const line = lineOf([4, ...quiet(24), 4]);
    expect(ofLevel(line)).toHaveLength(1);
    expect(ofLevel(line)[0]).toMatchObject({
      firstId: line.points[0]?.id,
      lastId: line.points[25]?.id,
      entries: [{ action: 'opened' }, { action: 'joined' }],
    });
  });

  it('opens another case 26 subgroups away, on the other side, or on another chart', () => {
    expect(ofLevel(lineOf([4, ...quiet(25), 4]))).toHaveLength(2);
    expect(ofLevel(lineOf([4, ...quiet(4), -4])).map(({ side }) => side)).toEqual(['above', 'below']);
    const line = emptyLine(setting);
    add(
      line,
      wafers([4, 0.5, 0.5]).map((wafer, i) => ({ ...wafer, within: i === 2 ? 5 : 1 })),
    );
    expect(line.excursions.map(({ chart }) => chart)).toEqual(['level', 'within']);
  });

  it('joins a case whose span it falls into, however far its end', () => {
    const line = lineOf([...Array.from({ length: 80 }, () => 0.5), ...quiet(1)]);
    expect(ofLevel(line)).toHaveLength(1);
    add(line, [{ ...wafers([4], 500)[0]!, at: 305 }]);
    expect(ofLevel(line)).toHaveLength(1);
    expect(ofLevel(line)[0]?.lastId).toBe(line.points[80]?.id);
  });

  it('joins the nearest of several open cases', () => {
    const line = lineOf([4, ...quiet(30), 4, ...quiet(10), 4]);
    expect(ofLevel(line)).toHaveLength(2);
    expect(ofLevel(line)[1]?.lastId).toBe(line.points[42]?.id);
  });

  it('that goes on moves the end of its case and says nothing more in the log', () => {
    const line = lineOf(Array.from({ length: 8 }, () => 0.5));
    const { excursions } = add(line, wafers([0.5], 8));
    expect(excursions).toEqual(line.excursions);
    expect(line.excursions).toMatchObject([{ lastId: line.points[8]?.id, entries: [{ action: 'opened' }] }]);
  });

  it('whose case was closed opens a new one when it goes on', () => {
    const line = lineOf(Array.from({ length: 9 }, () => 0.5));
    close(line);
    add(line, wafers([0.5], 9));
    expect(line.excursions).toMatchObject([
      {
        lastId: line.points[9]?.id,
        entries: [{ action: 'opened', note: '10 in a row above the centre line' }],
      },
    ]);
    expect(line.signals[0]?.excursion).toBe(line.excursions[0]);
  });

  it('whose case was closed opens none when it merely loses a point', () => {
    const line = lineOf(Array.from({ length: 12 }, () => 0.5));
    close(line);
    add(line, [{ ...wafers([-0.5], 500)[0]!, at: 115 }]);
    expect(line.signals).toMatchObject([{ completions: 4, withdrawn: null }]);
    expect(line.excursions).toEqual([]);
  });

  it('on wafers of history opens no case, until it goes on with others', () => {
    const line = emptyLine(setting);
    const run = wafers(Array.from({ length: 10 }, () => 0.5));
    add(
      line,
      run.slice(0, 9).map((wafer) => ({ ...wafer, history: true })),
    );
    expect(line.signals).toHaveLength(1);
    expect(line.excursions).toEqual([]);
    add(line, run.slice(9));
    expect(line.excursions).toHaveLength(1);
  });

  it('that is withdrawn leaves its case open', () => {
    const line = lineOf(Array.from({ length: 8 }, () => 0.5));
    const { excursions } = add(line, [{ ...wafers([-0.5], 500)[0]!, at: 45 }]);
    expect(line.signals[0]?.withdrawn).toBe('late');
    expect(line.excursions).toHaveLength(1);
    expect(excursions).toEqual([]);
  });
});
