import { csvRows } from './csv-rows';
import { mapHeader, type MapHeader, type WaferColumn } from './map-columns';
import { readNumber } from './read-number';
import { repeatedRows, rowCore, rowFrame, type RowCore, type RowFrame } from './repeated-rows';
import { unreadable, UnreadableFile } from './unreadable-file';

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
export type MapPart = { kind: 'header'; header: MapHeader } | { kind: 'map'; map: RawMap };

/** What tells one measurement of a file from the next. */
export const IDENTITY_COLUMNS: readonly WaferColumn[] = ['stream', 'lot', 'run', 'wafer', 'measured_at'];
const NOT_FINITE = /^[+-]?(nan|inf|infinity)$/i;

/** Cells of one wafer that disagree are told once per column, and no more than this many faults per wafer are kept. */
const MOST_FAULTS = 20;

/** The measurement being gathered, the cells of its first row, and what its rows share. */
interface Gathering {
  map: RawMap;
  cells: readonly string[];
  frame: RowFrame | null;
}

type RowFault = RawMap['faults'][number];

/**
 * Gathers the rows of a wafer-map file into measurements: rows that follow each other and name the same stream, lot,
 * run, wafer and time of measurement. Holds one measurement at a time. `pieces` are texts of whole records.
 */
export async function* rawMaps(pieces: AsyncIterable<string>): AsyncGenerator<MapPart[]> {
  let header: MapHeader | null = null;
  let core: RowCore | null = null;
  let current: Gathering | null = null;
  // Rows whose cells do not match the header: whose they are cannot be told, so they spoil the measurements on both sides.
  let strays: RowFault[] = [];
  let line = 1;
  for await (const text of pieces) {
    const parts: MapPart[] = [];
    const take = (header: MapHeader, cells: readonly string[], at: number) => {
      if (cells.length !== header.width) {
        const reason = `this row has ${cells.length} cells, the header ${header.width}`;
        strays = addFault(strays, { line: at, column: null, reason });
        return;
      }
      const isNext = current === null || !sameIdentity(header, current.cells, cells);
      if (current !== null) for (const stray of strays) addFault(current.map.faults, stray);
      if (current === null || isNext) {
        if (current !== null) parts.push({ kind: 'map', map: current.map });
        current = { map: begun(header, cells, at, strays), cells, frame: core && rowFrame(core, cells) };
      }
      strays = [];
      addRow(header, current.map, current.cells, cells, at);
    };
    if (header !== null && core !== null && !text.includes('"')) {
      for (let position = 0; position < text.length; line += 1) {
        const going = current as Gathering | null;
        if (going !== null && going.frame !== null && strays.length === 0) {
          const taken = repeatedRows(text, position, line, going.frame, core, going.map);
          position = taken.position;
          line += taken.rows;
          if (position >= text.length) break;
        }
        const end = text.indexOf('\n', position);
        const row = text.slice(position, end === -1 ? text.length : end).replace(/\r$/, '');
        if (row.trim() !== '') take(header, row.split(','), line);
        position = end === -1 ? text.length : end + 1;
      }
    } else {
      line = csvRows(text, line, (row, at) => {
        if (header !== null) return take(header, row, at);
        const found = mapHeader(row);
        if ('faults' in found)
          throw new UnreadableFile(found.faults.map((fault) => ({ line: at, ...fault })));
        header = found;
        core = rowCore(found);
        parts.push({ kind: 'header', header: found });
      });
    }
    yield parts;
  }
  if (header === null) throw unreadable('the file is empty', 1);
  const last = current as Gathering | null;
  if (last !== null) for (const stray of strays) addFault(last.map.faults, stray);
  else if (strays.length > 0) throw new UnreadableFile(strays);
  yield last === null ? [] : [{ kind: 'map', map: last.map }];
}

function sameIdentity(header: MapHeader, first: readonly string[], row: readonly string[]): boolean {
  for (const { column, index } of header.wafer) {
    if (first[index] === row[index] || !IDENTITY_COLUMNS.includes(column)) continue;
    if (first[index]?.trim() !== row[index]?.trim()) return false;
  }
  return true;
}

function begun(header: MapHeader, row: readonly string[], line: number, strays: readonly RowFault[]): RawMap {
  const words: RawMap['words'] = {};
  for (const { column, index } of header.wafer) words[column] = (row[index] ?? '').trim();
  return { firstLine: line, words, xMm: [], yMm: [], values: [], lines: [], faults: [...strays] };
}

/** The faults with one more, as long as there is room. */
function addFault(faults: RowFault[], fault: RowFault): RowFault[] {
  if (faults.length < MOST_FAULTS) faults.push(fault);
  return faults;
}

function addRow(
  header: MapHeader,
  map: RawMap,
  first: readonly string[],
  row: readonly string[],
  line: number,
): void {
  const fault = (column: string | null, reason: string) => addFault(map.faults, { line, column, reason });
  if (row !== first) {
    for (const { column, index } of header.wafer) {
      if (row[index] === first[index] || row[index]?.trim() === first[index]?.trim()) continue;
      const known = map.faults.some((other) => other.column === column);
      if (!known) {
        const [here, there] = [row[index], first[index]].map((cell) => (cell ?? '').trim().slice(0, 40));
        fault(column, `"${here}" here, but "${there}" on the wafer's first row`);
      }
    }
  }
  const x = readNumber(row[header.x] as string);
  const y = readNumber(row[header.y] as string);
  if (x === null || !Number.isFinite(x)) fault('x_mm', notANumber(row[header.x]));
  if (y === null || !Number.isFinite(y)) fault('y_mm', notANumber(row[header.y]));
  const cell = row[header.value] as string;
  const value = readNumber(cell);
  if (value !== null && Number.isNaN(value) && !NOT_FINITE.test(cell.trim()))
    fault(header.valueColumn, notANumber(cell));
  map.xMm.push(x ?? NaN);
  map.yMm.push(y ?? NaN);
  map.values.push(value);
  map.lines.push(line);
}

function notANumber(cell: string | undefined): string {
  return cell === undefined || cell.trim() === ''
    ? 'a number is missing'
    : `"${cell.trim().slice(0, 40)}" is not a number`;
}
