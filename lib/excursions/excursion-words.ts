import type { CaseEntry, ExcursionState, ListedExcursion } from './types';

export const STATE_WORDS: Record<ExcursionState, string> = {
  open: 'open',
  acknowledged: 'acknowledged',
  'under-investigation': 'under investigation',
  closed: 'closed',
};

/** What a case is about, by the chart its signals are on. */
export const CHART_WORDS: Record<string, string> = {
  level: 'level',
  'moving-range': 'moving range',
  within: 'spread within the wafer',
  between: 'spread between wafers',
  specification: 'specification',
};

export const ACTION_WORDS: Record<CaseEntry['action'], string> = {
  opened: 'opened by a signal',
  joined: 'another signal joined',
  acknowledged: 'acknowledged',
  investigating: 'took up the investigation',
  noted: 'noted',
  closed: 'closed',
};

/** Who has taken a case on, and how far: "nobody yet", "acknowledged by A", "closed by B". */
export function whoWords(
  excursion: Pick<ListedExcursion, 'state' | 'acknowledgedBy'> & Partial<Pick<ListedExcursion, 'closedBy'>>,
): string {
  const { state, acknowledgedBy, closedBy } = excursion;
  if (state === 'closed') return `closed by ${closedBy ?? 'someone'}`;
  if (acknowledgedBy === null) return 'nobody yet';
  return `${STATE_WORDS[state]} by ${acknowledgedBy}`;
}
