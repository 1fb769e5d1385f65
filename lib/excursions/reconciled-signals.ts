import type { Episode } from '@/lib/control/signal-episodes';
import { linePosition, type Line, type LinePoint, type LineSignal } from './line';
import type { RecordedSignal } from './signals-on-record';

/** An episode found by judging, with the points that its indices count, and the signal it goes on with, if any. */
export interface FoundSignal {
  episode: Episode;
  points: readonly LinePoint[];
  begun: RecordedSignal | undefined;
}

/** The signals that changed, and those among them that say something new: raised, reinstated or gone on. */
export interface ReconciledSignals {
  changed: LineSignal[];
  calling: LineSignal[];
}

/**
 * Holds the signals on record against those that judging found: a new one is raised, one that went on is extended,
 * one of `again` that was not found no longer holds and is withdrawn (never deleted), a withdrawn one that holds
 * again is reinstated.
 */
export function reconciledSignals(
  line: Line,
  found: readonly FoundSignal[],
  again: readonly RecordedSignal[],
  why: string,
): ReconciledSignals {
  const changed: LineSignal[] = [];
  const calling: LineSignal[] = [];
  const judgedAgain = new Map(again.map((record) => [record.signal, record]));
  const known = found.some(({ begun }) => begun === undefined)
    ? new Map(line.signals.map((signal) => [identity(signal, signal.firstId), signal]))
    : null;
  for (const { episode, points, begun } of found) {
    const now = asSignal(episode, points);
    const signal = begun?.signal ?? known?.get(identity(now, now.firstId));
    if (signal === undefined) {
      line.signals.push(now);
      changed.push(now);
      calling.push(now);
      continue;
    }
    const record = begun ?? judgedAgain.get(signal);
    judgedAgain.delete(signal);
    const last = points[episode.last] as LinePoint;
    const wentOn = record === undefined || linePosition(record.wasLast, last) < 0;
    if (wentOn) calling.push(signal);
    if (wentOn || differs(signal, now, begun === undefined)) changed.push(signal);
    signal.withdrawn = null;
    signal.lastId = now.lastId;
    signal.completions = now.completions;
    if (begun === undefined) {
      signal.participantIds = now.participantIds;
      signal.limits = now.limits;
    }
  }
  for (const signal of judgedAgain.keys()) {
    signal.withdrawn = why;
    changed.push(signal);
  }
  return { changed, calling };
}

/** Whether a signal on record reads otherwise now; its beginning is looked at only where it was judged again. */
function differs(signal: LineSignal, now: LineSignal, withBeginning: boolean): boolean {
  if (signal.withdrawn !== null) return true;
  if (signal.lastId !== now.lastId || signal.completions !== now.completions) return true;
  return (
    withBeginning &&
    (signal.limits !== now.limits || signal.participantIds.join() !== now.participantIds.join())
  );
}

function asSignal(episode: Episode, points: readonly LinePoint[]): LineSignal {
  const first = points[episode.first];
  const isSpecification = (episode.chart as string) === 'specification';
  return {
    id: null,
    chart: episode.chart,
    rule: episode.rule,
    side: episode.side,
    firstId: first?.id ?? '',
    participantIds: episode.participants.map((index) => (points[index] as LinePoint).id),
    lastId: (points[episode.last] as LinePoint).id,
    completions: episode.count,
    // Being out of specification has nothing to do with the limits in force.
    limits: isSpecification ? null : (first?.limits ?? null),
    excursion: null,
    withdrawn: null,
  };
}

function identity({ chart, rule, side }: LineSignal, firstId: string): string {
  return `${chart} ${rule} ${side} ${firstId}`;
}
