/** How a mishap acts on the making or the probing of a wafer, from its onset on. */
export type MishapEffect =
  | { kind: 'dose-drift'; dopingPercentPerSubgroup: number }
  | { kind: 'step'; dopingPercent: number }
  | {
      kind: 'hot-zone';
      temperatureCPerSubgroup: number;
      radiusShare: number;
      angleDegrees: number;
      widthShare: number;
    }
  | { kind: 'gauge-offset'; percent: number; days: number }
  | { kind: 'misrouted-wafer'; dopingPercent: number };

/** Something that truly goes wrong on the demonstration line, and by when a chart should have said so. */
export interface Mishap {
  streamSlug: string;
  /** What happened, in words. */
  truth: string;
  /** Days after the first day at which it begins. */
  onsetDay: number;
  effect: MishapEffect;
  /** The chart that should find it first. */
  chart: 'level' | 'within';
  /** Its first signal is due by this many subgroups from the onset, the first affected one counted as 1. */
  expectedWithinSubgroups: number;
}
