import { z } from 'zod';

/** Text a person writes. A null character has no place in it: the database does not keep one. */
const words = (most: number) =>
  z
    .string()
    .trim()
    .max(most, `At most ${most} characters; this is longer.`)
    .refine((text) => !text.includes('\u0000'), 'There is a character in it that cannot be kept.');

const note = words(2000);

/** A step of an excursion, as the forms of its page send it. */
export const excursionStep = z.discriminatedUnion('to', [
  z.object({ to: z.enum(['acknowledged', 'under-investigation']), note }),
  z.object({ to: z.literal('noted'), note: note.min(1, 'Write the note first.') }),
  z.object({
    to: z.literal('closed'),
    cause: words(500).min(1, 'Say what the cause was, or that none was found.'),
    note,
  }),
]);

export const excursionId = z.string().regex(/^\d{1,18}$/);

/** A stream's name in an address, and a page of a long list; what makes no sense is as if it were not there. */
const listed = {
  stream: z
    .string()
    .regex(/^[a-z0-9][a-z0-9-]{0,99}$/)
    .nullable()
    .catch(null),
  page: z.coerce.number().int().min(1).max(10_000).catch(1),
};

/** What the list of wafers to measure again takes from its address. */
export const measureAgainQuery = z.object(listed);

const STATES = ['unclosed', 'open', 'acknowledged', 'under-investigation', 'closed', 'all'] as const;

/** What the list of excursions takes from its address. */
export const excursionQuery = z.object({ state: z.enum(STATES).catch('unclosed'), ...listed });

export type ExcursionQuery = z.infer<typeof excursionQuery>;
