import { LOOK_BACK } from '@/lib/control/completions-at';
import { signalEpisodes } from '@/lib/control/signal-episodes';
import { firstLimits, mayPropose } from './first-limits';
import { joinedCases } from './joined-cases';
import { chartedPoints, isOpen, judgedPoints } from './judged-points';
import { JOIN_WITHIN_SUBGROUPS, type Line, type LineChange, type LinePoint } from './line';
import { reconciledSignals } from './reconciled-signals';
import { signalsOnRecord } from './signals-on-record';
import { specificationEpisodes } from './specification-episodes';

/** The line does not hold what judging looks back on: it must be loaded whole and judged again. */
export class LineTooShort extends Error {}

/**
 * Judges the end of a line again, from point `from` on, and returns what must be written. Nothing but the points,
 * the limit revisions and the restarts decide the outcome, so that a wafer that arrives late gives the same signals
 * as if it had come in order.
 *
 * `touched` are points that changed themselves; `why` is the reason written on a signal that no longer holds.
 *
 * Throws `LineTooShort`, and leaves the line unfit for use.
 */
export function judgedLine(
  line: Line,
  touched: ReadonlySet<LinePoint>,
  from: number,
  why: string,
): LineChange {
  let start = from;
  // The newest subgroup may have waited for wafers; once followed it waits no longer.
  while (start > 0 && line.points[start - 1]?.state === 'open') start -= 1;
  let chartStart = 0;
  for (let i = 0; i < start; i += 1) if (line.points[i]?.level !== null) chartStart += 1;
  if (!line.whole && (chartStart < LOOK_BACK || start < JOIN_WITHIN_SUBGROUPS)) throw new LineTooShort();

  const charted = chartedPoints(line);
  // First limits are drawn from the beginning of a stream: long after it where its first wafers could not be judged.
  if (!line.whole && mayPropose(line, charted)) throw new LineTooShort();
  const onRecord = signalsOnRecord(line, charted, chartStart, start);
  const judged = line.points.slice(start);
  const before = judged.map(fingerprint);
  judged.forEach((point, offset) => {
    point.state = point.level === null ? 'not-judged' : isOpen(line, start + offset) ? 'open' : 'judged';
    if (point.state === 'judged') return;
    point.movingRange = null;
    point.limits = null;
    point.completions = [];
  });
  const limits = firstLimits(line, charted);
  if (limits) line.limits.push(limits);

  const completions = judgedPoints(line, charted, chartStart);
  const episodes = signalEpisodes(
    completions,
    onRecord.charts.map(({ episode }) => episode),
  );
  const specification = specificationEpisodes(
    line.points,
    start,
    onRecord.specification.map(({ episode }) => episode),
  );
  const found = [
    ...episodes.map((episode, i) => ({ episode, points: charted, begun: onRecord.charts[i] })),
    ...specification.map((episode, i) => ({
      episode,
      points: line.points,
      begun: onRecord.specification[i],
    })),
  ];
  const { changed, calling } = reconciledSignals(line, found, onRecord.again, why);
  const excursions = joinedCases(line, calling);
  const points = judged.filter((point, i) => touched.has(point) || fingerprint(point) !== before[i]);
  line.judgedOrder = null;
  return { points, signals: changed, excursions, limits };
}

/** All that judging writes into a point. */
function fingerprint(point: LinePoint): string {
  return `${point.state}|${point.movingRange}|${point.limits?.revision}|${point.completions.join()}`;
}
