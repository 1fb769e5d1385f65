import { boardExpected, type BoardExpected } from './board-expected';
import { boardState } from './board-state';
import { boardStrip, limitsInForce, type BoardStrip } from './board-strip';
import { sizeInSigma } from './size-in-sigma';
import type { StreamState } from './stream-state';
import type { BoardStream } from './types';

/** One stream on the board, in numbers and words. */
export interface BoardRow {
  stream: BoardStream;
  state: StreamState;
  strip: BoardStrip & { band: { lowerZ: number; upperZ: number } | null };
  expected: BoardExpected | null;
  evenness: { nowPercent: number | null; usual: { lowerPercent: number; upperPercent: number } | null };
  /** What the newest charted subgroup itself calls attention to; an older case shows in the state alone. */
  calls: { level: boolean; within: boolean };
  /** The newest charted level, as charted and in σ from the centre. */
  level: number | null;
  levelInSigma: number | null;
  outOfSpecification: boolean;
  /** How far its worst case stands from the centre now, in σ; null without one. */
  size: number | null;
}

/**
 * The rows of the board, worst first: out of specification, then with a case nobody has answered, then by the size of
 * the deviation in σ, then the longest waiting; streams that need nobody by name, those not judged yet last.
 */
export function boardRows(streams: readonly BoardStream[]): BoardRow[] {
  return streams.map(boardRow).sort(worstFirst);
}

function boardRow(stream: BoardStream): BoardRow {
  const newest = stream.points.findLast((point) => point.level !== null);
  const inForce = limitsInForce(stream);
  const expected = boardExpected(stream);
  const strip = boardStrip(stream);
  const within = inForce?.limits.within ?? null;
  const { worst } = stream;
  return {
    stream,
    state: boardState(stream),
    strip: { ...strip, band: band(expected, inForce?.limits.level ?? null) },
    expected,
    evenness: {
      nowPercent: newest?.within ?? null,
      usual: within && { lowerPercent: within.lower, upperPercent: within.upper },
    },
    calls: { level: newest?.levelCalls ?? false, within: newest?.withinCalls ?? false },
    level: newest?.level ?? null,
    levelInSigma: inForce === null ? null : (strip.points.findLast((point) => point.z !== null)?.z ?? null),
    outOfSpecification: worst?.family === 'specification',
    size: worst?.at ? sizeInSigma(worst.chart, worst.at, worst.at.limits) : null,
  };
}

/** The expected band in units of the limits in force. */
function band(
  expected: BoardExpected | null,
  scale: { centre: number; sigma: number } | null,
): { lowerZ: number; upperZ: number } | null {
  if (expected === null || scale === null) return null;
  const z = (value: number) => (value - scale.centre) / scale.sigma;
  return { lowerZ: z(expected.charted.lower), upperZ: z(expected.charted.upper) };
}

const RANK = { 'needs-someone': 0, steady: 1, 'not-judged': 2 } as const;

function worstFirst(a: BoardRow, b: BoardRow): number {
  return (
    RANK[a.state.group] - RANK[b.state.group] ||
    Number(b.outOfSpecification) - Number(a.outOfSpecification) ||
    Number(b.stream.unansweredCases > 0) - Number(a.stream.unansweredCases > 0) ||
    (b.size ?? 0) - (a.size ?? 0) ||
    waitingSince(a.stream) - waitingSince(b.stream) ||
    (a.stream.name < b.stream.name ? -1 : a.stream.name > b.stream.name ? 1 : 0)
  );
}

function waitingSince({ oldestUnansweredAt, worst }: BoardStream): number {
  const since = oldestUnansweredAt ?? worst?.openedAt;
  return since?.getTime() ?? Number.MAX_SAFE_INTEGER;
}
