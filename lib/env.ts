import path from 'node:path';
import { z } from 'zod';

/** An empty variable is the same as an absent one: `PORT= npm start` means the default. */
const blankIsAbsent = (value: unknown) => (value === '' ? undefined : value);

const timeZone = z.string().refine(isTimeZone, 'is no IANA time zone such as Europe/Berlin or UTC');

const portWords = 'must be a port, a whole number from 0 to 65535';
const port = z.coerce.number(portWords).int(portWords).min(0, portWords).max(65535, portWords);

const webWords = 'must be an address that begins with https:// or http://';
const webAddress = z.url({ protocol: /^https?$/, error: webWords });
const onOrOff = z.enum(['on', 'off'], 'must be on or off');
const secret = z.string().min(32, 'must have 32 characters or more');

const databaseAddress = z.string().regex(/^postgres(ql)?:\/\//, 'must begin with postgresql://');

const variables = z.object({
  DATABASE_URL: z.preprocess(blankIsAbsent, databaseAddress.optional()),
  EVENOHM_OWNER_URL: z.preprocess(blankIsAbsent, databaseAddress.optional()),
  EVENOHM_DATA: z.preprocess(blankIsAbsent, z.string().default('.evenohm')),
  PORT: z.preprocess(blankIsAbsent, port.default(3000)),
  EVENOHM_HOST: z.preprocess(blankIsAbsent, z.string().default('127.0.0.1')),
  EVENOHM_URL: z.preprocess(blankIsAbsent, webAddress.optional()),
  EVENOHM_SECRET: z.preprocess(blankIsAbsent, secret.optional()),
  EVENOHM_TRUSTED_PROXY: z.preprocess(blankIsAbsent, z.string().optional()),
  EVENOHM_SITE_TIME_ZONE: z.preprocess(blankIsAbsent, timeZone.default('UTC')),
  EVENOHM_DEMO: z.preprocess(blankIsAbsent, onOrOff.optional()),
  EVENOHM_TOKEN: z.preprocess(blankIsAbsent, z.string().optional()),
  EVENOHM_OIDC_ISSUER: z.preprocess(blankIsAbsent, webAddress.optional()),
  EVENOHM_OIDC_CLIENT_ID: z.preprocess(blankIsAbsent, z.string().optional()),
  EVENOHM_OIDC_CLIENT_SECRET: z.preprocess(blankIsAbsent, z.string().optional()),
  EVENOHM_OIDC_NAME: z.preprocess(blankIsAbsent, z.string().default('plant account')),
  EVENOHM_OIDC_CREATE: z.preprocess(blankIsAbsent, onOrOff.default('off')),
});

/** The plant's own identity provider. */
export interface OidcEnvironment {
  issuer: string;
  clientId: string;
  clientSecret: string;
  /** What the button says after "Sign in with". */
  name: string;
  /** Whether someone whom it knows and this program does not becomes a person here, without any role. */
  creates: boolean;
}

/** What the program takes from its environment, named and checked. */
export interface Environment {
  /** Address of an existing PostgreSQL 15 or later; null means the embedded server. */
  databaseUrl: string | null;
  /** The same database as its owner, who migrates it and grants what the program needs; null: DATABASE_URL does both. */
  ownerUrl: string | null;
  /** The embedded server's folder, absolute. */
  dataFolder: string;
  port: number;
  host: string;
  publicUrl: string | null;
  secret: string | null;
  trustedProxy: string | null;
  siteTimeZone: string;
  /** Whether an empty database is filled with the demonstration line: by default only an embedded one. */
  demo: boolean;
  oidc: OidcEnvironment | null;
  /** What the command line shows to the server of others. */
  token: string | null;
}

/** An environment variable that cannot be used; the message names it. */
export class EnvironmentError extends Error {}

/**
 * Reads the environment (variables of the README's table), fills in defaults and refuses what makes no sense.
 * Throws `EnvironmentError` with one line that names every variable at fault.
 */
export function readEnvironment(source: Record<string, string | undefined> = process.env): Environment {
  const parsed = variables.safeParse(source);
  if (!parsed.success) {
    const faults = parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
    throw new EnvironmentError(faults.join('; '));
  }
  const found = parsed.data;
  if (found.EVENOHM_OWNER_URL !== undefined && found.DATABASE_URL === undefined) {
    throw new EnvironmentError(
      'EVENOHM_OWNER_URL: DATABASE_URL, by which the program itself signs in, must stand beside it',
    );
  }
  return {
    databaseUrl: found.DATABASE_URL ?? null,
    ownerUrl: found.EVENOHM_OWNER_URL ?? null,
    dataFolder: path.resolve(found.EVENOHM_DATA),
    port: found.PORT,
    host: found.EVENOHM_HOST,
    publicUrl: found.EVENOHM_URL ?? null,
    secret: found.EVENOHM_SECRET ?? null,
    trustedProxy: found.EVENOHM_TRUSTED_PROXY ?? null,
    siteTimeZone: found.EVENOHM_SITE_TIME_ZONE,
    demo: (found.EVENOHM_DEMO ?? (found.DATABASE_URL === undefined ? 'on' : 'off')) === 'on',
    oidc: oidcOf(found),
    token: found.EVENOHM_TOKEN ?? null,
  };
}

function oidcOf(found: z.infer<typeof variables>): OidcEnvironment | null {
  const { EVENOHM_OIDC_ISSUER: issuer, EVENOHM_OIDC_CLIENT_ID: clientId } = found;
  const clientSecret = found.EVENOHM_OIDC_CLIENT_SECRET;
  if (issuer === undefined && clientId === undefined && clientSecret === undefined) return null;
  if (issuer === undefined || clientId === undefined || clientSecret === undefined) {
    throw new EnvironmentError(
      'EVENOHM_OIDC_ISSUER, EVENOHM_OIDC_CLIENT_ID and EVENOHM_OIDC_CLIENT_SECRET go together: set all three, or none.',
    );
  }
  const creates = found.EVENOHM_OIDC_CREATE === 'on';
  return { issuer, clientId, clientSecret, name: found.EVENOHM_OIDC_NAME, creates };
}

function isTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: name });
    return true;
  } catch {
    return false;
  }
}
