import type { ChartName } from '@/lib/control/completions-at';
import { ruleSentence } from '@/lib/control/rule';

const SPECIFICATION_WORDS: Record<string, string> = {
  'wafer-mean:above': 'wafer mean above its specification',
  'wafer-mean:below': 'wafer mean below its specification',
  'site:above': 'a site above its specification',
  'site:below': 'a site below its specification',
  'nonuniformity:above': 'less even than specified',
};

const CHART_WORDS: Record<string, string> = {
  'moving-range': 'change from one subgroup to the next',
  within: 'spread within the wafer',
  between: 'spread between the wafers of a subgroup',
};

/** What happened, in words, such as "8 in a row below the centre line" or "wafer mean above its specification". */
export function signalSentence(signal: {
  chart: string;
  rule: string;
  side: 'above' | 'below';
  participantIds: readonly string[];
  completions: number;
}): string {
  if (signal.chart === 'specification') {
    return SPECIFICATION_WORDS[`${signal.rule}:${signal.side}`] ?? 'out of specification';
  }
  const inARow = signal.participantIds.length + signal.completions - 1;
  const words = (count: number) => ruleSentence(signal.rule, signal.side, count, signal.chart as ChartName);
  const chart = CHART_WORDS[signal.chart];
  if (chart === undefined) return words(inARow);
  if (inARow <= 1) return `${chart} ${words(1)}`;
  // "24 times beyond the limit" would read as a distance: the count stands behind what is no question.
  const said = words(1);
  return said.endsWith('?') ? `${chart} ${inARow} times ${said}` : `${chart} ${said} ${inARow} times`;
}
