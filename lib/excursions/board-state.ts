import { limitsState } from '@/lib/control/limits-state';
import { limitsInForce } from './board-strip';
import { FIRST_BASELINE } from './line';
import { signalSentence } from './signal-sentence';
import type { BoardStream } from './types';

export interface BoardState {
  group: 'needs-someone' | 'steady' | 'not-judged';
  words: string;
}

/**
 * The state of a stream in words. What needs a person comes first: its worst case not closed, then wafers to measure
 * again. "Steady" is said only of a stream that has limits to be steady between, with how far these can be trusted.
 */
export function boardState(stream: BoardStream): BoardState {
  const { worst } = stream;
  if (worst !== null) {
    const sentence = worst.signal === null ? null : signalSentence(worst.signal);
    if (worst.family === 'specification') {
      return { group: 'needs-someone', words: `out of specification${sentence ? `: ${sentence}` : ''}` };
    }
    return {
      group: 'needs-someone',
      words: sentence ?? 'its signals no longer hold; the case is not closed',
    };
  }
  const again = toMeasureWords(stream.toMeasureAgain.length);
  if (again !== null) return { group: 'needs-someone', words: again };
  const charted = stream.points.filter((point) => point.state === 'judged').length;
  if (stream.points.length === 0) return { group: 'not-judged', words: 'no wafer yet' };
  const inForce = limitsInForce(stream);
  if (inForce === null) {
    const progress = charted < FIRST_BASELINE ? `: ${charted} of ${FIRST_BASELINE} subgroups` : '';
    return { group: 'not-judged', words: `no limits yet${progress}` };
  }
  const trust = limitWords(stream);
  return { group: 'steady', words: trust === null ? 'steady' : `steady · ${trust}` };
}

/** How far the limits in force can be trusted, such as "limits young (61)"; null once they are established. */
export function limitWords(stream: Pick<BoardStream, 'limits'>): string | null {
  const inForce = limitsInForce(stream);
  if (inForce === null) return null;
  if (inForce.inherited) return 'limits inherited';
  const state = limitsState(inForce);
  return state === 'established' ? null : `limits ${state} (${inForce.limits.n})`;
}

/** "2 wafers to measure again"; null when there are none. */
export function toMeasureWords(count: number): string | null {
  return count === 0 ? null : count === 1 ? '1 wafer to measure again' : `${count} wafers to measure again`;
}
