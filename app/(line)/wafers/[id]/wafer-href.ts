import type { MapView } from '@/lib/maps/wafer-map-view';

/** The address of a wafer's page in a view, with a reading to decide about where one is meant. */
export function waferHref(id: string, view: MapView, site?: string): string {
  const query = new URLSearchParams();
  if (view !== 'value') query.set('map', view);
  if (site !== undefined) query.set('site', site);
  const words = query.size === 0 ? '' : `?${query.toString()}`;
  return `/wafers/${id}${words}${site === undefined ? '' : '#decide'}`;
}
