/** One level on a strip, in units of the limits: ±3 lies on a limit, 0 on the centre line. */
export interface StripPoint {
  /** Null where there is no level: the line has a gap. */
  z: number | null;
  signal: boolean;
  /** Left out of the judging: crossed. */
  excluded?: boolean;
  /** Late, re-measured, or a subgroup not complete yet: hollow. */
  open?: boolean;
}

export interface StripMark {
  x: number;
  y: number;
  shape: 'dot' | 'diamond' | 'cross' | 'ring';
  /** The level lies outside the drawing; the mark stands at the edge and says so. */
  beyond: boolean;
}

export interface Strip {
  marks: StripMark[];
  /** Runs of neighbouring levels, each the `points` of one polyline; a gap begins a new one. */
  lines: string[];
}

/** The levels a strip shows, in units where the limits are ±3; farther ones are drawn at its edge. */
export const STRIP_REACH = 4.6;

/** Room above and below for a mark that stands at the edge. */
const EDGE = 5;

/** Height of a level of `z` in a drawing `height` high, kept inside it. */
export function stripY(z: number, height: number): number {
  const kept = Math.max(-STRIP_REACH, Math.min(STRIP_REACH, z));
  return height / 2 - (kept / STRIP_REACH) * (height / 2 - EDGE);
}

const shapeOf = (point: StripPoint): StripMark['shape'] => {
  if (point.excluded) return 'cross';
  if (point.signal) return 'diamond';
  return point.open ? 'ring' : 'dot';
};

/**
 * Where the marks and segments of a small level chart stand, newest at the right. With fewer points than `slots`
 * they keep to the right, so that rows of different age stay comparable. Excluded levels get a mark but no segment.
 *
 * @throws RangeError when there are more points than slots, or a level is not finite.
 * @example stripMarks([{ z: 0, signal: false }], { width: 100, height: 30, slots: 1, inset: 5 }).marks[0] // x 95, y 15
 */
export function stripMarks(
  points: readonly StripPoint[],
  box: { width: number; height: number; slots: number; inset: number },
): Strip {
  if (points.length > box.slots)
    throw new RangeError(`${points.length} points do not fit ${box.slots} slots`);
  const step = box.slots > 1 ? (box.width - 2 * box.inset) / (box.slots - 1) : 0;
  const marks: StripMark[] = [];
  const lines: string[] = [];
  let run: string[] = [];
  const endRun = () => {
    if (run.length > 1) lines.push(run.join(' '));
    run = [];
  };
  points.forEach((point, at) => {
    if (point.z === null) return endRun();
    if (!Number.isFinite(point.z)) throw new RangeError('A level must be finite');
    const x = round(box.width - box.inset - (points.length - 1 - at) * step);
    const y = round(stripY(point.z, box.height));
    marks.push({ x, y, shape: shapeOf(point), beyond: Math.abs(point.z) > STRIP_REACH });
    if (!point.excluded) run.push(`${x},${y}`);
  });
  endRun();
  return { marks, lines };
}

const round = (value: number) => Math.round(value * 10) / 10;
