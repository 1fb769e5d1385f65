import { createHmac } from 'node:crypto';
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

/**
 * Entries as the rows of audit_entry in JSON, for a statement's `json_populate_recordset(NULL::audit_entry, …)`: it keeps
 * the text of before and after as it stands.
 */
export function entriesJson(entries: readonly LinkedEntry[]): string {
  return JSON.stringify(
    entries.map((entry) => ({
      id: entry.id,
      at: entry.at,
      actor_kind: entry.actorKind,
      actor_id: entry.actorId,
      actor_name: entry.actorName,
      action: entry.action,
      subject_kind: entry.subjectKind,
      subject_id: entry.subjectId,
      stream_id: entry.streamId,
      before: parsed(entry.before),
      after: parsed(entry.after),
      why: entry.why,
      mac: `\\x${entry.mac.toString('hex')}`,
    })),
  );
}

/** Made by JSON.stringify, so that it comes out of it alike again. */
function parsed(text: string | null): unknown {
  return text === null ? null : JSON.parse(text);
}

function factsText(facts: AuditFacts | undefined): string | null {
  return facts === undefined
    ? null
    : JSON.stringify(facts, (_, value: unknown) => (typeof value === 'string' ? storable(value) : value));
}

/** Text as PostgreSQL gives it back: it keeps neither NUL nor halves of surrogate pairs. */
function storable(text: string): string {
  return Buffer.from(text.replaceAll('\0', '\ufffd')).toString();
}
