import Papa from 'papaparse';
import type { Site } from '@/lib/wafer/site';

/** Why a file is refused, with the place. Lines and columns count from 1. */
export interface Refusal {
  file: string;
  line: number;
  column: number;
  reason: string;
}

/** The readings of one wafer as they stand in the file. */
export interface WaferRows {
  wafer: string | null;
  unit: 'Ω·cm' | 'Ω/□';
  diameterMm: number | null;
  sites: Site[];
  values: (number | null)[];
  /** The file's line of each reading. */
  lines: number[];
}

const VALUE_UNITS = { resistivity_ohm_cm: 'Ω·cm', sheet_resistance_ohm_sq: 'Ω/□' } as const;
const IDENTITY = ['stream', 'lot', 'run', 'wafer', 'measured_at'];
const MOST_REFUSALS = 1000;

/**
 * Reads a wafer-map file of `x_mm, y_mm` and one value column, with `diameter_mm` and the columns
 * that tell wafers apart where it has them. An empty value cell is a reading that was not taken;
 * `NaN` and `Inf` are readings that are no number. Every fault is listed with line and column.
 */
export function readMapFile(file: string, bytes: Uint8Array): { wafers: WaferRows[]; refusals: Refusal[] } {
  const refusals: Refusal[] = [];
  const refuse = (line: number, column: number, reason: string) => {
    if (refusals.length < MOST_REFUSALS) refusals.push({ file, line, column, reason });
  };
  let text = '';
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    refuse(1, 1, 'not a text file in UTF-8');
    return { wafers: [], refusals };
  }
  if (text.includes('\0')) refuse(1, 1, 'not a text file');
  else if (text.trim() === '') refuse(1, 1, 'the file is empty');
  if (refusals.length > 0) return { wafers: [], refusals };

  const [header = [], ...rows] = Papa.parse<string[]>(text, { delimiter: ',' }).data;
  const column = new Map(header.map((name, i) => [name.trim(), i] as const));
  const valueColumns = header
    .map((name) => name.trim())
    .filter((name): name is keyof typeof VALUE_UNITS => name in VALUE_UNITS);
  for (const name of ['x_mm', 'y_mm']) {
    if (!column.has(name)) refuse(1, 1, `the header has no column ${name}`);
  }
  if (valueColumns.length !== 1) {
    refuse(
      1,
      1,
      valueColumns.length === 0
        ? 'the header has no column resistivity_ohm_cm or sheet_resistance_ohm_sq'
        : `the columns ${valueColumns.join(' and ')} contradict each other: keep one`,
    );
  }
  const [valueColumn] = valueColumns;
  if (refusals.length > 0 || valueColumn === undefined) return { wafers: [], refusals };

  const wafers = new Map<string, WaferRows>();
  let line = 1 + newlines(header);
  for (const row of rows) {
    const at = line + 1;
    line = at + newlines(row);
    if (row.length === 1 && row[0]!.trim() === '') continue;
    if (row.length !== header.length) {
      refuse(at, 1, `${row.length} cells where the header has ${header.length}`);
      continue;
    }
    const cell = (name: string) => row[column.get(name) ?? -1]?.trim() ?? '';
    const number = (name: string, isReading: boolean): number | null => {
      const word = cell(name);
      if (isReading && word === '') return null;
      if (isReading && /^[+-]?(nan|inf|infinity)$/i.test(word)) return NaN;
      const value = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(word) ? Number(word) : NaN;
      if (!Number.isFinite(value)) {
        refuse(at, (column.get(name) ?? 0) + 1, `${name} is not a number: "${word.slice(0, 40)}"`);
      }
      return value;
    };
    const xMm = number('x_mm', false);
    const yMm = number('y_mm', false);
    const value = number(valueColumn, true);
    const diameterMm = cell('diameter_mm') === '' ? null : number('diameter_mm', false);
    const key = JSON.stringify(IDENTITY.map(cell));
    let wafer = wafers.get(key);
    if (wafer === undefined) {
      wafer = {
        wafer: cell('wafer') || null,
        unit: VALUE_UNITS[valueColumn],
        diameterMm,
        sites: [],
        values: [],
        lines: [],
      };
      wafers.set(key, wafer);
    }
    if (diameterMm !== wafer.diameterMm) {
      refuse(at, (column.get('diameter_mm') ?? 0) + 1, 'one wafer with two diameters');
    }
    wafer.sites.push({ xMm: xMm ?? NaN, yMm: yMm ?? NaN });
    wafer.values.push(value);
    wafer.lines.push(at);
  }
  if (wafers.size === 0 && refusals.length === 0) refuse(1, 1, 'a header, but no readings');
  return { wafers: [...wafers.values()], refusals };
}

function newlines(cells: readonly string[]): number {
  return cells.reduce((sum, cell) => sum + (cell.split('\n').length - 1), 0);
}
