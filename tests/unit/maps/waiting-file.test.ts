import { mkdtemp, readdir, rm, stat, utimes } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { commandActor } from '@/lib/access/local-actor';
import {
  claimWaitingFile,
  dropWaitingFile,
  findWaitingFile,
  keepWaitingFile,
  releaseWaitingFile,
} from '@/lib/maps/waiting-file';

const actor = commandActor();
const stream = (...chunks: string[]) => new Blob(chunks).stream();
let data = '';

beforeEach(async () => {
  data = await mkdtemp(path.join(tmpdir(), 'waiting-'));
  vi.stubEnv('EVENOHM_DATA', data);
});

afterEach(async () => {
  vi.unstubAllEnvs();
  await rm(data, { recursive: true });
});

async function kept(name: string, text: string): Promise<string> {
  const answer = await keepWaitingFile(actor, name, stream(text));
  if (!answer.ok) throw new Error(answer.reason);
  return answer.token;
}

async function textOf(token: string): Promise<string | null> {
  const file = await findWaitingFile(actor, token);
  if (file === null) return null;
  const chunks: Uint8Array[] = [];
  for await (const chunk of file.open()) chunks.push(chunk);
  return Buffer.concat(chunks).toString();
}

describe('a file that waits to be recorded', () => {
  it('is found again by its token, with its content and name, as often as it is read', async () => {
    const token = await kept('monday.csv', 'x_mm,y_mm\n1,2\n');
    expect((await findWaitingFile(actor, token))?.name).toBe('monday.csv');
    expect(await textOf(token)).toBe('x_mm,y_mm\n1,2\n');
    expect(await textOf(token)).toBe('x_mm,y_mm\n1,2\n');
  });

  it('is for its owner only', async () => {
    const token = await kept('monday.csv', 'x');
    const mode = async (...parts: string[]) => (await stat(path.join(data, ...parts))).mode & 0o777;
    expect(await mode('waiting')).toBe(0o700);
    expect(await mode('waiting', `${token}.csv`)).toBe(0o600);
  });

  it('never lets a name or a token lead out of the folder', async () => {
    const token = await kept('../../etc/pass\u0000wd', 'x');
    expect((await findWaitingFile(actor, token))?.name).toBe('passwd');
    expect((await findWaitingFile(actor, await kept('C:\\dir\\..', 'x')))?.name).toBe('unnamed file');
    for (const strange of ['..', '../waiting', `../waiting/${token}`, token.toUpperCase() + '0', '']) {
      expect(await findWaitingFile(actor, strange)).toBeNull();
      expect(await claimWaitingFile(actor, strange)).toBeNull();
      await dropWaitingFile(actor, strange);
    }
    expect(await textOf(token)).toBe('x');
  });

  it('is refused when larger than allowed, and nothing of it stays', async () => {
    const answer = await keepWaitingFile(actor, 'large.csv', stream('0123456789', '0123456789'), 15);
    expect(answer.ok).toBe(false);
    expect(await readdir(path.join(data, 'waiting'))).toEqual([]);
  });

  it('is claimed once, and can be claimed again after it was released', async () => {
    const token = await kept('monday.csv', 'x');
    expect((await claimWaitingFile(actor, token))?.name).toBe('monday.csv');
    expect(await claimWaitingFile(actor, token)).toBeNull();
    expect(await findWaitingFile(actor, token)).toBeNull();
    await releaseWaitingFile(actor, token);
    expect(await claimWaitingFile(actor, token)).not.toBeNull();
    await dropWaitingFile(actor, token);
    expect(await readdir(path.join(data, 'waiting'))).toEqual([]);
  });

  it('is thrown away a day later, when the next one comes', async () => {
    const old = await kept('old.csv', 'x');
    const twoDaysAgo = Date.now() / 1000 - 2 * 86_400;
    for (const part of ['csv', 'name']) {
      await utimes(path.join(data, 'waiting', `${old}.${part}`), twoDaysAgo, twoDaysAgo);
    }
    const token = await kept('new.csv', 'y');
    expect((await readdir(path.join(data, 'waiting'))).sort()).toEqual([`${token}.csv`, `${token}.name`]);
  });
});
