import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { capability } from '@/lib/command/verbs/capability';
import { UsageError } from '@/lib/command/verb';

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'capability-'));
});
afterAll(() => rmSync(folder, { recursive: true }));

async function run(content: string, ...args: string[]) {
  const file = join(folder, 'data.csv');
  writeFileSync(file, content);
  const printed: string[] = [];
  const said: string[] = [];
  const output = {
    out: (text: string) => void printed.push(text),
    say: (text: string) => void said.push(text),
  };
  const status = await capability.run([file, ...args], output);
  return { status, printed: printed.join('\n'), said: said.map((text) => text.replace(file, 'data.csv')) };
}

const column = (n: number): string =>
  ['y', ...Array.from({ length: n }, (_, i) => ((i * 7) % 10) - 4.5)].join('\n');
const LIMITS = ['--value', 'y', '--lower', '-12', '--upper', '9'];

describe('evenohm capability', () => {
  it('prints indices as numbers and their intervals beside, limits below zero as they are written', async () => {
    const { status, printed } = await run(column(40), ...LIMITS, '--target', '-1', '--json');
    expect(status).toBe(0);
    const { pp, intervals } = JSON.parse(printed) as {
      pp: number;
      intervals: Record<string, { low: number }>;
    };
    expect(intervals.pp?.low).toBeLessThan(pp);
    expect(Object.keys(intervals)).toEqual(['cp', 'cpk', 'pp', 'ppk', 'cpm']);
  });

  it('says beside the figures that a process is unstable', async () => {
    const { printed } = await run(`${column(40)}\n60\n61\n62`, ...LIMITS);
    expect(printed).toContain('unstable: ');
    expect((await run(column(40), ...LIMITS)).printed).toContain('stable: no point signals');
  });

  it('refuses fewer than thirty values and cells that are no number', async () => {
    expect(await run(column(29), ...LIMITS)).toMatchObject({
      status: 3,
      printed: '',
      said: ['data.csv: 29 values, and an index needs 30'],
    });
    expect((await run('y\n1\nx\n', ...LIMITS)).said).toEqual(['data.csv:3:1: not a number: "x"']);
    expect((await run(column(40), ...LIMITS, '--distribution', 'lognormal')).status).toBe(3);
  });

  it.each([
    [['--value', 'y'], '--lower or --upper'],
    [['--lower', '1'], '--value'],
    [['--value', 'y', '--lower', '2', '--upper', '1'], 'below'],
    [['--value', 'y', '--lower', 'x'], 'a number'],
    [[...LIMITS, '--sigma', 'pooled-s'], '--group'],
    [[...LIMITS, '--sigma', 'best'], 'one of'],
    [[...LIMITS, '--group', 'g', '--sigma', 'mean-moving-range'], 'single values'],
    [[...LIMITS, '--distribution', 'weibull'], 'one of'],
  ])('takes %j as wrong usage', async (args, word) => {
    const wrong = run(column(40), ...args);
    await expect(wrong).rejects.toThrow(UsageError);
    await expect(wrong).rejects.toThrow(word);
  });
});
