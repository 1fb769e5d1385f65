import { execFileSync } from 'node:child_process';
import { readFileSync, realpathSync, renameSync, rmSync } from 'node:fs';
import path from 'node:path';

/** A server process that runs on a database folder. */
export interface Postmaster {
  pid: number;
  port: number;
}

/**
 * The server that runs on this folder, or null. PostgreSQL writes `postmaster.pid` (line 1 the process, line 4 the
 * port; PostgreSQL documentation, "Database File Layout"); after a crash the file stays, and its number may by now
 * belong to another program, so the process is asked what it is.
 */
export function findPostmaster(clusterFolder: string): Postmaster | null {
  const lines = pidFileLines(clusterFolder);
  const pid = Number(lines?.[0]);
  const port = Number(lines?.[3]);
  if (!Number.isInteger(pid) || pid <= 0 || !Number.isInteger(port) || port <= 0) return null;
  return isServerOf(pid, clusterFolder) ? { pid, port } : null;
}

/**
 * Removes a pid file that a killed server left behind and whose number now belongs to another program: PostgreSQL
 * would take that program for a server and refuse to start. A file that changed meanwhile is put back.
 */
export function removeStalePidFile(clusterFolder: string): void {
  const pid = Number(pidFileLines(clusterFolder)?.[0]);
  if (!Number.isInteger(pid) || pid <= 0 || isServerOf(pid, clusterFolder)) return;
  const file = path.join(clusterFolder, 'postmaster.pid');
  const aside = `${file}.${process.pid}`;
  try {
    renameSync(file, aside);
    if (Number(readFileSync(aside, 'utf8').split('\n')[0]) === pid) rmSync(aside);
    else renameSync(aside, file);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ENOENT') throw error;
  }
}

/** Whether the process is alive (a zombie, which awaits only its parent, is not). */
export function isAlive(pid: number): boolean {
  return commandLine(pid) !== '';
}

function isServerOf(pid: number, clusterFolder: string): boolean {
  const command = commandLine(pid);
  return command.includes('postgres') && command.includes(realpathSync(clusterFolder));
}

function pidFileLines(clusterFolder: string): string[] | null {
  try {
    return readFileSync(path.join(clusterFolder, 'postmaster.pid'), 'utf8').split('\n');
  } catch {
    return null;
  }
}

function commandLine(pid: number): string {
  try {
    if (process.platform === 'linux') {
      return readFileSync(`/proc/${pid}/cmdline`, 'utf8').replaceAll('\0', ' ');
    }
    return execFileSync('ps', ['-ww', '-p', String(pid), '-o', 'command='], { stdio: 'pipe' }).toString();
  } catch {
    return '';
  }
}
