import { formatDateTime } from '@/lib/format';

/** Since when a revision is in force; the first of a stream holds from its beginning. */
export function effectiveWords(effectiveFrom: Date, timeZone: string): string {
  return effectiveFrom.getTime() <= 0 ? 'the beginning' : formatDateTime(effectiveFrom, timeZone);
}
