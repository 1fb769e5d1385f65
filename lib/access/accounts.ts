import { type BetterAuthOptions, betterAuth } from 'better-auth';
import { prismaAdapter } from 'better-auth/adapters/prisma';
import { APIError } from 'better-auth/api';
import { genericOAuth } from 'better-auth/plugins/generic-oauth';
import { getPool, getPrisma } from '@/lib/database/client';
import { type Environment, readEnvironment } from '@/lib/env';
import { PLANT_PROVIDER } from './auth-paths';
import { demonstrationSignIn } from './demonstration-sign-in';
import { isDemonstrationOffered } from './demonstration';
import { LEAST_PASSWORD, MOST_PASSWORD } from './password-fault';
import { refusePassword } from './refuse-password';
import { plantKey } from './secret';
import { SESSION_COOKIE_PREFIX, hasSecureCookies } from './session-cookie';

const SESSION_SECONDS = 12 * 3600;

/** What the identity provider hands out for its own doors is not needed here, so it is not kept. */
const NO_TOKENS = { accessToken: null, refreshToken: null, idToken: null };

const made = new WeakMap<object, ReturnType<typeof makeAccounts>>();

/**
 * The accounts library (better-auth) on the open database: it hashes passwords, keeps sessions, limits the rate of
 * sign-in and speaks OpenID Connect. Who may do what is none of its business.
 */
export function accounts(): ReturnType<typeof makeAccounts> {
  const prisma = getPrisma();
  const known = made.get(prisma);
  if (known !== undefined) return known;
  const fresh = makeAccounts(readEnvironment());
  made.set(prisma, fresh);
  return fresh;
}

function makeAccounts(environment: Environment) {
  return betterAuth({
    ...foundations(environment),
    user: { modelName: 'person' },
    rateLimit: {
      enabled: true,
      storage: 'database',
      window: 60,
      max: 100,
      customRules: {
        '/sign-in/email': { window: 60, max: 10 },
        '/sign-in/social': { window: 60, max: 30 },
        '/change-password': { window: 60, max: 10 },
        '/reset-password': { window: 60, max: 10 },
        '/sign-in/demonstration': { window: 60, max: 100 },
      },
    },
    session: { expiresIn: SESSION_SECONDS, disableSessionRefresh: true },
    // As `writePasswordLink` writes them: whoever reads the table learns no link.
    verification: { storeIdentifier: 'hashed' },
    emailAndPassword: {
      enabled: true,
      disableSignUp: true,
      minPasswordLength: LEAST_PASSWORD,
      maxPasswordLength: MOST_PASSWORD,
      revokeSessionsOnPasswordReset: true,
    },
    // The address was entered by an administrator, never by whoever signs in: the provider's word for it is enough.
    account: { accountLinking: { requireLocalEmailVerified: false }, updateAccountOnSignIn: false },
    databaseHooks: {
      session: { create: { before: async ({ userId }) => admit(userId) } },
      account: { create: { before: async (account) => ({ data: { ...account, ...NO_TOKENS } }) } },
    },
    hooks: { before: refusePassword },
    plugins: [demonstrationSignIn, ...plantProvider(environment)],
  });
}

/** Where it works: database, keys, cookies, the addresses it answers to. */
function foundations({ publicUrl, trustedProxy }: Environment) {
  return {
    appName: 'Evenohm',
    database: prismaAdapter(getPrisma(), { provider: 'postgresql' }),
    secret: plantKey('sessions').toString('base64url'),
    baseURL: {
      allowedHosts: [
        'localhost*',
        '127.*',
        '[::1]*',
        ...(publicUrl === null ? [] : [new URL(publicUrl).host]),
      ],
    },
    // The address of a request is made by `answerAuth` from a host that the server answers to.
    trustedOrigins: (request?: Request) => (request === undefined ? [] : [new URL(request.url).origin]),
    telemetry: { enabled: false },
    advanced: {
      cookiePrefix: SESSION_COOKIE_PREFIX,
      useSecureCookies: hasSecureCookies(publicUrl),
      ipAddress: { trustedProxies: trustedProxy === null ? [] : [trustedProxy] },
    },
    // A refusal is an answer, not an incident. What the library would add to a line may hold what somebody typed.
    onAPIError: { onError: (error) => sayUnexpected(error) },
    logger: { level: 'error', log: (_level, message) => console.warn(`Accounts: ${message}`) },
  } satisfies BetterAuthOptions;
}

function sayUnexpected(error: unknown): void {
  if (!(error instanceof APIError)) console.error(error);
}

/** The plant's own identity provider (OpenID Connect Discovery 1.0, PKCE of RFC 7636), where one is named. */
function plantProvider({ oidc }: Environment) {
  if (oidc === null) return [];
  const provider = {
    providerId: PLANT_PROVIDER,
    discoveryUrl: `${oidc.issuer.replace(/\/$/, '')}/.well-known/openid-configuration`,
    clientId: oidc.clientId,
    clientSecret: oidc.clientSecret,
    scopes: ['openid', 'profile', 'email'],
    pkce: true,
    requireIdTokenVerification: true,
    disableSignUp: !oidc.creates,
    mapProfileToUser: (profile: Record<string, unknown>) => ({
      name: String(profile['name'] ?? profile['email'] ?? 'nameless'),
    }),
  };
  return [genericOAuth({ config: [provider] })];
}

/** A session begins only for someone who still counts. */
async function admit(personId: string): Promise<void> {
  const { rows } = await getPool().query<{ demonstration: boolean; gone: boolean }>(
    'SELECT demonstration, deactivated_at IS NOT NULL AS gone FROM person WHERE id = $1',
    [personId],
  );
  const [person] = rows;
  if (person === undefined || person.gone || (person.demonstration && !isDemonstrationOffered())) {
    throw new APIError('FORBIDDEN', { code: 'DEACTIVATED', message: 'This account is no longer in use.' });
  }
}
