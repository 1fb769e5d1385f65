import type { Capability } from '@/lib/control/capability';
import { plainTable } from './plain-table';
import { sixDigits } from './six-digits';

/** Capability as a table for people, with what speaks against trusting it. */
export function capabilityTable(found: Capability): string {
  const { values, mean, sigma, overall, signals, normality } = found;
  const rows = (['cp', 'cpk', 'pp', 'ppk', 'cpm'] as const).map((name) => {
    const index = found[name];
    const interval = index ? `${sixDigits(index.interval.low)} … ${sixDigits(index.interval.high)}` : '—';
    return [name.replace(/^./, (letter) => letter.toUpperCase()), sixDigits(index?.value ?? null), interval];
  });
  return [
    plainTable([['index', 'value', '95 %'], ...rows]),
    '',
    `${values} values, mean ${sixDigits(mean)}, s ${sixDigits(overall.sigma)}`,
    `σ ${sixDigits(sigma.sigma)} by ${sigma.estimator}, ${sixDigits(sigma.degreesOfFreedom)} degrees of freedom`,
    signals === 0
      ? 'stable: no point signals by the Western Electric rules'
      : `unstable: ${signals} points signal by the Western Electric rules; no index foretells what this process will do`,
    ...(normality !== null && normality < 0.05
      ? [`not normal (Anderson–Darling p ${sixDigits(normality)}): think of --distribution lognormal`]
      : []),
  ].join('\n');
}
