import { readFileSync, rmSync } from 'node:fs';
import { afterAll, beforeEach, describe, expect, test, vi } from 'vitest';
import { auditWarning } from '@/lib/access/audit-at-start';
import { headFile, keepWaitingHeads } from '@/lib/access/audit-head';
import { audited } from '@/lib/access/audited';
import { commandActor } from '@/lib/access/local-actor';
import { verifyAudit } from '@/lib/access/verify-audit';
import { closeClients, getPool, openClients } from '@/lib/database/client';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';

let database: FreshDatabase | null = null;
let head = '';
let warn = vi.spyOn(console, 'warn');

async function act(times: number): Promise<void> {
  for (let i = 0; i < times; i += 1) {
    await audited(commandActor(), async (_, tell) => {
      tell({ action: 'closed a case', subject: { kind: 'excursion', id: String(i) } });
    });
  }
  keepWaitingHeads();
}

/** What the owner of the database can do. */
async function cut(after: number): Promise<void> {
  await getPool()
    .query(`ALTER TABLE audit_entry DISABLE TRIGGER USER; DELETE FROM audit_entry WHERE id > ${after};
    ALTER TABLE audit_entry ENABLE TRIGGER USER`);
}

/** Another process on the same database and data folder: it knows nothing of the chain yet. */
async function anew(): Promise<void> {
  await closeClients();
  openClients(database?.url ?? '');
}

beforeEach(async () => {
  warn = vi.spyOn(console, 'warn');
  await database?.drop();
  database = await freshDatabase();
  await act(10);
  const { rows } = await getPool().query<{ name: string }>('SELECT name FROM audit_chain');
  head = headFile(rows[0]?.name ?? '');
});
afterAll(async () => {
  await database?.drop();
});

describe('a head that the database no longer holds, because an older one was put back', () => {
  test.each([
    ['while the program runs', async () => undefined],
    ['while it does not', anew],
  ])('stays and shows it %s, also when the chain has grown past it again', async (_when, between) => {
    const kept = readFileSync(head, 'utf8');
    await cut(6);
    await between();
    await act(8);
    expect(readFileSync(head, 'utf8')).toBe(kept);
    expect(warn.mock.calls).toEqual([[expect.stringContaining('does not hold entry 10 as it was')]]);
    expect((await verifyAudit()).broken).toEqual([{ from: 10, to: 10, fault: 'replaced' }]);
  });

  test('gives way once someone has moved it away', async () => {
    await cut(6);
    await act(1);
    rmSync(head);
    await act(1);
    expect(readFileSync(head, 'utf8')).toMatch(/^8 /);
    expect(await verifyAudit()).toMatchObject({ entries: 8, heads: 1, broken: [] });
  });
});

describe('what is said of the end of the audit trail at the start', () => {
  test('is nothing where all is well', async () => {
    expect(await auditWarning()).toBeNull();
  });

  test('is that the secret is another one', async () => {
    vi.stubEnv('EVENOHM_SECRET', 'another secret of thirty-two characters and more');
    expect(await auditWarning()).toMatch(/does not bear the key of this secret: the secret was lost/);
    vi.unstubAllEnvs();
  });

  test('is that it was cut, or that nothing is there to tell by', async () => {
    await cut(6);
    expect(await auditWarning()).toMatch(/does not hold entry 10 as it was\.$/);
    rmSync(head);
    expect(await auditWarning()).toMatch(/^No head of the audit trail is kept in /);
    await cut(0);
    expect(await auditWarning()).toBeNull();
  });
});

test('a head goes on with its chain from one process to the next', async () => {
  await anew();
  await act(2);
  expect(readFileSync(head, 'utf8')).toMatch(/^12 /);
  expect(warn).not.toHaveBeenCalled();
});
