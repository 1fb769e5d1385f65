/** What the accounts endpoints answered: their body, or what to tell the person. */
type AccountsAnswer = { ok: true; body: unknown } | { ok: false; reason: string };

const WORDS: Readonly<Record<string, string>> = {
  INVALID_EMAIL_OR_PASSWORD: 'This address and password do not belong together.',
  INVALID_EMAIL: 'This is no e-mail address.',
  INVALID_PASSWORD: 'The password in use is another one.',
  CREDENTIAL_ACCOUNT_NOT_FOUND: 'You sign in elsewhere: this server keeps no password of yours.',
  INVALID_TOKEN: 'This link was used already, or is too old. An administrator can make another.',
  PASSWORD_TOO_SHORT: 'At least 12 characters; several words do well.',
  PASSWORD_TOO_LONG: 'At most 128 characters; this is longer.',
};

/** Posts to an endpoint of accounts from a page, and puts a refusal into words. */
export async function postToAccounts(path: string, body: object): Promise<AccountsAnswer> {
  const response = await fetch(`/api/auth${path}`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(body),
  }).catch(() => null);
  if (response === null) return { ok: false, reason: 'The server does not answer. Try again in a moment.' };
  const answer = (await response.json().catch(() => ({}))) as { code?: string; message?: string };
  if (response.ok) return { ok: true, body: answer };
  if (response.status === 429) {
    const seconds = Number(response.headers.get('retry-after') ?? 60);
    return { ok: false, reason: `Too many tries. Wait ${seconds} seconds, then try again.` };
  }
  const reason = WORDS[answer.code ?? ''] ?? answer.message ?? 'The server could not do this.';
  return { ok: false, reason };
}
