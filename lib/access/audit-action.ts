/**
 * What can be told of in the audit trail, in the words it is read by ("Ada approved limits …"). The accounts tables'
 * own triggers tell of sign-ins and passwords in the same words.
 */
export const AUDIT_ACTIONS = [
  'recorded maps',
  'refused maps',
  'received maps on record',
  'took out a reading',
  'put back a reading',
  'acknowledged a case',
  'took up a case',
  'wrote into a case',
  'closed a case',
  'recorded an event',
  'drafted limits',
  'approved limits',
  'set limits aside',
  'changed the screening',
  'revised a target',
  'revised a specification',
  'created a stream',
  'created a site plan',
  'retired a stream',
  'took a stream up again',
  'added a person',
  'changed a person',
  'removed a person',
  'deactivated a person',
  'reactivated a person',
  'changed roles',
  'invited a person',
  'added a way to sign in',
  'changed a way to sign in',
  'removed a way to sign in',
  'changed a password',
  'signed in',
  'ended a session',
  'ended all sessions',
  'made a token',
  'revoked a token',
  'changed a setting',
] as const;

export type AuditAction = (typeof AUDIT_ACTIONS)[number];

/** The kinds of things that are acted on. */
export type AuditSubject =
  | 'batch'
  | 'wafer'
  | 'excursion'
  | 'event'
  | 'limit-revision'
  | 'target-revision'
  | 'specification-revision'
  | 'stream'
  | 'site-plan'
  | 'person'
  | 'token'
  | 'setting';
