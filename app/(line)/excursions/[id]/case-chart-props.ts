import type { CaseChartProps } from '@/app/_charts/case-chart';
import { chartMarkShape } from '@/app/_charts/chart-mark-shape';
import { chartValue } from '@/app/_charts/chart-value';
import { limitSpans } from '@/app/_charts/limit-spans';
import { thinned } from '@/app/_charts/thinned';
import type { ChartName } from '@/lib/control/completions-at';
import { leadSignal } from '@/lib/excursions/case-answer';
import { signalSentence } from '@/lib/excursions/signal-sentence';
import type { CasePoint, ExcursionCase } from '@/lib/excursions/types';
import { formatShortDay } from './short-day';
import { specificationSpans } from './specification-spans';

const MOST_POINTS = 240;

/** The chart that a case is about; out of specification is about the level, or the spread within. */
export function caseChartName(found: Pick<ExcursionCase, 'chart' | 'signals'>): ChartName {
  if (found.chart !== 'specification') return found.chart as ChartName;
  return found.signals.some((signal) => signal.rule !== 'nonuniformity') ? 'level' : 'within';
}

/** What the chart of a case draws. Limits are those that judged each subgroup; a long case is thinned. */
export function caseChartProps(found: ExcursionCase, timeZone: string): Omit<CaseChartProps, 'axis'> {
  const chart = caseChartName(found);
  const held = found.signals.filter((signal) => signal.withdrawnAt === null);
  const tookPart = new Set(held.flatMap((signal) => signal.participantIds));
  const isFault = found.chart === 'specification';
  const numbered = found.points.map((point, index) => ({ ...point, index }));
  const place = (id: string, missing: number) => {
    const at = found.points.findIndex((point) => point.id === id);
    return at === -1 ? missing : at;
  };
  const reach = { from: place(found.first.id, 0), to: place(found.last.id, found.points.length - 1) };
  const lead = leadSignal(found.signals);
  const shown = thinned(numbered, MOST_POINTS);
  const drawn = new Set(shown.map((point) => point.index));
  const call = lead && { index: place(lead.first.id, -1), words: signalSentence(lead) };
  return {
    chart,
    points: shown.map((point) => ({
      index: point.index,
      day: formatShortDay(point.at, timeZone),
      value: chartValue(point, chart),
      shape: shapeOf(point, chart, isFault),
      tookPart: tookPart.has(point.id),
    })),
    limits: limitSpans(found.points, found.limits, { isDrawn: (index) => drawn.has(index) }),
    specification: isFault ? specificationSpans(found, chart) : [],
    events: found.events.map(({ at, text }) => ({
      index: numbered.findIndex((point) => point.at >= at) - 0.5,
      text,
    })),
    reach: { from: Math.min(reach.from, reach.to), to: Math.max(reach.from, reach.to) },
    call,
    label: `${found.points.length} subgroups about case ${found.id}, ${tookPart.size} of which took part in its signals${
      lead ? `: ${signalSentence(lead)}` : ''
    }`,
  };
}

function shapeOf(point: CasePoint, chart: ChartName, isFault: boolean) {
  return chartMarkShape(
    {
      completions: point.completions,
      outOfSpecification: isFault && point.outOfSpecification,
      open: point.state === 'open',
      judged: point.state === 'judged',
      hollow: false,
    },
    chart,
  );
}
