import { describe, expect, it } from 'vitest';
import { limitSet } from '@/lib/control/limit-set';
import { WESTERN_ELECTRIC } from '@/lib/control/rule';
import { ruleRunLength } from '@/lib/control/rule-run-length';
import { ruleWalk } from '@/lib/control/rule-walk';
import { sigmaWithin, standardDeviationLaw } from '@/lib/control/spread-law';
import { scheilDensity } from '@/lib/physics/scheil-density';
import { mean } from '@/lib/stats/mean';
import { CRYSTAL_STREAMS } from '@/seed/crystal-streams';
import type { DemoStream } from '@/seed/demo-stream';
import type { DemoWafer } from '@/seed/demo-wafer';
import { FURNACE_STREAMS } from '@/seed/furnace-streams';
import { simulateStream } from '@/seed/simulate';
import { valueAt } from '@/seed/value-at';

/** Wafers of a stream on which nothing happens, gathered by run, lot or ingot. */
function quietSubgroups(stream: DemoStream, count: number, seed: number): DemoWafer[][] {
  const subgroups = new Map<string, DemoWafer[]>();
  const days = Math.ceil(count / stream.subgroupsPerDay);
  const endAt = new Date('2026-01-01T00:00:00Z');
  for (const wafer of simulateStream(stream, { days, endAt, seed, mishaps: [] })) {
    const key = `${wafer.lot} ${wafer.run}`;
    subgroups.set(key, [...(subgroups.get(key) ?? []), wafer]);
  }
  return [...subgroups.values()];
}

const logs = ({ values }: DemoWafer): number[] =>
  values.filter((value) => value > 0).map((value) => 100 * Math.log(value));
const levelOf = (wafer: DemoWafer): number => mean(logs(wafer));

/**
 * Cases per 1000 wafers by the four rules, each case beginning the rules afresh. The first hundred levels set the
 * limits, from their moving ranges unless `sigma` is given.
 */
function casesPerThousand(levels: readonly number[], wafersPerLevel: number, sigma?: number): number {
  const baseline = levels.slice(0, 100).map((level) => ({ level, within: null, between: null, wafers: 1 }));
  const limits = limitSet(baseline).level;
  const walk = ruleWalk(WESTERN_ELECTRIC);
  const judged = levels.slice(100);
  let cases = 0;
  for (const level of judged) {
    if (!walk.signals((level - limits.centre) / (sigma ?? limits.sigma))) continue;
    cases++;
    walk.restart();
  }
  return (1000 * cases) / (judged.length * wafersPerLevel);
}

describe('on a line on which nothing happens', () => {
  it('false cases are many times as many with limits from within wafers, or with wafers counted instead of runs', () => {
    const stream = FURNACE_STREAMS.find(({ quiet }) => quiet);
    if (!stream) throw new Error('no quiet furnace');
    const found = [5, 6, 7].map((seed) => {
      const runs = quietSubgroups(stream, 600, seed);
      const wafers = runs.flat();
      const within = sigmaWithin(wafers.slice(0, 100).map(logs), standardDeviationLaw);
      const sites = mean(wafers.slice(0, 100).map((wafer) => logs(wafer).length));
      const right = casesPerThousand(
        runs.map((run) => mean(run.map(levelOf))),
        stream.subgroupSize,
      );
      const byWithin = casesPerThousand(wafers.map(levelOf), 1, within / Math.sqrt(sites));
      return { right, byWithin, byWafer: casesPerThousand(wafers.map(levelOf), 1) };
    });
    const [right, byWithin, byWafer] = (['right', 'byWithin', 'byWafer'] as const).map((chart) =>
      mean(found.map((rates) => rates[chart])),
    ) as [number, number, number];
    // Champ and Woodall (1987): one case in 91.75 runs with known limits, so 3.6 per 1000 wafers of three a run. These
    // streams give 3.6 by runs, 71 by wafers and 423 by limits from within wafers.
    expect(right).toBeLessThan((2 * 1000) / 91.75 / 3);
    expect(byWithin).toBeGreaterThan(50 * right);
    expect(byWafer).toBeGreaterThan(10 * right);
  });

  it('raw resistivity along crystals has limits so wide that they see next to nothing', () => {
    const [stream] = CRYSTAL_STREAMS;
    if (!stream) throw new Error('no crystals');
    const wafers = quietSubgroups(stream, 150, 5).flat();
    const reading = valueAt(stream.target);
    const { dopant, densityPerCm3 } = stream.target;
    const expected = (wafer: DemoWafer): number =>
      100 * Math.log(reading(scheilDensity(dopant, densityPerCm3, wafer.ingotFraction ?? 0), 0));
    const [raw, right] = [wafers.map(levelOf), wafers.map((wafer) => levelOf(wafer) - expected(wafer))].map(
      (levels) =>
        limitSet(levels.map((level) => ({ level, within: null, between: null, wafers: 1 }))).level.sigma,
    ) as [number, number];
    expect(raw).toBeGreaterThan(5 * right);
    // By a factor of 26. A shift of three σ of the right chart, seen in two wafers there, is lost on the raw one.
    const late = ruleRunLength(WESTERN_ELECTRIC, { shift: (3 * right) / raw });
    expect(late).toBeGreaterThan(10 * ruleRunLength(WESTERN_ELECTRIC, { shift: 3 }));
  });
});
