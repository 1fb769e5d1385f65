import { parseArgs } from 'node:util';
import { cusumFor } from '@/lib/control/cusum-for';
import { ewmaFor } from '@/lib/control/ewma-for';
import type { ChartDesign } from '@/lib/control/chart-run-length';
import { WESTERN_ELECTRIC } from '@/lib/control/rule';
import type { StartState } from '@/lib/control/rule-run-length';
import { decimalNumber } from '../decimal-number';
import { numberFlag, ruleList } from '../study-flags';
import { UsageError } from '../verb';

const text = { type: 'string' } as const;
const flag = { type: 'boolean' } as const;
const options = {
  rules: text,
  ewma: text,
  cusum: text,
  choose: text,
  'in-control': text,
  shift: text,
  baseline: text,
  runs: text,
  seed: text,
  steady: flag,
  json: flag,
} as const;

/** What is asked of `runlength`. */
export interface RunLengthQuestion {
  design: ChartDesign;
  shift: number;
  start: StartState;
  /** Subgroups that the limits came from; null where they are known. */
  baseline: number | null;
  runs: number;
  seed: string;
  json: boolean;
}

/**
 * Reads the words after `runlength`. Throws `UsageError` for any that make no sense, `RangeError` for a chart that
 * cannot be chosen.
 */
export function runLengthQuestion(args: string[]): RunLengthQuestion {
  const flags = parsed(args);
  const given = [flags.rules, flags.ewma, flags.cusum, flags.choose];
  if (given.filter((one) => one !== undefined).length > 1) {
    throw new UsageError('one of --rules, --ewma, --cusum and --choose');
  }
  const whole = (name: string, usual: number): number => {
    const value = numberFlag(flags, name) ?? usual;
    if (!Number.isInteger(value) || value < 2 || value > 10_000_000) {
      throw new UsageError(`--${name} is a whole number from 2 to 10000000`);
    }
    return value;
  };
  const shift = numberFlag(flags, 'shift') ?? 0;
  return {
    design: designOf(flags, shift),
    shift,
    start: flags.steady === true ? 'steady' : 'zero',
    baseline: flags.baseline === undefined ? null : whole('baseline', 25),
    runs: whole('runs', 20_000),
    seed: flags.seed ?? 'run length',
    json: flags.json ?? false,
  };
}

function parsed(args: string[]) {
  try {
    return parseArgs({ args, options }).values;
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
}

function designOf(flags: ReturnType<typeof parsed>, shift: number): ChartDesign {
  const { rules, ewma, cusum, choose } = flags;
  const inControl = numberFlag(flags, 'in-control');
  if (choose !== undefined) {
    const wanted = { inControl: inControl ?? 370, shift };
    if (choose === 'ewma') return { kind: 'ewma', ...ewmaFor(wanted) };
    if (choose === 'cusum') return { kind: 'cusum', ...cusumFor(wanted) };
    throw new UsageError(`--choose is ewma or cusum, not "${choose}"`);
  }
  if (inControl !== undefined) throw new UsageError('--in-control goes with --choose');
  if (ewma !== undefined) {
    const [lambda, width] = pair('ewma', ewma);
    return { kind: 'ewma', lambda, width };
  }
  if (cusum !== undefined) {
    const [reference, decision] = pair('cusum', cusum);
    return { kind: 'cusum', reference, decision };
  }
  return { kind: 'rules', rules: rules === undefined ? WESTERN_ELECTRIC : ruleList(rules) };
}

function pair(name: string, typed: string): [number, number] {
  const [first, second, ...more] = typed.split(',').map((part) => decimalNumber(part.trim()));
  if (first == null || second == null || more.length > 0) {
    throw new UsageError(`--${name} takes two numbers with a comma between, not "${typed}"`);
  }
  return [first, second];
}
