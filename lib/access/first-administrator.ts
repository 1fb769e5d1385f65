import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto';
import { hashPassword } from 'better-auth/crypto';
import { getPool } from '@/lib/database/client';
import { readEnvironment } from '@/lib/env';
import { audited } from './audited';
import { isLoopbackName, nameOfHost } from './is-loopback-name';
import { programActor } from './local-actor';
import { passwordFault } from './password-fault';
import type { FirstAdministrator } from './schema';
import { plantKey } from './secret';

/** Only one process at a time makes a first administrator. */
const FIRST_ADMINISTRATOR_LOCK = 7_267_001;

const NOBODY = 'NOT EXISTS (SELECT FROM person WHERE NOT demonstration)';

/** Whether nobody has been entered yet, apart from the people of the demonstration line. */
export async function isFirstAdministratorDue(): Promise<boolean> {
  const { rows } = await getPool().query<{ due: boolean }>(`SELECT ${NOBODY} AS due`);
  return rows[0]?.due ?? false;
}

/** The code that the log of `serve` shows until there is an administrator: 80 bits, the same for every instance. */
export function firstAdministratorCode(): string {
  const mac = createHmac('sha256', plantKey('first administrator')).update('code').digest('hex');
  return (mac.slice(0, 20).match(/.{5}/g) ?? []).join('-');
}

/**
 * Whether a request was typed at this machine itself: it came over loopback, by a loopback name, and nothing says
 * that others are let in through a proxy.
 */
export function isFromThisMachine(headers: Headers): boolean {
  const { publicUrl, trustedProxy } = readEnvironment();
  return (
    publicUrl === null &&
    trustedProxy === null &&
    isLoopbackName(headers.get('x-forwarded-for') ?? '') &&
    isLoopbackName(nameOfHost(headers.get('host') ?? ''))
  );
}

/** Enters the first administrator, once, for someone at the machine or with the code from its log. */
export async function createFirstAdministrator(
  given: FirstAdministrator,
  isAtMachine: boolean,
): Promise<{ ok: true } | { ok: false; field?: string; reason: string }> {
  if (!isAtMachine && !isCode(given.code)) {
    return { ok: false, field: 'code', reason: 'This is not the code in the server’s log.' };
  }
  const fault = passwordFault(given.password, [given.name, given.email]);
  if (fault !== null) return { ok: false, field: 'password', reason: fault };
  const id = randomBytes(16).toString('hex');
  const hash = await hashPassword(given.password);
  return audited(programActor(), async (client, tell) => {
    await client.query('SELECT pg_advisory_xact_lock($1)', [FIRST_ADMINISTRATOR_LOCK]);
    const { rowCount } = await client.query(
      `INSERT INTO person (id, name, email) SELECT $1, $2, $3 WHERE ${NOBODY}`,
      [id, given.name, given.email],
    );
    if (rowCount !== 1) return { ok: false, reason: 'There is an administrator already.' };
    await client.query(
      `INSERT INTO account (id, person_id, provider_id, account_id, password) VALUES ($1, $1, 'credential', $1, $2)`,
      [id, hash],
    );
    await client.query(
      `INSERT INTO role_grant (person_id, role, granted_by) VALUES ($1, 'administrator', 'Evenohm')`,
      [id],
    );
    tell({
      action: 'added a person',
      subject: { kind: 'person', id },
      after: { name: given.name, roles: ['administrator'] },
      why: `the first administrator, entered ${isAtMachine ? 'at the machine itself' : 'with the code from the log'}`,
    });
    return { ok: true };
  });
}

function isCode(code: string): boolean {
  const given = Buffer.from(code.trim().toLowerCase());
  const due = Buffer.from(firstAdministratorCode());
  return given.length === due.length && timingSafeEqual(given, due);
}
