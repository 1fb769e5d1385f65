import type { Screen } from '@/lib/wafer/measure-wafer';
import type { StreamSettings } from './types';

/**
 * How the readings of a wafer processed at an instant are screened: as the stream is now, unless that has changed
 * since; then as before the first change from there on. It goes by when the wafer was processed, as the limits that
 * judge it do, and not by when it is recorded.
 */
export function screeningAt({ stream, screenings }: StreamSettings, processedAt: Date): Screen {
  return screenings.find((change) => change.at >= processedAt)?.former ?? stream.screening;
}
