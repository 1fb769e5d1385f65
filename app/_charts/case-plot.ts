import type { ChartName } from '@/lib/control/completions-at';
import { axisTicks } from './axis-ticks';
import { chartDomain } from './chart-domain';
import { dayTicks } from './day-ticks';
import { limitSegments } from './limit-segments';
import { linearScale } from './linear-scale';
import type { MarkShape } from './mark';
import type { LimitSpan } from './stream-chart-point';

/** One subgroup on the chart of a case. */
export interface CasePlotPoint {
  index: number;
  day: string;
  /** Null where there is no figure: the line has a gap. */
  value: number | null;
  shape: MarkShape;
  /** It took part in a signal of the case that holds. */
  tookPart: boolean;
}

/** What was specified from one index to another, both included. */
export interface SpecificationSpan {
  fromIndex: number;
  toIndex: number;
  lower: number | null;
  upper: number | null;
}

export interface CasePlotInput {
  chart: ChartName;
  /** In order of `index`. */
  points: readonly CasePlotPoint[];
  limits: readonly LimitSpan[];
  /** Of the charted figure; drawn where it does not squeeze the points. */
  specification: readonly SpecificationSpan[];
  events: readonly { index: number; text: string }[];
  /** From the first subgroup of the case to the last, by index. */
  reach: { from: number; to: number };
}

const LEFT = 52;
const RIGHT = 14;
const TOP = 26;
const BOTTOM = 22;
const DAY_WIDTH = 84;

/** Where everything on the chart of a case stands, in a drawing of a given size. */
export function casePlot(input: CasePlotInput, size: { width: number; height: number }) {
  const { points, chart, reach } = input;
  const [from, to] = [points[0]?.index ?? 0, points.at(-1)?.index ?? 0];
  const x = linearScale([from - 0.5, to + 0.5], [LEFT, size.width - RIGHT]);
  const segments = limitSegments(input.limits, chart, { from, to });
  const edges = input.specification.flatMap((span) =>
    [span.lower, span.upper].flatMap((edge) => (edge === null ? [] : { ...span, edge })),
  );
  const values = points.flatMap((point) => point.value ?? []);
  const intervals = segments.flatMap((segment) => segment.interval ?? []);
  const domain = chartDomain(
    [...values, ...segments.map((segment) => segment.y)],
    [intervals, edges.map(({ edge }) => edge)].filter((wish) => wish.length > 0),
    chart === 'level' ? {} : { from: 0 },
  );
  const y = linearScale(domain, [size.height - BOTTOM, TOP], { clamp: true });
  const inside = (value: number) => value > domain[0] && value < domain[1];
  return {
    ticks: axisTicks(domain, 5).map(({ value, text }) => ({ y: round(y(value)), text })),
    days: dayTicks(points, Math.max(2, Math.floor((size.width - LEFT - RIGHT) / DAY_WIDTH))).map(
      ({ index, day }) => ({ x: round(x(index)), text: day }),
    ),
    limits: segments.map((segment) => ({
      x1: round(x(segment.fromX)),
      x2: round(x(segment.toX)),
      y: round(y(segment.y)),
      part: segment.part,
      dashed: segment.dashed,
      interval:
        segment.interval === null
          ? null
          : { top: round(y(segment.interval[1])), bottom: round(y(segment.interval[0])) },
    })),
    specification: edges
      .filter(({ edge }) => inside(edge))
      .map(({ fromIndex, toIndex, edge }) => ({
        x1: round(x(fromIndex - 0.5)),
        x2: round(x(toIndex + 0.5)),
        y: round(y(edge)),
      })),
    events: input.events.map(({ index, text }) => ({ x: round(x(index)), text })),
    wash: { x: round(x(reach.from - 0.5)), width: round(x(reach.to + 0.5) - x(reach.from - 0.5)) },
    lines: lines(points, x, y),
    marks: points.flatMap(({ index, value, shape, tookPart }) =>
      value === null ? [] : [{ index, x: round(x(index)), y: round(y(value)), shape, tookPart }],
    ),
    frame: { left: LEFT, right: size.width - RIGHT, top: TOP, bottom: size.height - BOTTOM },
  };
}

/** Runs of neighbouring points with a figure, each the `points` of one polyline; what is left out has no segment. */
function lines(
  points: readonly CasePlotPoint[],
  x: (index: number) => number,
  y: (value: number) => number,
): string[] {
  const found: string[] = [];
  let run: string[] = [];
  for (const { index, value, shape } of points) {
    if (value !== null && shape !== 'cross') {
      run.push(`${round(x(index))},${round(y(value))}`);
      continue;
    }
    if (value === null) {
      if (run.length > 1) found.push(run.join(' '));
      run = [];
    }
  }
  if (run.length > 1) found.push(run.join(' '));
  return found;
}

const round = (value: number) => Math.round(value * 10) / 10;
