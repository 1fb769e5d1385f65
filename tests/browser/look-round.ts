import { expect, type APIRequestContext } from '@playwright/test';
import type { Role } from '@/lib/access/permission';

/** Signs in as the person of the demonstration line who has a role; the session's cookie stays in the context. */
export async function lookRound(request: APIRequestContext, baseURL: string, role: Role): Promise<void> {
  const answer = await request.post('/api/auth/sign-in/demonstration', {
    data: { role },
    headers: { origin: baseURL },
  });
  expect(answer.status(), await answer.text()).toBe(200);
}
