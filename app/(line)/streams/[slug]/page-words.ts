import { type StreamFigures, streamAnswer, streamRemarks } from '@/lib/excursions/stream-answer';
import { MOST_SUBGROUPS } from '@/lib/excursions/span-points';
import { inForce } from '@/lib/streams/in-force';
import type { StreamView } from './stream-view';

/** The first sentence of the page and what stands under it, from the figures below. */
export function pageWords(view: StreamView): { answer: string; sub: string } {
  const { settings, standing, span, isFiltered } = view;
  const { stream } = settings;
  if (span.whole === null) return { answer: `${stream.name}: no wafer yet`, sub: placeOf(view) };
  const specification = inForce(settings.specifications, view.now)?.specification;
  const figures: StreamFigures = {
    name: stream.name,
    subgroup: stream.subgroup,
    cases: standing.cases,
    openCases: standing.openCases,
    limits: standing.inForce,
    judged: standing.since.subgroups,
    withSignal: standing.since.withSignal,
    toMeasureAgain: view.newestToMeasure,
    shown: {
      subgroups: span.points.length,
      outOfSpecification: span.points.filter((point) => point.outOfSpecification).length,
    },
    hasSpecification: specification !== undefined,
  };
  const remarks = [...streamRemarks(figures), view.isLatest && !isFiltered ? newestWords(view) : null];
  return {
    answer: streamAnswer(figures),
    sub: [...remarks.filter((remark) => remark !== null), placeOf(view)].join(' '),
  };
}

/** Remarks on the stretch itself. */
export function spanNotices({ span, wish, rows }: StreamView): string[] {
  const notices: string[] = [];
  if (span.isCut) {
    notices.push(
      `This stretch holds more than ${MOST_SUBGROUPS} subgroups: its newest ${MOST_SUBGROUPS} are shown.`,
    );
  }
  if (wish.around !== null && !rows.some((row) => row.id === wish.around)) {
    notices.push('The subgroup that the address names is not among those shown.');
  }
  return notices;
}

function newestWords({ rows, settings }: StreamView): string | null {
  const newest = rows.findLast((row) => row.level !== null);
  const isRelative = settings.stream.chartedValue === 'relative';
  if (newest?.texts.difference == null || newest.expected === null) return null;
  const level = newest.expected.value;
  const dopant = newest.texts.dopant === null ? '' : `, ${newest.texts.dopant} dopant`;
  return level === null && !isRelative
    ? null
    : `The newest, ${newest.label}, reads ${newest.texts.difference} against expected${dopant}.`;
}

function placeOf({ settings: { stream } }: StreamView): string {
  const place = [stream.step, stream.tool, stream.chamber].filter((word) => word !== '').join(', ');
  return `${place}.${stream.retiredAt === null ? '' : ' This stream is out of use.'}`;
}
