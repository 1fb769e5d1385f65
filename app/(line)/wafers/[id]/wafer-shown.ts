import { formatNumber, undefinedMark } from '@/lib/format';
import { readingUnit, type ReadingUnit } from '@/lib/maps/reading-unit';
import type { MapView } from '@/lib/maps/wafer-map-view';
import type { WaferOnRecord } from '@/lib/maps/wafer-on-record';
import type { WaferStudy } from '@/lib/maps/wafer-study';

/** What every part of a wafer's page draws from. */
export interface WaferShown extends WaferOnRecord, ReadingUnit {
  study: WaferStudy;
  view: MapView;
  timeZone: string;
  /** The good readings' plain mean, which usual maps are relative to. */
  meanOfSites: number | null;
  /** A reading in the page's unit, with it: "101.9 Ω/□". */
  reading: (value: number | null, digits?: number) => string;
}

/** One unit for all readings of a page, and one way to write them. */
export function waferShown(
  record: WaferOnRecord,
  study: WaferStudy,
  options: { view: MapView; timeZone: string },
): WaferShown {
  const { unit, scale } = readingUnit(record.settings.stream.quantity, study.statistic);
  const reading = (value: number | null, digits = 4) =>
    value === null ? undefinedMark : `${formatNumber(value / scale, digits)}\u00a0${unit}`;
  const meanOfSites = study.measure.figures.mean;
  return { ...record, ...options, study, unit, scale, meanOfSites, reading };
}
