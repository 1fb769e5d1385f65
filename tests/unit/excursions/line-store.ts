import { judgedLine, LineTooShort } from '@/lib/excursions/judged-line';
import { joinedMembers, type LineAddition } from '@/lib/excursions/joined-members';
import {
  LINE_DEPTH,
  linePosition,
  type Line,
  type LineChange,
  type LineExcursion,
  type LineLimits,
  type LinePoint,
  type LineSignal,
} from '@/lib/excursions/line';

/** What decides how a stream is judged, besides its wafers. */
export interface Setting {
  subgroupSize: number;
  limits: LineLimits[];
  restarts: number[];
}

export function emptyLine({ subgroupSize, limits, restarts }: Setting): Line {
  return {
    streamId: '1',
    version: '0',
    subgroupSize,
    whole: true,
    points: [],
    limits: [...limits],
    restarts,
    signals: [],
    excursions: [],
  };
}

let lastId = 0;
export const newId = () => String((lastId += 1));

/** Adds wafers to a line, judges it, and gives everything new its id, as if it had been written. */
export function add(line: Line, additions: readonly LineAddition[], why = 'late'): LineChange {
  const { touched, from } = joinedMembers(line, additions, newId);
  const change = judgedLine(line, touched, from, why);
  for (const row of [...change.signals, ...change.excursions]) row.id ??= newId();
  if (change.limits) change.limits.id ??= newId();
  return change;
}

/** A stand-in for the tables: it keeps copies of what each judgement says must be written, and nothing else. */
export class LineStore {
  readonly points = new Map<string, LinePoint>();
  readonly signals = new Map<string, LineSignal & { excursionId: string | null }>();
  readonly excursions = new Map<string, LineExcursion>();
  wholeLoads = 0;

  constructor(readonly setting: Setting) {}

  write(change: LineChange): void {
    for (const point of change.points) this.points.set(point.id, copyOf(point));
    for (const signal of change.signals) {
      const excursionId = signal.excursion?.id ?? null;
      this.signals.set(signal.id as string, {
        ...signal,
        participantIds: [...signal.participantIds],
        excursionId,
      });
    }
    for (const excursion of change.excursions) {
      excursion.entries = [];
      this.excursions.set(excursion.id as string, { ...excursion });
    }
    if (change.limits) this.setting.limits.push(change.limits);
  }

  /** The end of the stream: every point from `from` on and the last `LINE_DEPTH + 1` before it. */
  load(from: number): Line {
    const all = [...this.points.values()].sort(linePosition);
    const first = all.findIndex((point) => point.at >= from);
    const cut = Math.max(0, (first === -1 ? all.length : first) - LINE_DEPTH - 1);
    const points = all.slice(cut).map(copyOf);
    const ids = new Set(points.map((point) => point.id));
    const excursions = [...this.excursions.values()].map((excursion) => ({ ...excursion, entries: [] }));
    const signals = [...this.signals.values()]
      .filter((signal) => ids.has(signal.lastId))
      .map(({ excursionId, ...signal }) => ({
        ...signal,
        participantIds: [...signal.participantIds],
        excursion: excursions.find(({ id }) => id === excursionId) ?? null,
      }));
    return { ...emptyLine(this.setting), whole: cut === 0, points, signals, excursions };
  }

  /** Records wafers on a line of this store; where the line is too short, on the whole stream. */
  record(line: Line, additions: readonly LineAddition[]): Line {
    try {
      this.write(add(line, additions));
      return line;
    } catch (error) {
      if (!(error instanceof LineTooShort)) throw error;
      this.wholeLoads += 1;
      const whole = this.load(-Infinity);
      this.write(add(whole, additions));
      return whole;
    }
  }
}

/** Keeps a line's last points only, as the process does between two wafers of a long stream. */
export function trim(line: Line, kept = LINE_DEPTH + 20): void {
  if (line.points.length <= kept) return;
  line.points = line.points.slice(-kept);
  line.whole = false;
  const ids = new Set(line.points.map((point) => point.id));
  line.signals = line.signals.filter((signal) => ids.has(signal.lastId));
}

/** What of a line must not depend on the order of arrival, under keys instead of ids. */
export function outcome(line: Line) {
  const keys = new Map(line.points.map((point) => [point.id, point.key]));
  const signals = line.signals
    .filter((signal) => signal.withdrawn === null)
    .map(({ chart, rule, side, firstId, lastId, participantIds, completions, limits }) => ({
      what: `${chart} ${rule} ${side}`,
      first: keys.get(firstId),
      last: keys.get(lastId),
      participants: participantIds.map((id) => keys.get(id)),
      completions,
      revision: limits?.revision ?? null,
    }))
    .sort((a, b) => (`${a.what} ${a.first}` < `${b.what} ${b.first}` ? -1 : 1));
  const points = line.points.map((point) => ({
    key: point.key,
    at: point.at,
    state: point.state,
    level: point.level,
    within: point.within,
    between: point.between,
    movingRange: point.movingRange,
    revision: point.limits?.revision ?? null,
    completions: point.completions,
    wafers: point.members.map(({ waferId }) => waferId).sort(),
    specification: [...point.specification].sort(),
  }));
  return { points, signals };
}

/** The signals that hold, each as what it is, its first and last subgroup and its completions. */
export const keyed = (line: Line) =>
  outcome(line).signals.map(({ what, first, last, completions }) => [what, first, last, completions]);

function copyOf(point: LinePoint): LinePoint {
  return {
    ...point,
    members: point.members.map((member) => ({ ...member })),
    completions: [...point.completions],
    specification: [...point.specification],
  };
}
