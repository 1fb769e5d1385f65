import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';

/** What a running server leaves in its data folder, for the one who starts a second. */
interface ServingNote {
  pid: number;
  address: string;
}

export function writeServingNote(dataFolder: string, note: ServingNote): void {
  mkdirSync(dataFolder, { recursive: true });
  writeFileSync(noteFile(dataFolder), JSON.stringify(note));
}

export function removeServingNote(dataFolder: string): void {
  rmSync(noteFile(dataFolder), { force: true });
}

/** One line on the server that holds the data folder. The lock says that there is one; the note only says where. */
export function alreadyRunning(dataFolder: string): string {
  try {
    const { pid, address } = JSON.parse(readFileSync(noteFile(dataFolder), 'utf8')) as ServingNote;
    return `Evenohm is already running on ${dataFolder} (process ${pid}), at ${address}`;
  } catch {
    return `Evenohm is already running on ${dataFolder}.`;
  }
}

function noteFile(dataFolder: string): string {
  return path.join(dataFolder, 'serving.json');
}
