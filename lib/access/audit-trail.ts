import { getPool } from '@/lib/database/client';
import { AppError } from '@/lib/errors';
import { may, type Actor } from './actor';
import type { AuditFacts } from './audit-entry';
import { refusalOf } from './refusal';
import type { AuditQuery } from './schema';

/** An entry of the audit trail as it is read. */
export interface ListedEntry {
  id: string;
  at: Date;
  actorKind: Actor['kind'];
  actorId: string | null;
  actorName: string;
  action: string;
  subjectKind: string;
  subjectId: string;
  /** How it is named now: a person, a wafer, a stream; null where the facts name it. */
  subjectName: string | null;
  stream: { slug: string; name: string } | null;
  before: AuditFacts | null;
  after: AuditFacts | null;
  why: string | null;
  mac: Buffer;
}

const LIST = `
SELECT e.id, e.at, e.actor_kind AS "actorKind", e.actor_id AS "actorId", e.actor_name AS "actorName", e.action,
  e.subject_kind AS "subjectKind", e.subject_id AS "subjectId", e.before, e.after, e.why, e.mac,
  CASE e.subject_kind
    WHEN 'person' THEN (SELECT p.name FROM person p WHERE p.id = e.subject_id)
    WHEN 'stream' THEN (SELECT o.name FROM stream o WHERE o.id = e.subject_id::bigint)
    WHEN 'wafer' THEN (SELECT w.wafer FROM wafer_measurement w WHERE w.id = e.subject_id::bigint)
  END AS "subjectName",
  CASE WHEN s.id IS NOT NULL THEN json_build_object('slug', s.slug, 'name', s.name) END AS stream
FROM (SELECT a.* FROM audit_entry a
  WHERE ($1::text IS NULL OR a.actor_name ILIKE $1)
    AND ($2::text IS NULL OR a.stream_id = (SELECT o.id FROM stream o WHERE o.slug = $2))
    AND ($3::text IS NULL OR a.action = $3)
    AND ($4::timestamptz IS NULL OR a.at >= $4) AND ($5::timestamptz IS NULL OR a.at < $5)
  ORDER BY a.id DESC LIMIT $6 OFFSET $7) e
LEFT JOIN stream s ON s.id = e.stream_id
ORDER BY e.id DESC`;

/** The entries that are asked for, the newest first. Throws `AppError` for someone who may not read them. */
export async function listAuditEntries(
  actor: Actor,
  { who, stream, action, from, to }: Omit<AuditQuery, 'page'>,
  { skip, most }: { skip: number; most: number },
): Promise<ListedEntry[]> {
  if (!may(actor, 'read-audit')) throw new AppError('forbidden', refusalOf('read-audit'));
  const name = who === null ? null : `%${who.replace(/[\\%_]/g, '\\$&')}%`;
  const { rows } = await getPool().query<ListedEntry>(LIST, [name, stream, action, from, to, most, skip]);
  return rows;
}
