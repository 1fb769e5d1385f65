import { linePosition } from './line';
import { caseSentence } from './stream-state';
import { subgroupLabel } from './subgroup-label';
import { toldWhen } from './told-when';
import type { CaseSignal, ExcursionCase } from './types';

/**
 * The signal that speaks for a case: of those that hold the one that went on longest, by its last subgroup, then by
 * how many subgroups it counts, then the newest. Null when none holds. The board, the lists and the stream's page
 * choose by the same order (`LEAD_SIGNAL`).
 */
export function leadSignal(signals: readonly CaseSignal[]): CaseSignal | null {
  const place = ({ last }: CaseSignal) => ({ at: last.at.getTime(), key: last.key });
  const size = ({ participantIds, completions }: CaseSignal) => participantIds.length + completions;
  return signals
    .filter((signal) => signal.withdrawnAt === null)
    .reduce<CaseSignal | null>((lead, signal) => {
      if (lead === null) return signal;
      const later = linePosition(place(signal), place(lead)) || size(signal) - size(lead);
      return later > 0 || (later === 0 && BigInt(signal.id) > BigInt(lead.id)) ? signal : lead;
    }, null);
}

type Told = Pick<ExcursionCase, 'stream' | 'signals' | 'points'>;

/**
 * What happened in one sentence: the stream, its signal, and from which subgroup to which; "since" while the newest
 * judged subgroup takes part.
 *
 * @example caseAnswer(found) // 'N-epi, Reactor 2: 8 in a row below the centre line, since run R1177'
 */
export function caseAnswer(found: Told): string {
  const lead = leadSignal(found.signals);
  const words = caseSentence(lead);
  return `${found.stream.name}: ${lead === null ? words : toldWhen(words, when(lead, found))}`;
}

function when({ participants, first, last }: CaseSignal, { stream, points }: Told): string {
  const begin = participants[0] ?? first;
  const name = (one: { key: string }) => subgroupLabel(stream.subgroup, one.key);
  const newest = points.findLast((point) => point.state === 'judged');
  if (begin.id !== last.id && newest?.id === last.id) return `since ${name(begin)}`;
  return begin.id === last.id ? `at ${name(last)}` : `from ${name(begin)} to ${name(last)}`;
}

/** How many signals hold, how many were withdrawn, and over how many subgroups the case reaches. */
export function caseExtent(found: Pick<ExcursionCase, 'signals' | 'points' | 'first' | 'last'>): string {
  const withdrawn = found.signals.filter((signal) => signal.withdrawnAt !== null).length;
  const held = found.signals.length - withdrawn;
  const from = found.points.findIndex((point) => point.id === found.first.id);
  const to = found.points.findIndex((point) => point.id === found.last.id);
  const reach = from === -1 || to === -1 ? null : Math.abs(to - from) + 1;
  return [
    held === 1 ? '1 signal' : `${held} signals`,
    ...(withdrawn > 0 ? [`${withdrawn} withdrawn`] : []),
    ...(reach === null ? [] : [reach === 1 ? 'one subgroup' : `over ${reach} subgroups`]),
  ].join(', ');
}
