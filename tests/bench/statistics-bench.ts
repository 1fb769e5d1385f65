import { baselineStudy } from '@/lib/control/baseline-study';
import { capability } from '@/lib/control/capability';
import { onset } from '@/lib/control/onset';
import { varianceComponents } from '@/lib/control/variance-components';
import { seededRandom } from '@/lib/stats/seeded-random';
import { theilSen } from '@/lib/stats/theil-sen';
import { middle, type Figure } from './figure';

const WAFERS = 1000;

/** Processor time of one call in ms, the middle of seven after one to warm up. */
function milliseconds(call: () => unknown): number {
  const run = (): number => {
    const before = process.cpuUsage();
    call();
    const { user, system } = process.cpuUsage(before);
    return (user + system) / 1000;
  };
  run();
  return middle(Array.from({ length: 7 }, run));
}

/** What the statistics of a baseline of a thousand wafers cost, in processor time; no database. */
export function statisticsBench(): Figure[] {
  const random = seededRandom('statistics bench');
  const levels = Array.from({ length: WAFERS }, () => 10 + random.normal());
  const points = levels.map((level) => ({ level, within: 1, between: null, wafers: 1 }));
  const rows = levels.map((value, i) => ({
    labels: [`L${Math.floor(i / 10)}`, `R${Math.floor(i / 3)}`],
    value,
  }));
  const places = levels.map((_, i) => i);
  const since = levels.slice(-250).map((x, i) => x + (i < 200 ? 0 : 1));
  const specification = { lower: 5, upper: 15, target: 10 };
  const parts: [string, number, () => unknown][] = [
    ['limits, normality, memory', 100, () => baselineStudy(points)],
    ['components of lots and runs', 100, () => varianceComponents(rows, ['lot', 'run'])],
    [
      'capability',
      100,
      () =>
        capability(
          levels.map((x) => [x]),
          specification,
        ),
    ],
    ['slope by all pairs', 100, () => theilSen(places, levels)],
    [
      'set of onsets in 250',
      250,
      () => onset(since, { centre: 10, sigma: 1 }, 'step', seededRandom('onset')),
    ],
  ];
  const figures = parts.map(([name, atMost, call]): Figure => {
    const size = name.includes('250') ? '' : ` of ${WAFERS} wafers`;
    return { name: `${name}${size}`, value: milliseconds(call), unit: 'ms', atMost };
  });
  const study = figures.slice(0, 3).reduce((sum, { value }) => sum + value, 0);
  return [...figures, { name: `baseline study of ${WAFERS} wafers`, value: study, unit: 'ms', atMost: 100 }];
}
