import type { Actor } from '@/lib/access/actor';
import { csvPieces } from './csv-rows';
import type { FileSource } from './file-check';
import type { MapHeader } from './map-columns';
import { rawMaps } from './raw-maps';
import { UnreadableFile } from './unreadable-file';

/** The header of a wafer-map file, read without the rest of it; null where it cannot serve, which checking explains. */
export async function findFileHeader(_actor: Actor, file: FileSource): Promise<MapHeader | null> {
  try {
    for await (const parts of rawMaps(csvPieces(file.open()))) {
      for (const part of parts) if (part.kind === 'header') return part.header;
    }
  } catch (error) {
    if (!(error instanceof UnreadableFile)) throw error;
  }
  return null;
}
