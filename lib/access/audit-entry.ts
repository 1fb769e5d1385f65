import { createHmac } from 'node:crypto';
import type { Column } from '@/lib/database/columnar';
import type { Actor } from './actor';
import type { AuditAction, AuditSubject } from './audit-action';

/** A few small facts; never a secret, never a whole row. */
export type AuditFacts = Record<string, string | number | boolean | null | readonly (string | number)[]>;

/** What someone did, as a mutation tells it. */
export interface Telling {
  action: AuditAction;
  subject: { kind: AuditSubject; id: string };
  streamId?: string | null;
  before?: AuditFacts;
  after?: AuditFacts;
  why?: string;
  /** When, where it was not just now. */
  at?: Date;
}

/** Who did it, and what. */
export interface Told extends Telling {
  actor: Pick<Actor, 'kind' | 'id' | 'name'>;
}

/** One link of the audit chain, without its mac; `before` and `after` are JSON as it was written. */
export interface AuditEntry {
  id: number;
  at: Date;
  actorKind: Actor['kind'];
  actorId: string | null;
  actorName: string;
  action: string;
  subjectKind: string;
  subjectId: string;
  streamId: string | null;
  before: string | null;
  after: string | null;
  why: string | null;
}

/** The chain's name, and its last entry: what the next is linked to. An empty chain ends at id 0. */
export interface ChainEnd {
  name: string;
  id: number;
  mac: Buffer;
}

export interface LinkedEntry extends AuditEntry {
  mac: Buffer;
}

export const MAC_BEFORE_FIRST = Buffer.alloc(32);

/**
 * The mac of an entry: HMAC-SHA256 (RFC 2104, FIPS 198-1) over the mac before it, then the chain's name and every field
 * of the entry as a JSON array (RFC 8259), which no two different entries share.
 */
export function entryMac(key: Buffer, chain: string, previousMac: Buffer, entry: AuditEntry): Buffer {
  const { id, at, actorKind, actorId, actorName, action } = entry;
  const { subjectKind, subjectId, streamId, before, after, why } = entry;
  const told = [chain, id, at.toISOString(), actorKind, actorId, actorName, action];
  const text = JSON.stringify([...told, subjectKind, subjectId, streamId, before, after, why]);
  return createHmac('sha256', key).update(previousMac).update(text).digest();
}

/** What was done, as the entries that go on from the end of a chain. */
export function linkedEntries(key: Buffer, end: ChainEnd, told: readonly Told[], now: Date): LinkedEntry[] {
  let previousMac = end.mac;
  return told.map(({ actor, ...telling }, i) => {
    const entry: AuditEntry = {
      id: end.id + 1 + i,
      at: telling.at ?? now,
      actorKind: actor.kind,
      actorId: actor.id === null ? null : storable(actor.id),
      actorName: storable(actor.name),
      action: telling.action,
      subjectKind: telling.subject.kind,
      subjectId: storable(telling.subject.id),
      streamId: telling.streamId ?? null,
      before: factsText(telling.before),
      after: factsText(telling.after),
      why: telling.why === undefined ? null : storable(telling.why),
    };
    previousMac = entryMac(key, end.name, previousMac, entry);
    return { ...entry, mac: previousMac };
  });
}

/** The columns of audit_entry. */
export const ENTRY_COLUMNS: readonly Column<LinkedEntry>[] = [
  { name: 'id', type: 'bigint', value: (entry) => entry.id },
  { name: 'at', type: 'timestamptz', value: (entry) => entry.at.toISOString() },
  { name: 'actor_kind', type: 'text', value: (entry) => entry.actorKind },
  { name: 'actor_id', type: 'text', value: (entry) => entry.actorId },
  { name: 'actor_name', type: 'text', value: (entry) => entry.actorName },
  { name: 'action', type: 'text', value: (entry) => entry.action },
  { name: 'subject_kind', type: 'text', value: (entry) => entry.subjectKind },
  { name: 'subject_id', type: 'text', value: (entry) => entry.subjectId },
  { name: 'stream_id', type: 'bigint', value: (entry) => entry.streamId },
  { name: 'before', type: 'json', value: (entry) => entry.before },
  { name: 'after', type: 'json', value: (entry) => entry.after },
  { name: 'why', type: 'text', value: (entry) => entry.why },
  { name: 'mac', type: 'bytea', value: (entry) => `"\\\\x${entry.mac.toString('hex')}"` },
];

function factsText(facts: AuditFacts | undefined): string | null {
  return facts === undefined
    ? null
    : JSON.stringify(facts, (_, value: unknown) => (typeof value === 'string' ? storable(value) : value));
}

/** Text as PostgreSQL gives it back: it keeps neither NUL nor halves of surrogate pairs. */
function storable(text: string): string {
  return Buffer.from(text.replaceAll('\0', '\ufffd')).toString();
}
