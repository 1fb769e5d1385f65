import { PERMISSIONS, type Permission, type Role } from './permission';

declare const proof: unique symbol;

/** A role someone has, for all streams (null) or for chosen ones. */
export interface Grant {
  role: Role;
  streamIds: readonly string[] | null;
}

/** What is known of whoever acts. */
export interface Identity {
  /** A person who signed in, a machine with a token, the command line on this machine, or the program itself. */
  kind: 'person' | 'token' | 'command' | 'program';
  /** The id of the person or token; null for the command line and the program. */
  id: string | null;
  /** How they are named beside whatever they do. */
  name: string;
  grants: readonly Grant[];
  /** What a token was made for, and for which streams (null: all). */
  token?: { scope: 'read' | 'intake'; streamIds: readonly string[] | null };
}

/**
 * Someone who may act, proven so by this room. Every read and write of a service room takes one first; only the
 * functions of this room can make one, so code that has not asked who acts does not compile.
 */
export interface Actor extends Identity {
  readonly [proof]: true;
}

/** The one place where an `Actor` comes into being. */
export function provenActor(identity: Identity): Actor {
  return identity as Actor;
}

/**
 * Whether someone may do a thing: on the stream given, or, without one, on at least one stream. What the program does
 * by itself and what is typed on the machine's own command line may be everything.
 */
export function may(actor: Actor, permission: Permission, streamId?: string): boolean {
  if (actor.kind === 'program' || actor.kind === 'command') return true;
  const { roles, ofChosen, token } = PERMISSIONS[permission];
  if (actor.token !== undefined) return actor.token.scope === token && holds(actor.token.streamIds, streamId);
  return actor.grants.some(
    ({ role, streamIds }) =>
      roles.some((allowed) => allowed === role) &&
      (streamIds === null || ofChosen === 'all' || (ofChosen === 'those' && holds(streamIds, streamId))),
  );
}

/** Whether a choice of streams (null: all) holds the one given, or any where none is given. */
function holds(streamIds: readonly string[] | null, streamId: string | undefined): boolean {
  return streamIds === null || streamId === undefined || streamIds.includes(streamId);
}
