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
 * Gives each raised or extended signal its case: the open case of the same chart, side and family whose last point is
 * at most 25 subgroups away, else a new one. Signals that end on wafers of history open nothing. A case whose signal
 * is withdrawn stays: what someone may have acted on is never undone. Returns the cases that changed.
 */
export function joinedCases(line: Line, signals: readonly LineSignal[]): LineExcursion[] {
  if (signals.length === 0) return [];
  const places = new Map(line.points.map((point, index) => [point.id, index]));
  const changed = new Set<LineExcursion>();
  for (const signal of signals) {
    const lastPlace = places.get(signal.lastId) ?? -1;
    if (signal.withdrawn !== null || line.points[lastPlace]?.history !== false) continue;
    const current =
      signal.excursion !== null && line.excursions.includes(signal.excursion) ? signal.excursion : null;
    const excursion = current ?? joinable(line, signal, places) ?? opened(line, signal);
    if (excursion !== current) {
      const isNew = excursion.id === null && excursion.entries.length === 0;
      excursion.entries.push({ action: isNew ? 'opened' : 'joined', note: signalSentence(signal) });
      signal.excursion = excursion;
    }
    if (lastPlace >= (places.get(excursion.lastId) ?? -1)) excursion.lastId = signal.lastId;
    changed.add(excursion);
  }
  return [...changed];
}

function familyOf(signal: LineSignal): ExcursionFamily {
  return signal.chart === 'specification' ? 'specification' : ruleFamily(signal.rule);
}

function joinable(
  line: Line,
  signal: LineSignal,
  places: ReadonlyMap<string, number>,
): LineExcursion | undefined {
  const place = places.get(signal.firstId) ?? places.size;
  return line.excursions.find((excursion) => {
    const last = places.get(excursion.lastId);
    return (
      excursion.chart === signal.chart &&
      excursion.side === signal.side &&
      excursion.family === familyOf(signal) &&
      last !== undefined &&
      Math.abs(place - last) <= JOIN_WITHIN_SUBGROUPS
    );
  });
}

function opened(line: Line, signal: LineSignal): LineExcursion {
  const excursion: LineExcursion = {
    id: null,
    chart: signal.chart,
    side: signal.side,
    family: familyOf(signal),
    firstId: signal.participantIds[0] ?? signal.firstId,
    lastId: signal.lastId,
    entries: [],
  };
  line.excursions.push(excursion);
  return excursion;
}
