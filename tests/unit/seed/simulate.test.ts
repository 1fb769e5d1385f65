import { describe, expect, it } from 'vitest';
import { expectedValue } from '@/lib/physics/expected-value';
import { benchStreams } from '@/seed/bench-streams';
import { benchWafers } from '@/seed/bench-wafers';
import type { DemoStream } from '@/seed/demo-stream';
import type { DemoWafer } from '@/seed/demo-wafer';
import { diffusionLengthPercentPerC } from '@/seed/diffusion-length-percent-per-c';
import { lineEvents } from '@/seed/events';
import { PLANT } from '@/seed/plant';
import { seededRandom } from '@/lib/stats/seeded-random';
import { simulateStream } from '@/seed/simulate';
import { spreadAtSite } from '@/seed/spread-at-site';
import { valueAt } from '@/seed/value-at';
import { modelValue } from '@/lib/physics/model-value';

const endAt = new Date('2026-03-31T06:00:00Z');
const options = { days: PLANT.days, endAt, seed: PLANT.seed };

function streamNamed(slug: string): DemoStream {
  const stream = PLANT.streams.find((s) => s.slug === slug);
  if (stream === undefined) throw new Error(`There is no stream ${slug}.`);
  return stream;
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

function goodMean(wafer: DemoWafer): number {
  return mean(wafer.values.filter((value) => value > 0));
}

/** ln(measured/expected) of every subgroup, in percent. */
function levels(stream: DemoStream, wafers: readonly DemoWafer[]): number[] {
  const groups = new Map<string, number[]>();
  for (const wafer of wafers) {
    const expected = expectedValue(stream.target, {
      ingotFraction: wafer.ingotFraction,
      layerThicknessUm: stream.kind === 'epi' ? wafer.thicknessUm : null,
    }).value;
    const key = stream.subgroup === 'wafer' ? `${wafer.lot} ${wafer.wafer}` : `${wafer.run ?? wafer.lot}`;
    groups.set(key, [...(groups.get(key) ?? []), 100 * Math.log(goodMean(wafer) / expected)]);
  }
  return [...groups.values()].map(mean);
}

describe('the demonstration line', () => {
  it('is the same for the same seed and another for another', () => {
    const stream = streamNamed('boron-implant-3');
    const once = JSON.stringify([...simulateStream(stream, options)]);
    expect(JSON.stringify([...simulateStream(stream, options)])).toBe(once);
    expect(JSON.stringify([...simulateStream(stream, { ...options, seed: 2 })])).not.toBe(once);
  });

  it('has 12 streams with names of their own, 2500 to 3500 wafers, 9, 49 and 121 sites, 150 to 300 mm', () => {
    expect(new Set(PLANT.streams.map((s) => s.slug)).size).toBe(12);
    const wafers = PLANT.streams.map((s) => [...simulateStream(s, options)].length);
    expect(wafers.reduce((a, b) => a + b)).toBeGreaterThan(2500);
    expect(wafers.reduce((a, b) => a + b)).toBeLessThan(3500);
    expect(new Set(PLANT.streams.map((s) => s.sites.length))).toEqual(new Set([9, 49, 121]));
    expect(new Set(PLANT.streams.map((s) => s.diameterMm))).toEqual(new Set([150, 200, 300]));
    expect(PLANT.streams.filter((s) => s.quiet)).toHaveLength(2);
  });

  it.each(PLANT.streams.map((s) => [s.slug, s] as const))(
    'gives %s readable wafers in order of time',
    (_, stream) => {
      let before = 0;
      const seen = new Set<string>();
      let dead = 0;
      for (const wafer of simulateStream(stream, options)) {
        expect(wafer.values).toHaveLength(stream.sites.length);
        expect(wafer.values.every((v) => Number.isFinite(v) && v >= 0)).toBe(true);
        expect(wafer.processedAt.getTime()).toBeGreaterThan(before);
        before = wafer.processedAt.getTime();
        expect(wafer.measuredAt > wafer.processedAt && wafer.measuredAt <= endAt).toBe(true);
        seen.add(`${wafer.lot} ${wafer.run} ${wafer.wafer}`);
        dead += wafer.values.includes(0) ? 1 : 0;
        const isMisrouted = PLANT.mishaps.some(
          (m) => m.streamSlug === stream.slug && m.effect.kind === 'misrouted-wafer',
        );
        if (
          !isMisrouted &&
          stream.specification?.meanLower != null &&
          stream.specification.meanUpper != null
        ) {
          expect(goodMean(wafer)).toBeGreaterThan(stream.specification.meanLower);
          expect(goodMean(wafer)).toBeLessThan(stream.specification.meanUpper);
        }
      }
      expect(seen.size).toBeGreaterThan(100);
      expect(dead / seen.size).toBeLessThan(0.03);
    },
  );

  it.each(PLANT.streams.map((s) => [s.slug, s] as const))(
    'makes the subgroups of %s independent and normal once its mishaps are left out',
    (_, stream) => {
      const level = levels(stream, [...simulateStream(stream, { ...options, mishaps: [] })]);
      const centre = mean(level);
      const deviations = level.map((v) => v - centre);
      const variance = mean(deviations.map((d) => d * d));
      const lagOne = mean(deviations.slice(1).map((d, i) => d * (deviations[i] ?? 0))) / variance;
      const kurtosis = mean(deviations.map((d) => d ** 4)) / variance ** 2;
      // 3.5 standard errors of the lag-one correlation and the kurtosis of independent normal values.
      expect(Math.abs(lagOne)).toBeLessThan(3.5 / Math.sqrt(level.length));
      expect(Math.abs(kurtosis - 3)).toBeLessThan(3.5 * Math.sqrt(24 / level.length));
      expect(Math.abs(centre - 100 * Math.log(stream.making.trueOverModel))).toBeLessThan(1);
    },
  );

  it('shows every mishap in the wafers after its onset, by its size, and nowhere before', () => {
    for (const mishap of PLANT.mishaps) {
      const stream = streamNamed(mishap.streamSlug);
      const onset = endAt.getTime() - (PLANT.days - mishap.onsetDay) * 86_400_000;
      const hit = [...simulateStream(stream, options)];
      const plain = [...simulateStream(stream, { ...options, mishaps: [] })];
      const differ = hit.filter(
        (wafer, i) => JSON.stringify(wafer.values) !== JSON.stringify(plain[i]?.values),
      );
      expect(differ.length).toBeGreaterThan(0);
      expect(differ.every((wafer) => wafer.processedAt.getTime() >= onset)).toBe(true);
      if (mishap.effect.kind === 'misrouted-wafer') expect(differ).toHaveLength(1);
      if (mishap.effect.kind === 'gauge-offset') {
        expect(differ).toHaveLength(12);
        const first = hit.findIndex((wafer) => wafer === differ[0]);
        const shift = goodMean(hit[first] as DemoWafer) / goodMean(plain[first] as DemoWafer) - 1;
        expect(shift * 100).toBeCloseTo(0.8, 1);
      }
      expect(mishap.expectedWithinSubgroups).toBeGreaterThan(0);
    }
  });

  it('keeps its log in order and within its days', () => {
    const events = lineEvents(90, endAt);
    expect(events.every((e) => PLANT.streams.some((s) => s.slug === e.streamSlug))).toBe(true);
    expect(events.map((e) => e.at.getTime())).toEqual(
      events.map((e) => e.at.getTime()).sort((a, b) => a - b),
    );
    expect(lineEvents(40, endAt).length).toBeLessThan(events.length);
  });
});

describe('the making of a wafer', () => {
  it('reads a graded layer off its table within 1e-5 of the integral', () => {
    const { target } = streamNamed('arsenic-implant-1');
    const reading = valueAt(target);
    for (const share of [0.9, 0.9876, 1, 1.0023, 1.1]) {
      const density = target.densityPerCm3 * share;
      expect(reading(density, 0) / modelValue(target, density)).toBeCloseTo(1, 5);
      const stretched = { ...target, lengthUm: (target.lengthUm ?? 0) * 1.02 };
      expect(reading(density, Math.log(1.02)) / modelValue(stretched, density)).toBeCloseTo(1, 5);
    }
  });

  it('spreads a cause with no mean over the disc', () => {
    const spread = { bowl: 2, rim: 1, tilt: 3, tiltDegrees: 30 };
    let [sum, count] = [0, 0];
    for (let x = -0.995; x < 1; x += 0.01) {
      for (let y = -0.995; y < 1; y += 0.01) {
        if (x * x + y * y > 1) continue;
        sum += spreadAtSite(spread, { xMm: 100 * x, yMm: 100 * y }, 100);
        count++;
      }
    }
    expect(sum / count).toBeCloseTo(0, 2);
  });

  it('lengthens a phosphorus diffusion at 900 °C by 1.54 % per °C, as its activation energy says', () => {
    const at = (temperatureC: number): number =>
      Math.exp(-3.66 / (2 * 8.617333262e-5 * (temperatureC + 273.15)));
    expect(diffusionLengthPercentPerC('phosphorus', 900)).toBeCloseTo(
      100 * Math.log(at(900.5) / at(899.5)),
      4,
    );
  });

  it('draws even and normal numbers', () => {
    const random = seededRandom('test');
    const n = 20_000;
    const even = Array.from({ length: n }, () => random.uniform());
    const normal = Array.from({ length: n }, () => random.normal());
    const bound = 3.5 / Math.sqrt(n);
    expect(Math.abs(mean(even) - 0.5)).toBeLessThan(bound / Math.sqrt(12));
    expect(Math.abs(mean(normal))).toBeLessThan(bound);
    expect(Math.abs(mean(normal.map((z) => z * z)) - 1)).toBeLessThan(bound * Math.SQRT2);
    expect(Math.abs(mean(normal.slice(1).map((z, i) => z * (normal[i] ?? 0))))).toBeLessThan(bound);
  });

  it('makes bench wafers by the thousand, the same each time', () => {
    const streams = benchStreams(4);
    const wafers = [...benchWafers(streams, 1000, endAt, 7)];
    expect(wafers).toHaveLength(1000);
    expect(wafers.every(({ wafer }) => wafer.values.length === 49)).toBe(true);
    expect(wafers.at(-1)?.wafer.values).toEqual(
      [...benchWafers(streams, 1000, endAt, 7)].at(-1)?.wafer.values,
    );
    const keys = wafers.map(({ stream, wafer }) => `${stream.slug} ${wafer.lot} ${wafer.wafer}`);
    expect(new Set(keys).size).toBe(1000);
  });
});
