import { z } from 'zod';
import { typedChoice, typedText, typedTime } from '@/lib/typed';
import type { Grant } from './actor';
import { AUDIT_ACTIONS } from './audit-action';
import { PERMISSIONS, ROLES, type Role } from './permission';

const emailAddress = z.preprocess(
  (value) => (typeof value === 'string' ? value.trim().toLowerCase() : ''),
  z.email('Give an e-mail address.').max(200, 'At most 200 characters; this is longer.'),
);

/** The first administrator, as a form gives them. */
export const firstAdministrator = z.object({
  name: typedText({ most: 80, ask: 'Give a name.' }),
  email: emailAddress,
  password: z.string('Give a password.'),
  code: z.string().max(100).default(''),
});

export type FirstAdministrator = z.infer<typeof firstAdministrator>;

/** A person, as a form enters one; their roles are read by `grantsGiven`. */
export const newPerson = z.object({
  name: typedText({ most: 80, ask: 'Give a name.' }),
  email: emailAddress,
});

/** Roles that can be given for chosen streams: those with a permission that reaches no further. */
export const STREAM_ROLES = ROLES.filter((role) =>
  Object.values(PERMISSIONS).some(
    ({ roles, ofChosen }) => ofChosen === 'those' && roles.some((one) => one === role),
  ),
);

/** The words by which a form says how far a role goes. */
export const REACHES = ['no', 'all', 'chosen'] as const;

/**
 * The roles that a form gives: a field `role-shift-lead` that is `no`, `all` or `chosen`, and `streams-shift-lead` once
 * for each stream chosen. Returns what is wrong by its field otherwise.
 */
export function grantsGiven(form: FormData): { grants: Grant[] } | { field: string; reason: string } {
  const grants: Grant[] = [];
  for (const role of ROLES) {
    const reach = REACHES.find((word) => word === form.get(`role-${role}`)) ?? 'no';
    if (reach === 'no') continue;
    const ids = streamsChosen(form, role);
    if (reach === 'all') grants.push({ role, streamIds: null });
    else if (!STREAM_ROLES.includes(role) || ids.length === 0) {
      return { field: `role-${role}`, reason: 'Choose at least one stream.' };
    } else grants.push({ role, streamIds: ids });
  }
  return { grants };
}

/** The streams ticked for a role or, without one, for a token. */
export function streamsChosen(form: FormData, of: Role | 'token'): string[] {
  const ids = form.getAll(`streams-${of}`).filter((value) => typeof value === 'string');
  return [...new Set(ids.filter((id) => /^\d{1,18}$/.test(id)))];
}

export const TOKEN_DAYS = ['30', '90', '365'] as const;

/** A token, as a form asks for one. */
export const newToken = z.object({
  name: typedText({ most: 80, ask: 'Give a name: the gauge or program that will show it.' }),
  scope: typedChoice(['intake', 'read'], 'Choose what it is for.'),
  reach: typedChoice(['all', 'chosen'], 'Choose the streams.').default('all'),
  days: typedChoice(TOKEN_DAYS, 'Choose how long it holds.').transform(Number),
});

/** What the audit trail's page takes from its address; what makes no sense is as if it were not there. */
export const auditQuery = (timeZone: string) => {
  const instant = typedTime(timeZone).nullable().catch(null);
  return z.object({
    who: typedText({ most: 100 })
      .transform((text) => (text === '' ? null : text))
      .catch(null),
    stream: z
      .string()
      .regex(/^[a-z0-9][a-z0-9-]{0,99}$/)
      .nullable()
      .catch(null),
    action: z.enum(AUDIT_ACTIONS).nullable().catch(null),
    from: instant,
    to: instant,
    page: z.coerce.number().int().min(1).max(10_000).catch(1),
  });
};

export type AuditQuery = z.infer<ReturnType<typeof auditQuery>>;
