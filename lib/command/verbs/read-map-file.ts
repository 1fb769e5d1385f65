import { csvPieces } from '@/lib/maps/csv-rows';
import type { MapHeader } from '@/lib/maps/map-columns';
import { IDENTITY_COLUMNS, rawMaps, type RawMap } from '@/lib/maps/raw-maps';
import { readNumber } from '@/lib/maps/read-number';
import { UnreadableFile, type PlacedFault } from '@/lib/maps/unreadable-file';
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
const MOST_REFUSALS = 1000;

/**
 * Reads the wafers of a wafer-map file for measuring without a database: places, readings, diameter, and the columns
 * that tell wafers apart where the file has them; what else it says of a wafer is passed over. An empty value cell is
 * a reading that was not taken; `NaN` and `Inf` are readings that are no number. Every fault comes with line and column.
 */
export async function readMapFile(
  file: string,
  bytes: Iterable<Uint8Array> | AsyncIterable<Uint8Array>,
): Promise<{ wafers: WaferRows[]; refusals: Refusal[] }> {
  const wafers = new Map<string, WaferRows>();
  const refusals: Refusal[] = [];
  let header: MapHeader | null = null;
  const refuse = ({ line, column, reason }: PlacedFault) => {
    const refusal = { file, line: line ?? 1, column: columnNumber(header, column), reason };
    if (refusals.length < MOST_REFUSALS) refusals.push(refusal);
  };
  try {
    for await (const parts of rawMaps(csvPieces(bytes))) {
      for (const part of parts) {
        if (part.kind === 'header') header = part.header;
        else addMap(wafers, header as unknown as MapHeader, part.map, refuse);
      }
    }
    if (wafers.size === 0) refuse({ line: 1, column: null, reason: 'a header, but no readings' });
  } catch (error) {
    if (!(error instanceof UnreadableFile)) throw error;
    error.faults.forEach(refuse);
  }
  return { wafers: [...wafers.values()], refusals };
}

/** Adds rows that follow each other to their wafer; those of one wafer may stand apart. */
function addMap(
  wafers: Map<string, WaferRows>,
  header: MapHeader,
  map: RawMap,
  refuse: (fault: PlacedFault) => void,
): void {
  const ours: (string | null)[] = ['x_mm', 'y_mm', header.valueColumn, 'diameter_mm', null];
  for (const fault of map.faults) if (ours.includes(fault.column)) refuse(fault);
  const diameterMm = readNumber(map.words.diameter_mm ?? '');
  const spoilt = (reason: string) => refuse({ line: map.firstLine, column: 'diameter_mm', reason });
  if (diameterMm !== null && !(diameterMm > 0)) spoilt('the diameter is no number above 0');
  const key = JSON.stringify(IDENTITY_COLUMNS.map((column) => map.words[column]));
  const wafer = wafers.get(key) ?? {
    wafer: map.words.wafer || null,
    unit: VALUE_UNITS[header.valueColumn],
    diameterMm,
    sites: [],
    values: [],
    lines: [],
  };
  if (diameterMm !== wafer.diameterMm) spoilt('one wafer with two diameters');
  wafers.set(key, wafer);
  map.values.forEach((value, i) => {
    wafer.sites.push({ xMm: map.xMm[i] ?? NaN, yMm: map.yMm[i] ?? NaN });
    wafer.values.push(value);
    wafer.lines.push(map.lines[i] ?? map.firstLine);
  });
}

/** Where a column stands, counted from 1; the first for a fault of a whole row. */
function columnNumber(header: MapHeader | null, column: string | null): number {
  if (header === null || column === null) return 1;
  const places: Record<string, number> = {
    x_mm: header.x,
    y_mm: header.y,
    [header.valueColumn]: header.value,
  };
  return 1 + (places[column] ?? header.wafer.find((one) => one.column === column)?.index ?? 0);
}
