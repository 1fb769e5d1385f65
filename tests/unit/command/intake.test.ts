import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { UsageError } from '@/lib/command/verb';
import { intake } from '@/lib/command/verbs/intake';

let folder = '';
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'intake-verb-'));
  await writeFile(join(folder, 'map.csv'), 'x_mm,y_mm,resistivity_ohm_cm\n0,0,1\n');
});
afterAll(() => rm(folder, { recursive: true }));

async function run(...args: string[]) {
  const said: string[] = [];
  const exit = await intake.run(args, { out: () => undefined, say: (text) => said.push(text) });
  return { exit, said: said.join('\n') };
}

describe('intake', () => {
  it('tells wrong usage before it opens a database', async () => {
    await expect(run()).rejects.toThrow(UsageError);
    await expect(run('--json')).rejects.toThrow('name at least one file');
    await expect(run(join(folder, 'map.csv'), '--what')).rejects.toThrow(UsageError);
    await expect(run('--follow', folder)).rejects.toThrow('--follow is not available yet');
  });
});
