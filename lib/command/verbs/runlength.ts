import { parseArgs } from 'node:util';
import { chartRunLength, type ChartDesign } from '@/lib/control/chart-run-length';
import { parseRule, WESTERN_ELECTRIC } from '@/lib/control/rule';
import { ruleWalk } from '@/lib/control/rule-walk';
import { simulatedRunLength } from '@/lib/control/simulated-run-length';
import { seededRandom } from '@/lib/stats/seeded-random';
import { decimalNumber } from '../decimal-number';
import { numberFlag, ruleList } from '../study-flags';
import { UsageError, type Verb } from '../verb';

const usage = `evenohm runlength [--rules A,B | --ewma LAMBDA,L | --cusum K,H] [options]

The average run length: the mean number of points until a chart signals, that point included, for
independent normal values and limits that are known.

  --rules A,B       rules by name (the four Western Electric rules by default)
  --ewma LAMBDA,L   an EWMA with steady limits L standard deviations away
  --cusum K,H       a two-sided tabular CUSUM, reference value and decision interval in σ
  --shift S         the mean has moved by S σ (0: points between false signals)
  --steady          the shift comes after the chart ran long without a signal; otherwise with the
                    chart just begun (zero state)
  --runs N          runs of a simulation (20000)
  --seed TEXT       its seed
  --json            one JSON object

Exact by Markov chain, but for a trend or alternation, which is simulated; then the standard error
is printed too.`;

interface Answer {
  averageRunLength: number;
  standardError?: number;
  shift: number;
  start: 'zero' | 'steady';
  method: 'markov-chain' | 'simulation';
}

/** How late a chart sees a shift, and how often it cries wolf. */
export const runlength: Verb = {
  name: 'runlength',
  summary: 'average run length of a chart: how late it sees a shift',
  usage,
  run(args, output) {
    const { design, shift, start, runs, seed, json } = question(args);
    let answer: Answer;
    try {
      answer = answered(design, shift, start, runs, seed);
    } catch (error) {
      if (error instanceof RangeError) throw new UsageError(error.message);
      throw error;
    }
    const { averageRunLength, standardError, method } = answer;
    const error = standardError === undefined ? '' : ` ± ${standardError.toPrecision(2)} (standard error)`;
    const words = `${averageRunLength.toPrecision(6)}${error} points in the mean, ${start} state, by ${method}`;
    output.out(json ? JSON.stringify(answer) : words);
    return Promise.resolve(0);
  },
};

function answered(
  design: ChartDesign,
  shift: number,
  start: 'zero' | 'steady',
  runs: number,
  seed: string,
): Answer {
  const simulated =
    design.kind === 'rules' &&
    design.rules.map(parseRule).some(({ kind }) => kind === 'trend' || kind === 'alternating');
  if (!simulated) {
    return {
      averageRunLength: chartRunLength(design, { shift, start }),
      shift,
      start,
      method: 'markov-chain',
    };
  }
  if (start === 'steady')
    throw new UsageError('a trend or alternation is simulated from the zero state only');
  const walk = ruleWalk(design.rules);
  const source = seededRandom(seed);
  const newRun = (): (() => boolean) => {
    walk.restart();
    return () => walk.signals(shift + source.normal());
  };
  return { ...simulatedRunLength(newRun, runs), shift, start, method: 'simulation' };
}

function question(args: string[]) {
  const text = { type: 'string' } as const;
  const flag = { type: 'boolean' } as const;
  const options = { rules: text, ewma: text, cusum: text, shift: text, runs: text, seed: text } as const;
  const { values } = parsed(() => parseArgs({ args, options: { ...options, steady: flag, json: flag } }));
  const { rules, ewma, cusum } = values;
  if ([rules, ewma, cusum].filter((given) => given !== undefined).length > 1) {
    throw new UsageError('one of --rules, --ewma and --cusum');
  }
  const runs = numberFlag(values, 'runs') ?? 20_000;
  if (!Number.isInteger(runs) || runs < 2 || runs > 10_000_000)
    throw new UsageError('--runs is 2 to 10000000');
  return {
    design: designOf(rules, ewma, cusum),
    shift: numberFlag(values, 'shift') ?? 0,
    start: values.steady === true ? ('steady' as const) : ('zero' as const),
    runs,
    seed: values.seed ?? 'run length',
    json: values.json ?? false,
  };
}

function parsed<T>(parse: () => T): T {
  try {
    return parse();
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
}

function designOf(rules?: string, ewma?: string, cusum?: string): ChartDesign {
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

function pair(flag: string, typed: string): [number, number] {
  const [first, second, ...more] = typed.split(',').map((part) => decimalNumber(part.trim()));
  if (first == null || second == null || more.length > 0) {
    throw new UsageError(`--${flag} takes two numbers with a comma between, not "${typed}"`);
  }
  return [first, second];
}
