import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { AppError } from '@/lib/errors';
import { projectRoot } from './project-root';
import { sourceKey } from './source-key';

const noteFile = path.join(projectRoot, '.next/evenohm-sources');

/** Whether the app is built from the sources that lie here now. */
export function isBuilt(): boolean {
  return existsSync(noteFile) && readFileSync(noteFile, 'utf8') === sourceKey(projectRoot);
}

/** Builds the app; the note of its sources is written last, so that a killed build is never taken for a whole one. */
export async function buildApp(signal: AbortSignal): Promise<void> {
  const key = sourceKey(projectRoot);
  rmSync(noteFile, { force: true });
  const words = [path.join(projectRoot, 'node_modules/next/dist/bin/next'), 'build'];
  const child = spawn(process.execPath, words, {
    cwd: projectRoot,
    signal,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: { ...process.env, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' },
  });
  let said = '';
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (part) => (said += String(part)));
  const status = await new Promise<number | null>((resolve, reject) => {
    child.once('error', reject);
    child.once('close', resolve);
  });
  if (status !== 0) throw new AppError('internal', `The app could not be built:\n${said.trim()}`);
  mkdirSync(path.dirname(noteFile), { recursive: true });
  writeFileSync(noteFile, key);
}
