import type { SpanWish } from '@/lib/excursions/span-points';
import { siteInstant } from '@/lib/site-time';

export type SearchWords = Record<string, string | string[] | undefined>;

const INSTANT = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}(:\d{2}(\.\d{1,6})?)?(Z|[+-]\d{2}:\d{2})$/;
const DAY = /^\d{4}-\d{2}-\d{2}$/;

/**
 * What the address of a stream's page asks for. What it gets wrong is left aside and said: `from` and `to` are instants
 * with offset or days of the site, `at` is a subgroup's id, `gauge` and `lot` are names.
 */
export function spanWish(search: SearchWords, timeZone: string): { wish: SpanWish; notices: string[] } {
  const word = (name: string) => {
    const found = search[name];
    const text = (Array.isArray(found) ? found[0] : found)?.replace(/\p{Cc}/gu, '').trim() ?? '';
    return text === '' ? null : text.slice(0, 100);
  };
  const notices: string[] = [];
  const instant = (name: 'from' | 'to') => {
    const text = word(name);
    const found = text === null ? null : instantOf(text, timeZone);
    if (text !== null && found === null) {
      notices.push(`“${name}” in the address is left aside: “${text}” is no time such as 2031-04-05T06:07Z.`);
    }
    return found;
  };
  let [from, to] = [instant('from'), instant('to')];
  if (from !== null && to !== null && from > to) {
    notices.push('The stretch in the address is left aside: it ends before it begins.');
    [from, to] = [null, null];
  }
  const at = word('at');
  const around = at !== null && /^\d{1,18}$/.test(at) ? at : null;
  if (at !== null && around === null)
    notices.push(`“at” in the address is left aside: “${at}” is no subgroup.`);
  return { wish: { from, to, around, gauge: word('gauge'), lot: word('lot') }, notices };
}

function instantOf(text: string, timeZone: string): Date | null {
  const found = DAY.test(text)
    ? siteInstant(`${text}T00:00`, timeZone)
    : INSTANT.test(text)
      ? new Date(text)
      : null;
  if (found === null || Number.isNaN(found.getTime())) return null;
  const year = found.getUTCFullYear();
  return year >= 1900 && year <= 2200 ? found : null;
}

/** The address of a stream's page, with so much of a wish as differs from the usual view. */
export function streamHref(slug: string, wish: Partial<SpanWish>, base = '/streams', tail = ''): string {
  const query = new URLSearchParams();
  if (wish.from) query.set('from', wish.from.toISOString());
  if (wish.to) query.set('to', wish.to.toISOString());
  if (wish.around) query.set('at', wish.around);
  if (wish.gauge) query.set('gauge', wish.gauge);
  if (wish.lot) query.set('lot', wish.lot);
  const text = query.toString();
  return `${base}/${slug}${tail}${text === '' ? '' : `?${text}`}`;
}
