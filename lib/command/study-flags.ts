import { parseArgs } from 'node:util';
import { parseRule } from '@/lib/control/rule';
import { decimalNumber } from './decimal-number';
import { UsageError } from './verb';

const text = { type: 'string' } as const;
const options = {
  value: text,
  group: text,
  values: text,
  chart: text,
  baseline: text,
  rules: text,
  'spread-rules': text,
  estimate: text,
  limits: text,
  target: text,
  sigma: text,
  lambda: text,
  width: text,
  reference: text,
  decision: text,
  json: { type: 'boolean' },
} as const;

/** The flags of `study` as typed. */
export type StudyFlags = { [name in Exclude<keyof typeof options, 'json'>]?: string | undefined } & {
  json?: boolean | undefined;
};

/** Reads the flags and the words without one; throws `UsageError` for a flag that does not exist. */
export function studyFlags(args: string[]): { flags: StudyFlags; words: string[] } {
  try {
    const { values, positionals } = parseArgs({ args, allowPositionals: true, options });
    return { flags: values, words: positionals };
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
}

/** A number, or undefined when the flag is absent. Throws `UsageError` for text that is no number. */
export function numberFlag(flags: Readonly<Record<string, unknown>>, name: string): number | undefined {
  const typed = flags[name];
  if (typeof typed !== 'string') return undefined;
  const value = decimalNumber(typed);
  if (value === null) throw new UsageError(`--${name} is a number, not "${typed}"`);
  return value;
}

/** Rules by name, separated by commas, each once. Throws `UsageError` for a name that no rule has. */
export function ruleList(list: string): string[] {
  const names = list.split(',').map((name) => name.trim());
  try {
    for (const name of names) parseRule(name);
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
  return [...new Set(names)];
}
