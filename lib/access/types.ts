import type { Grant } from './actor';

/** Someone who may sign in, or might once. */
export interface Person {
  id: string;
  name: string;
  email: string;
  /** One of the people of the demonstration line, who stay as they are. */
  demonstration: boolean;
  deactivatedAt: Date | null;
  grants: Grant[];
  /** Sessions that go on. */
  sessions: number;
  /** By a password of this program, by the plant's identity provider; neither while a link waits to be used. */
  signsInBy: ('password' | 'provider')[];
  lastSignInAt: Date | null;
}

/** A token as it is on record; the token itself is not. */
export interface TokenOnRecord {
  id: string;
  name: string;
  prefix: string;
  scope: 'read' | 'intake';
  /** The streams it may record wafers of; null: all. */
  streamIds: string[] | null;
  createdBy: string;
  createdAt: Date;
  expiresAt: Date;
  revokedAt: Date | null;
  revokedBy: string | null;
  lastUsedAt: Date | null;
}

export type AccessResult<Value = undefined> = { ok: true; value: Value } | { ok: false; reason: string };
