import { csvPieces } from '@/lib/maps/csv-rows';
import { rawMaps, type RawMap } from '@/lib/maps/raw-maps';
import type { MapHeader } from '@/lib/maps/map-columns';
import { UnreadableFile, type PlacedFault } from '@/lib/maps/unreadable-file';

export interface ReadFile {
  header: MapHeader | null;
  maps: RawMap[];
  /** Why the file as a whole cannot be read; null where it can. */
  faults: readonly PlacedFault[] | null;
}

/** What reading a file makes of it, given its bytes in these chunks. */
export async function readFile(chunks: Iterable<Uint8Array>): Promise<ReadFile> {
  const read: ReadFile = { header: null, maps: [], faults: null };
  try {
    for await (const parts of rawMaps(csvPieces(chunks))) {
      for (const part of parts) {
        if (part.kind === 'header') read.header = part.header;
        else read.maps.push(part.map);
      }
    }
  } catch (error) {
    if (!(error instanceof UnreadableFile)) throw error;
    read.faults = error.faults;
  }
  return read;
}

export const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);

export const readText = (text: string) => readFile([bytesOf(text)]);

/** Bytes in chunks cut at these places. */
export function chunked(bytes: Uint8Array, cuts: readonly number[]): Uint8Array[] {
  const places = [...new Set([0, ...cuts.map((cut) => cut % (bytes.length + 1)), bytes.length])];
  places.sort((a, b) => a - b);
  return places.slice(1).map((place, i) => bytes.subarray(places[i], place));
}
