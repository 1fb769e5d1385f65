import { type DrawnSurface, isInside, type Place } from '@/lib/wafer/drawn-surface';

/** Where the value of an isoline is written, in mm from the wafer centre. */
export interface IsolineLabel {
  level: number;
  place: Place;
}

/**
 * Chooses where isolines carry their value: at most one place on each ring, well inside the hull, away from the
 * sites and from labels already placed; rings too small to be read past a label get none.
 */
export function isolineLabels(
  surface: DrawnSurface,
  levels: readonly number[],
  sites: readonly Place[],
  radiusMm: number,
): IsolineLabel[] {
  const labels: IsolineLabel[] = [];
  const inner = surface.hull.map(([x, y]): Place => [0.9 * x, 0.9 * y]);
  for (const { level, rings } of surface.regions) {
    if (!levels.includes(level)) continue;
    for (const ring of rings) {
      const seen = ring.filter(([x, y], i) => i % 2 === 0 && isInside(inner, x, y));
      if (seen.length < 7) continue;
      const best = seen
        .map((place) => ({
          place,
          room: Math.min(
            nearest(place, sites) / (0.07 * radiusMm),
            nearest(
              place,
              labels.map((label) => label.place),
            ) /
              (0.3 * radiusMm),
          ),
        }))
        .reduce((a, b) => (b.room > a.room ? b : a));
      if (best.room >= 0.75) labels.push({ level, place: best.place });
    }
  }
  return labels;
}

function nearest([x, y]: Place, others: readonly Place[]): number {
  return Math.sqrt(others.reduce((least, [ox, oy]) => Math.min(least, (x - ox) ** 2 + (y - oy) ** 2), 1e18));
}
