import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { Provider } from 'oidc-provider';

export const CLIENT_SECRET = 'a secret shared with the identity provider';

/** Someone whom the identity provider knows. */
export interface ProviderPerson {
  sub: string;
  name: string;
  email: string;
  email_verified: boolean;
}

/** A real OpenID Connect provider on this machine, which signs in whomever `person` names without asking. */
export interface OidcServer {
  issuer: string;
  person: ProviderPerson;
  /** Parameters of the last request to authorize. */
  lastAsked: URLSearchParams;
  close(): Promise<void>;
}

export async function startOidcServer(redirectUri: string): Promise<OidcServer> {
  const server = createServer();
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const issuer = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const nobody = { sub: '', name: '', email: '', email_verified: false };
  const own: OidcServer = {
    issuer,
    person: nobody,
    lastAsked: new URLSearchParams(),
    close: () => closed(server),
  };
  const provider = new Provider(issuer, {
    clients: [
      {
        client_id: 'evenohm',
        client_secret: CLIENT_SECRET,
        redirect_uris: [redirectUri],
        grant_types: ['authorization_code'],
        response_types: ['code'],
      },
    ],
    claims: { openid: ['sub'], profile: ['name'], email: ['email', 'email_verified'] },
    conformIdTokenClaims: false,
    cookies: { keys: ['for tests alone'] },
    pkce: { required: () => true },
    features: { devInteractions: { enabled: false } },
    interactions: { url: (_context, interaction) => `/interaction/${interaction.uid}` },
    findAccount: async (_context, sub) => ({ accountId: sub, claims: async () => ({ ...own.person }) }),
    ttl: { Session: 60, Interaction: 60, Grant: 60, AccessToken: 60, AuthorizationCode: 60, IdToken: 60 },
  });
  const answer = provider.callback();
  server.on('request', (request, response) => {
    const asked = new URL(request.url ?? '/', issuer);
    if (asked.pathname === '/auth' && asked.searchParams.has('client_id')) own.lastAsked = asked.searchParams;
    if (!asked.pathname.startsWith('/interaction/')) return void answer(request, response);
    void (async () => {
      const grant = new provider.Grant({ accountId: own.person.sub, clientId: 'evenohm' });
      grant.addOIDCScope('openid profile email');
      const grantId = await grant.save();
      await provider.interactionFinished(request, response, {
        login: { accountId: own.person.sub },
        consent: { grantId },
      });
    })();
  });
  return own;
}

function closed(server: Server): Promise<void> {
  server.closeAllConnections();
  return new Promise((resolve) => server.close(() => resolve()));
}
