import type { ChartName, Completion } from './completions-at';
import { isOneSided, type RuleName } from './rule';

export { ruleFamily } from './rule';

/**
 * One signal and how long it went on: `first` and `last` completing point, the points of the first pattern, and the
 * `count` of completing points.
 */
export interface Episode {
  chart: ChartName;
  rule: RuleName;
  side: 'above' | 'below';
  first: number;
  participants: number[];
  last: number;
  count: number;
}

/**
 * Completions gathered into signals: a run that goes on extends its signal instead of raising one at every point. A
 * completion extends the latest episode of its chart, rule and side when its pattern overlaps or directly adjoins
 * the last completing point, within the same regime. Rules that use both halves of the chart have no side of their
 * own: their episodes go on whichever half the next point falls in, and keep the side they began with.
 *
 * `open` holds episodes that earlier points began; they come back first, extended where they went on. A completion
 * that an episode already counts changes nothing, so that judging a tail again is harmless. The order of the
 * completions does not matter; arguments are left as they are.
 */
export function signalEpisodes(completions: readonly Completion[], open: readonly Episode[] = []): Episode[] {
  const episodes = open.map((episode) => ({ ...episode }));
  const openByKey = new Map<string, Episode[]>();
  for (const episode of episodes) {
    openByKey.set(key(episode), [...(openByKey.get(key(episode)) ?? []), episode]);
  }
  const latest = new Map<string, Episode>();
  for (const [name, list] of openByKey)
    latest.set(
      name,
      list.reduce((a, b) => (b.last > a.last ? b : a)),
    );
  const inOrder = [...completions].sort((a, b) => a.index - b.index);
  for (const completion of inOrder) {
    const { chart, rule, side, index, participants } = completion;
    const episode = latest.get(key(completion));
    const counts = ({ first, last }: Episode) => first <= index && index <= last;
    if ((episode && counts(episode)) || openByKey.get(key(completion))?.some(counts)) continue;
    if (episode && goesOn(episode, completion)) {
      episode.last = index;
      episode.count++;
      continue;
    }
    const begun: Episode = {
      chart,
      rule,
      side,
      first: index,
      participants: [...participants],
      last: index,
      count: 1,
    };
    episodes.push(begun);
    if (!episode || index > episode.last) latest.set(key(begun), begun);
  }
  return episodes;
}

function key({ chart, rule, side }: { chart: ChartName; rule: RuleName; side: string }): string {
  return isOneSided(rule) ? `${chart} ${rule} ${side}` : `${chart} ${rule}`;
}

function goesOn(episode: Episode, { index, participants, sameRegimeBefore }: Completion): boolean {
  const regimeStart = index - (sameRegimeBefore ?? index);
  const patternStart = Math.min(index, ...participants);
  return index > episode.last && episode.last >= regimeStart && patternStart <= episode.last + 1;
}
