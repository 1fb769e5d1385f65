import { chanceLimits, chanceStream } from '@/lib/control/chance-stream';
import { MEMORY_BEGIN, memorySignals, nextMemory } from '@/lib/control/chart-memory';
import { completionsAt, type ChartPoint } from '@/lib/control/completions-at';
import { cusumRunLength } from '@/lib/control/cusum-run-length';
import { ewmaRunLength } from '@/lib/control/ewma-run-length';
import { CHECKPOINT_EVERY, replayed } from '@/lib/control/replayed';
import { WESTERN_ELECTRIC } from '@/lib/control/rule';
import { ruleRunLength } from '@/lib/control/rule-run-length';
import { seededRandom } from '@/lib/stats/seeded-random';
import { middle, type Figure } from './figure';
import { microseconds } from './microseconds';

const shape = { within: true, wafers: 3 };
const designs = { ewma: { lambda: 0.2, width: 2.962 }, cusum: { reference: 0.5, decision: 5 } };
const rules = [
  ...WESTERN_ELECTRIC,
  'fifteen-within-1-sigma',
  'eight-beyond-1-sigma',
  'six-in-a-trend',
  'fourteen-alternating',
];
const next = (memory: typeof MEMORY_BEGIN, point: ChartPoint) => nextMemory(memory, point, designs);

/** What judging one wafer on all charts and what run lengths cost, in processor time; no database. */
export function controlBench(): Figure[] {
  const line = stream(1_000_000);
  const { checkpoints } = replayed(next, MEMORY_BEGIN, line, [], 0);
  const [short, long] = [line.slice(0, 1000), line];
  const shortCheckpoints = checkpoints.slice(0, 4);
  /** The point at the end of a stream: all rules and limits, EWMA and CUSUM from the last checkpoint. */
  const judge = (points: readonly ChartPoint[], kept: typeof checkpoints) => (): unknown => {
    const { after } = replayed(next, MEMORY_BEGIN, points, kept, points.length - 1);
    return [
      completionsAt(points, points.length - 1, rules),
      memorySignals(after.at(-1) ?? MEMORY_BEGIN, designs),
    ];
  };
  /** The same where the memory after the point before is at hand, as it is for a wafer in order. */
  const before = checkpoints.at(-1) ?? MEMORY_BEGIN;
  const inOrder =
    (points: readonly ChartPoint[]) =>
    (i: number): unknown => {
      const place = points.length - 1 - (i % 500);
      const point = points[place];
      return point && [completionsAt(points, place, rules), memorySignals(next(before, point), designs)];
    };
  const pairs = Array.from({ length: 5 }, () => [
    microseconds(20_000, inOrder(short)),
    microseconds(20_000, inOrder(long)),
  ]);
  const [few, many] = [0, 1].map((i) => middle(pairs.map((pair) => pair[i] ?? 0)));
  const four = microseconds(10, (i) => ruleRunLength(WESTERN_ELECTRIC, { shift: i / 10 }));
  const ewma = microseconds(10, (i) => ewmaRunLength(designs.ewma, { shift: i / 10 }));
  const cusum = microseconds(10, (i) => cusumRunLength(designs.cusum, { shift: i / 10 }));
  return [
    { name: 'one wafer on all charts, all rules, of 1e6', value: many ?? 0, unit: 'µs', atMost: 50 },
    { name: 'the same of 1e6 against 1e3', value: (many ?? 0) / (few ?? 1), unit: 'ratio', atMost: 1.2 },
    {
      name: `a late wafer, at most ${CHECKPOINT_EVERY} points from a checkpoint, of 1e6`,
      value: microseconds(2000, judge(long, checkpoints)),
      unit: 'µs',
    },
    {
      name: 'the same of 1e3',
      value: microseconds(2000, judge(short, shortCheckpoints)),
      unit: 'µs',
    },
    { name: 'run length of four rules, from their names', value: four / 1000, unit: 'ms', atMost: 20 },
    { name: 'run length of an EWMA', value: ewma / 1000, unit: 'ms' },
    { name: 'run length of a CUSUM', value: cusum / 1000, unit: 'ms' },
  ];
}

/** A stream of chance in control, a few thousand different points over and over. */
function stream(length: number): ChartPoint[] {
  const draw = chanceStream(shape, seededRandom('bench'));
  const limits = chanceLimits(shape);
  let level: number | null = null;
  const points = Array.from({ length: 5000 }, (): ChartPoint => {
    const point = draw();
    const movingRange = level === null ? null : Math.abs(point.level - level);
    level = point.level;
    return { ...point, movingRange, limits, regime: 'a' };
  });
  return Array.from({ length }, (_, i) => points[i % points.length] ?? points[0]).filter(
    (point) => point !== undefined,
  );
}
