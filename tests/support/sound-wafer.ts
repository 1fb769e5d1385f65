import type { Site } from '@/lib/wafer/site';

/** A sound wafer: bowl, tilt, and a fixed scatter of about 0.2 %. */
export function soundWafer(sites: readonly Site[], level = 10): number[] {
  return sites.map(
    ({ xMm, yMm }, i) =>
      level *
      (1 +
        0.02 * ((xMm * xMm + yMm * yMm) / 97 ** 2) +
        0.005 * (xMm / 97) +
        0.002 * Math.sin(1 + 12.9898 * i * (1 + 0.37 * i))),
  );
}

/** The same readings, some of them changed by site. */
export function withValue(
  values: readonly number[],
  changes: Record<number, number | null>,
): (number | null)[] {
  return values.map((value, i) => (i in changes ? changes[i]! : value));
}
