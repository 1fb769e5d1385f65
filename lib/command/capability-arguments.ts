import { parseArgs } from 'node:util';
import type { Specification } from '@/lib/control/capability';
import type { SigmaEstimator } from '@/lib/control/sigma-estimate';
import { decimalNumber } from './decimal-number';
import type { SubgroupColumns } from './study-subgroups';
import { UsageError } from './verb';

const SIGMAS = ['overall-s', 'mean-moving-range', 'pooled-s', 'mean-range'] as const;
const DISTRIBUTIONS = ['normal', 'lognormal'] as const;

/** What the words after `capability` ask for. */
export interface CapabilityArguments {
  file: string;
  columns: SubgroupColumns;
  specification: Specification;
  options: { estimator: SigmaEstimator; distribution: (typeof DISTRIBUTIONS)[number] };
  json: boolean;
}

/** Reads the words after `capability`. Throws `UsageError` for any that make no sense together or alone. */
export function capabilityArguments(args: string[]): CapabilityArguments {
  const { values, positionals } = parse(args);
  const [file, ...more] = positionals;
  if (file === undefined || more.length > 0) throw new UsageError('capability takes one file');
  const { value, group, json = false } = values;
  if (value === undefined) throw new UsageError('name the column of the values: --value COLUMN');
  const [lower, upper, target] = (['lower', 'upper', 'target'] as const).map((name) =>
    limit(name, values[name]),
  );
  if (lower == null && upper == null)
    throw new UsageError('name a limit of the specification: --lower or --upper');
  if (lower != null && upper != null && lower >= upper) throw new UsageError('--lower must be below --upper');
  const estimator = oneOf('sigma', SIGMAS, values.sigma ?? (group === undefined ? 'overall-s' : 'pooled-s'));
  const grouped = estimator === 'pooled-s' || estimator === 'mean-range';
  if (grouped && group === undefined) throw new UsageError(`${estimator} needs subgroups: --group COLUMN`);
  if (estimator === 'mean-moving-range' && group !== undefined) {
    throw new UsageError('moving ranges are of single values: leave out --group');
  }
  return {
    file,
    columns: group === undefined ? { value } : { value, group },
    specification: { lower: lower ?? null, upper: upper ?? null, target: target ?? null },
    options: {
      estimator,
      distribution: oneOf('distribution', DISTRIBUTIONS, values.distribution ?? 'normal'),
    },
    json,
  };
}

function parse(args: string[]) {
  const text = { type: 'string' } as const;
  const names = {
    value: text,
    group: text,
    lower: text,
    upper: text,
    target: text,
    sigma: text,
    distribution: text,
  };
  try {
    return parseArgs({
      args: args.flatMap(joined),
      allowPositionals: true,
      options: { ...names, json: { type: 'boolean' } },
    });
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
}

/** A limit below zero begins as a flag does: `--lower -5` is read as `--lower=-5`. */
function joined(word: string, i: number, all: string[]): string[] {
  const isNumber = (text: string | undefined): boolean =>
    text?.startsWith('-') === true && decimalNumber(text) !== null;
  if (isNumber(word) && all[i - 1]?.startsWith('--')) return [];
  return word.startsWith('--') && isNumber(all[i + 1]) ? [`${word}=${all[i + 1]}`] : [word];
}

function limit(name: string, text: string | undefined): number | null {
  if (text === undefined) return null;
  const value = decimalNumber(text);
  if (value === null) throw new UsageError(`--${name} takes a number, not "${text}"`);
  return value;
}

function oneOf<T extends string>(flag: string, words: readonly T[], given: string): T {
  const found = words.find((word) => word === given);
  if (found === undefined) throw new UsageError(`--${flag} is one of ${words.join(', ')}, not "${given}"`);
  return found;
}
