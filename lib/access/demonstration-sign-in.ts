import type { BetterAuthPlugin } from 'better-auth';
import { APIError, createAuthEndpoint } from 'better-auth/api';
import { setSessionCookie } from 'better-auth/cookies';
import { z } from 'zod';
import { demonstrationId, isDemonstrationOffered } from './demonstration';
import { ROLES } from './permission';

/** Signs in as the person of the demonstration line who has a role, where that is offered. */
export const demonstrationSignIn = {
  id: 'demonstration',
  endpoints: {
    signInDemonstration: createAuthEndpoint(
      '/sign-in/demonstration',
      { method: 'POST', body: z.object({ role: z.enum(ROLES) }) },
      async (context) => {
        const { internalAdapter } = context.context;
        const user = isDemonstrationOffered()
          ? await internalAdapter.findUserById(demonstrationId(context.body.role))
          : null;
        if (user === null) {
          throw new APIError('FORBIDDEN', {
            code: 'NO_DEMONSTRATION',
            message: 'This server has no demonstration line to look round.',
          });
        }
        const session = await internalAdapter.createSession(user.id);
        await setSessionCookie(context, { session, user });
        return context.json({ signedIn: true });
      },
    ),
  },
} satisfies BetterAuthPlugin;
