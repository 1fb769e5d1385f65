import { ruleSentence } from '@/lib/control/rule';
import type { StudyChart, StudySignal } from '@/lib/control/study-chart';
import { plainTable } from './plain-table';
import { sixDigits } from './six-digits';

/** A study as a table for people: the figures of each chart, and under it each signal in words. */
export function studyTable(charts: readonly StudyChart[]): string {
  const rows = charts.map(({ name, lower, centre, upper, sigma, estimator }) => [
    name,
    ...[lower, centre, upper, sigma].map(figure),
    estimator,
  ]);
  const table = [['chart', 'lower', 'centre', 'upper', 'sigma', 'sigma from'], ...rows];
  const signals = charts.flatMap((chart) =>
    chart.signals.map(
      (signal) => `point ${signal.point}, ${chart.name}: ${signalWords(chart, signal)} (${signal.rule})`,
    ),
  );
  return [plainTable(table), '', ...(signals.length > 0 ? signals : ['no signal'])].join('\n');
}

function signalWords({ name }: StudyChart, { rule, side, participants }: StudySignal): string {
  if (name === 'cusum-above') return 'the level has risen';
  if (name === 'cusum-below') return 'the level has fallen';
  return ruleSentence(rule, side, participants.length, name === 'within' ? name : undefined);
}

function figure(value: number | readonly (number | null)[]): string {
  if (typeof value === 'number') return sixDigits(value);
  const known = value.filter((entry) => entry !== null);
  if (known.length === 0) return '—';
  return `${figure(Math.min(...known))} … ${figure(Math.max(...known))}`;
}
