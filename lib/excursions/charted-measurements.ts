/** Why a measurement is not judged though it could be: its wafer stands on the charts with another. */
export const MEASURED_AGAIN = 'measured again; the first measurement is charted';

/** One measurement of a wafer among others of the same wafer in the same subgroup; times in milliseconds since 1970. */
export interface MeasuredOnce {
  measuredAt: number;
  processedAt: number;
  /** Whether it can be judged for itself. */
  judgeable: boolean;
}

/**
 * Which of the measurements of one wafer of a run, lot or ingot stand for it on the charts: of each time it was
 * processed the first that can be judged, else the first. A wafer measured twice does not count twice in the mean of
 * its subgroup, and measuring again does not replace what was found at first.
 *
 * A measurement that brings no time of processing of its own (it is that of measuring then) belongs to the same
 * processing as the one measured before it. The order of the list decides nothing.
 */
export function chartedMeasurements<Measurement extends MeasuredOnce>(
  measurements: readonly Measurement[],
): Set<Measurement> {
  const charted = new Map<number, Measurement>();
  let processing: number | null = null;
  for (const one of measurements.toSorted((a, b) => a.measuredAt - b.measuredAt)) {
    if (processing === null || one.processedAt !== one.measuredAt) processing = one.processedAt;
    const first = charted.get(processing);
    if (first === undefined || (!first.judgeable && one.judgeable)) charted.set(processing, one);
  }
  return new Set(charted.values());
}
