/** One subgroup as the stream's charts show it. `texts` are made by the server, with unit and fitting digits. */
export interface StreamChartPoint {
  id: string;
  /** Its place in the stream's order: the shared horizontal axis. */
  index: number;
  /** Its name, such as "run 1184". */
  label: string;
  /** When it was processed, ISO 8601. */
  at: string;
  /** The day in the site's time zone, such as "29 Nov": the axis is labelled where it changes. */
  day: string;
  /** Null where there is no level: the line has a gap. */
  level: number | null;
  movingRange: number | null;
  within: number | null;
  between: number | null;
  /** Patterns this point completes, as `chart:rule:side`. */
  completions: readonly string[];
  outOfSpecification: boolean;
  /** The subgroup is not complete: hollow, and not judged yet. */
  open: boolean;
  /** False: left out of the judging, and crossed. */
  judged: boolean;
  /** Late or re-measured. */
  hollow: boolean;
  /** Where Enter leads. */
  href: string;
  texts: StreamPointTexts;
}

/** What "At the cursor" says of a point; null where a figure is undefined. */
export interface StreamPointTexts {
  /** With unit, such as "5.514 Ω·cm". */
  level: string;
  at: string;
  expected: string | null;
  difference: string | null;
  dopant: string | null;
  /** The density that the level stands for. */
  density: string | null;
  /** Against the point before it, as dopant: what is common to a stream tells neither from the other. */
  onBefore: string | null;
  movingRange: string | null;
  within: string | null;
  between: string | null;
  /** Gauge, bad sites, why it is not judged: one line each. */
  notes: readonly string[];
}

/** A centre line between two limits, with the 90 % interval of each limit itself until the limits are established. */
export interface TwoSidedLimits {
  centre: number;
  lower: number;
  upper: number;
  lowerInterval?: readonly [number, number];
  upperInterval?: readonly [number, number];
}

/** Limits as they were in force from one index to another, both included. */
export interface LimitSpan {
  fromIndex: number;
  toIndex: number;
  revision: number;
  state: 'provisional' | 'young' | 'established';
  level: TwoSidedLimits;
  movingRange: { centre: number; upper: number };
  within: TwoSidedLimits | null;
  /** The spread between wafers has a limit for each number of wafers: from where on which. */
  between: { fromIndex: number; centre: number; upper: number }[];
}

/** What physics expects from one index to another: value, its uncertainty, and the target's tolerance apart. */
export interface ExpectedSpan {
  fromIndex: number;
  toIndex: number;
  value: number;
  lower: number;
  upper: number;
  /** Null where no tolerance is agreed. */
  toleranceLower: number | null;
  toleranceUpper: number | null;
}

/** Something that happened: an adjustment, a maintenance, new limits, or the estimated onset of a change. */
export interface StreamEvent {
  /** At a point, or half a step before the first point that came after it. */
  index: number;
  text: string;
  kind: 'adjustment' | 'maintenance' | 'onset' | 'limits' | 'note';
}
