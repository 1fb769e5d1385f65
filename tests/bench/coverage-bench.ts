import { capability } from '@/lib/control/capability';
import { crossingForecast } from '@/lib/control/crossing-forecast';
import { onset } from '@/lib/control/onset';
import { percentileCapability } from '@/lib/control/percentile-capability';
import { varianceComponents } from '@/lib/control/variance-components';
import { seededRandom, type SeededRandom } from '@/lib/stats/seeded-random';
import { theilSen } from '@/lib/stats/theil-sen';
import type { Figure } from './figure';

interface Range {
  low: number | null;
  high: number | null;
}

/** An interval of one simulated process, and the truth it should hold. */
type Trial = (
  random: SeededRandom,
) => (readonly [name: string, interval: Range | undefined, truth: number])[];

const PLAIN = { centre: 0, sigma: 1 };

function normals(n: number, random: SeededRandom): number[] {
  return Array.from({ length: n }, () => random.normal());
}

const indices: Trial = (random) => {
  const specification = { lower: -6, upper: 3.5, target: -0.5 };
  const found = capability(
    normals(60, random).map((x) => [x]),
    specification,
    { estimator: 'mean-moving-range' },
  );
  return [
    ['Cp by moving ranges', found?.cp?.interval, 9.5 / 6],
    ['Cpk by moving ranges', found?.cpk?.interval, 3.5 / 3],
    ['Pp', found?.pp?.interval, 9.5 / 6],
    ['Ppk', found?.ppk?.interval, 3.5 / 3],
    ['Cpm', found?.cpm?.interval, 9.5 / 6 / Math.hypot(1, 0.5)],
  ];
};

const percentiles: Trial = (random) => {
  const values = normals(100, random).map((x) => Math.exp(0.3 * x));
  const found = percentileCapability(values, { lower: null, upper: 3 });
  return [['Ppk by percentiles', found?.ppk.interval, 2 / Math.expm1(0.9)]];
};

/** Lots of runs of wafers; every third run of `short` lots has one wafer less. */
function lots(name: string, short: boolean): Trial {
  return (random) => {
    const rows = Array.from({ length: 12 }, (_, lot) => {
      const level = 2 * random.normal();
      return Array.from({ length: 4 }, (_, run) => {
        const here = level + random.normal();
        const wafers = short && (lot + run) % 3 === 0 ? 2 : 3;
        return normals(wafers, random).map((x) => ({ labels: [`${lot}`, `${run}`], value: here + x }));
      });
    }).flat(2);
    const { levels } = varianceComponents(rows, ['lot', 'run']);
    return levels.map((level, i) => [`${name}, ${level.name}`, level.interval ?? undefined, i === 0 ? 4 : 1]);
  };
}

const slopes: Trial = (random) => {
  const values = normals(40, random).map((x, i) => x + 0.05 * i);
  const places = values.map((_, i) => i);
  return [['slope of Theil and Sen', theilSen(places, values) ?? undefined, 0.05]];
};

const onsets: Trial = (random) => {
  const noise = normals(40, random);
  const set = (shape: 'step' | 'drift'): Range => {
    const values = noise.map((x, i) => x + (i < 25 ? 0 : shape === 'step' ? 1 : 0.15 * (i - 24)));
    const held = onset(values, PLAIN, shape, random, { replicates: 200 }).set.includes(25);
    return held ? { low: 25, high: 25 } : { low: -1, high: -1 };
  };
  return [
    ['set of onsets of a step', set('step'), 25],
    ['set of onsets of a drift', set('drift'), 25],
  ];
};

const crossings: Trial = (random) =>
  [0, 0.5].map((phi) => {
    let noise = random.normal();
    const series = Array.from({ length: 300 }, (_, i) => {
      noise = phi * noise + Math.sqrt(1 - phi * phi) * random.normal();
      return noise + (i < 25 ? 0 : 0.08 * (i - 24));
    });
    const course = { ...PLAIN, autocorrelation: phi, gapsHours: [] };
    const { points } = crossingForecast(series.slice(0, 60), course, 6, random, { draws: 400 });
    return [
      `points to the limit, memory ${phi}`,
      points,
      series.slice(60).findIndex((x) => x > 6) + 1,
    ] as const;
  });

/**
 * How often each 95 % interval holds the truth that a seeded process was made with, in percent. Bounds: 94 and 96 %, and
 * 3.5 standard errors of the simulation.
 */
export function coverageBench(): Figure[] {
  const parts: [Trial, number][] = [
    [indices, 1000],
    [percentiles, 4000],
    [lots('component, equal groups', false), 2000],
    [lots('component, unequal groups', true), 2000],
    [slopes, 4000],
    [onsets, 600],
    [crossings, 1500],
  ];
  return parts.flatMap(([trial, count]) => {
    const random = seededRandom('coverage');
    const held = new Map<string, number>();
    for (let i = 0; i < count; i++) {
      for (const [name, interval, truth] of trial(random)) {
        const { low = null, high = null } = interval ?? {};
        const holds = low !== null && low <= truth && (high === null || truth <= high);
        held.set(name, (held.get(name) ?? 0) + (holds ? 1 : 0));
      }
    }
    const slack = 1 + 350 * Math.sqrt((0.05 * 0.95) / count);
    return [...held].map(([name, times]): Figure => {
      const value = (100 * times) / count;
      const bound = (side: number): number => Math.round(10 * (95 + side * slack)) / 10;
      const limit = value > 95 ? { atMost: bound(1) } : { atLeast: bound(-1) };
      return { name: `coverage: ${name}`, value, unit: '%', ...limit };
    });
  });
}
