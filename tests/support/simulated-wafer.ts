import type { SeededRandom } from '@/lib/stats/seeded-random';
import { discTermValue, SHAPE_TERMS } from '@/lib/wafer/disc-terms';
import type { PlanGeometry } from '@/lib/wafer/plan-geometry';

/** How far shapes of each radial order usually go, as a standard deviation in percent. */
const USUAL_PERCENT = [0, 0.5, 1.5, 0.15, 0.2];
const GAUGE_PERCENT = 0.2;

/**
 * A wafer at about 10 Ω·cm with chance shapes to the fourth order, read by a gauge that repeats to 0.2 %.
 * `shapePercent` gives all shapes one standard deviation instead of the usual ones.
 */
export function simulatedWafer(
  geometry: PlanGeometry,
  random: SeededRandom,
  shapePercent: number | null = null,
): number[] {
  const percent = geometry.sites.map(() => GAUGE_PERCENT * random.normal());
  for (const term of SHAPE_TERMS.flat()) {
    const spread = term.radialOrder === 0 ? 0 : (shapePercent ?? USUAL_PERCENT[term.radialOrder] ?? 0);
    const size = spread * random.normal();
    geometry.sites.forEach(({ xMm, yMm }, i) => {
      const { unitRadiusMm } = geometry;
      percent[i]! += size * discTermValue(term, xMm / unitRadiusMm, yMm / unitRadiusMm);
    });
  }
  return percent.map((p) => 10 * (1 + p / 100));
}

/**
 * `count` neighbouring sites: about a chance one in the inner 70 % of the radius, nearest first, or along the
 * outermost ring.
 */
export function chanceFeature(
  geometry: PlanGeometry,
  random: SeededRandom,
  place: 'rim' | 'inside',
  count: number,
): number[] {
  const radiusMm = (i: number) => Math.hypot(geometry.sites[i]!.xMm, geometry.sites[i]!.yMm);
  const isRim = (i: number) => geometry.outerSites.includes(i);
  const allowed = [...geometry.whole.indices].filter((i) => isRim(i) === (place === 'rim'));
  const starts = allowed.filter((i) => place === 'rim' || radiusMm(i) < 0.7 * geometry.unitRadiusMm);
  const start = starts[Math.floor(random.uniform() * starts.length)]!;
  const farMm = (i: number) =>
    Math.hypot(
      geometry.sites[i]!.xMm - geometry.sites[start]!.xMm,
      geometry.sites[i]!.yMm - geometry.sites[start]!.yMm,
    );
  const feature = [start];
  while (feature.length < count) {
    const beside = feature
      .flatMap((i) => geometry.neighbours[i]!)
      .filter((i) => allowed.includes(i) && !feature.includes(i));
    if (beside.length === 0) throw new Error(`no ${count} neighbouring sites`);
    feature.push(beside.reduce((a, b) => (farMm(b) < farMm(a) ? b : a)));
  }
  return feature;
}

/** The same readings with those of some sites off by `percent`, each by 70 to 100 % of it. */
export function withFeature(
  values: readonly number[],
  sites: readonly number[],
  percent: number,
  random: SeededRandom,
): number[] {
  return values.map((value, i) =>
    sites.includes(i) ? value * (1 + (percent / 100) * (0.7 + 0.3 * random.uniform())) : value,
  );
}
