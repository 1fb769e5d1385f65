import { scheilDensity } from '@/lib/physics/scheil-density';
import type { DemoStream } from './demo-stream';
import type { DemoWafer } from './demo-wafer';
import { makeWafer, type Causes } from './make-wafer';
import type { Mishap } from './mishap';
import { mishapOnWafer } from './mishap-on-wafer';
import { MISHAPS } from './mishaps';
import { probeWafer } from './probe-wafer';
import { seededRandom } from '@/lib/stats/seeded-random';
import { valueAt } from './value-at';
import { waferNames } from './wafer-names';

const DAY_MS = 86_400_000;
const MINUTE_MS = 60_000;

/** Over how many days a stream runs, when it ends, and which of all possible histories it takes. */
export interface SimulateOptions {
  days: number;
  endAt: Date;
  seed: number;
  /** The mishaps of the plant unless others are given. */
  mishaps?: readonly Mishap[];
}

/**
 * The wafers of one stream in processing order, made by physics and measured by a probe with noise.
 *
 * Runs differ from each other, wafers within a run, and sites within a wafer by the stream's causes, all normal and
 * independent from subgroup to subgroup: what is not a mishap is chance. The same options give the same wafers.
 * Wafers whose measurement would fall after `endAt` are not there yet.
 */
export function* simulateStream(stream: DemoStream, options: SimulateOptions): Generator<DemoWafer> {
  const { days, endAt, seed } = options;
  const random = seededRandom(`${stream.slug} ${seed}`);
  const startMs = endAt.getTime() - days * DAY_MS;
  const mishaps = (options.mishaps ?? MISHAPS).filter((m) => m.streamSlug === stream.slug);
  const firstAffected = new Map<Mishap, number>();
  const reading = valueAt(stream.target);
  const { making } = stream;

  for (let index = 0; index < Math.floor(days * stream.subgroupsPerDay); index++) {
    const day = (index + 0.3 + 0.4 * random.uniform()) / stream.subgroupsPerDay;
    for (const mishap of mishaps) {
      if (day >= mishap.onsetDay && !firstAffected.has(mishap)) firstAffected.set(mishap, index);
    }
    const mishap = mishapOnWafer(mishaps, day, (m) => index - (firstAffected.get(m) ?? Infinity));
    const run: Causes = {
      dopingPercent: making.dopingPercent.runToRun * random.normal(),
      lengthPercent: making.lengthPercent.runToRun * random.normal(),
      temperatureC: making.temperatureC.runToRun * random.normal(),
    };
    const processedMs = startMs + day * DAY_MS;
    const queueMinutes = 15 + 45 * random.uniform();
    for (let nth = 0; nth < stream.subgroupSize; nth++) {
      const fraction = cutFraction(stream, nth, random.uniform());
      const wafer = makeWafer(stream, reading, {
        densityPerCm3:
          fraction === null
            ? stream.target.densityPerCm3
            : scheilDensity(stream.target.dopant, stream.target.densityPerCm3, fraction),
        run,
        mishap,
        random,
      });
      const probed = probeWafer(stream, wafer, mishap.readingPercent, random);
      const measuredAt = new Date(Math.round(processedMs + (queueMinutes + 4 * nth) * MINUTE_MS));
      if (measuredAt > endAt) continue;
      yield {
        ...waferNames(stream, index, nth),
        processedAt: new Date(Math.round(processedMs + nth * MINUTE_MS)),
        measuredAt,
        ...probed,
        ingotFraction: fraction,
        gauge: stream.probing.gauge,
        operator: null,
        note: null,
      };
    }
  }
}

/** Where along the crystal the nth wafer was cut: its planned place, give or take a hundredth. */
function cutFraction(stream: DemoStream, nth: number, uniform: number): number | null {
  const planned = stream.fractions[nth];
  return planned === undefined ? null : Number((planned + 0.02 * (uniform - 0.5)).toFixed(4));
}
