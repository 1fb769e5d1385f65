import type { Episode } from '@/lib/control/signal-episodes';
import type { LinePoint } from './line';

/** The ways in which a point is out of specification, as `rule:side`, each once. */
export function specificationFaults(point: LinePoint): string[] {
  if (point.specification.length === 0) return [];
  return [...new Set(point.specification.map((entry) => entry.slice(entry.indexOf(':') + 1)))].sort();
}

/**
 * Subgroups out of specification in the same way, one after another, are one signal that goes on. `open` are the
 * episodes that end before `start`; they come back first, extended where they went on. Indices count in `points`;
 * the chart's name stands for its own kind of signal.
 */
export function specificationEpisodes(
  points: readonly LinePoint[],
  start: number,
  open: readonly Episode[],
): Episode[] {
  const episodes = open.map((episode) => ({ ...episode }));
  const latest = new Map(episodes.map((episode) => [`${episode.rule}:${episode.side}`, episode]));
  for (let index = start; index < points.length; index += 1) {
    for (const fault of specificationFaults(points[index] as LinePoint)) {
      const going = latest.get(fault);
      if (going?.last === index - 1) {
        going.last = index;
        going.count += 1;
        continue;
      }
      const [rule = '', side = ''] = fault.split(':');
      const begun: Episode = {
        chart: 'specification' as Episode['chart'],
        rule,
        side: side as Episode['side'],
        first: index,
        participants: [index],
        last: index,
        count: 1,
      };
      episodes.push(begun);
      latest.set(fault, begun);
    }
  }
  return episodes;
}
