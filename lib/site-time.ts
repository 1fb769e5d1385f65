import { formatDateTime } from './format';

const LOCAL = /^(\d{4})-(\d{2})-(\d{2})[T ](\d{2}):(\d{2})(?::(\d{2}))?$/;

/**
 * The instant of a wall-clock time in a zone, written as a time field sends it: "2031-04-05T06:07". Null for what is
 * no such time. Where clocks are set back the earlier of the two instants is meant; a time that clocks skip is read
 * with the offset from before.
 *
 * @example siteInstant('2031-07-05T06:07', 'Europe/Berlin')?.toISOString() // '2031-07-05T04:07:00.000Z'
 */
export function siteInstant(words: string, timeZone: string): Date | null {
  const found = LOCAL.exec(words.trim());
  if (found === null) return null;
  const [year = 0, month = 0, day = 0, hour = 0, minute = 0, second = 0] = found
    .slice(1)
    .map((part) => Number(part ?? 0));
  const asUtc = Date.UTC(year, month - 1, day, hour, minute, second);
  const read = new Date(asUtc);
  const holds =
    read.getUTCMonth() === month - 1 && read.getUTCDate() === day && hour < 24 && minute < 60 && second < 60;
  if (!holds || year < 1900) return null;
  const dayMs = 86_400_000;
  const offsets = [offsetMs(asUtc - dayMs, timeZone), offsetMs(asUtc + dayMs, timeZone)];
  const fitting = offsets.filter((offset) => offsetMs(asUtc - offset, timeZone) === offset);
  const offset = fitting.length > 0 ? Math.max(...fitting) : (offsets[0] ?? 0);
  return new Date(asUtc - offset);
}

/** An instant as a time field holds it, in a zone: "2031-04-05T06:07". */
export function siteTimeField(moment: Date, timeZone: string): string {
  return formatDateTime(moment, timeZone).replace(' ', 'T');
}

/** How far the zone's wall clock is ahead of UTC at an instant. */
function offsetMs(at: number, timeZone: string): number {
  const parts = new Intl.DateTimeFormat('en-US', {
    timeZone,
    hourCycle: 'h23',
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: 'numeric',
    minute: 'numeric',
    second: 'numeric',
  }).formatToParts(at);
  const part = (type: string) => Number(parts.find((one) => one.type === type)?.value ?? 0);
  const wall = Date.UTC(
    part('year'),
    part('month') - 1,
    part('day'),
    part('hour'),
    part('minute'),
    part('second'),
  );
  return wall - Math.floor(at / 1000) * 1000;
}
