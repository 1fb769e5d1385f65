import type { WaferShown } from './wafer-shown';
import { formatNumber, formatPercent } from '@/lib/format';
import type { MapGap, MapView } from '@/lib/maps/wafer-map-view';
import { figureDefinition } from '@/lib/wafer/figure-definition';

export const VIEW_NAMES: Record<MapView, string> = {
  value: 'Value',
  mean: 'Against the mean',
  expected: 'Against expected',
  usual: 'Against the usual map',
};

/** What stands where a map cannot be drawn, and how it comes about. */
export const GAP_WORDS: Record<MapGap, { what: string; how: string }> = {
  'no-reading': {
    what: 'No reading of this wafer counts, so there is nothing to draw.',
    how: 'The readings below say why each is out. Measure the wafer again.',
  },
  'nothing-expected': {
    what: 'Here the readings would be drawn against what physics expects.',
    how: 'Nothing is expected of this wafer: see Physics on this page for what is missing.',
  },
  'no-habit': {
    what: 'Here the readings would be drawn against what wafers of this stream usually look like.',
    how: 'That takes five judged wafers before this one, or in the baseline of its limits.',
  },
};

/** What the colours of a view mean, in a sentence. */
export function viewNote(shown: WaferShown): string {
  const { view, study, settings } = shown;
  const statistic = figureDefinition(settings.stream.controlStatistic).label;
  const smoothing = `The surface between the sites leaves the readings no farther than the gauge scatters, ${formatPercent(settings.stream.repeatabilityPercent)}; beyond them nothing is drawn.`;
  if (view === 'mean')
    return `Percent from the ${statistic}, ${shown.reading(study.statistic)}. ${smoothing}`;
  if (view === 'expected' && study.against !== null) {
    const { value, uncertaintyPercent } = study.against.expected;
    return `Percent from expected, ${shown.reading(value)} ± ${formatNumber(uncertaintyPercent, 2)}\u00a0% (k = 1), which moves the whole map and not its pattern. ${smoothing}`;
  }
  if (view === 'usual') return `${usualNote(shown)} Level is taken out. ${smoothing}`;
  return `Readings at 23 °C. ${smoothing}`;
}

/** Whose habit the usual map is. */
export function usualNote({ study, usual }: WaferShown): string {
  const wafers = `${study.usual?.wafers ?? 0} wafers`;
  return usual.from === 'baseline'
    ? `Usual is the mean of ${wafers} in the baseline of limits revision ${usual.revision}.`
    : `Usual is the mean of the ${wafers} judged last before this one.`;
}
