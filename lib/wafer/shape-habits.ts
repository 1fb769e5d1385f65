import type { UsualMap } from './usual-map';
import type { WaferShape } from './wafer-shape';

/** One shape of a wafer, its two orientations together, held against what is usual. */
export interface ShapeHabit {
  /** "bowl", "tilt". */
  name: string;
  /** Its size on this wafer, percent of the mean. */
  percent: number;
  /** Whether it stands out of its own noise. */
  isSeen: boolean;
  /** Whether it lies beyond what wafers of the stream usually do; null where too few are known. */
  isUnusual: boolean | null;
}

/** The reach of one shape term among usual wafers. */
export interface UsualReach {
  lowerPercent: number;
  upperPercent: number;
}

/** Under so many wafers a spread is too poorly known to call a wafer unusual by. */
const LEAST_WAFERS = 15;
/** With a dozen terms looked at, two standard deviations would find something on every other wafer. */
const REACH_SIGMAS = 3;
const SEEN_ERRORS = 3;

/**
 * The family of a shape term: "tilt along x" and "tilt along y" are one tilt, which turning the wafer divides anew.
 */
export function shapeFamily(name: string): string {
  return name.replace(/ (along|on|between) .*$/, '');
}

/**
 * How far each shape term of one more wafer goes before it is unlike the others: the usual mean ± three standard
 * deviations of a new wafer, s·√(1 + 1/n). s is the wafers' own spread, or this wafer's standard error where that is
 * larger. Terms known from fewer than 15 wafers are left out.
 */
export function usualReaches(shape: WaferShape, usual: UsualMap): Map<string, UsualReach> {
  const reaches = new Map<string, UsualReach>();
  for (const term of shape.terms) {
    const known = usual.shapes.find(({ name }) => name === term.name);
    if (known === undefined || known.wafers < LEAST_WAFERS || term.name === 'level') continue;
    const spread = Math.max(known.spreadPercent, term.standardError ?? 0);
    const reach = REACH_SIGMAS * spread * Math.sqrt(1 + 1 / known.wafers);
    reaches.set(term.name, { lowerPercent: known.percent - reach, upperPercent: known.percent + reach });
  }
  return reaches;
}

/** The shapes of one wafer beside what is usual, the largest first; the level is no shape. */
export function shapeHabits(shape: WaferShape, usual: UsualMap | null): ShapeHabit[] {
  const reaches = usual === null ? new Map<string, UsualReach>() : usualReaches(shape, usual);
  const families = new Map<string, WaferShape['terms']>();
  for (const term of shape.terms) {
    if (term.name === 'level') continue;
    const family = shapeFamily(term.name);
    families.set(family, [...(families.get(family) ?? []), term]);
  }
  return [...families]
    .map(([name, terms]) => ({
      name,
      percent: Math.hypot(...terms.map((term) => term.percent)),
      isSeen: terms.some(
        ({ percent, standardError }) =>
          standardError !== null && Math.abs(percent) > SEEN_ERRORS * standardError,
      ),
      isUnusual: terms.every((term) => reaches.has(term.name))
        ? terms.some(({ name: term, percent }) => {
            const reach = reaches.get(term);
            return reach !== undefined && (percent < reach.lowerPercent || percent > reach.upperPercent);
          })
        : null,
    }))
    .sort((a, b) => b.percent - a.percent);
}
