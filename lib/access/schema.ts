import { z } from 'zod';
import { typedText } from '@/lib/typed';

/** The first administrator, as a form gives them. */
export const firstAdministrator = z.object({
  name: typedText({ most: 80, ask: 'Give a name.' }),
  email: z.preprocess(
    (value) => (typeof value === 'string' ? value.trim().toLowerCase() : ''),
    z.email('Give an e-mail address.').max(200, 'At most 200 characters; this is longer.'),
  ),
  password: z.string('Give a password.'),
  code: z.string().max(100).default(''),
});

export type FirstAdministrator = z.infer<typeof firstAdministrator>;
