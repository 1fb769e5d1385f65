/** Someone who asks: headers that say who, or none. */
export interface Asker {
  name: string;
  headers: Record<string, string>;
}

/** What became of asking. */
export type Outcome = 'allowed' | 'refused' | 'nobody' | `strange: ${string}`;

const SIGN_IN = /^(http:\/\/[^/]+)?\/sign-in/;
const UNSENT = { taken: 0, errors: {}, message: null, done: null };

export async function askPage(origin: string, address: string, { headers }: Asker): Promise<Outcome> {
  const answer = await fetch(origin + address, { headers, redirect: 'manual' });
  const text = await answer.text();
  if (answer.status === 200) return 'allowed';
  if (answer.status === 403) return 'refused';
  if (SIGN_IN.test(answer.headers.get('location') ?? '')) return 'nobody';
  return `strange: ${answer.status} ${text.slice(0, 200)}`;
}

export async function askRoute(
  origin: string,
  method: string,
  address: string,
  asker: Asker,
  body?: string,
): Promise<Outcome> {
  const answer = await fetch(origin + address, {
    method,
    headers: { ...asker.headers, origin, ...(body && { 'content-type': 'text/csv' }) },
    redirect: 'manual',
    ...(body && { body }),
  });
  const text = await answer.text();
  if (answer.status === 401) return 'nobody';
  if (answer.status === 403) return 'refused';
  return answer.ok || answer.status === 422 ? 'allowed' : `strange: ${answer.status} ${text.slice(0, 200)}`;
}

/**
 * Calls a server action as Next's client does: the arguments as `0`, the fields of the form beside it. What comes back
 * begins with the state that the form would show.
 */
export async function askAction(
  origin: string,
  action: { id: string; address: string },
  call: { args: readonly unknown[]; fields: Record<string, string> | null },
  asker: Asker,
): Promise<Outcome> {
  const body = new FormData();
  for (const [name, value] of Object.entries(call.fields ?? {})) body.append(`_1_${name}`, value);
  body.append('0', JSON.stringify(call.fields === null ? call.args : [...call.args, UNSENT, '$K1']));
  const answer = await fetch(origin + action.address, {
    method: 'POST',
    headers: { ...asker.headers, origin, 'next-action': action.id },
    redirect: 'manual',
    body,
  });
  const text = await answer.text();
  if (answer.status === 403) return 'refused';
  const goes = answer.headers.get('x-action-redirect') ?? answer.headers.get('location') ?? '';
  if (SIGN_IN.test(goes)) return 'nobody';
  const state = /^1:(\{"taken":.*\})$/m.exec(text)?.[1] ?? '';
  if (state.includes('You are signed out.')) return 'nobody';
  if (state.includes('Your roles do not allow this')) return 'refused';
  return answer.status === 200 || answer.status === 303
    ? 'allowed'
    : `strange: ${answer.status} ${text.slice(0, 200)}`;
}
