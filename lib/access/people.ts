import { randomBytes } from 'node:crypto';
import type { ClientBase } from 'pg';
import type { Actor, Grant } from './actor';
import { areStreams } from './are-streams';
import { audited, type Tell } from './audited';
import { writePasswordLink } from './password-link';
import { refuse } from './refusal';
import { isAdministrator, isLastAdministrator, rolesOf, writeGrants } from './role-grants';
import type { AccessResult } from './types';

/** One at a time changes who has which role, so that two administrators cannot take it from each other. */
const ROLES_LOCK = 7_267_002;

interface Found {
  id: string;
  name: string;
  demonstration: boolean;
  gone: boolean;
  grants: Grant[];
}

/** Enters a person with their roles. Returns the code by which they choose a password, the only time that it is seen. */
export async function addPerson(
  actor: Actor,
  person: { name: string; email: string; grants: readonly Grant[] },
): Promise<AccessResult<{ id: string; code: string }>> {
  const refusal = refuse(actor, 'manage-people');
  if (refusal) return refusal;
  const { name, email, grants } = person;
  const id = randomBytes(16).toString('hex');
  return audited(actor, async (client, tell) => {
    if (
      !(await areStreams(
        client,
        grants.flatMap((grant) => grant.streamIds ?? []),
      ))
    )
      return NO_STREAM;
    const { rowCount } = await client.query(
      'INSERT INTO person (id, name, email) VALUES ($1, $2, lower($3)) ON CONFLICT (email) DO NOTHING',
      [id, name, email],
    );
    if (rowCount !== 1) return { ok: false, reason: 'There is someone with that address already.' };
    tell({ action: 'added a person', subject: { kind: 'person', id }, after: { name, ...rolesOf(grants) } });
    await writeGrants(actor, client, id, grants);
    return { ok: true, value: { id, code: await writePasswordLink(client, id) } };
  });
}

/** Makes a new link by which a person chooses a password; the one before it, if any, no longer counts. */
export async function invitePerson(actor: Actor, personId: string): Promise<AccessResult<string>> {
  return changePerson(actor, personId, async (client, tell, person) => {
    if (person.gone) return { ok: false, reason: `${person.name} is deactivated.` };
    tell({ action: 'invited a person', subject: { kind: 'person', id: personId } });
    return { ok: true, value: await writePasswordLink(client, personId) };
  });
}

/** Gives a person these roles and no others. */
export async function changeRoles(
  actor: Actor,
  personId: string,
  grants: readonly Grant[],
): Promise<AccessResult> {
  return changePerson(actor, personId, async (client, tell, person) => {
    if (
      !(await areStreams(
        client,
        grants.flatMap((grant) => grant.streamIds ?? []),
      ))
    )
      return NO_STREAM;
    if (!grants.some(isAdministrator) && (await isLastAdministrator(client, person))) return LAST;
    await client.query('DELETE FROM role_grant WHERE person_id = $1', [personId]);
    await writeGrants(actor, client, personId, grants);
    tell({
      action: 'changed roles',
      subject: { kind: 'person', id: personId },
      before: rolesOf(person.grants),
      after: rolesOf(grants),
    });
    return DONE;
  });
}

/** Ends what a person may do, and their sessions; or lets them sign in again. They are never deleted. */
export async function deactivatePerson(
  actor: Actor,
  personId: string,
  deactivated: boolean,
): Promise<AccessResult> {
  return changePerson(actor, personId, async (client, tell, person) => {
    if (person.gone === deactivated) return { ok: false, reason: 'It is so already.' };
    if (deactivated && (await isLastAdministrator(client, person))) return LAST;
    await client.query(
      'UPDATE person SET deactivated_at = CASE WHEN $2::boolean THEN now() END, updated_at = now() WHERE id = $1',
      [personId, deactivated],
    );
    await client.query('DELETE FROM session WHERE person_id = $1', [personId]);
    await client.query('DELETE FROM verification WHERE value = $1', [personId]);
    const action = deactivated ? 'deactivated a person' : 'reactivated a person';
    tell({ action, subject: { kind: 'person', id: personId } });
    return DONE;
  });
}

/** Signs a person out everywhere. */
export async function endSessions(actor: Actor, personId: string): Promise<AccessResult> {
  return changePerson(actor, personId, async (client, tell) => {
    const { rowCount } = await client.query('DELETE FROM session WHERE person_id = $1', [personId]);
    const subject = { kind: 'person', id: personId } as const;
    tell({ action: 'ended all sessions', subject, before: { sessions: rowCount ?? 0 } });
    return DONE;
  });
}

const DONE = { ok: true, value: undefined } as const;
const NO_STREAM = { ok: false, reason: 'One of the streams does not exist.' } as const;
const LAST = {
  ok: false,
  reason: 'Nobody else is an administrator: give someone else that role first.',
} as const;

async function changePerson<Value>(
  actor: Actor,
  personId: string,
  work: (client: ClientBase, tell: Tell, person: Found) => Promise<AccessResult<Value>>,
): Promise<AccessResult<Value>> {
  const refusal = refuse(actor, 'manage-people');
  if (refusal) return refusal;
  return audited(actor, async (client, tell) => {
    await client.query('SELECT pg_advisory_xact_lock($1)', [ROLES_LOCK]);
    const { rows } = await client.query<Found>(
      `SELECT id, name, demonstration, deactivated_at IS NOT NULL AS gone,
         (SELECT coalesce(json_agg(json_build_object('role', role, 'streamIds', stream_ids::text[])), '[]')
          FROM role_grant WHERE person_id = person.id) AS grants
       FROM person WHERE id = $1 FOR UPDATE`,
      [personId],
    );
    const [person] = rows;
    if (person === undefined) return { ok: false, reason: 'There is no such person.' };
    if (person.demonstration) {
      return { ok: false, reason: 'The people of the demonstration line stay as they are.' };
    }
    return work(client, tell, person);
  });
}
