import { parseArgs } from 'node:util';
import { decimalNumber } from '@/lib/command/decimal-number';
import { UsageError } from '@/lib/command/verb';
import { DOPANTS, type Dopant } from '@/lib/physics/dopant';

const text = { type: 'string' } as const;
const options = {
  dopant: text,
  density: text,
  resistivity: text,
  inverse: text,
  conversion: text,
  'temperature-c': text,
  'temperature-uncertainty-c': text,
  model: text,
  'counter-dopant': text,
  'counter-density': text,
  profile: text,
  'peak-density': text,
  'dose-per-cm2': text,
  'length-um': text,
  'range-um': text,
  'straggle-um': text,
  'drive-in-c': text,
  'drive-in-min': text,
  'pairs-file': text,
  'background-dopant': text,
  'background-density': text,
  'thickness-um': text,
  'thickness-uncertainty-percent': text,
  'substrate-dopant': text,
  'substrate-density': text,
  method: text,
  fraction: text,
  measured: text,
  uncertainty: { type: 'boolean' },
  json: { type: 'boolean' },
} as const;

type Switch = 'json' | 'uncertainty';

/** The flags of `expect` as typed. */
export type Flags = { [name in Exclude<keyof typeof options, Switch>]?: string | undefined } & {
  [name in Switch]?: boolean | undefined;
};

/** A flag that takes a value. */
export type Valued = Exclude<keyof Flags, Switch>;

/** Reads the flags; throws `UsageError` for one that does not exist. */
export function expectFlags(args: string[]): Flags {
  try {
    return parseArgs({ args, options, allowPositionals: false }).values;
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
}

/** One word of a list, or null when the flag is absent. */
export function word<W extends string>(flags: Flags, name: Valued, words: readonly W[]): W | null {
  const given = flags[name];
  if (given === undefined) return null;
  const found = words.find((w) => w === given);
  if (found === undefined) throw new UsageError(`--${name} is one of ${words.join(', ')}, not "${given}"`);
  return found;
}

/** A number, or null when the flag is absent. */
export function number(flags: Flags, name: Valued): number | null {
  const given = flags[name];
  if (given === undefined) return null;
  const value = decimalNumber(given);
  if (value === null) throw new UsageError(`--${name} is no number: "${given}"`);
  return value;
}

/** A dopant and its density, which go together, or null when both flags are absent. */
export function pair(
  flags: Flags,
  name: 'counter' | 'background' | 'substrate',
): { dopant: Dopant; densityPerCm3: number } | null {
  const dopant = word(flags, `${name}-dopant`, DOPANTS);
  const densityPerCm3 = number(flags, `${name}-density`);
  if (dopant === null && densityPerCm3 === null) return null;
  if (dopant === null || densityPerCm3 === null) {
    throw new UsageError(`--${name}-dopant and --${name}-density go together`);
  }
  return { dopant, densityPerCm3 };
}

/** Throws `UsageError` for the first of these flags that is there. */
export function refuse(flags: Flags, names: readonly Valued[], why: string): void {
  const given = names.find((name) => flags[name] !== undefined);
  if (given !== undefined) throw new UsageError(`--${given} ${why}`);
}
