import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { study } from '@/lib/command/verbs/study';
import { UsageError } from '@/lib/command/verb';

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'study-'));
});
afterAll(() => rmSync(folder, { recursive: true }));

async function run(content: string | Uint8Array, ...args: string[]) {
  const file = join(folder, 'data.csv');
  writeFileSync(file, content);
  const printed: string[] = [];
  const said: string[] = [];
  const output = {
    out: (text: string) => void printed.push(text),
    say: (text: string) => void said.push(text),
  };
  const status = await study.run([file, ...args], output);
  return { status, printed: printed.join('\n'), said: said.map((text) => text.replace(file, 'data.csv')) };
}

describe('evenohm study', () => {
  it('prints one JSON object and nothing else', async () => {
    const { status, printed, said } = await run('y\n1\n2\n1\n2\n', '--value', 'y', '--json');
    expect(status).toBe(0);
    expect(said).toEqual([]);
    const { charts } = JSON.parse(printed) as { charts: { name: string }[] };
    expect(charts.map((chart) => chart.name)).toEqual(['level', 'moving-range']);
  });

  it('prints a table and each signal in words to a person', async () => {
    const { printed } = await run('y\n1\n2\n1\n2\n9\n', '--value', 'y', '--baseline', '4');
    expect(printed).toContain('point 5, level: beyond the upper limit (beyond-3-sigma)');
  });

  it('forms the same subgroups from rows and from columns', async () => {
    const rows = await run('lot,y\nA,1\nA,2\nB,3\nB,5\nA,6\n', '--value', 'y', '--group', 'lot', '--json');
    const columns = await run('a,b,c\n1,2,6\n3,5,\n', '--values', 'a,b,c', '--json');
    expect(rows.status).toBe(0);
    expect(columns.printed).toBe(rows.printed);
    const { charts } = JSON.parse(rows.printed) as { charts: { name: string; points: number[] }[] };
    expect(charts.map((chart) => chart.name)).toEqual(['level', 'moving-range', 'within']);
    expect(charts[0]?.points).toEqual([3, 4]);
  });

  it('takes rules by name, and limits by probability', async () => {
    const ramp = 'y\n1\n2\n3\n4\n5\n6\n';
    const { printed } = await run(ramp, '--value', 'y', '--rules', 'six-in-a-trend', '--json');
    const { charts } = JSON.parse(printed) as {
      charts: { signals: { point: number; rule: string }[]; upper: number }[];
    };
    expect(charts[0]?.signals).toMatchObject([{ point: 6, rule: 'six-in-a-trend' }]);
    // Mean moving range 1. D4 of two, 3.267 (ASTM MNL7); by probability 3.760, computed from the range's law.
    expect(charts[1]?.upper).toBeCloseTo(3.267, 3);
    const live = await run(ramp, '--value', 'y', '--limits', 'probability', '--json');
    expect((JSON.parse(live.printed) as { charts: { upper: number }[] }).charts[1]?.upper).toBeCloseTo(
      3.76,
      3,
    );
  });

  it('charts an EWMA and a CUSUM of what is given, or of the baseline', async () => {
    const values = 'y\n52\n47\n53\n';
    const ewma = ['--chart', 'ewma', '--target', '50', '--sigma', '2', '--lambda', '0.3', '--width', '3'];
    const { printed } = await run(values, '--value', 'y', ...ewma, '--json');
    // NIST/SEMATECH e-Handbook, section 6.3.2.4: the first three values of its example.
    const { charts } = JSON.parse(printed) as { charts: { name: string; points: number[]; upper: number }[] };
    expect(charts.map(({ name }) => name)).toEqual(['ewma']);
    [50.6, 49.52, 50.56].forEach((z, i) => expect(charts[0]?.points[i]).toBeCloseTo(z, 2));
    expect(charts[0]?.upper).toBeCloseTo(50 + 3 * 2 * Math.sqrt(0.3 / 1.7), 12);
    const growing = await run(values, '--value', 'y', ...ewma, '--limits', 'growing', '--json');
    const [grown] = (JSON.parse(growing.printed) as { charts: { upper: number[] }[] }).charts;
    expect(grown?.upper[0]).toBeCloseTo(50 + 3 * 2 * 0.3, 12);
    const sums = await run('y\n1\n2\n1\n2\n9\n', '--value', 'y', '--chart', 'cusum', '--baseline', '4');
    expect(sums.printed).toContain('point 5, cusum-above: the level has risen');
    const fallen = await run('y\n1\n2\n1\n2\n-9\n', '--value', 'y', '--chart', 'cusum', '--baseline', '4');
    expect(fallen.printed).toContain('point 5, cusum-below: the level has fallen');
  });

  it('takes runs of wafers of sites by two groups, and names what σ came from', async () => {
    const rows = 'run,wafer,y\nA,1,1\nA,1,3\nA,2,2\nA,2,4\nB,1,5\nB,1,7\nB,2,6\nB,2,8\n';
    const { printed } = await run(rows, '--value', 'y', '--group', 'run,wafer', '--json');
    const { charts } = JSON.parse(printed) as {
      charts: { name: string; points: number[]; estimator: string }[];
    };
    expect(charts.map(({ name }) => name)).toEqual(['level', 'moving-range', 'between', 'within']);
    expect(charts[0]?.points).toEqual([2.5, 6.5]);
    expect(charts[3]?.points).toHaveLength(4);
    const table = await run('y\n1\n2\n1\n9\n', '--value', 'y', '--estimate', 'median-moving-range');
    expect(table.printed).toContain('median-moving-range');
  });

  it('takes rules of the spread where subgroups are large enough, and refuses others with the reason', async () => {
    const pairs = 'a,b\n1,2\n1,3\n1,2\n';
    const words = ['--values', 'a,b', '--chart', 'mean-range', '--spread-rules'];
    expect((await run(pairs, ...words, '7-of-7-beyond-0-sigma')).status).toBe(0);
    const { status, said } = await run(pairs, ...words, 'eight-on-one-side');
    expect(status).toBe(3);
    expect(said[0]).toContain('eight-on-one-side is not for the spread of fewer than 5 values');
  });

  it('refuses cells that are no number, with line and column, past quoted line breaks', async () => {
    const { status, said } = await run(
      'n,y\r\n"a\r\nb",1\r\nc,"1,5"\r\nd,\r\ne,0x10\r\nf,NaN\r\n',
      '--value',
      'y',
    );
    expect(status).toBe(3);
    expect(said).toEqual([
      'data.csv:4:2: not a number: "1,5"',
      'data.csv:5:2: the cell is empty',
      'data.csv:6:2: not a number: "0x10"',
      'data.csv:7:2: not a number: "NaN"',
    ]);
  });

  it.each([
    ['', 'data.csv:1:1: the file is empty: it needs a header row'],
    ['a,b\n1,2\n', 'data.csv:1:1: no column "y"; there is a, b'],
    ['y,y\n1,2\n', 'data.csv:1:2: column "y" is there twice'],
    ['x,y\n1,2\n3\n', 'data.csv:3:2: 1 cells where the header has 2'],
    ['y\n\u0000\u0001', 'data.csv:1:1: not a text file'],
    ['y\n1\n', 'data.csv: a study needs at least two points, not 1'],
    ['y\n', 'data.csv: a study needs at least two points, not 0'],
  ])('refuses %j', async (content, reason) => {
    const { status, said, printed } = await run(content, '--value', 'y');
    expect({ status, said, printed }).toEqual({ status: 3, said: [reason], printed: '' });
  });

  it('fails on a file that is not there', async () => {
    const said: string[] = [];
    const output = { out: () => undefined, say: (text: string) => void said.push(text) };
    expect(await study.run([join(folder, 'none.csv'), '--value', 'y'], output)).toBe(1);
    expect(said).toHaveLength(1);
  });

  it.each([
    [[]],
    [['--value', 'y', '--values', 'a,b']],
    [['--value', 'y', '--chart', 'pie']],
    [['--value', 'y', '--chart', 'mean-s']],
    [['--value', 'y', '--group', 'g', '--chart', 'individuals']],
    [['--value', 'y', '--rules', 'unheard-of']],
    [['--value', 'y', '--baseline', '1']],
    [['--value', 'y', '--limits', 'tight']],
    [['--value', 'y', '--lambda', '0.2']],
    [['--value', 'y', '--chart', 'ewma', '--lambda', 'x']],
    [['--value', 'y', '--chart', 'ewma', '--rules', 'beyond-3-sigma']],
    [['--value', 'y', '--chart', 'cusum', '--limits', 'classical']],
    [['--value', 'y', '--estimate', 'guess']],
    [['--value', 'y', '--group', 'a,b', '--chart', 'mean-s']],
    [['--value', 'y', '--chart', 'nested']],
    [['--value', 'y', '--unheard-of']],
  ])('calls %j wrong usage', async (args) => {
    await expect(run('y\n1\n2\n', ...args)).rejects.toThrow(UsageError);
  });

  it('reads a file with a byte-order mark and blank lines', async () => {
    const { status } = await run('\uFEFFy\n1\n\n2\n\n', '--value', 'y');
    expect(status).toBe(0);
  });
});
