import { limitSet } from '@/lib/control/limit-set';
import { signalEpisodes, type Episode } from '@/lib/control/signal-episodes';
import { chartedPoints, isOpen, judgedPoints } from './judged-points';
import { FIRST_BASELINE, type Line, type LineChange, type LineLimits, type LinePoint } from './line';
import { joinedCases } from './joined-cases';
import { reconciledSignals, type FoundSignal } from './reconciled-signals';
import { specificationEpisodes } from './specification-episodes';

/**
 * Judges the end of a line again, from point `from` on, and returns what must be written. Nothing but the points,
 * the limit revisions and the restarts decide the outcome, so that a wafer that arrives late gives the same signals
 * as if it had come in order.
 *
 * `touched` are points that changed themselves; `why` is the reason written on a signal that no longer holds.
 */
export function judgedLine(
  line: Line,
  touched: ReadonlySet<LinePoint>,
  from: number,
  why: string,
): LineChange {
  const start = startOf(line, from);
  const before = new Map(line.points.slice(start).map((point) => [point, fingerprint(point)]));
  line.points.slice(start).forEach((point, offset) => {
    point.state = point.level === null ? 'not-judged' : isOpen(line, start + offset) ? 'open' : 'judged';
    if (point.state === 'judged') return;
    point.movingRange = null;
    point.limits = null;
    point.completions = [];
  });
  const charted = chartedPoints(line);
  const newLimits = firstLimits(line, charted);
  if (newLimits) line.limits.push(newLimits);
  const chartStart = line.points.slice(0, start).filter((point) => point.level !== null).length;
  const completions = judgedPoints(line, charted, chartStart);

  const openCharts = openEpisodes(line, charted, chartStart, (chart) => chart !== 'specification');
  const chartEpisodes = signalEpisodes(completions, openCharts);
  const openSpecification = openEpisodes(line, line.points, start, (chart) => chart === 'specification');
  const found: FoundSignal[] = [
    ...chartEpisodes.map((episode) => ({ episode, points: charted, start: chartStart })),
    ...specificationEpisodes(line.points, start, openSpecification).map((episode) => ({
      episode,
      points: line.points,
      start,
    })),
  ];
  const changedFrom = line.points[start];
  const signals = reconciledSignals(line, found, changedFrom, why);
  const excursions = joinedCases(line, signals);
  const points = [...before].filter(([point, print]) => touched.has(point) || fingerprint(point) !== print);
  return { points: points.map(([point]) => point), signals, excursions, limits: newLimits };
}

/** A signal reaches back beyond the loaded points: the line must be loaded whole and judged again. */
export class LineTooShort extends Error {}

/** Goes back to the newest point that still waited for wafers, and to the beginning of every signal that spans `from`. */
function startOf(line: Line, from: number): number {
  let start = from;
  while (start > 0 && line.points[start - 1]?.state === 'open') start -= 1;
  const places = new Map(line.points.map((point, index) => [point.id, index]));
  for (let again = true; again;) {
    again = false;
    for (const signal of line.signals) {
      if (signal.withdrawn !== null || (places.get(signal.lastId) ?? -1) < start) continue;
      const first = Math.min(...signal.participantIds.map((id) => places.get(id) ?? -1));
      if (first === -1 && !line.whole) throw new LineTooShort();
      if (first < start) {
        start = first;
        again = true;
      }
    }
  }
  return start;
}

/** The signals before `start` that later points may go on with, as episodes by index. */
function openEpisodes(
  line: Line,
  points: readonly LinePoint[],
  start: number,
  ofChart: (chart: string) => boolean,
): Episode[] {
  const places = new Map(points.slice(0, start).map((point, index) => [point.id, index]));
  const open: Episode[] = [];
  for (const signal of line.signals) {
    const last = places.get(signal.lastId);
    if (signal.withdrawn !== null || last === undefined || !ofChart(signal.chart)) continue;
    open.push({
      chart: signal.chart as Episode['chart'],
      rule: signal.rule,
      side: signal.side,
      first: places.get(signal.firstId) ?? -1,
      participants: signal.participantIds.map((id) => places.get(id) ?? -1),
      last,
      count: signal.completions,
    });
  }
  return open;
}

/** The first 25 charted subgroups propose limits by themselves, as long as the stream has none. */
function firstLimits(line: Line, charted: readonly LinePoint[]): LineLimits | null {
  if (line.limits.length > 0 || !line.whole || charted.length < FIRST_BASELINE) return null;
  const baseline = charted.slice(0, FIRST_BASELINE);
  const limits = limitSet(
    baseline.map(({ level, within, between, members }) => ({
      level: level as number,
      within,
      between,
      wafers: members.length,
    })),
  );
  if (limits.level.sigma === 0) return null;
  return {
    id: null,
    revision: 1,
    effectiveFrom: (baseline.at(-1) as LinePoint).at,
    baselineIds: baseline.map((point) => point.id),
    limits,
  };
}

function fingerprint(point: LinePoint): string {
  return [
    point.state,
    point.movingRange,
    point.limits?.revision,
    point.completions.join(),
    point.specification.join(),
  ].join('|');
}
