import type { Actor } from '@/lib/access/actor';
import { checkFile, SpoiltFile, type FileCheck, type FileSource } from './file-check';
import type { RawMap } from './raw-maps';
import { withSmallMemory } from './small-memory';

export interface CheckedFile extends Omit<FileCheck, 'kept' | 'keptTo'> {
  /** The file as a whole cannot be taken; `problems` say why. */
  spoilt: boolean;
  /** Measurements that are new and can be recorded. */
  fresh: number;
}

/** What checking a file found, a file that cannot be read among it: for a person to look at before recording. */
export async function checkedFile(
  actor: Actor,
  file: FileSource,
  words: RawMap['words'],
): Promise<CheckedFile> {
  try {
    const check = await withSmallMemory(() => checkFile(actor, file, words, 'show'));
    const { measurements, faulty, repeated, problems, problemCount, previews, notices } = check;
    const fresh = Math.max(0, measurements - faulty.size - repeated);
    return {
      ...{ measurements, faulty, repeated, problems, problemCount, previews, notices },
      spoilt: false,
      fresh,
    };
  } catch (error) {
    if (!(error instanceof SpoiltFile)) throw error;
    return {
      measurements: 0,
      faulty: new Set(),
      repeated: 0,
      problems: error.problems,
      problemCount: error.problems.length,
      previews: [],
      notices: [],
      spoilt: true,
      fresh: 0,
    };
  }
}
