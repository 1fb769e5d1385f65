import { countWord } from '@/lib/excursions/board-answer';

/** How many wafers wait: the answer of the list. `stream` is the one asked for, by its name. */
export function measureAgainAnswer(count: number, stream: string | null): string {
  const said = `${countWord(count)} ${count < 2 ? 'wafer waits' : 'wafers wait'} to be measured again.`;
  return stream === null ? said.charAt(0).toUpperCase() + said.slice(1) : `${stream}: ${said}`;
}
