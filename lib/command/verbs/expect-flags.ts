import { parseArgs } from 'node:util';
import { decimalNumber } from '@/lib/command/decimal-number';
import { UsageError } from '@/lib/command/verb';
import { DOPANTS, type Dopant } from '@/lib/physics/dopant';

const options = {
  dopant: { type: 'string' },
  density: { type: 'string' },
  resistivity: { type: 'string' },
  inverse: { type: 'string' },
  'temperature-c': { type: 'string' },
  model: { type: 'string' },
  'counter-dopant': { type: 'string' },
  'counter-density': { type: 'string' },
  profile: { type: 'string' },
  'peak-density': { type: 'string' },
  'length-um': { type: 'string' },
  'background-dopant': { type: 'string' },
  'background-density': { type: 'string' },
  fraction: { type: 'string' },
  json: { type: 'boolean' },
} as const;

/** The flags of `expect` as typed. */
export type Flags = { [name in Exclude<keyof typeof options, 'json'>]?: string | undefined } & {
  json?: boolean | undefined;
};

/** Reads the flags; throws `UsageError` for one that does not exist. */
export function expectFlags(args: string[]): Flags {
  try {
    return parseArgs({ args, options, allowPositionals: false }).values;
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
}

/** One word of a list, or null when the flag is absent. */
export function word<W extends string>(flags: Flags, name: keyof Flags, words: readonly W[]): W | null {
  const given = flags[name];
  if (given === undefined) return null;
  const found = words.find((w) => w === given);
  if (found === undefined) throw new UsageError(`--${name} is one of ${words.join(', ')}, not "${given}"`);
  return found;
}

/** A number, or null when the flag is absent. */
export function number(flags: Flags, name: Exclude<keyof Flags, 'json'>): number | null {
  const given = flags[name];
  if (given === undefined) return null;
  const value = decimalNumber(given);
  if (value === null) throw new UsageError(`--${name} is no number: "${given}"`);
  return value;
}

/** A dopant and its density, which go together, or null when both flags are absent. */
export function pair(
  flags: Flags,
  name: 'counter' | 'background',
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
export function refuse(flags: Flags, names: readonly (keyof Flags)[], why: string): void {
  const given = names.find((name) => flags[name] !== undefined);
  if (given !== undefined) throw new UsageError(`--${given} ${why}`);
}
