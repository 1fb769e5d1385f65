/** What the tests use of oidc-provider, which brings no types. */
declare module 'oidc-provider' {
  import type { IncomingMessage, ServerResponse } from 'node:http';

  export class Provider {
    constructor(
      issuer: string,
      configuration: {
        interactions: { url(context: unknown, interaction: { uid: string }): string };
        findAccount(
          context: unknown,
          sub: string,
        ): Promise<{ accountId: string; claims(): Promise<Record<string, unknown>> }>;
        [setting: string]: unknown;
      },
    );
    readonly Grant: new (of: { accountId: string; clientId: string }) => {
      addOIDCScope(scope: string): void;
      save(): Promise<string>;
    };
    callback(): (request: IncomingMessage, response: ServerResponse) => Promise<void>;
    interactionFinished(request: IncomingMessage, response: ServerResponse, result: object): Promise<void>;
  }
}
