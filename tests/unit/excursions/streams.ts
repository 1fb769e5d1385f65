import fc from 'fast-check';
import type { LimitSet } from '@/lib/control/limit-set';
import type { LineAddition } from '@/lib/excursions/joined-members';
import type { LineLimits } from '@/lib/excursions/line';
import type { Setting } from './line-store';

/** Limits around a centre with σ = 1; spread within a wafer from 0.55 to 1.82. */
export function limitsAround(centre: number): LimitSet {
  return {
    n: 100,
    level: { centre, sigma: 1, lower: centre - 3, upper: centre + 3 },
    movingRange: { centre: 1.128, upper: 4.243 },
    within: { logMean: 0, logSigma: 0.2, lower: 0.55, centre: 1, upper: 1.82 },
    between: { centre: 0.8, upper: 2, wafers: 3 },
  };
}

export function revision(number: number, effectiveFrom: number, centre = 0): LineLimits {
  return {
    id: `L${number}`,
    revision: number,
    effectiveFrom,
    supersededFrom: null,
    baselineIds: [],
    limits: limitsAround(centre),
  };
}

/** Levels half a σ above the centre: enough for a run on one side, and for nothing else. */
export const above = (count: number): number[] => Array.from({ length: count }, () => 0.5);

/** Levels on alternate sides of the centre, that no rule minds. */
export const quiet = (count: number): number[] =>
  Array.from({ length: count }, (_, i) => (i % 2 === 0 ? 0.5 : -0.5));

/** One wafer a subgroup, one every ten milliseconds, at these levels; null is a wafer that is not judged. */
export function wafers(levels: readonly (number | null)[], since = 0): LineAddition[] {
  return levels.map((level, i) => ({
    waferId: `w${since + i}`,
    key: `k${String(since + i).padStart(4, '0')}`,
    at: 10 * (since + i + 1),
    history: false,
    level,
    within: level === null ? null : 1,
    specification: [],
  }));
}

export interface Stream extends Setting {
  /** In the order of processing. */
  additions: LineAddition[];
}

interface StreamShape {
  minLength: number;
  maxLength: number;
  revisions: readonly number[];
  /** Whether runs may overlap in time, and times be equal. */
  tangled: boolean;
}

/** A stream with long runs, excursions, unjudged wafers, restarts and revisions, in single wafers or in runs of three. */
export function streams(shape: StreamShape): fc.Arbitrary<Stream> {
  const wafer = fc.record({
    noise: fc.integer({ min: -5, max: 5 }),
    gap: fc.integer({ min: shape.tangled ? 0 : 1, max: 3 }),
    within: fc.constantFrom(1, 1, 1, 1, 1, 0.5, 1.9),
    lives: fc.integer({ min: 0, max: 11 }).map((x) => x > 0),
    faults: fc.constantFrom([], [], [], ['site:above'], ['site:above', 'wafer-mean:below']),
    history: fc.constantFrom(false, false, false, true),
    lag: fc.integer({ min: 0, max: shape.tangled ? 12 : 0 }),
    runSize: fc.constantFrom(3, 3, 3, 2, 1),
  });
  return fc
    .record({
      list: fc.array(wafer, { minLength: shape.minLength, maxLength: shape.maxLength, size: 'max' }),
      bases: fc.array(fc.constantFrom(-2, -1, 0, 0, 0.75, 1, 2), { minLength: 8, maxLength: 8 }),
      outSince: fc.option(fc.nat(shape.maxLength), { freq: 2 }),
      subgroupSize: fc.constantFrom(1, 3),
      restarts: fc.array(fc.nat(2 * shape.maxLength), { maxLength: 3 }),
      revisions: fc.constantFrom(...shape.revisions),
      supersededFrom: fc.option(fc.nat(2 * shape.maxLength)),
      effective: fc.tuple(fc.nat(shape.maxLength), fc.nat(shape.maxLength), fc.constantFrom(0, 1)),
    })
    .map(({ list, bases, outSince, subgroupSize, restarts, revisions, effective, supersededFrom }) => {
      const additions: LineAddition[] = [];
      let [at, run, left] = [0, 0, 0];
      list.forEach((one, i) => {
        at += one.gap;
        if (left === 0) {
          run += 1;
          left = one.runSize;
        }
        left -= 1;
        const level = (bases[Math.floor(i / 24) % 8] as number) + one.noise / 2;
        const isOut = outSince !== null && i >= outSince;
        additions.push({
          waferId: `w${i}`,
          key: subgroupSize === 1 ? `k${(i * 7919) % 1009}` : `r${(run * 7919) % 1009}`,
          at: at + one.lag,
          history: one.history,
          level: one.lives ? level : null,
          within: one.lives ? one.within : null,
          specification: [...(one.lives ? one.faults : []), ...(isOut ? ['nonuniformity:above'] : [])],
        });
      });
      additions.sort((a, b) => a.at - b.at || (a.key < b.key ? -1 : a.key > b.key ? 1 : 0));
      const [first, second, centre] = effective;
      const limits = [revision(1, first - 1), revision(2, first + second, centre)].slice(0, revisions);
      if (limits.length > 1 && supersededFrom !== null) limits[1]!.supersededFrom = supersededFrom;
      return { additions, subgroupSize, restarts, limits };
    });
}

/** Cuts a list into batches of the given sizes, used in turn. */
export function batches<T>(list: readonly T[], sizes: readonly number[]): T[][] {
  const cut: T[][] = [];
  for (let i = 0, turn = 0; i < list.length; turn += 1) {
    const size = sizes[turn % sizes.length] ?? 1;
    cut.push(list.slice(i, i + size));
    i += size;
  }
  return cut;
}
