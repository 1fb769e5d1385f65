/** A day as an axis says it, in the site's time zone: "29 Nov". */
export function formatShortDay(moment: Date, timeZone: string): string {
  return new Intl.DateTimeFormat('en-GB', { timeZone, day: 'numeric', month: 'short' }).format(moment);
}
