/**
 * The endpoints of the accounts library that this server answers, below /api/auth. It brings many more (sign-up,
 * change of e-mail, deletion of accounts, …): whatever is not named here does not exist.
 */
export const AUTH_PATHS = [
  'POST /sign-in/email',
  'POST /sign-in/social',
  'POST /sign-in/demonstration',
  'GET /callback/plant',
  'POST /sign-out',
  'POST /change-password',
  'POST /reset-password',
  'POST /revoke-sessions',
  'POST /revoke-other-sessions',
] as const;

/** The identity provider's name in addresses and in the table of accounts. */
export const PLANT_PROVIDER = 'plant';
