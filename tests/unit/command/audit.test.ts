import { existsSync, mkdirSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { AuditVerdict } from '@/lib/access/verify-audit';
import { audit, verdictLines, verdictStatus } from '@/lib/command/verbs/audit';

const sound: AuditVerdict = { entries: 20, heads: 1, strangers: [], broken: [] };
const stranger = { ...sound, strangers: ['audit-head-1'] };

describe('what is said of an audit trail', () => {
  it('is good where its chain holds and its end was kept', () => {
    expect(verdictStatus(sound, true)).toBe(0);
    expect(verdictLines(sound)).toEqual(['20 entries, and the chain holds.']);
  });

  it('is not good where no head is there to hold its end against', () => {
    const verdict = { ...sound, heads: 0 };
    expect(verdictStatus(verdict, true)).toBe(3);
    expect(verdictLines(verdict)[0]).toMatch(
      /No head of it is kept here, so that a cut end would not show\.$/,
    );
    expect(verdictStatus({ ...verdict, entries: 0 }, true)).toBe(0);
  });

  it('is not good where an embedded database lies beside the head of another chain', () => {
    expect(verdictStatus(stranger, true)).toBe(3);
    expect(verdictStatus(stranger, false)).toBe(0);
    expect(verdictLines(stranger)[1]).toMatch(/^audit-head-1 keeps the head of another chain: unless /);
  });

  it('names each broken place', () => {
    const broken = [
      { from: 7, to: 8, fault: 'missing' },
      { from: 9, to: 9, fault: 'unproven' },
    ] as const;
    const verdict = { ...sound, broken: [...broken] };
    expect(verdictStatus(verdict, false)).toBe(3);
    expect(verdictLines(verdict)).toEqual([
      '20 entries, and the chain is broken:',
      '  entries 7 to 8: missing',
      '  entry 9: linked to one that is missing: whether it is as written cannot be told',
    ]);
  });
});

describe('verifying', () => {
  const output = { out: () => undefined, say: () => undefined };
  let folder = '';
  beforeEach(() => {
    folder = mkdtempSync(path.join(tmpdir(), 'evenohm-no-database-'));
    vi.stubEnv('DATABASE_URL', '');
    vi.stubEnv('EVENOHM_SECRET', '');
  });
  afterEach(() => {
    vi.unstubAllEnvs();
    rmSync(folder, { recursive: true });
  });

  it('where there is no database says so, and makes none', async () => {
    vi.stubEnv('EVENOHM_DATA', path.join(folder, 'mistyped'));
    await expect(audit.run(['--verify'], output)).rejects.toThrow(/There is no database in .*mistyped/);
    expect(existsSync(path.join(folder, 'mistyped'))).toBe(false);
  });

  it('without the secret says so, and makes none', async () => {
    mkdirSync(path.join(folder, 'postgres'));
    vi.stubEnv('EVENOHM_DATA', folder);
    await expect(audit.run(['--verify'], output)).rejects.toThrow(/There is no secret in /);
    expect(readdirSync(folder)).toEqual(['postgres']);
  });
});
