import { chartRunLength, type ChartDesign } from '@/lib/control/chart-run-length';
import { conditionalRate, type ConditionalRate } from '@/lib/control/conditional-rate';
import { parseRule } from '@/lib/control/rule';
import type { StartState } from '@/lib/control/rule-run-length';
import { ruleWalk } from '@/lib/control/rule-walk';
import { simulatedRunLength } from '@/lib/control/simulated-run-length';
import { seededRandom } from '@/lib/stats/seeded-random';
import { UsageError, type Verb } from '../verb';
import { runLengthQuestion, type RunLengthQuestion } from './runlength-question';

const usage = `evenohm runlength [--rules A,B | --ewma LAMBDA,L | --cusum K,H | --choose KIND] [options]

The average run length: the mean number of points until a chart of levels signals, that point
included, for independent normal values and limits that are known.

  --rules A,B       rules by name (the four Western Electric rules by default)
  --ewma LAMBDA,L   an EWMA with steady limits L standard deviations away
  --cusum K,H       a two-sided tabular CUSUM, reference value and decision interval in σ
  --choose KIND     the ewma or cusum that sees --shift soonest with --in-control points between
                    false signals (370)
  --shift S         the mean has moved by S σ (0: points between false signals)
  --steady          the shift comes after the chart ran long without a signal; otherwise with the
                    chart just begun (zero state)
  --baseline N      also the signals a point with limits estimated from N points by their moving
                    ranges: in the mean, and for the middle 80 % of baselines
  --runs N          runs of a simulation (20000)
  --seed TEXT       seed of simulations
  --json            one JSON object

Exact by Markov chain, but for a trend or alternation, which is simulated; then the standard error
is printed too.`;

interface Answer {
  averageRunLength: number;
  standardError?: number;
  shift: number;
  start: StartState;
  method: 'markov-chain' | 'simulation';
  design: ChartDesign;
  estimated?: ConditionalRate & { baseline: number };
}

/** How late a chart sees a shift, and how often it cries wolf. */
export const runlength: Verb = {
  name: 'runlength',
  summary: 'average run length of a chart: how late it sees a shift',
  usage,
  run(args, output) {
    try {
      const question = runLengthQuestion(args);
      const answer = answered(question);
      output.out(question.json ? JSON.stringify(answer) : inWords(answer));
      return Promise.resolve(0);
    } catch (error) {
      if (error instanceof RangeError) throw new UsageError(error.message);
      throw error;
    }
  },
};

function answered({ design, shift, start, baseline, runs, seed }: RunLengthQuestion): Answer {
  const hasSteps =
    design.kind === 'rules' &&
    design.rules.map(parseRule).some(({ kind }) => kind === 'trend' || kind === 'alternating');
  if (hasSteps && (start === 'steady' || baseline !== null)) {
    throw new UsageError(
      'a trend or alternation is simulated, from the zero state and with known limits only',
    );
  }
  if (hasSteps) {
    const walk = ruleWalk(design.rules);
    const source = seededRandom(seed);
    const newRun = (): (() => boolean) => {
      walk.restart();
      return () => walk.signals(shift + source.normal());
    };
    return { ...simulatedRunLength(newRun, runs), shift, start, method: 'simulation', design };
  }
  const averageRunLength = chartRunLength(design, { shift, start });
  const answer: Answer = { averageRunLength, shift, start, method: 'markov-chain', design };
  if (baseline === null) return answer;
  const rate = conditionalRate(design, baseline, seededRandom(seed), { shift });
  return { ...answer, estimated: { baseline, ...rate } };
}

function inWords({ averageRunLength, standardError, start, method, design, estimated }: Answer): string {
  const error = standardError === undefined ? '' : ` ± ${standardError.toPrecision(2)} (standard error)`;
  const each = (rate: number): string => (1 / rate).toPrecision(4);
  const lines = [
    ...(design.kind === 'ewma'
      ? [`EWMA, λ ${design.lambda.toPrecision(4)}, limits at ${design.width.toPrecision(4)} σ`]
      : []),
    ...(design.kind === 'cusum'
      ? [`CUSUM, k ${design.reference.toPrecision(4)} σ, h ${design.decision.toPrecision(4)} σ`]
      : []),
    `${averageRunLength.toPrecision(6)}${error} points in the mean, ${start} state, by ${method}`,
    ...(estimated
      ? [
          `limits from ${estimated.baseline} points: one signal in ${each(estimated.perPoint)} points in the mean;`,
          `for 80 % of baselines one in ${each(estimated.high)} to ${each(estimated.low)}`,
        ]
      : []),
  ];
  return lines.join('\n');
}
