/** What stands where a quantity is not defined for this sample. */
export const undefinedMark = '—';

const minus = '\u2212';
const noBreakSpace = '\u00a0';

/**
 * A number to so many significant digits, without exponent, with a true minus sign. Trailing zeros stay: they say
 * how far the number is known. `formatNumber(10.0449, 4)` is "10.04"; `null` is "—".
 */
export function formatNumber(value: number | null, significantDigits = 4): string {
  if (value === null || !Number.isFinite(value)) return undefinedMark;
  if (value === 0) return '0';
  const rounded = Number(value.toPrecision(significantDigits));
  const decimals = Math.max(0, significantDigits - 1 - Math.floor(Math.log10(Math.abs(rounded))));
  return withTrueMinus(rounded.toFixed(Math.min(decimals, 100)));
}

/**
 * A number cut where its standard uncertainty stops meaning anything: the uncertainty keeps two significant digits
 * and the value ends on the same decimal place (GUM, JCGM 100:2008 §7.2.6).
 * `formatWithUncertainty(10.0449, 0.023)` is "10.045 ± 0.023".
 */
export function formatWithUncertainty(value: number | null, uncertainty: number | null, unit = ''): string {
  if (value === null || !Number.isFinite(value)) return undefinedMark;
  const tail = unit === '' ? '' : noBreakSpace + unit;
  if (uncertainty === null || !Number.isFinite(uncertainty) || uncertainty <= 0) {
    return formatNumber(value) + tail;
  }
  const rounded = Number(uncertainty.toPrecision(2));
  const place = Math.floor(Math.log10(rounded)) - 1;
  const decimals = Math.min(100, Math.max(0, -place));
  const step = 10 ** Math.max(0, place);
  const cut = (x: number) => withTrueMinus((Math.round(x / step) * step).toFixed(decimals));
  const valueText = step > 1 ? cut(value) : withTrueMinus(value.toFixed(decimals));
  const uncertaintyText = step > 1 ? cut(rounded) : rounded.toFixed(decimals);
  return `${valueText} ± ${uncertaintyText}${tail}`;
}

/** A dopant density without its unit: `formatDensity(1.34e15)` is "1.34 × 10¹⁵". */
export function formatDensity(perCm3: number | null, significantDigits = 3): string {
  if (perCm3 === null || !Number.isFinite(perCm3)) return undefinedMark;
  if (perCm3 === 0) return '0';
  const [mantissa = '', exponent = '0'] = perCm3.toExponential(significantDigits - 1).split('e');
  return `${withTrueMinus(mantissa)}${noBreakSpace}×${noBreakSpace}10${superscript(Number(exponent))}`;
}

/** The same with its unit: "1.34 × 10¹⁵ cm⁻³". */
export function formatDensityPerCm3(perCm3: number | null, significantDigits = 3): string {
  const text = formatDensity(perCm3, significantDigits);
  return text === undefinedMark ? text : `${text}${noBreakSpace}cm⁻³`;
}

/** A resistivity in the unit people say: "850.0 mΩ·cm", "10.04 Ω·cm", "2.100 kΩ·cm". */
export function formatResistivity(ohmCm: number | null, significantDigits = 4): string {
  return inEngineeringUnits(ohmCm, significantDigits, 'Ω·cm');
}

/** A sheet resistance: "850.0 mΩ/□", "45.30 Ω/□", "1.200 kΩ/□". */
export function formatSheetResistance(ohmSq: number | null, significantDigits = 4): string {
  return inEngineeringUnits(ohmSq, significantDigits, 'Ω/□');
}

/** A reading in the unit of its quantity: "10.04 Ω·cm", "45.30 Ω/□". */
export function formatReading(
  quantity: 'resistivity' | 'sheet_resistance',
  value: number | null,
  significantDigits = 4,
): string {
  return quantity === 'resistivity'
    ? formatResistivity(value, significantDigits)
    : formatSheetResistance(value, significantDigits);
}

/** A whole number, thousands set apart by a narrow space from ten thousand on: "9500", "12 345". */
export function formatCount(count: number): string {
  const digits = String(Math.trunc(count));
  return digits.length < 5 ? digits : digits.replace(/\B(?=(\d{3})+$)/g, '\u202f');
}

/** A share in percent, given in percent: `formatPercent(0.8634)` is "0.86 %". */
export function formatPercent(percent: number | null, decimals = 2): string {
  if (percent === null || !Number.isFinite(percent)) return undefinedMark;
  return `${withTrueMinus(percent.toFixed(decimals))}${noBreakSpace}%`;
}

/** A difference in percent, its sign always shown: "+2.1 %", "−0.8 %"; what rounds to nothing has none, "0.0 %". */
export function formatSignedPercent(percent: number | null, decimals = 1): string {
  const text = formatPercent(percent, decimals);
  return text === undefinedMark || text.startsWith(minus) || !/[1-9]/.test(text) ? text : `+${text}`;
}

/** A day in the site's time zone, ISO 8601: "2026-03-04". */
export function formatDate(moment: Date | null, timeZone: string): string {
  return moment === null ? undefinedMark : calendarParts(moment, timeZone).day;
}

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/**
 * The day of a date, or of a minute, as an axis names it: `shortDay('2026-03-04 17:05')` is "4 Mar". It takes the text
 * because a chart names hundreds of moments, and asking for the time zone again doubles the cost.
 */
export function shortDay(isoDate: string): string {
  const month = MONTHS[Number(isoDate.slice(5, 7)) - 1];
  return month === undefined ? undefinedMark : `${Number(isoDate.slice(8, 10))}${noBreakSpace}${month}`;
}

/** A minute in the site's time zone: "2026-03-04 17:05". */
export function formatDateTime(moment: Date | null, timeZone: string): string {
  if (moment === null) return undefinedMark;
  const { day, minute } = calendarParts(moment, timeZone);
  return `${day} ${minute}`;
}

/** How long ago, in the two largest units that matter: "under 1 min", "12 min", "3 h 10 min", "2 d 4 h". */
export function formatAge(milliseconds: number | null): string {
  if (milliseconds === null || !Number.isFinite(milliseconds)) return undefinedMark;
  const minutes = Math.floor(milliseconds / 60_000);
  if (minutes < 1) return `under 1${noBreakSpace}min`;
  const hours = Math.floor(minutes / 60);
  const days = Math.floor(hours / 24);
  if (hours < 1) return amount(minutes, 'min');
  if (days < 1) return pair(amount(hours, 'h'), minutes % 60, 'min');
  return days < 10 ? pair(amount(days, 'd'), hours % 24, 'h') : amount(days, 'd');
}

/** Making a formatter takes fifty times as long as using it, and a chart names hundreds of moments. */
const dateFormats = new Map<string, Intl.DateTimeFormat>();

function dateFormat(timeZone: string): Intl.DateTimeFormat {
  let format = dateFormats.get(timeZone);
  if (format === undefined) {
    format = new Intl.DateTimeFormat('sv-SE', { timeZone, dateStyle: 'short', timeStyle: 'short' });
    dateFormats.set(timeZone, format);
  }
  return format;
}

function inEngineeringUnits(value: number | null, significantDigits: number, unit: string): string {
  if (value === null || !Number.isFinite(value)) return undefinedMark;
  const size = Math.abs(Number(value.toPrecision(significantDigits)));
  const [prefix, scale] = size === 0 ? ['', 1] : size < 1 ? ['m', 1e-3] : size < 1000 ? ['', 1] : ['k', 1e3];
  return `${formatNumber(value / scale, significantDigits)}${noBreakSpace}${prefix}${unit}`;
}

function calendarParts(moment: Date, timeZone: string): { day: string; minute: string } {
  const text = dateFormat(timeZone).format(moment);
  const [day = '', minute = ''] = text.split(' ');
  return { day, minute };
}

function amount(count: number, unit: string): string {
  return `${count}${noBreakSpace}${unit}`;
}

function pair(first: string, rest: number, unit: string): string {
  return rest === 0 ? first : `${first} ${amount(rest, unit)}`;
}

/** A minus sign instead of the hyphen, and none on a number that rounded to zero. */
function withTrueMinus(text: string): string {
  if (!text.startsWith('-')) return text;
  return /[1-9]/.test(text) ? minus + text.slice(1) : text.slice(1);
}

function superscript(exponent: number): string {
  return String(exponent).replace(/[-\d]/g, (c) => (c === '-' ? '⁻' : '⁰¹²³⁴⁵⁶⁷⁸⁹'.charAt(Number(c))));
}
