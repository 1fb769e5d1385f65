import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { EnvironmentError, readEnvironment } from '@/lib/env';

describe('readEnvironment', () => {
  it('fills in what is absent or blank', () => {
    const defaults = {
      databaseUrl: null,
      ownerUrl: null,
      dataFolder: path.resolve('.evenohm'),
      port: 3000,
      host: '127.0.0.1',
      publicUrl: null,
      secret: null,
      trustedProxy: null,
      siteTimeZone: 'UTC',
      demo: true,
      oidc: null,
      token: null,
    };
    expect(readEnvironment({})).toEqual(defaults);
    expect(readEnvironment({ PORT: '', DATABASE_URL: '', EVENOHM_DEMO: '' })).toEqual(defaults);
  });
  it('turns the demonstration off beside a database of your own, unless it is asked for', () => {
    const url = 'postgresql://someone@localhost/line';
    expect(readEnvironment({ DATABASE_URL: url }).demo).toBe(false);
    expect(readEnvironment({ DATABASE_URL: url, EVENOHM_DEMO: 'on' }).demo).toBe(true);
    expect(readEnvironment({ EVENOHM_DEMO: 'off' }).demo).toBe(false);
  });
  it('says in plain words what a variable must be', () => {
    const fault = (source: Record<string, string>) => () => readEnvironment(source);
    expect(fault({ EVENOHM_SECRET: 'short' })).toThrow('EVENOHM_SECRET: must have 32 characters or more');
    expect(fault({ EVENOHM_DEMO: 'maybe' })).toThrow('EVENOHM_DEMO: must be on or off');
    for (const name of ['EVENOHM_URL', 'EVENOHM_OIDC_ISSUER']) {
      for (const value of ['plant', 'ftp://plant.example']) {
        expect(fault({ [name]: value })).toThrow(`${name}: must be an address that begins with https://`);
      }
    }
  });
  it('takes an identity provider whole or not at all', () => {
    const given = {
      EVENOHM_OIDC_ISSUER: 'https://login.plant.example',
      EVENOHM_OIDC_CLIENT_ID: 'evenohm',
      EVENOHM_OIDC_CLIENT_SECRET: 's',
    };
    expect(readEnvironment(given).oidc).toEqual({
      issuer: 'https://login.plant.example',
      clientId: 'evenohm',
      clientSecret: 's',
      name: 'plant account',
      creates: false,
    });
    expect(() => readEnvironment({ ...given, EVENOHM_OIDC_CLIENT_SECRET: '' })).toThrow(/go together/);
  });
  it('needs the program’s own address beside the owner’s', () => {
    expect(() => readEnvironment({ EVENOHM_OWNER_URL: 'postgresql://owner@localhost/line' })).toThrow(
      /DATABASE_URL.*must stand beside it/,
    );
  });

  it('names every variable at fault in one line', () => {
    const read = () =>
      readEnvironment({ PORT: 'x', DATABASE_URL: 'mysql://a', EVENOHM_SITE_TIME_ZONE: 'Mars/Base' });
    expect(read).toThrow(EnvironmentError);
    expect(read).toThrow(/DATABASE_URL: .*; PORT: must be a port.*; EVENOHM_SITE_TIME_ZONE: /);
  });

  it('reads the variables of the README, all and no others', () => {
    const root = path.resolve(import.meta.dirname, '../..');
    const [, table = ''] = readFileSync(path.join(root, 'README.md'), 'utf8').split('## Settings');
    const described = [...table.matchAll(/^\| (`[^|]*`)/gm)].flatMap(([, names = '']) =>
      names.match(/[A-Z_]+/g),
    );
    const source = readFileSync(path.join(root, 'lib/env.ts'), 'utf8');
    const read = [...source.matchAll(/^ {2}([A-Z_]+): z\./gm)].map(([, name]) => name);
    expect(read.length).toBeGreaterThan(8);
    expect(described.toSorted()).toEqual(read.toSorted());
  });
});
