import { limitsState } from '@/lib/control/limits-state';
import { limitsInForce } from './board-strip';
import { limitsWords } from './limits-words';
import { type StreamState, streamState } from './stream-state';
import type { BoardStream } from './types';

/** The state of a stream on the board: of a steady one with how far its limits can be trusted. */
export function boardState(stream: BoardStream): StreamState {
  const { worst, points, toMeasureAgain } = stream;
  const state = streamState({
    worst,
    toMeasureAgain: toMeasureAgain.length,
    hasWafers: points.length > 0,
    hasLimits: stream.limits.length > 0,
    judged: points.filter((point) => point.state === 'judged').length,
  });
  const trust = state.group === 'steady' ? limitWords(stream) : null;
  return trust === null ? state : { ...state, words: `${state.words} · ${trust}` };
}

/** How far the limits in force can be trusted, such as "limits young (61 subgroups)"; null once they are established. */
export function limitWords(stream: Pick<BoardStream, 'limits'>): string | null {
  const inForce = limitsInForce(stream);
  if (inForce === null || (!inForce.inherited && limitsState(inForce) === 'established')) return null;
  return `limits ${limitsWords(inForce)}`;
}
