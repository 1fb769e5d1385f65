import type { Site } from '@/lib/wafer/site';
import type { Mishap } from './mishap';

/** What mishaps add to one wafer. */
export interface MishapOnWafer {
  dopingPercent: number;
  readingPercent: number;
  temperatureC(site: Site, radiusMm: number): number;
}

/**
 * What the mishaps of a stream do to the wafers of one subgroup, `day` days after the start and `since` subgroups
 * after each mishap's first (0 for the first affected one, negative before).
 */
export function mishapOnWafer(
  mishaps: readonly Mishap[],
  day: number,
  since: (mishap: Mishap) => number,
): MishapOnWafer {
  let [dopingPercent, readingPercent] = [0, 0];
  const zones: ((site: Site, radiusMm: number) => number)[] = [];
  for (const mishap of mishaps) {
    const nth = since(mishap);
    if (nth < 0) continue;
    const effect = mishap.effect;
    if (effect.kind === 'dose-drift') dopingPercent += effect.dopingPercentPerSubgroup * (nth + 1);
    if (effect.kind === 'step') dopingPercent += effect.dopingPercent;
    if (effect.kind === 'misrouted-wafer' && nth === 0) dopingPercent += effect.dopingPercent;
    if (effect.kind === 'gauge-offset' && day < mishap.onsetDay + effect.days)
      readingPercent += effect.percent;
    if (effect.kind === 'hot-zone') {
      const angle = (effect.angleDegrees * Math.PI) / 180;
      const hottest = effect.temperatureCPerSubgroup * (nth + 1);
      zones.push((site, radiusMm) => {
        const x = site.xMm / radiusMm - effect.radiusShare * Math.cos(angle);
        const y = site.yMm / radiusMm - effect.radiusShare * Math.sin(angle);
        return hottest * Math.exp(-(x * x + y * y) / (2 * effect.widthShare ** 2));
      });
    }
  }
  return {
    dopingPercent,
    readingPercent,
    temperatureC: (site, radiusMm) => zones.reduce((sum, zone) => sum + zone(site, radiusMm), 0),
  };
}
