import { z } from 'zod';
import { siteInstant } from './site-time';

const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/**
 * The number that a person typed, or null when it is none: a decimal point, an exponent as e15 or as a page prints it,
 * × 10¹⁵, a true minus sign as well as a hyphen.
 *
 * @example numberTyped('1.34 × 10¹⁵') // 1.34e15
 */
export function numberTyped(text: string): number | null {
  const plain = text
    .trim()
    .replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹]/g, (digit) => String(SUPERSCRIPTS.indexOf(digit)))
    .replaceAll('⁻', '-')
    .replaceAll('−', '-')
    .replace(/\s*[×x*]\s*10\s*\^?\s*(?=[+-]?\d+$)/, 'e');
  if (!NUMBER.test(plain)) return null;
  const value = Number(plain);
  return Number.isFinite(value) ? value : null;
}

interface Wish {
  /** What is asked for, to follow "Give": "a density above 0". */
  wish: string;
  holds?: (value: number) => boolean;
}

function numberOr<Blank>(
  blank: (wish: string) => { value: Blank } | { reason: string },
  { wish, holds }: Wish,
) {
  return z.preprocess(
    (value) => (typeof value === 'string' ? value : ''),
    z.string().transform((text, context): number | Blank => {
      const fault = (message: string) => {
        context.addIssue({ code: 'custom', message });
        return z.NEVER;
      };
      if (text.trim() === '') {
        const answer = blank(wish);
        return 'value' in answer ? answer.value : fault(answer.reason);
      }
      const value = numberTyped(text);
      if (value === null) {
        const hint = /^[+-]?\d+,\d+$/.test(text.trim())
          ? `Write a decimal point: ${text.trim().replace(',', '.')}.`
          : `“${text.trim().slice(0, 40)}” is not a number. Give ${wish}.`;
        return fault(hint);
      }
      return holds === undefined || holds(value) ? value : fault(`Give ${wish}.`);
    }),
  );
}

/** A number a form must hold. */
export const typedNumber = (wish: Wish) => numberOr<never>((words) => ({ reason: `Give ${words}.` }), wish);

/** A number a form may leave empty. */
export const typedNumberOrNone = (wish: Wish) => numberOr<null>(() => ({ value: null }), wish);

/** Text a form must hold (`least` 1) or may (0). A null character is dropped: the database does not keep one. */
export const typedText = (words: { most: number; ask?: string }) =>
  z.preprocess(
    (value) => (typeof value === 'string' ? value.replaceAll('\u0000', '').trim() : ''),
    z
      .string()
      .min(words.ask === undefined ? 0 : 1, words.ask ?? '')
      .max(words.most, `At most ${words.most} characters; this is longer.`),
  );

/** A box that is ticked or not. */
export const typedBox = z.preprocess((value) => value !== undefined && value !== '', z.boolean());

/** One of some words, or none of them where the field is empty. */
export function typedChoice<const Words extends readonly string[]>(words: Words, ask: string) {
  return z.enum(words as unknown as [Words[number], ...Words[number][]], { error: ask });
}

/** A clock time of the site, as a time field sends it. */
export const typedTime = (timeZone: string) =>
  z.preprocess(
    (value) => (typeof value === 'string' ? value : ''),
    z.string().transform((text, context): Date => {
      const moment = siteInstant(text, timeZone);
      if (moment !== null) return moment;
      context.addIssue({ code: 'custom', message: 'Give a day and a time.' });
      return z.NEVER;
    }),
  );
