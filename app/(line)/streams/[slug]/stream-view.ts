import type { Actor } from '@/lib/access/actor';
import { BOARD_POINTS } from '@/lib/excursions/board-streams';
import {
  findStreamSpan,
  findStreamStanding,
  listSpanWafers,
  listWafersToMeasure,
} from '@/lib/excursions/data';
import { modelsOf } from '@/lib/excursions/point-expected';
import type { SpanWish } from '@/lib/excursions/span-points';
import type { SpanWafer } from '@/lib/excursions/span-wafers';
import { listStreamEvents } from '@/lib/streams/data';
import type { StreamSettings } from '@/lib/streams/types';
import { chartRows } from './chart-points';
import { chartUnit } from './chart-unit';
import { drawnPoints } from './drawn-points';

const MOST_EVENTS = 200;
/** More than the newest subgroups hold, which are counted as the board counts them. */
const MOST_TO_MEASURE = 1000;

export type StreamView = NonNullable<Awaited<ReturnType<typeof readStreamView>>>;

/**
 * Everything a stream's page shows: first the stretch and how the stream stands, then the wafers of the subgroups that
 * are drawn, the log, and what is to be measured again.
 */
export async function readStreamView(
  actor: Actor,
  settings: StreamSettings,
  wish: SpanWish,
  options: { timeZone: string; now: Date },
) {
  const { stream } = settings;
  const [span, standing] = await Promise.all([
    findStreamSpan(actor, stream.id, wish),
    findStreamStanding(actor, stream.id, options.now),
  ]);
  const drawn = drawnPoints(span.points, wish.around);
  const shown = shownSpan(span, wish);
  const [wafers, toMeasure, events] = await Promise.all([
    listSpanWafers(
      actor,
      stream.id,
      drawn.map((point) => point.id),
    ),
    shown === null ? [] : listWafersToMeasure(actor, stream.id, { ...shown, most: MOST_TO_MEASURE }),
    listStreamEvents(actor, stream.id, { ...(shown && { since: shown.from }), most: MOST_EVENTS }),
  ]);
  const wafersOf = new Map<string, SpanWafer[]>();
  for (const wafer of wafers) {
    const found = wafersOf.get(wafer.subgroupId);
    if (found === undefined) wafersOf.set(wafer.subgroupId, [wafer]);
    else found.push(wafer);
  }
  const isFiltered = wish.gauge !== null || wish.lot !== null;
  const level = span.points.find((point) => point.level !== null)?.level ?? null;
  const unit = chartUnit(stream, level);
  const rows = chartRows({
    stream,
    points: drawn,
    wafersOf,
    modelOf: modelsOf(settings.targets),
    unit,
    timeZone: options.timeZone,
    isFiltered,
  });
  const isLatest = shown !== null && span.whole !== null && shown.to >= span.whole.to;
  const newest = new Set(span.points.slice(-BOARD_POINTS).map((point) => point.id));
  return {
    settings,
    wish,
    span,
    shown,
    standing,
    rows,
    wafers,
    events,
    toMeasure,
    unit,
    isFiltered,
    isLatest,
    newestToMeasure: isLatest ? toMeasure.filter((wafer) => newest.has(wafer.subgroupId)).length : 0,
    ...options,
  };
}

/** The stretch as asked for, or as its points lie where nobody asked; null in an empty stream. */
function shownSpan(span: Awaited<ReturnType<typeof findStreamSpan>>, wish: SpanWish) {
  if (span.whole === null) return null;
  const [first, last] = [span.points[0], span.points.at(-1)];
  const from = span.isCut || wish.from === null ? (first ? new Date(first.at) : span.whole.from) : wish.from;
  const wanted = wish.to ?? (wish.from === null && last ? new Date(last.at) : span.whole.to);
  return { from, to: wanted < from ? from : wanted };
}
