import type { RawMap } from './raw-maps';
import { CORRECTIONS, type MeasurementFacts } from './types';
import type { WaferColumn } from './map-columns';

export type WordFault = { column: WaferColumn; reason: string };

/** A time that names its offset from UTC: ISO 8601, `2031-04-05T06:07:08+02:00` or with Z. */
const WITH_OFFSET = /^\d{4}-\d{2}-\d{2}[T ]\d{2}:\d{2}(:\d{2}(\.\d{1,6})?)?(Z|[+-]\d{2}:?\d{2})$/;
const WITHOUT_OFFSET = /^\d{4}-\d{2}-\d{2}([T ]\d{2}:\d{2}(:\d{2}(\.\d+)?)?)?$/;
const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;

/**
 * What the columns of a wafer say of it, as values. `defaults` stand in where the file has no column or an empty cell.
 */
export function readFacts(
  words: RawMap['words'],
  defaults: RawMap['words'],
): { facts: MeasurementFacts; diameterMm: number | null; faults: WordFault[] } {
  const faults: WordFault[] = [];
  const word = (column: WaferColumn): string | null => detached(words[column] || defaults[column]) || null;
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
    const date = WITH_OFFSET.test(text) ? new Date(text.replace(' ', 'T')) : new Date(NaN);
    if (!Number.isNaN(date.getTime())) return date;
    faults.push({ column, reason: `"${text.slice(0, 40)}" is not a time such as 2031-04-05T06:07:08+00:00` });
    return null;
  };
  const number = (column: WaferColumn, wish: string, holds: (value: number) => boolean): number | null => {
    const text = word(column);
    if (text === null) return null;
    const value = NUMBER.test(text) ? Number(text) : NaN;
    if (Number.isFinite(value) && holds(value)) return value;
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

/** A copy of its own: a piece of a larger text would keep the whole of that text in memory. */
function detached(text: string | undefined): string {
  return text === undefined ? '' : Buffer.from(text).toString();
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
