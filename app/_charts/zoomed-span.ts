/** A stretch of time in milliseconds since 1970. */
export interface TimeSpan {
  from: number;
  to: number;
}

/**
 * A span made narrower (`factor` below 1) or wider (above 1) about a moment, kept within the whole, and moved by
 * `shift` times its own width; null when nothing is left out any more, so that the address needs no span.
 * A span does not shrink below a minute.
 *
 * @throws RangeError when the factor is not above zero or a time is not finite.
 * @example zoomedSpan({ from: 0, to: 8e6 }, { from: 0, to: 8e6 }, { about: 4e6, factor: 0.5 }) // from 2e6 to 6e6
 */
export function zoomedSpan(
  span: TimeSpan,
  whole: TimeSpan,
  change: { about?: number; factor?: number; shift?: number },
): TimeSpan | null {
  const { about = (span.from + span.to) / 2, factor = 1, shift = 0 } = change;
  if (
    ![span.from, span.to, whole.from, whole.to, about, factor, shift].every(Number.isFinite) ||
    factor <= 0
  ) {
    throw new RangeError('A span needs finite times and a factor above zero');
  }
  const width = Math.max(60_000, (span.to - span.from) * factor);
  if (width >= whole.to - whole.from) return null;
  const share = span.to > span.from ? (about - span.from) / (span.to - span.from) : 0.5;
  const wanted = about - share * width + shift * width;
  const from = Math.max(whole.from, Math.min(wanted, whole.to - width));
  return { from, to: from + width };
}
