import { chmodSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { fileFailure } from '@/lib/command/file-failure';
import { intake } from '@/lib/command/verbs/intake';
import { map } from '@/lib/command/verbs/map';
import { study } from '@/lib/command/verbs/study';

const folder = mkdtempSync(join(tmpdir(), 'evenohm-files-'));
afterAll(() => rmSync(folder, { recursive: true }));

const file = (name: string, content: string | Uint8Array) => {
  writeFileSync(join(folder, name), content);
  return join(folder, name);
};
const sound = file('sound.csv', 'x_mm,y_mm,resistivity_ohm_cm\n0,0,9\n1,0,9\n');
const verbs = {
  study: (path: string) => ({ verb: study, args: [path, '--value', 'resistivity_ohm_cm'] }),
  map: (path: string) => ({ verb: map, args: [path] }),
  intake: (path: string) => ({ verb: intake, args: [sound, path] }),
};
const all = Object.keys(verbs) as (keyof typeof verbs)[];

async function run(name: keyof typeof verbs, path: string) {
  const said: string[] = [];
  const { verb, args } = verbs[name](path);
  const exit = await verb.run(args, { out: () => undefined, say: (text) => said.push(text) });
  return { exit, said: said.join('\n') };
}

describe('a file that cannot be opened', () => {
  it.each(all)('fails %s with one line in words, before anything else is done', async (verb) => {
    const missing = join(folder, 'none.csv');
    expect(await run(verb, missing)).toEqual({ exit: 1, said: `${missing}: there is no such file.` });
    const under = join(sound, 'none.csv');
    expect(await run(verb, under)).toEqual({ exit: 1, said: `${under}: there is no such file.` });
    expect(await run(verb, folder)).toEqual({ exit: 1, said: `${folder}: this is a folder, not a file.` });
  });

  it.skipIf(process.getuid?.() === 0).each(all)('fails %s where it may not be read', async (verb) => {
    const locked = file('locked.csv', 'a');
    chmodSync(locked, 0);
    expect(await run(verb, locked)).toEqual({ exit: 1, said: `${locked}: this file may not be read.` });
  });

  it('is said in words whatever the system calls it', () => {
    const error = (code: string) => Object.assign(new Error(`${code}: raw words`), { code });
    expect(fileFailure('a.csv', error('EACCES'))).toBe('a.csv: this file may not be read.');
    expect(fileFailure('a.csv', error('EIO'))).toBe('a.csv: EIO: raw words.');
  });
});

describe('a file that is no table', () => {
  it.each(['study', 'map'] as const)('is refused by %s with its place', async (verb) => {
    const empty = file('empty.csv', '');
    const binary = file('binary.csv', Uint8Array.of(0x7f, 0x45, 0, 0, 0xff, 0xfe));
    for (const path of [empty, binary]) {
      const { exit, said } = await run(verb, path);
      expect(exit).toBe(3);
      expect(said).toContain(`${path}:1:1: `);
    }
  });
});
