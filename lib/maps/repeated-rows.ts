import { detached } from './detached';
import type { MapHeader } from './map-columns';
import { plainNumber } from './plain-number';
import type { RawMap } from './raw-maps';

/** What the rows of one wafer share to the letter: all before and all behind their place and value. */
export interface RowFrame {
  prefix: string;
  suffix: string;
}

/** Where place and value stand within their three neighbouring cells, and what the places of a file look like. */
export interface RowCore {
  first: number;
  x: number;
  y: number;
  value: number;
  /** The two cells before the value as the last wafer had them in this row: most files repeat one site plan. */
  known: { text: string; numbers: readonly [number, number] }[];
}

/** The core of a file's rows; null where place and value are not neighbours, the value last. */
export function rowCore({ x, y, value }: MapHeader): RowCore | null {
  const first = Math.min(x, y);
  return Math.abs(x - y) === 1 && value === first + 2
    ? { first, x: x - first, y: y - first, value: 2, known: [] }
    : null;
}

/** The frame of rows that begin with these cells; null where the cells do not stand in the text as they are. */
export function rowFrame(core: RowCore, cells: readonly string[]): RowFrame | null {
  if (cells.some((cell) => /[",\n]/.test(cell))) return null;
  const before = cells.slice(0, core.first);
  const behind = cells.slice(core.first + 3);
  return {
    prefix: before.map((cell) => `${cell},`).join(''),
    suffix: behind.map((cell) => `,${cell}`).join(''),
  };
}

const COMMA = 44;

/**
 * Reads rows of text without quotes as long as they repeat the wafer's words to the letter and hold three plain
 * numbers: nearly every row of a long file. Returns where the first other row begins, and how many rows it took.
 */
export function repeatedRows(
  text: string,
  from: number,
  line: number,
  frame: RowFrame,
  core: RowCore,
  map: RawMap,
): { position: number; rows: number } {
  let position = from;
  let rows = 0;
  const cells = new Float64Array(3);
  while (position < text.length && text.startsWith(frame.prefix, position)) {
    const start = position + frame.prefix.length;
    const known = core.known[map.values.length];
    let end: number;
    if (known !== undefined && text.startsWith(known.text, start)) {
      [cells[0], cells[1]] = known.numbers;
      end = start + known.text.length;
    } else {
      end = plainNumber(text, start, cells, 0);
      if (end === -1 || text.charCodeAt(end) !== COMMA) break;
      end = plainNumber(text, end + 1, cells, 1);
      if (end === -1 || text.charCodeAt(end) !== COMMA) break;
      end += 1;
      const numbers = [cells[0] as number, cells[1] as number] as const;
      core.known[map.values.length] = { text: detached(text.slice(start, end)), numbers };
    }
    end = plainNumber(text, end, cells, 2);
    if (end === -1 || !text.startsWith(frame.suffix, end)) break;
    end += frame.suffix.length;
    if (text.charCodeAt(end) === 13) end += 1;
    if (end < text.length && text.charCodeAt(end) !== 10) break;
    map.xMm.push(cells[core.x] as number);
    map.yMm.push(cells[core.y] as number);
    map.values.push(cells[core.value] as number);
    map.lines.push(line + rows);
    rows += 1;
    position = end + 1;
  }
  return { position: Math.min(position, text.length), rows };
}
