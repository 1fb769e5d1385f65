const WORDS: Readonly<Record<string, string>> = {
  signup_disabled:
    'The identity provider knows you, but you have no account here. An administrator can add you.',
  account_not_linked:
    'There is an account with your address here, but the identity provider does not vouch for the address. Sign in with your password.',
  DEACTIVATED: 'This account is no longer in use.',
  access_denied: 'The identity provider did not let you in.',
};

/** What went wrong at the plant's identity provider, in words; null where nothing did. */
export function providerFault(error: string | undefined): string | null {
  if (error === undefined || error === '') return null;
  return WORDS[error] ?? 'Signing in by the identity provider did not succeed. Try again.';
}
