import { ruleFamily } from '@/lib/control/rule';
import {
  JOIN_WITHIN_SUBGROUPS,
  type ExcursionFamily,
  type Line,
  type LineExcursion,
  type LineSignal,
} from './line';
import { signalSentence } from './signal-sentence';

/**
 * Gives each signal that was raised, reinstated or went on its case: its own while that is not closed, else the open
 * one of the same chart, side and family at most 25 subgroups away, else a new one. Signals that end on wafers of
 * history open nothing. A case whose signal is withdrawn stays: what someone may have acted on is never undone.
 * Returns the cases that changed.
 */
export function joinedCases(line: Line, signals: readonly LineSignal[]): LineExcursion[] {
  if (signals.length === 0) return [];
  const places = new Map(line.points.map((point, index) => [point.id, index]));
  const changed = new Set<LineExcursion>();
  for (const signal of signals) {
    const last = places.get(signal.lastId) ?? -1;
    if (line.points[last]?.history !== false) continue;
    const current =
      signal.excursion !== null && line.excursions.includes(signal.excursion) ? signal.excursion : null;
    const excursion = current ?? joined(line, signal, places) ?? opened(line, signal);
    if (excursion !== current) {
      signal.excursion = excursion;
      changed.add(excursion);
    }
    if (last > (places.get(excursion.lastId) ?? -1)) {
      excursion.lastId = signal.lastId;
      changed.add(excursion);
    }
  }
  return [...changed];
}

/** The nearest open case that the signal may join, with the log line that says so. */
function joined(
  line: Line,
  signal: LineSignal,
  places: ReadonlyMap<string, number>,
): LineExcursion | undefined {
  // A beginning that is not loaded lies before everything that is.
  const [first, last] = [places.get(signal.firstId) ?? 0, places.get(signal.lastId) ?? 0];
  let nearest: { excursion: LineExcursion; gap: number } | null = null;
  for (const excursion of line.excursions) {
    const end = places.get(excursion.lastId);
    if (end === undefined || excursion.chart !== signal.chart || excursion.side !== signal.side) continue;
    if (excursion.family !== familyOf(signal)) continue;
    const beginning = Math.min(end, places.get(excursion.firstId) ?? 0);
    const gap = Math.max(0, first - end, beginning - last);
    if (gap <= JOIN_WITHIN_SUBGROUPS && (nearest === null || gap <= nearest.gap))
      nearest = { excursion, gap };
  }
  nearest?.excursion.entries.push({ action: 'joined', note: signalSentence(signal) });
  return nearest?.excursion;
}

function opened(line: Line, signal: LineSignal): LineExcursion {
  const excursion: LineExcursion = {
    id: null,
    chart: signal.chart,
    side: signal.side,
    family: familyOf(signal),
    firstId: signal.participantIds[0] ?? signal.firstId,
    lastId: signal.lastId,
    entries: [{ action: 'opened', note: signalSentence(signal) }],
  };
  line.excursions.push(excursion);
  return excursion;
}

function familyOf(signal: LineSignal): ExcursionFamily {
  return signal.chart === 'specification' ? 'specification' : ruleFamily(signal.rule);
}
