import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { components } from '@/lib/command/verbs/components';
import { UsageError } from '@/lib/command/verb';

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'components-'));
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
  const status = await components.run([file, ...args], output);
  return { status, printed: printed.join('\n'), said: said.map((text) => text.replace(file, 'data.csv')) };
}

const NEST = ['--value', 'y', '--nest', 'lot'];

describe('evenohm components', () => {
  it('prints one JSON object with a row for each level', async () => {
    const { status, printed } = await run('lot,y\nA,1\nA,3\nB,6\nB,10\n', ...NEST, '--json');
    expect(status).toBe(0);
    const { levels } = JSON.parse(printed) as { levels: Record<string, unknown>[] };
    expect(levels[0]).toMatchObject({ name: 'lot', degreesOfFreedom: 1, sumOfSquares: 36, variance: 15.5 });
    expect(levels[1]).toMatchObject({ name: 'within', f: null, variance: 5 });
  });

  it('tells a person that an estimate came out negative', async () => {
    const { printed } = await run('lot,y\nA,1\nA,9\nB,2\nB,8\n', ...NEST);
    expect(printed).toContain('lot: the estimate is -12.5; a variance is not below zero');
    expect(printed).toContain('4 values, mean 5, groups of equal size');
  });

  it('refuses cells that are empty or no number, each with its line and column', async () => {
    const { status, printed, said } = await run('lot,y\nA,1\n,2\nB,x\nB,\n', ...NEST);
    expect(status).toBe(3);
    expect(printed).toBe('');
    expect(said).toEqual([
      'data.csv:3:1: the cell is empty',
      'data.csv:4:2: not a number: "x"',
      'data.csv:5:2: the cell is empty',
    ]);
  });

  it('refuses a missing column and a single value, and fails on a missing file', async () => {
    expect((await run('lot,z\nA,1\n', ...NEST)).said).toEqual([
      'data.csv:1:1: no column "y"; there is lot, z',
    ]);
    expect((await run('lot,y\nA,1\n', ...NEST)).status).toBe(3);
    const none = await components.run(['/nowhere.csv', ...NEST], {
      out: () => undefined,
      say: () => undefined,
    });
    expect(none).toBe(1);
  });

  it.each([
    [['--value', 'y'], '--nest'],
    [['--nest', 'lot'], '--value'],
    [['--value', 'y', '--nest', 'lot,lot'], 'each once'],
    [['--value', 'y', '--nest', 'y'], 'each once'],
    [[...NEST, 'second.csv'], 'one file'],
    [[...NEST, '--colour'], '--colour'],
  ])('takes %j as wrong usage', async (args, word) => {
    const wrong = run('lot,y\nA,1\n', ...args);
    await expect(wrong).rejects.toThrow(UsageError);
    await expect(wrong).rejects.toThrow(word);
  });
});
