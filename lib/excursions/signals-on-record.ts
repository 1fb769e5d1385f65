import { LOOK_BACK } from '@/lib/control/completions-at';
import { isOneSided } from '@/lib/control/rule';
import type { Episode } from '@/lib/control/signal-episodes';
import type { Line, LinePoint, LineSignal } from './line';

/** A signal on record and the last point it had. */
export interface RecordedSignal {
  signal: LineSignal;
  wasLast: LinePoint;
}

/** A signal that began before the judged points: what these leave of it, as an episode they may go on with. */
export interface BegunSignal extends RecordedSignal {
  episode: Episode;
}

/** The signals of a line that judging from some point on may change. Withdrawn ones are not among them. */
export interface SignalsOnRecord {
  /** On the charts, by index among the charted points. */
  charts: BegunSignal[];
  /** Out of specification, by index among all points. */
  specification: BegunSignal[];
  /** Those that began at or after the first judged point: they hold only if judging finds them again. */
  again: RecordedSignal[];
}

/**
 * Sorts the signals on record by what judging the points from `start` on (`chartStart` among the charted ones) can do
 * to them. Of one that began earlier, what happened before `start` stays as it is: its count is its completions less
 * those recorded on judged points, so that a run however long never needs its beginning. Call it before the points
 * are judged again.
 */
export function signalsOnRecord(
  line: Line,
  charted: readonly LinePoint[],
  chartStart: number,
  start: number,
): SignalsOnRecord {
  const found: SignalsOnRecord = { charts: [], specification: [], again: [] };
  if (line.signals.length === 0) return found;
  const before = line.judgedOrder ?? line.points;
  const places = new Map<string, number>();
  for (let i = start; i < before.length; i += 1) places.set((before[i] as LinePoint).id, i);
  const recent = new Map<string, number>();
  for (let i = Math.max(0, chartStart - LOOK_BACK); i < chartStart; i += 1) {
    recent.set((charted[i] as LinePoint).id, i);
  }
  const adjoining = line.points[start - 1];
  for (const signal of line.signals) {
    if (signal.withdrawn !== null) continue;
    const last = places.get(signal.lastId);
    const isSpecification = signal.chart === 'specification';
    if (last === undefined) {
      const end = isSpecification ? adjoining?.id === signal.lastId && start - 1 : recent.get(signal.lastId);
      if (typeof end !== 'number') continue;
      const wasLast = (isSpecification ? line.points : charted)[end] as LinePoint;
      const begun = { signal, wasLast, episode: episodeOf(signal, end, signal.completions) };
      (isSpecification ? found.specification : found.charts).push(begun);
      continue;
    }
    const wasLast = before[last] as LinePoint;
    if (places.has(signal.firstId)) {
      found.again.push({ signal, wasLast });
    } else if (isSpecification) {
      const episode = episodeOf(signal, start - 1, signal.completions - (last - start + 1));
      found.specification.push({ signal, wasLast, episode });
    } else {
      let end = chartStart - 1;
      while (end >= 0 && !completes(charted[end] as LinePoint, signal)) end -= 1;
      const since = before.slice(start, last + 1).filter((point) => completes(point, signal)).length;
      const episode = episodeOf(signal, end, signal.completions - since);
      found.charts.push({ signal, wasLast, episode });
    }
  }
  return found;
}

function episodeOf(signal: LineSignal, last: number, count: number): Episode {
  const { chart, rule, side } = signal;
  return { chart: chart as Episode['chart'], rule, side, first: -1, participants: [], last, count };
}

/** Whether a point is on record as completing the signal's rule; a rule of both halves of the chart on either. */
function completes(point: LinePoint, { chart, rule, side }: LineSignal): boolean {
  const name = `${chart}:${rule}:`;
  return isOneSided(rule)
    ? point.completions.includes(name + side)
    : point.completions.some((completion) => completion.startsWith(name));
}
