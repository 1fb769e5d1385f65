import type { ClientBase, Pool } from 'pg';
import { getPool } from '@/lib/database/client';
import { AppError } from '@/lib/errors';
import { entryMac, MAC_BEFORE_FIRST, type AuditEntry } from './audit-entry';
import { headFile, keepWaitingHeads, readHead, strangeHeads, type AuditHead } from './audit-head';
import { plantKey } from './secret';

/** A place where the chain does not hold: these entries, and what is wrong with them. */
export interface BrokenPlace {
  from: number;
  to: number;
  /**
   * altered: edited, moved, or written with another key; missing: taken out of the middle or the beginning;
   * unproven: linked to one that is missing, so that nobody can tell whether it is as written; cut: taken off the end;
   * replaced: not the entry that was kept outside the database as the last.
   */
  fault: 'altered' | 'missing' | 'unproven' | 'cut' | 'replaced';
}

export interface AuditVerdict {
  entries: number;
  /** The heads kept outside the database that the chain was held against. */
  heads: number;
  /** Files beside its own that keep the head of another chain: of another database, or of the one that was here before. */
  strangers: string[];
  broken: BrokenPlace[];
}

interface EntryRow extends AuditEntry {
  mac: Buffer;
}

const AT_ONCE = 2000;
/** So many places are named; a chain broken in more of them is broken enough. */
const MOST_PLACES = 1000;

/**
 * Follows the chain from its first entry to its last and names each place where it does not hold. The heads are read
 * first: the database may have gone on since, but never back. Memory does not grow with the chain. Throws `AppError`
 * where a file that was named holds no head.
 */
export async function verifyAudit(headFiles: readonly string[] = []): Promise<AuditVerdict> {
  keepWaitingHeads();
  const client = await getPool().connect();
  try {
    const { rows } = await client.query<{ name: string }>('SELECT name FROM audit_chain');
    const chain = rows[0]?.name ?? '';
    const own = readHead(headFile(chain));
    const others = headFiles.map(givenHead);
    const verdict = await followed(client, chain, own === null ? others : [own, ...others]);
    return { ...verdict, strangers: strangeHeads(chain) };
  } finally {
    client.release();
  }
}

function givenHead(file: string): AuditHead {
  const head = readHead(file);
  if (head === null) throw new AppError('invalid', `There is no head of an audit trail in ${file}.`);
  return head;
}

async function followed(
  client: ClientBase,
  chain: string,
  heads: AuditHead[],
): Promise<Omit<AuditVerdict, 'strangers'>> {
  const key = plantKey('audit');
  const verdict: Omit<AuditVerdict, 'strangers'> = { entries: 0, heads: heads.length, broken: [] };
  let last = 0;
  let previousMac: Buffer | null = MAC_BEFORE_FIRST;
  for (;;) {
    const rows = await entriesAfter(client, last);
    for (const { mac, ...entry } of rows) {
      if (entry.id !== last + 1) {
        note(verdict, { from: last + 1, to: entry.id - 1, fault: 'missing' });
        previousMac = null;
      }
      const isSound = previousMac !== null && entryMac(key, chain, previousMac, entry).equals(mac);
      const fault = previousMac === null ? 'unproven' : 'altered';
      if (!isSound) note(verdict, { from: entry.id, to: entry.id, fault });
      for (const head of heads) {
        if (head.id === entry.id && !head.mac.equals(mac))
          note(verdict, { from: entry.id, to: entry.id, fault: 'replaced' });
      }
      previousMac = mac;
      last = entry.id;
      verdict.entries += 1;
    }
    if (rows.length < AT_ONCE) break;
  }
  const furthest = Math.max(0, ...heads.map((head) => head.id));
  if (furthest > last) note(verdict, { from: last + 1, to: furthest, fault: 'cut' });
  return verdict;
}

/** Places that touch and have the same fault are one. */
function note({ broken }: Pick<AuditVerdict, 'broken'>, place: BrokenPlace): void {
  const before = broken.at(-1);
  if (before?.fault === place.fault && before.to + 1 === place.from) before.to = place.to;
  else if (broken.length < MOST_PLACES) broken.push(place);
}

/** The next entries of the chain after one, so many as are read at once. */
export async function entriesAfter(client: ClientBase | Pool, id: number): Promise<EntryRow[]> {
  const { rows } = await client.query<Omit<EntryRow, 'id'> & { id: string }>(
    `SELECT id, at, actor_kind AS "actorKind", actor_id AS "actorId", actor_name AS "actorName", action,
       subject_kind AS "subjectKind", subject_id AS "subjectId", stream_id AS "streamId", before::text, after::text, why, mac
     FROM audit_entry WHERE id > $1 ORDER BY id LIMIT $2`,
    [id, AT_ONCE],
  );
  return rows.map((row) => ({ ...row, id: Number(row.id) }));
}
