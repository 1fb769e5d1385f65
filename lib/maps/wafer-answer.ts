import { formatPercent } from '@/lib/format';
import type { ShapeHabit } from '@/lib/wafer/shape-habits';

/** What a wafer's answer is written from; every part of it stands as a figure on the page. */
export interface WaferAnswerFacts {
  /** "Wafer 10 of M0015". */
  name: string;
  notJudgedReason: string | null;
  /** Each way out of specification in words, the weightiest first: the first is said. */
  outOfSpecification: readonly string[];
  /** A signal its point completes whose case is not closed, in words; null without. Out of specification outranks it. */
  signal: string | null;
  /** Percent from expected; null where nothing is expected. */
  differencePercent: number | null;
  /** The measured value with its unit; null without a good reading. */
  value: string | null;
  habits: readonly ShapeHabit[];
  /** "this chamber", "this tool": whose habits they are. */
  whose: string;
}

const MOST_NAMED = 3;
const MOST_USUAL_NAMED = 2;

/**
 * A wafer in one sentence: where it lies against expected, and whether its shape is as usual. A shape is called usual
 * only where every shape is, and nothing is said of it where too few wafers are known. A plan that tells but a shape or
 * two apart is not said to know the whole.
 *
 * @example "W-2207: 1.6 % below expected, bowl and tilt as usual for this chamber"
 */
export function waferAnswer(facts: WaferAnswerFacts): string {
  const { name, notJudgedReason, outOfSpecification, signal } = facts;
  if (notJudgedReason !== null) {
    const outside = outOfSpecification[0];
    return `${name}: ${outside === undefined ? '' : `${outside}, `}not judged, ${notJudgedReason}`;
  }
  const parts = [outOfSpecification[0] ?? signal, levelWords(facts), shapeWords(facts)];
  return `${name}: ${parts.filter((part) => part !== null).join(', ')}`;
}

function levelWords({ differencePercent, value }: WaferAnswerFacts): string | null {
  if (differencePercent === null) return value;
  const size = Math.abs(differencePercent);
  const words = formatPercent(size, size < 9.95 ? 1 : 0);
  if (!/[1-9]/.test(words)) return 'as expected';
  return `${words} ${differencePercent < 0 ? 'below' : 'above'} expected`;
}

function shapeWords({ habits, whose }: WaferAnswerFacts): string | null {
  const unusual = habits.filter((habit) => habit.isUnusual === true).map(({ name }) => name);
  if (unusual.length > 0) {
    const more = unusual.length - MOST_NAMED;
    const named = more > 0 ? [...unusual.slice(0, MOST_NAMED), `${more} more`] : unusual;
    return `${listed(named)} unlike the usual for ${whose}`;
  }
  if (habits.length === 0 || habits.some((habit) => habit.isUnusual === null)) return null;
  const seen = habits.filter((habit) => habit.isSeen).slice(0, MOST_USUAL_NAMED);
  const said = seen.length === 0 && habits.length <= MOST_USUAL_NAMED ? habits : seen;
  const what = said.length === 0 ? 'shape' : listed(said.map((habit) => habit.name));
  return `${what} as usual for ${whose}`;
}

function listed(words: readonly string[]): string {
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}
