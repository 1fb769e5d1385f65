import type { CsvRows } from './csv-rows';
import { UnreadableFile } from './csv-rows';
import { mapHeader, type MapHeader, type WaferColumn } from './map-columns';

/** The rows of one measurement as they stand in the file: places and values as numbers, the rest still as words. */
export interface RawMap {
  firstLine: number;
  /** What the wafer's columns say; columns the file lacks are not there, empty cells are empty. */
  words: Partial<Record<WaferColumn, string>>;
  xMm: number[];
  yMm: number[];
  /** NaN for a reading that is no finite number; null for an empty cell. */
  values: (number | null)[];
  lines: number[];
  faults: { line: number; column: string | null; reason: string }[];
}

/** What a reader of a file yields: its header once, then each measurement, whole. */
export type MapPart =
  | { kind: 'header'; header: MapHeader }
  | { kind: 'faults'; faults: { line: number; column: string | null; reason: string }[] }
  | { kind: 'map'; map: RawMap };

const IDENTITY: readonly WaferColumn[] = ['stream', 'lot', 'run', 'wafer', 'measured_at'];
const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;
const NOT_FINITE = /^[+-]?(nan|inf|infinity)$/i;

/** Cells of one wafer that disagree are told once per column, and no more than this many faults per wafer are kept. */
const MOST_FAULTS = 20;

/**
 * Gathers the rows of a wafer-map file into measurements: rows that follow each other and name the same stream, lot,
 * run, wafer and time of measurement. Holds one measurement at a time.
 */
export async function* rawMaps(batches: AsyncIterable<CsvRows>): AsyncGenerator<MapPart[]> {
  let header: MapHeader | null = null;
  let current: { map: RawMap; cells: string[] } | null = null;
  for await (const { rows, lines } of batches) {
    const parts: MapPart[] = [];
    let index = 0;
    if (header === null) {
      const found = mapHeader(rows[0] as string[]);
      const line = lines[0] as number;
      if ('faults' in found) {
        yield [{ kind: 'faults', faults: found.faults.map((fault) => ({ line, ...fault })) }];
        return;
      }
      header = found;
      parts.push({ kind: 'header', header });
      index = 1;
    }
    for (; index < rows.length; index += 1) {
      const row = rows[index] as string[];
      const line = lines[index] as number;
      if (current === null || !sameIdentity(header, current.cells, row)) {
        if (current !== null) parts.push({ kind: 'map', map: current.map });
        current = { map: begun(header, row, line), cells: row };
      }
      addRow(header, current.map, current.cells, row, line);
    }
    yield parts;
  }
  if (header === null) throw new UnreadableFile('the file is empty');
  yield current === null ? [] : [{ kind: 'map', map: current.map }];
}

function sameIdentity(header: MapHeader, first: readonly string[], row: readonly string[]): boolean {
  for (const { column, index } of header.wafer) {
    if (first[index] !== row[index] && IDENTITY.includes(column)) return false;
  }
  return true;
}

function begun(header: MapHeader, row: readonly string[], line: number): RawMap {
  const words: RawMap['words'] = {};
  for (const { column, index } of header.wafer) words[column] = (row[index] ?? '').trim();
  return { firstLine: line, words, xMm: [], yMm: [], values: [], lines: [], faults: [] };
}

function addRow(
  header: MapHeader,
  map: RawMap,
  first: readonly string[],
  row: readonly string[],
  line: number,
): void {
  const fault = (column: string | null, reason: string) => {
    if (map.faults.length < MOST_FAULTS) map.faults.push({ line, column, reason });
  };
  if (row.length !== header.width) {
    fault(null, `this row has ${row.length} cells, the header ${header.width}`);
    return;
  }
  if (row !== first) {
    for (const { column, index } of header.wafer) {
      if (row[index] === first[index] || row[index]?.trim() === first[index]?.trim()) continue;
      const known = map.faults.some((other) => other.column === column);
      if (!known) fault(column, `"${row[index]}" here, but "${first[index]}" on the wafer's first row`);
    }
  }
  const x = number(row[header.x] as string);
  const y = number(row[header.y] as string);
  if (x === null || !Number.isFinite(x)) fault('x_mm', notANumber(row[header.x]));
  if (y === null || !Number.isFinite(y)) fault('y_mm', notANumber(row[header.y]));
  const cell = row[header.value] as string;
  const value = number(cell);
  if (value !== null && Number.isNaN(value) && !NOT_FINITE.test(cell.trim()))
    fault(header.valueColumn, notANumber(cell));
  map.xMm.push(x ?? NaN);
  map.yMm.push(y ?? NaN);
  map.values.push(value);
  map.lines.push(line);
}

/** A cell as a number; null when it is empty, NaN when it is no finite number. */
function number(cell: string): number | null {
  if (NUMBER.test(cell)) return finite(Number(cell));
  const trimmed = cell.trim();
  if (trimmed === '') return null;
  return NUMBER.test(trimmed) ? finite(Number(trimmed)) : NaN;
}

function finite(value: number): number {
  return Number.isFinite(value) ? value : NaN;
}

function notANumber(cell: string | undefined): string {
  return cell === undefined || cell.trim() === ''
    ? 'a number is missing'
    : `"${cell.trim().slice(0, 40)}" is not a number`;
}
