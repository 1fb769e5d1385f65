import type { Site } from '@/lib/wafer/site';
import type { SpreadOverWafer } from './demo-stream';

/**
 * A cause's deviation at one site, in the cause's unit, zero on average over the disc: a bowl r², the outermost rim
 * r⁸, a tilt. Site and radius in mm.
 */
export function spreadAtSite(spread: SpreadOverWafer, site: Site, radiusMm: number): number {
  const r2 = (site.xMm ** 2 + site.yMm ** 2) / radiusMm ** 2;
  const angle = (spread.tiltDegrees * Math.PI) / 180;
  const along = (site.xMm * Math.cos(angle) + site.yMm * Math.sin(angle)) / radiusMm;
  // Over the disc r² averages 1/2 and r⁸ 1/5.
  return spread.bowl * (r2 - 0.5) + spread.rim * (r2 ** 4 - 0.2) + (spread.tilt / 2) * along;
}
