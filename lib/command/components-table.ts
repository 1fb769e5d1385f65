import type { VarianceComponents } from '@/lib/control/variance-components';
import { plainTable } from './plain-table';
import { sixDigits } from './six-digits';

/** Variance components as a table for people, with a sentence on estimates that came out negative. */
export function componentsTable({ values, mean, balanced, levels }: VarianceComponents): string {
  const rows = levels.map((level) => [
    level.name,
    String(level.degreesOfFreedom),
    ...[level.sumOfSquares, level.meanSquare, level.f, level.p, level.variance].map(sixDigits),
    level.interval ? `${sixDigits(level.interval.low)} … ${sixDigits(level.interval.high)}` : '—',
    sixDigits(level.reml),
    level.sharePercent === null ? '—' : `${level.sharePercent.toFixed(1)} %`,
  ]);
  const head = [
    'level',
    'df',
    'sum of squares',
    'mean square',
    'F',
    'p',
    'variance',
    '95 %',
    'REML',
    'share',
  ];
  const negative = levels.filter(({ estimate }) => estimate !== null && estimate < 0);
  return [
    plainTable([head, ...rows]),
    '',
    `${values} values, mean ${sixDigits(mean)}, groups ${balanced ? 'of equal size' : 'of unequal size'}`,
    ...negative.map(
      ({ name, estimate }) => `${name}: the estimate is ${sixDigits(estimate)}; a variance is not below zero`,
    ),
  ].join('\n');
}
