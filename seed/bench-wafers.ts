import type { DemoStream } from './demo-stream';
import type { DemoWafer } from './demo-wafer';
import { makeWafer } from './make-wafer';
import { mishapOnWafer } from './mishap-on-wafer';
import { seededRandom } from '@/lib/stats/seeded-random';
import { valueAt } from './value-at';
import { waferNames } from './wafer-names';

const HOUR_MS = 3_600_000;

/**
 * `wafers` wafers spread evenly over `streams`, each stream one an hour up to `endAt`, in order of time. Every stream
 * repeats one map made by physics, at a level and with noise of its own: quick to make, real to judge. The same
 * arguments give the same wafers.
 */
export function* benchWafers(
  streams: readonly DemoStream[],
  wafers: number,
  endAt: Date,
  seed: number,
): Generator<{ stream: DemoStream; wafer: DemoWafer }> {
  const random = seededRandom(`bench ${seed}`);
  const nothing = mishapOnWafer([], 0, () => -1);
  const run = { dopingPercent: 0, lengthPercent: 0, temperatureC: 0 };
  const maps = streams.map((stream) => {
    const densityPerCm3 = stream.target.densityPerCm3;
    return makeWafer(stream, valueAt(stream.target), { densityPerCm3, run, mishap: nothing, random }).values;
  });
  const rounds = Math.ceil(wafers / streams.length);
  for (let i = 0; i < wafers; i++) {
    const [stream, map] = [streams[i % streams.length], maps[i % streams.length]];
    if (stream === undefined || map === undefined) return;
    const index = Math.floor(i / streams.length);
    const level = 1 + 0.003 * random.normal();
    const processedMs = endAt.getTime() - (rounds - index) * HOUR_MS;
    const wafer: DemoWafer = {
      ...waferNames(stream, index, 0),
      processedAt: new Date(processedMs),
      measuredAt: new Date(processedMs + HOUR_MS / 2),
      temperatureC: 23,
      thicknessUm: 725,
      ingotFraction: null,
      gauge: stream.probing.gauge,
      operator: null,
      values: map.map((value) => Math.round(value * level * (1 + 0.0012 * random.normal()) * 1e3) / 1e3),
      note: null,
    };
    yield { stream, wafer };
  }
}
