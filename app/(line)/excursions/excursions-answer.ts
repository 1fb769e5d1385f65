import { countWord } from '@/lib/excursions/board-answer';
import type { ExcursionList } from '@/lib/excursions/types';

/** How many excursions wait and how many are worked on: the answer of the list, made from its counts. */
export function excursionsAnswer(
  { counts, streams }: Pick<ExcursionList, 'counts' | 'streams'>,
  stream: string | null,
): { answer: string; sub: string } {
  const { open, acknowledged, closed } = counts;
  const inWork = acknowledged + counts['under-investigation'];
  const name = stream === null ? null : (streams.find((one) => one.slug === stream)?.name ?? stream);
  const said = [
    open > 0
      ? `${countWord(open)} ${open === 1 ? 'excursion waits' : 'excursions wait'} for an answer.`
      : 'no excursion waits for an answer.',
    ...(inWork > 0 ? [`${countWord(inWork)} ${inWork === 1 ? 'is' : 'are'} being worked on.`] : []),
  ];
  const answer = said.map((text) => text.charAt(0).toUpperCase() + text.slice(1)).join(' ');
  return {
    answer: name === null ? answer : `${name}: ${answer.charAt(0).toLowerCase()}${answer.slice(1)}`,
    sub: closed === 0 ? 'None has been closed yet.' : `${closed} closed with a cause.`,
  };
}
