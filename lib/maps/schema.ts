import { z } from 'zod';
import { siteInstant } from '@/lib/site-time';
import { columnFlag, WAFER_COLUMNS, type WaferColumn } from './map-columns';
import type { RawMap } from './raw-maps';
import { readFacts } from './read-facts';

/** What a person says of a file's wafers where its columns say nothing: as typed, as read, and what is wrong with it. */
export interface GivenWords {
  typed: Partial<Record<WaferColumn, string>>;
  words: RawMap['words'];
  errors: Partial<Record<WaferColumn, string>>;
}

const typedWord = z.preprocess(
  (value) => (Array.isArray(value) ? value[0] : value),
  z
    .string()
    .transform((text) => text.replaceAll('\u0000', '').trim().slice(0, 300))
    .optional(),
);
const typedWords = z.object(Object.fromEntries(WAFER_COLUMNS.map((column) => [column, typedWord])));

/**
 * Reads what a form or an address says of the wafers. Times are the site's wall clock, as a time field sends them, or
 * carry an offset of their own.
 */
export function givenWords(source: Record<string, unknown>, timeZone: string): GivenWords {
  const parsed = typedWords.parse(source) as Partial<Record<WaferColumn, string | undefined>>;
  const typed: GivenWords['typed'] = {};
  const words: RawMap['words'] = {};
  for (const column of WAFER_COLUMNS) {
    const text = parsed[column];
    if (text === undefined || text === '') continue;
    typed[column] = text;
    const isTime = column === 'measured_at' || column === 'processed_at';
    words[column] = (isTime ? siteInstant(text, timeZone)?.toISOString() : undefined) ?? text;
  }
  const errors: GivenWords['errors'] = {};
  for (const { column, reason } of readFacts({}, words).faults) {
    if (typed[column] !== undefined) errors[column] = reason;
  }
  return { typed, words, errors };
}

/** The same words as an address carries them. */
export function wordsQuery(typed: GivenWords['typed']): string {
  return new URLSearchParams(typed as Record<string, string>).toString();
}

const sentFlag = z.enum(['', 'on']).optional();
const sentQuery = z.strictObject({
  check: sentFlag,
  sound: sentFlag,
  history: sentFlag,
  ...Object.fromEntries(WAFER_COLUMNS.map((column) => [columnFlag(column), z.string().max(2000).optional()])),
});

/** How a file that is sent over the network is to be taken: the flags of the command, in the address. */
export interface SentOptions {
  checkOnly: boolean;
  sound: boolean;
  history: boolean;
  defaults: RawMap['words'];
}

/**
 * Reads the address that a file is sent to: `check`, `sound` and `history` stand there without a value, and what the
 * file does not say of its wafers as `stream=…&measured-at=…`. Returns what is wrong with it otherwise, an unknown word
 * among it: a misspelt `history` must not record as new.
 */
export function sentOptions(query: URLSearchParams): SentOptions | { faults: string[] } {
  const parsed = sentQuery.safeParse(Object.fromEntries(query));
  if (!parsed.success) {
    const faults = parsed.error.issues.map((issue) =>
      issue.code === 'unrecognized_keys'
        ? `the address holds what is not understood: ${issue.keys.join(', ').slice(0, 100)}`
        : `“${issue.path.join('.')}” in the address is not understood`,
    );
    return { faults };
  }
  const given: Partial<Record<string, string>> = parsed.data;
  const defaults: RawMap['words'] = {};
  for (const column of WAFER_COLUMNS) {
    const word = given[columnFlag(column)];
    if (word !== undefined) defaults[column] = word;
  }
  const is = (flag: 'check' | 'sound' | 'history') => given[flag] !== undefined;
  return { checkOnly: is('check'), sound: is('sound'), history: is('history'), defaults };
}

/** A person's word on one reading: `out-12` takes the reading of site index 12 out, `in-12` puts it back; and why. */
export const readingDecision = z.object({
  site: z
    .string({ error: 'Choose a reading.' })
    .regex(/^(in|out)-\d{1,5}$/, 'Choose a reading.')
    .transform((word) => ({
      action: word.startsWith('in') ? ('in' as const) : ('out' as const),
      siteIndex: Number(word.slice(word.indexOf('-') + 1)),
    })),
  reason: z
    .string({ error: 'Say why.' })
    .transform((text) => text.replaceAll('\u0000', '').trim())
    .pipe(
      z
        .string()
        .min(3, 'Say why, in a few words: it stays with the wafer.')
        .max(500, 'Say it in 500 characters or fewer.'),
    ),
});
