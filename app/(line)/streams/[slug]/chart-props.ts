import type { ComponentProps } from 'react';
import { limitSpans } from '@/app/_charts/limit-spans';
import { packedPoints } from '@/app/_charts/packed-points';
import type { PackedStreamCharts } from '@/app/_charts/packed-stream-charts';
import { streamPanels } from '@/app/_charts/stream-panels';
import { signalSentence } from '@/lib/excursions/signal-sentence';
import type { ChartRow } from './chart-points';
import { dopingScale } from './doping-scale';
import { eventMarks } from './event-marks';
import { expectedSpans } from './expected-spans';
import { streamHref } from './span-wish';
import type { StreamView } from './stream-view';

const WITHIN = '1 s, % of the mean';

/** What the charts of a stream draw; null where the stretch holds no point. */
export function chartProps(
  page: StreamView,
): Omit<ComponentProps<typeof PackedStreamCharts>, 'children'> | null {
  const { settings, span, shown, rows, unit, standing, wish } = page;
  const { stream } = settings;
  if (shown === null || span.whole === null || rows.length === 0) return null;
  const isRelative = stream.chartedValue === 'relative';
  const drawn = new Set(rows.map((row) => row.index));
  const isDrawn = (index: number) => drawn.has(index);
  const limits = page.isFiltered
    ? []
    : limitSpans(span.points, standing.limits, { factor: unit.factor, isDrawn });
  const expected = expectedSpans(rows, { isRelative, factor: unit.factor });
  const newest = rows.findLast((row) => row.expected !== null)?.expected ?? null;
  const target = settings.targets.find((revision) => revision.id === newest?.targetId)?.target;
  const view = { from: rows[0]?.index ?? 0, to: rows.at(-1)?.index ?? 0 };
  const units = { level: unit.levelLabel, 'moving-range': unit.unit, within: WITHIN, between: unit.unit };
  const range = streamPanels({ points: rows, limits, expected, view, units })[0]?.domain ?? [0, 0];
  const scale =
    target === undefined || newest === null
      ? { ticks: [], unit: '' }
      : dopingScale(target, range, {
          isRelative,
          factor: unit.factor,
          sensitivity: newest.model?.sensitivity ?? null,
        });
  return {
    name: stream.name,
    packed: packedPoints(rows),
    pointsInSpan: span.points.length,
    limits,
    events: eventMarks(span.points, page.isLatest ? page.events : within(page.events, shown.to), limits),
    expected,
    dopingTicks: scale.ticks,
    dopingUnit: scale.unit,
    unit: unit.unit,
    levelLabel: unit.levelLabel,
    withinLabel: WITHIN,
    completionWords: completionWords(rows),
    shown: { from: shown.from.toISOString(), to: shown.to.toISOString() },
    whole: { from: span.whole.from.toISOString(), to: span.whole.to.toISOString() },
    selectedId: wish.around,
    download: {
      href: streamHref(stream.slug, { ...wish, ...shown, around: null }, '/api/streams', '/points.csv'),
      label: span.points.length === 1 ? 'This subgroup as CSV' : `All ${span.points.length} subgroups as CSV`,
    },
  };
}

function within<Event extends { at: Date }>(events: readonly Event[], to: Date): Event[] {
  return events.filter(({ at }) => at <= to);
}

/** Words for every pattern that occurs among the rows. */
function completionWords(rows: readonly Pick<ChartRow, 'completions'>[]): Record<string, string> {
  const names = new Set(rows.flatMap((row) => row.completions));
  return Object.fromEntries(
    [...names].map((name) => {
      const [chart = '', rule = '', side] = name.split(':');
      const signal = { chart, rule, side: side === 'below' ? ('below' as const) : ('above' as const) };
      return [name, signalSentence({ ...signal, participantIds: [], completions: 1 })];
    }),
  );
}
