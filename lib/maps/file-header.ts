import type { Actor } from '@/lib/access/actor';
import { csvRows, UnreadableFile } from './csv-rows';
import type { FileSource } from './file-check';
import { mapHeader, type MapHeader } from './map-columns';

/** The header of a wafer-map file, read without the rest of it; null where it cannot serve, which checking explains. */
export async function findFileHeader(_actor: Actor, file: FileSource): Promise<MapHeader | null> {
  try {
    for await (const { rows } of csvRows(file.open())) {
      const header = mapHeader(rows[0] ?? []);
      return 'faults' in header ? null : header;
    }
  } catch (error) {
    if (!(error instanceof UnreadableFile)) throw error;
  }
  return null;
}
