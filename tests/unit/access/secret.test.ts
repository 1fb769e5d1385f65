import { createHmac } from 'node:crypto';
import { mkdtempSync, readdirSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { plantKey } from '@/lib/access/secret';

describe('the plant’s secret', () => {
  let folder = '';
  beforeEach(() => {
    folder = mkdtempSync(path.join(tmpdir(), 'evenohm-secret-'));
    vi.stubEnv('EVENOHM_DATA', path.join(folder, 'data'));
    vi.stubEnv('EVENOHM_SECRET', '');
    vi.stubEnv('DATABASE_URL', '');
  });
  afterEach(() => {
    vi.unstubAllEnvs();
    rmSync(folder, { recursive: true });
  });

  test('is made once beside the embedded database, for its owner’s eyes only', () => {
    const first = plantKey('sessions');
    expect(readdirSync(path.join(folder, 'data'))).toEqual(['secret']);
    expect(statSync(path.join(folder, 'data/secret')).mode & 0o777).toBe(0o600);
    expect(plantKey('sessions').equals(first)).toBe(true);
  });

  test('gives a key of its own for each purpose', () => {
    const keys = (['sessions', 'audit', 'first administrator'] as const).map((purpose) =>
      plantKey(purpose).toString('hex'),
    );
    expect(new Set(keys).size).toBe(keys.length);
  });

  test('is demanded where the database is given', () => {
    vi.stubEnv('DATABASE_URL', 'postgresql://127.0.0.1/plant');
    expect(() => plantKey('audit')).toThrow(/EVENOHM_SECRET is not set/);
  });

  test('draws keys by HKDF-SHA256', () => {
    vi.stubEnv('EVENOHM_SECRET', 'a secret of more than thirty-two characters');
    // RFC 5869 §2: extract with a salt of zeroes, expand with info and a first block.
    const extracted = createHmac('sha256', Buffer.alloc(32)).update(process.env['EVENOHM_SECRET'] ?? '');
    const expanded = createHmac('sha256', extracted.digest())
      .update('evenohm audit')
      .update(Buffer.from([1]));
    expect(plantKey('audit').equals(expanded.digest())).toBe(true);
  });
});
