import { linePosition, type Line, type LinePoint } from './line';

/** One measured wafer on its way into a line. */
export interface LineAddition {
  waferId: string;
  key: string;
  at: number;
  history: boolean;
  level: number | null;
  within: number | null;
  /** `rule:side` for each way in which the wafer is out of specification. */
  specification: string[];
  /** Another measurement of the same wafer is charted: this one belongs to the subgroup and is no member of it. */
  isAgain?: boolean;
}

/**
 * Puts measured wafers into a line: into their subgroup, or as a new subgroup at its place in the order of processing.
 * A subgroup stands where its earliest wafer was processed. Returns the points it touched and, for each wafer, the
 * point it belongs to.
 */
export function joinedMembers(
  line: Line,
  additions: readonly LineAddition[],
  newId: () => string,
): { touched: Set<LinePoint>; pointOf: LinePoint[]; from: number } {
  line.judgedOrder ??= [...line.points];
  const byKey = new Map(line.points.map((point) => [point.key, point]));
  const touched = new Set<LinePoint>();
  const pointOf: LinePoint[] = [];
  const wasFirst = { at: Infinity, key: '' };
  let sorted = true;
  for (const addition of additions) {
    let point = byKey.get(addition.key);
    if (point) {
      if (addition.at < point.at) {
        point.at = addition.at;
        sorted = false;
      }
      point.history &&= addition.history;
    } else {
      point = emptyPoint(newId(), addition);
      byKey.set(addition.key, point);
      const last = line.points.at(-1);
      if (last && linePosition(last, point) > 0) sorted = false;
      line.points.push(point);
    }
    keepEarlier(wasFirst, point);
    if (addition.isAgain !== true) placeMember(point, addition.waferId, addition);
    touched.add(point);
    pointOf.push(point);
  }
  if (!sorted) line.points.sort(linePosition);
  for (const point of touched) summarise(point);
  let from = line.points.length;
  while (from > 0 && linePosition(line.points[from - 1] as LinePoint, wasFirst) >= 0) from -= 1;
  return { touched, pointOf, from };
}

/**
 * Puts a measured wafer among the members of a subgroup, in place of what it was there; with null takes it out. Its
 * figures are to be made again then.
 */
export function placeMember(
  point: Pick<LinePoint, 'members' | 'specification'>,
  waferId: string,
  measured: Pick<LineAddition, 'level' | 'within' | 'specification'> | null,
): void {
  const place = point.members.findIndex((member) => member.waferId === waferId);
  if (place !== -1)
    point.specification = point.specification.filter((entry) => !entry.startsWith(`${waferId}:`));
  if (measured === null) {
    if (place !== -1) point.members.splice(place, 1);
    return;
  }
  const { level, within, specification } = measured;
  point.members[place === -1 ? point.members.length : place] = { waferId, level, within };
  for (const reason of specification) point.specification.push(`${waferId}:${reason}`);
}

/** A subgroup's charted figures from its wafers, whatever the order in which these arrived. */
export function summarise(point: Pick<LinePoint, 'members' | 'level' | 'within' | 'between'>): void {
  const levels = sortedNumbers(point.members.map((member) => member.level));
  const withins = sortedNumbers(point.members.map((member) => member.within));
  const mean = levels.length === 0 ? null : sum(levels) / levels.length;
  point.level = mean;
  point.within = withins.length === 0 ? null : Math.sqrt(sum(withins.map((s) => s * s)) / withins.length);
  point.between =
    mean === null || levels.length < 2
      ? null
      : Math.sqrt(sum(levels.map((level) => (level - mean) ** 2)) / (levels.length - 1));
}

function keepEarlier(first: { at: number; key: string }, other: { at: number; key: string }): void {
  if (linePosition(other, first) < 0) Object.assign(first, { at: other.at, key: other.key });
}

function emptyPoint(id: string, addition: LineAddition): LinePoint {
  return {
    id,
    key: addition.key,
    at: addition.at,
    history: addition.history,
    members: [],
    state: 'open',
    level: null,
    within: null,
    between: null,
    movingRange: null,
    limits: null,
    completions: [],
    specification: [],
  };
}

function sortedNumbers(values: readonly (number | null)[]): number[] {
  return values.filter((value) => value !== null).sort((a, b) => a - b);
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
