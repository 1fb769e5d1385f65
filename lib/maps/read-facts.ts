import { detached } from './detached';
import type { RawMap } from './raw-maps';
import { CORRECTIONS, type MeasurementFacts } from './types';
import type { WaferColumn } from './map-columns';
import { readNumber } from './read-number';

export type WordFault = { column: WaferColumn; reason: string };

/** A time that names its offset from UTC: ISO 8601, `2031-04-05T06:07:08+02:00` or with Z. */
const WITH_OFFSET = /^\d{4}-\d{2}-\d{2}[T ]\d{2}:\d{2}(:\d{2}(\.\d{1,6})?)?(Z|[+-]\d{2}:?\d{2})$/;
const WITHOUT_OFFSET = /^\d{4}-\d{2}-\d{2}([T ]\d{2}:\d{2}(:\d{2}(\.\d+)?)?)?$/;

/** Nobody probed silicon before; a database knows no year 0. */
const EARLIEST = Date.UTC(1950, 0, 1);
/** Names are keys of the database's indexes, which hold no long texts. */
const LONGEST_NAME = 200;
const LONGEST_NOTE = 2000;

/**
 * What the columns of a wafer say of it, as values. `defaults` stand in where the file has no column or an empty cell.
 */
export function readFacts(
  words: RawMap['words'],
  defaults: RawMap['words'],
): { facts: MeasurementFacts; diameterMm: number | null; faults: WordFault[] } {
  const faults: WordFault[] = [];
  const word = (column: WaferColumn): string | null => {
    const text = detached(words[column] || defaults[column] || '');
    const most = column === 'note' ? LONGEST_NOTE : LONGEST_NAME;
    if (text.length > most) faults.push({ column, reason: `this is longer than ${most} characters` });
    return text.slice(0, most) || null;
  };
  const time = (column: 'measured_at' | 'processed_at'): Date | null => {
    const text = word(column);
    if (text === null) return null;
    if (WITHOUT_OFFSET.test(text)) {
      faults.push({
        column,
        reason: `"${text}" has no offset from UTC: write it as ${text.replace(' ', 'T')}+00:00 or with Z`,
      });
      return null;
    }
    const date = WITH_OFFSET.test(text) && isDay(text) ? new Date(text.replace(' ', 'T')) : new Date(NaN);
    if (date.getTime() >= EARLIEST) return date;
    const reason = Number.isNaN(date.getTime())
      ? `"${text.slice(0, 40)}" is not a time such as 2031-04-05T06:07:08+00:00`
      : 'this time lies before 1950';
    faults.push({ column, reason });
    return null;
  };
  const number = (column: WaferColumn, wish: string, holds: (value: number) => boolean): number | null => {
    const text = word(column);
    if (text === null) return null;
    const value = readNumber(text);
    if (value !== null && !Number.isNaN(value) && holds(value)) return value;
    faults.push({ column, reason: `"${text.slice(0, 40)}" is not ${wish}` });
    return null;
  };
  const wafer = word('wafer');
  if (wafer === null) faults.push({ column: 'wafer', reason: 'the wafer has no name' });
  const measuredAt = time('measured_at');
  if (measuredAt === null && !faults.some((fault) => fault.column === 'measured_at')) {
    faults.push({ column: 'measured_at', reason: 'the time of measurement is missing' });
  }
  const processedAt = time('processed_at');
  const stage = word('stage');
  if (stage !== null && stage !== 'pre' && stage !== 'post') {
    faults.push({ column: 'stage', reason: `"${stage.slice(0, 40)}" is neither pre nor post` });
  }
  const positive = (value: number) => value > 0;
  const facts: MeasurementFacts = {
    lot: word('lot'),
    run: word('run'),
    wafer: wafer ?? '',
    slot: number('slot', 'a whole number of 0 or more', (v) => Number.isInteger(v) && v >= 0 && v < 2 ** 31),
    measuredAt: measuredAt ?? new Date(0),
    processedAt: processedAt ?? measuredAt ?? new Date(0),
    stage: stage === 'pre' || stage === 'post' ? stage : null,
    tool: word('tool'),
    chamber: word('chamber'),
    recipe: word('recipe'),
    gauge: word('gauge'),
    operator: word('operator'),
    temperatureC: number(
      'temperature_c',
      'a temperature in °C between −50 and 200',
      (v) => v > -50 && v < 200,
    ),
    thicknessUm: number('thickness_um', 'a thickness above 0', positive),
    ingotFraction: number('ingot_fraction', 'a share from 0 to below 1', (v) => v >= 0 && v < 1),
    correctionsApplied: corrections(word('corrections_applied'), faults),
    note: word('note'),
  };
  return { facts, diameterMm: number('diameter_mm', 'a diameter above 0', positive), faults };
}

/** Whether the day of a time is one of its month: a `Date` takes 30 February for 2 March. */
function isDay(text: string): boolean {
  if (Number(text.slice(8, 10)) <= 28) return true;
  const [year = 0, month = 0, day = 0] = text.slice(0, 10).split('-').map(Number);
  return day <= new Date(Date.UTC(year, month, 0)).getUTCDate();
}

/** Without a word of its own a resistivity or sheet resistance has had every correction. */
function corrections(text: string | null, faults: WordFault[]): string[] {
  if (text === null) return [...CORRECTIONS];
  const given = text.split(/[\s;,+]+/).filter((word) => word !== '');
  if (given.length === 1 && given[0] === 'none') return [];
  const unknown = given.find((word) => !CORRECTIONS.some((known) => known === word));
  if (unknown !== undefined) {
    faults.push({
      column: 'corrections_applied',
      reason: `"${unknown}" is none of ${CORRECTIONS.join(', ')} or none`,
    });
  }
  return CORRECTIONS.filter((known) => given.includes(known));
}
