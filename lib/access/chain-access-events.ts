import type { AuditAction } from './audit-action';
import type { AuditFacts } from './audit-entry';
import { chained } from './audited';
import { programActor } from './local-actor';

interface EventRow {
  id: string;
  at: Date;
  action: AuditAction;
  by_person: boolean;
  person_id: string;
  person_name: string;
  before: AuditFacts | null;
  after: AuditFacts | null;
}

const AT_ONCE = 500;

/**
 * Takes what the accounts library wrote by itself (sign-ins, sessions ended, passwords changed) into the audit chain.
 * The tables' own triggers note it in its transactions; this follows each request to the library, and each start.
 * Returns how many were taken in.
 */
export async function chainAccessEvents(): Promise<number> {
  const taken = await chained(async (client, tell) => {
    const { rows } = await client.query<EventRow>(
      `DELETE FROM access_event WHERE id IN (SELECT id FROM access_event ORDER BY id LIMIT $1 FOR UPDATE SKIP LOCKED)
       RETURNING id, at, action, by_person, person_id, person_name, before, after`,
      [AT_ONCE],
    );
    for (const row of rows.sort((a, b) => Number(a.id) - Number(b.id))) {
      tell({
        actor: row.by_person ? { kind: 'person', id: row.person_id, name: row.person_name } : programActor(),
        at: row.at,
        action: row.action,
        subject: { kind: 'person', id: row.person_id },
        ...(row.before === null ? {} : { before: row.before }),
        ...(row.after === null ? {} : { after: row.after }),
      });
    }
    return rows.length;
  });
  return taken < AT_ONCE ? taken : taken + (await chainAccessEvents());
}
