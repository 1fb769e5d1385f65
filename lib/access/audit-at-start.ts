import { getPool } from '@/lib/database/client';
import { entryMac, MAC_BEFORE_FIRST } from './audit-entry';
import { headFile, readHead } from './audit-head';
import { headFault } from './keep-end';
import { plantKey } from './secret';
import { entriesAfter } from './verify-audit';

/**
 * What is to be said of the audit trail's end before anything is added to it, or null: that it was written with another
 * secret, that it is not what was kept outside the database, or that nothing was kept. It looks at the last entry alone;
 * `evenohm audit --verify` follows the whole chain.
 */
export async function auditWarning(): Promise<string | null> {
  const pool = getPool();
  const { rows } = await pool.query<{ name: string; last: number }>(
    'SELECT name, coalesce((SELECT max(id) FROM audit_entry), 0)::integer AS last FROM audit_chain',
  );
  const { name = '', last = 0 } = rows[0] ?? {};
  const found = await entriesAfter(pool, last - 2);
  const entry = found.at(-1);
  const previousMac = last === 1 ? MAC_BEFORE_FIRST : found.at(-2)?.mac;
  if (entry !== undefined && previousMac !== undefined) {
    const { mac, ...fields } = entry;
    if (!entryMac(plantKey('audit'), name, previousMac, fields).equals(mac)) {
      return 'The end of the audit trail does not bear the key of this secret: the secret was lost or is another one, or the end was altered.';
    }
  }
  const fault = await headFault(pool, name);
  if (fault !== null) return `The audit trail is not what was kept of it in ${headFile(name)}: ${fault}.`;
  return last > 0 && readHead(headFile(name)) === null
    ? `No head of the audit trail is kept in ${headFile(name)}: what was cut off its end before now does not show.`
    : null;
}
