import type { ClientBase } from 'pg';
import type { Actor, Grant } from './actor';
import type { AuditFacts } from './audit-entry';

export function isAdministrator({ role }: Grant): boolean {
  return role === 'administrator';
}

/** Whether nobody would be left to manage people were this one gone; those of the demonstration do not count. */
export async function isLastAdministrator(
  client: ClientBase,
  person: { id: string; gone: boolean; grants: readonly Grant[] },
): Promise<boolean> {
  if (person.gone || !person.grants.some(isAdministrator)) return false;
  const { rowCount } = await client.query(
    `SELECT FROM role_grant g JOIN person p ON p.id = g.person_id
     WHERE g.role = 'administrator' AND p.id <> $1 AND NOT p.demonstration AND p.deactivated_at IS NULL`,
    [person.id],
  );
  return rowCount === 0;
}

export async function writeGrants(
  actor: Actor,
  client: ClientBase,
  personId: string,
  grants: readonly Grant[],
): Promise<void> {
  for (const { role, streamIds } of grants) {
    await client.query(
      'INSERT INTO role_grant (person_id, role, stream_ids, granted_by) VALUES ($1, $2, $3, $4)',
      [personId, role, streamIds, actor.name],
    );
  }
}

/** Roles as the audit trail keeps them. */
export function rolesOf(grants: readonly Grant[]): AuditFacts {
  return Object.fromEntries(grants.map(({ role, streamIds }) => [role, streamIds ?? 'all']));
}
