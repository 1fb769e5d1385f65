import type { Episode } from '@/lib/control/signal-episodes';
import type { LinePoint } from './line';

/** The ways in which a point is out of specification, as `rule:side`, each once. */
export function specificationFaults(point: LinePoint): string[] {
  return [...new Set(point.specification.map((entry) => entry.slice(entry.indexOf(':') + 1)))].sort();
}

/**
 * Subgroups out of specification in the same way, one after another, are one signal that goes on. `open` are the
 * episodes that end before `start`. Indices count in `points`; the chart's name stands for its own kind of signal.
 */
export function specificationEpisodes(
  points: readonly LinePoint[],
  start: number,
  open: readonly Episode[],
): Episode[] {
  const episodes = open.map((episode) => ({ ...episode }));
  for (let index = start; index < points.length; index += 1) {
    for (const fault of specificationFaults(points[index] as LinePoint)) {
      const [rule = '', side = ''] = fault.split(':');
      const going = episodes.find((e) => e.rule === rule && e.side === side && e.last === index - 1);
      if (going) {
        going.last = index;
        going.count += 1;
      } else {
        episodes.push({
          chart: 'specification' as Episode['chart'],
          rule,
          side: side as Episode['side'],
          first: index,
          participants: [index],
          last: index,
          count: 1,
        });
      }
    }
  }
  return episodes;
}
