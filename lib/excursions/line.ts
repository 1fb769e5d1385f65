import type { LimitSet } from '@/lib/control/limit-set';

/** What the judging knows of one wafer of a subgroup. A wafer that is not judged has neither level nor spread. */
export interface LineMember {
  waferId: string;
  level: number | null;
  within: number | null;
}

/** A limit revision that judges; `id` is null until it has been written. Times are milliseconds since 1970. */
export interface LineLimits {
  id: string | null;
  revision: number;
  effectiveFrom: number;
  /** Of a provisional revision, from when on another that was approved since judges; null of every other. */
  supersededFrom: number | null;
  baselineIds: string[];
  limits: LimitSet;
}

/**
 * One subgroup in the order of processing.
 *
 * `completions` names each rule that this point completes as `chart:rule:side`; `specification` each way in which one
 * of its wafers is out of specification as `waferId:rule:side`.
 */
export interface LinePoint {
  id: string;
  key: string;
  at: number;
  history: boolean;
  members: LineMember[];
  state: 'judged' | 'open' | 'not-judged';
  level: number | null;
  within: number | null;
  between: number | null;
  movingRange: number | null;
  limits: LineLimits | null;
  completions: string[];
  specification: string[];
}

export type ExcursionFamily = 'specification' | 'instability' | 'pattern';

/** An excursion that is not closed. `entries` are log lines still to be written. */
export interface LineExcursion {
  id: string | null;
  chart: string;
  side: 'above' | 'below';
  family: ExcursionFamily;
  firstId: string;
  lastId: string;
  entries: { action: 'opened' | 'joined'; note: string }[];
}

/** A signal, from the subgroup that first completed its pattern to the last that went on with it. */
export interface LineSignal {
  id: string | null;
  chart: string;
  rule: string;
  side: 'above' | 'below';
  firstId: string;
  participantIds: string[];
  lastId: string;
  completions: number;
  limits: LineLimits | null;
  excursion: LineExcursion | null;
  withdrawn: string | null;
}

/**
 * The end of a stream, as much of it as judging needs: the last points in order (`whole` when that is all of them),
 * every limit revision that judges, the restarts, the signals that reach into these points and the cases not closed.
 *
 * `judgedOrder` keeps the points as they stood when they were last judged, while additions wait for their judgement:
 * what signals on record say about "first" and "last" is said in that order.
 */
export interface Line {
  streamId: string;
  version: string;
  subgroupSize: number;
  whole: boolean;
  points: LinePoint[];
  limits: LineLimits[];
  restarts: number[];
  signals: LineSignal[];
  excursions: LineExcursion[];
  judgedOrder?: readonly LinePoint[] | null;
}

/** What a judgement changed in a line and what must therefore be written. */
export interface LineChange {
  points: LinePoint[];
  signals: LineSignal[];
  excursions: LineExcursion[];
  limits: LineLimits | null;
}

/** How many points before the first touched one a loaded line holds: for the rules, and for joining cases. */
export const LINE_DEPTH = 60;

/** A new signal joins an open case whose last point lies at most this many subgroups away. */
export const JOIN_WITHIN_SUBGROUPS = 25;

/** The subgroups that make the first proposed limits. */
export const FIRST_BASELINE = 25;

/** The order of processing: by time, and by the subgroup's own key where times are equal, never by arrival. */
export function linePosition(a: { at: number; key: string }, b: { at: number; key: string }): number {
  return a.at - b.at || (a.key < b.key ? -1 : a.key > b.key ? 1 : 0);
}
