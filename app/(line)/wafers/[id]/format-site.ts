import { formatNumber } from '@/lib/format';
import type { WaferShown } from './wafer-shown';

/** A length on the wafer: "−42.4", "0". */
export function formatMm(mm: number): string {
  return Math.abs(mm) < 0.05 ? '0' : formatNumber(mm, Math.abs(mm) < 10 ? 2 : 3);
}

/** A site and what it read: "Site 12 (30.0, −42.4 mm), 5.512 Ω·cm". */
export function formatSite(shown: WaferShown, siteIndex: number): string {
  const site = shown.settings.stream.plan.sites[siteIndex];
  const value = shown.study.values[siteIndex] ?? null;
  const place = site === undefined ? '' : ` (${formatMm(site.xMm)}, ${formatMm(site.yMm)} mm)`;
  return `Site ${siteIndex + 1}${place}${value === null || !Number.isFinite(value) ? '' : `, ${shown.reading(value)}`}`;
}
