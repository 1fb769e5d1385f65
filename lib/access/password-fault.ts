import { dictionary } from '@zxcvbn-ts/language-common';

/** NIST SP 800-63B §3.1.1.2 asks for a length, a look at known passwords, and no rules of composition. */
export const LEAST_PASSWORD = 12;
export const MOST_PASSWORD = 128;

const common = new Set<string>(dictionary['passwords-common']);

/**
 * What is wrong with a password, in a sentence, or null when it will do. Refused are, besides the short ones: one of
 * the common passwords, one repeated, one with figures or signs put round it, nothing but figures and signs; and the
 * person's own name or e-mail address in the same ways.
 *
 * @example passwordFault('Password1234!', []) // 'This is one of the passwords that are tried first. …'
 */
export function passwordFault(password: string, ofPerson: readonly string[]): string | null {
  if (password.length < LEAST_PASSWORD)
    return `At least ${LEAST_PASSWORD} characters; several words do well.`;
  if (password.length > MOST_PASSWORD) return `At most ${MOST_PASSWORD} characters; this is longer.`;
  const cores = [password, repeatedPart(password)].flatMap((one) => [folded(one), bareWord(one)]);
  if (cores.some((core) => core.length <= 3 || common.has(core))) {
    return 'This is one of the passwords that are tried first. Choose several words that nobody would put together.';
  }
  const own = ofPerson.flatMap((word) => [word, word.replace(/@.*$/s, '')]).map(lettersOf);
  if (own.some((word) => word.length > 3 && cores.some((core) => lettersOf(core) === word))) {
    return 'This is your own name or address. Choose several words that nobody would put together.';
  }
  return null;
}

const folded = (text: string) => text.normalize('NFKC').toLowerCase();

/** What is left when figures and signs at both ends are taken off. */
const bareWord = (text: string) => folded(text).replace(/^[^\p{L}]+|[^\p{L}]+$/gu, '');

const lettersOf = (text: string) => folded(text).replace(/[^\p{L}]/gu, '');

/** The part that the text repeats throughout, or the text itself. */
function repeatedPart(text: string): string {
  const period = (text + text).indexOf(text, 1);
  return text.slice(0, period);
}
