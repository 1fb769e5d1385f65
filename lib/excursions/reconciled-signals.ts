import type { Episode } from '@/lib/control/signal-episodes';
import { linePosition, type Line, type LinePoint, type LineSignal } from './line';

/** An episode found by judging, with the points that its indices count, and the index from which they were judged. */
export interface FoundSignal {
  episode: Episode;
  points: readonly LinePoint[];
  start: number;
}

/**
 * Holds the signals on record against those that judging found from point `from` on: a new one is raised, one that
 * went on is extended, one that no longer holds is withdrawn (never deleted), a withdrawn one that holds again is
 * reinstated. Returns the signals that changed.
 */
export function reconciledSignals(
  line: Line,
  found: readonly FoundSignal[],
  from: LinePoint | undefined,
  why: string,
): LineSignal[] {
  const known = new Map(line.signals.map((signal) => [identity(signal), signal]));
  const places = new Map(line.points.map((point) => [point.id, point]));
  const holds = new Set<LineSignal>();
  const changed = new Set<LineSignal>();
  for (const { episode, points, start } of found) {
    const last = points[episode.last] as LinePoint;
    if (episode.last < start) {
      const untouched = line.signals.find(
        (s) => s.lastId === last.id && sameKind(s, episode) && s.withdrawn === null,
      );
      if (untouched) holds.add(untouched);
      continue;
    }
    const signal =
      episode.first < start
        ? extendable(line, episode, points)
        : known.get(`${kind(episode)} ${points[episode.first]?.id}`);
    if (signal) {
      const goesOn =
        signal.lastId !== last.id || signal.completions !== episode.count || signal.withdrawn !== null;
      if (goesOn) changed.add(signal);
      Object.assign(signal, { lastId: last.id, completions: episode.count, withdrawn: null });
      if (episode.first >= start) {
        signal.participantIds = episode.participants.map((index) => (points[index] as LinePoint).id);
      }
      holds.add(signal);
    } else {
      const raised = raisedSignal(episode, points);
      line.signals.push(raised);
      holds.add(raised);
      changed.add(raised);
    }
  }
  for (const signal of line.signals) {
    if (holds.has(signal) || signal.withdrawn !== null || from === undefined) continue;
    const last = places.get(signal.lastId);
    if (last === undefined || linePosition(last, from) < 0) continue;
    signal.withdrawn = why;
    changed.add(signal);
  }
  return [...changed];
}

function raisedSignal(episode: Episode, points: readonly LinePoint[]): LineSignal {
  const first = points[episode.first] as LinePoint;
  return {
    id: null,
    chart: episode.chart,
    rule: episode.rule,
    side: episode.side,
    firstId: first.id,
    participantIds: episode.participants.map((index) => (points[index] as LinePoint).id),
    lastId: (points[episode.last] as LinePoint).id,
    completions: episode.count,
    limits: first.limits,
    excursion: null,
    withdrawn: null,
  };
}

/** The signal on record that an episode from before the judged points goes on with: the latest of its kind. */
function extendable(line: Line, episode: Episode, points: readonly LinePoint[]): LineSignal | undefined {
  const firstId = points[episode.first]?.id;
  const alike = line.signals.filter((signal) => signal.withdrawn === null && sameKind(signal, episode));
  if (firstId !== undefined) return alike.find((signal) => signal.firstId === firstId);
  const places = new Map(points.map((point, index) => [point.id, index]));
  return alike
    .filter((signal) => !places.has(signal.firstId))
    .sort((a, b) => (places.get(b.lastId) ?? -1) - (places.get(a.lastId) ?? -1))[0];
}

function kind({ chart, rule, side }: { chart: string; rule: string; side: string }): string {
  return `${chart} ${rule} ${side}`;
}

function sameKind(signal: LineSignal, episode: Episode): boolean {
  return kind(signal) === kind(episode);
}

function identity(signal: LineSignal): string {
  return `${kind(signal)} ${signal.firstId}`;
}
