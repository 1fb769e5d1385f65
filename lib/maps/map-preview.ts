import type { StreamSettings } from '@/lib/streams/types';
import type { SiteStatus } from '@/lib/wafer/measure-wafer';
import type { Site } from '@/lib/wafer/site';
import { expectedWafer, measuredWafer, measuringStream, type MeasuringStream } from './measured-wafer';
import type { Measurement } from './types';
import { valuesAt23C } from './values-at-23c';

/** A map before it is recorded, enough to draw it and to say what it is. Times are ISO 8601. */
export interface MapPreview {
  name: string;
  streamSlug: string;
  streamName: string;
  quantity: 'resistivity' | 'sheet_resistance';
  measuredAt: string;
  diameterMm: number;
  orientation: 'notch' | 'flat';
  sites: Site[];
  values: (number | null)[];
  status: SiteStatus[];
  repeatabilityPercent: number;
  level: number | null;
  expected: number | null;
  relativeStandardDeviationPercent: number | null;
  badSites: number;
  notJudgedReason: string | null;
}

const ready = new WeakMap<StreamSettings, MeasuringStream>();

export function mapPreview(settings: StreamSettings, measurement: Measurement, name: string): MapPreview {
  const by = ready.get(settings) ?? measuringStream(settings);
  ready.set(settings, by);
  const { stream } = settings;
  const measured = measuredWafer(by, measurement.facts, measurement.readings);
  return {
    name,
    streamSlug: stream.slug,
    streamName: stream.name,
    quantity: stream.quantity,
    measuredAt: measurement.facts.measuredAt.toISOString(),
    diameterMm: stream.plan.diameterMm,
    orientation: stream.plan.orientation,
    sites: stream.plan.sites,
    values: [
      ...valuesAt23C(
        measurement.readings,
        measurement.facts,
        measured.target?.target ?? null,
        expectedWafer(stream, measurement.facts),
      ),
    ],
    status: measured.measure.status,
    repeatabilityPercent: stream.repeatabilityPercent,
    level: measured.measure.figures[stream.controlStatistic],
    expected: measured.expected?.value ?? null,
    relativeStandardDeviationPercent: measured.measure.figures.relativeStandardDeviationPercent,
    badSites: measured.measure.badSites,
    notJudgedReason: measured.notJudgedReason,
  };
}
