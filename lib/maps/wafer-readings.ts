import type { SiteStatus } from '@/lib/wafer/measure-wafer';
import type { WaferOnRecord } from './wafer-on-record';
import type { WaferStudy } from './wafer-study';

/** One reading of a wafer as tables and files show it. */
export interface WaferReadingRow {
  /** Counted from 1, in the order of the site plan. */
  site: number;
  xMm: number;
  yMm: number;
  radiusMm: number;
  sent: number | null;
  /** At 23 °C. */
  value: number | null;
  againstMeanPercent: number | null;
  againstExpectedPercent: number | null;
  status: SiteStatus;
  /** What a person may decide about it. */
  decision: 'in' | 'out' | null;
}

/** All readings of a wafer; percentages are of the control statistic and of what is expected. */
export function waferReadings(
  { wafer, settings }: Pick<WaferOnRecord, 'wafer' | 'settings'>,
  study: Pick<WaferStudy, 'values' | 'status' | 'statistic' | 'against'>,
): WaferReadingRow[] {
  const against = (value: number | null, reference: number | null) => {
    const percent = value === null || reference === null ? NaN : 100 * (value / reference - 1);
    return Number.isFinite(percent) ? percent : null;
  };
  return settings.stream.plan.sites.map(({ xMm, yMm }, i) => {
    const value = study.values[i] ?? null;
    const status = study.status[i] ?? 'missing';
    const isPossible = value !== null && value > 0 && Number.isFinite(value);
    return {
      site: i + 1,
      xMm,
      yMm,
      radiusMm: Math.hypot(xMm, yMm),
      sent: wafer.readings[i] ?? null,
      value,
      againstMeanPercent: against(value, study.statistic),
      againstExpectedPercent: against(value, study.against?.expected.value ?? null),
      status,
      decision: status === 'good' ? 'out' : status === 'excluded' || !isPossible ? null : 'in',
    };
  });
}
