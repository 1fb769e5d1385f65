import { FIRST_BASELINE } from './line';
import { signalSentence } from './signal-sentence';
import type { SignalWords } from './types';

/** What the state of a stream is told from. */
export interface StreamSituation {
  /** The signal that speaks for its worst case not closed (null where none of it holds); null without a case. */
  worst: { signal: SignalWords | null } | null;
  /** Wafers to measure again among the newest subgroups. */
  toMeasureAgain: number;
  hasWafers: boolean;
  hasLimits: boolean;
  /** Subgroups judged so far, where there are no limits yet. */
  judged: number;
}

export interface StreamState {
  group: 'needs-someone' | 'steady' | 'not-judged';
  words: string;
}

/**
 * The state of a stream in words, on the board and on its own page. What needs a person comes first: its worst case not
 * closed, then wafers to measure again. "Steady" is said only of a stream that has limits to be steady between.
 */
export function streamState(situation: StreamSituation): StreamState {
  const { worst, toMeasureAgain, hasWafers, hasLimits, judged } = situation;
  if (worst !== null) return { group: 'needs-someone', words: caseSentence(worst.signal) };
  const again = toMeasureWords(toMeasureAgain);
  if (again !== null) return { group: 'needs-someone', words: again };
  if (!hasWafers) return { group: 'not-judged', words: 'no wafer yet' };
  if (hasLimits) return { group: 'steady', words: 'steady' };
  const progress = judged < FIRST_BASELINE ? `: ${judged} of ${FIRST_BASELINE} subgroups` : '';
  return { group: 'not-judged', words: `no limits yet${progress}` };
}

/** What a case says: the signal that speaks for it, null where none of its signals holds. */
export function caseSentence(signal: SignalWords | null): string {
  return signal === null ? 'its signals no longer hold' : signalSentence(signal);
}

/** "2 wafers to measure again"; null when there are none. */
export function toMeasureWords(count: number): string | null {
  return count === 0 ? null : count === 1 ? '1 wafer to measure again' : `${count} wafers to measure again`;
}
