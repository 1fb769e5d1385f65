import { basename } from 'node:path';
import { commandActor } from '@/lib/access/local-actor';
import { fileBytes } from '@/lib/maps/file-bytes';
import { intakeFile } from '@/lib/maps/intake-file';
import type { SentOptions } from '@/lib/maps/schema';
import type { IntakeResult } from '@/lib/maps/types';

/** Records files in the database that is open, and says every second how far it is. */
export function intakeHere(options: SentOptions, say: (text: string) => void) {
  return (path: string): Promise<IntakeResult> => {
    let toldAt = Date.now();
    const onProgress = (count: number) => {
      if (Date.now() - toldAt < 1000) return;
      toldAt = Date.now();
      say(`${basename(path)}: ${count} measurements so far.`);
    };
    const open = () => fileBytes(path);
    return intakeFile(
      commandActor(),
      { name: basename(path), open },
      { origin: 'command', ...options, onProgress },
    );
  };
}
