import type { WaferStudy } from './wafer-study';

/** What a wafer's map shows: readings, or differences from something in percent. */
export const MAP_VIEWS = ['value', 'mean', 'expected', 'usual'] as const;
export type MapView = (typeof MAP_VIEWS)[number];

/** The word of an address as a view; anything else is the readings themselves. */
export function mapViewOf(word: string | string[] | undefined): MapView {
  return MAP_VIEWS.find((view) => view === word) ?? 'value';
}

/** Why a view cannot be drawn of this wafer. */
export type MapGap = 'no-reading' | 'nothing-expected' | 'no-habit';

/**
 * The numbers of one view, site by site: readings over `scale`; or 100 · (reading / reference − 1), where the
 * reference is the wafer's mean, what physics expects, or the mean times the site's usual share of it.
 */
export function mapViewValues(
  view: MapView,
  study: Pick<WaferStudy, 'values' | 'statistic' | 'against' | 'usual'> & { meanOfSites: number | null },
  scale: number,
): { values: (number | null)[] } | { gap: MapGap } {
  const { values, statistic, against, usual, meanOfSites } = study;
  if (view === 'value')
    return { values: values.map((value) => finite(value === null ? null : value / scale)) };
  if (statistic === null || statistic <= 0 || meanOfSites === null) return { gap: 'no-reading' };
  if (view === 'expected' && against === null) return { gap: 'nothing-expected' };
  if (view === 'usual' && usual === null) return { gap: 'no-habit' };
  return {
    values: values.map((value, site) => {
      const ratio = usual?.ratios[site] ?? null;
      const reference =
        view === 'mean'
          ? statistic
          : view === 'expected'
            ? (against?.expected.value ?? null)
            : ratio === null
              ? null
              : ratio * meanOfSites;
      return finite(value === null || reference === null ? null : 100 * (value / reference - 1));
    }),
  };
}

function finite(value: number | null): number | null {
  return value !== null && Number.isFinite(value) ? value : null;
}
