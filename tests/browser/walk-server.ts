import { execFile, spawn, type ChildProcess } from 'node:child_process';
import { mkdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { promisify } from 'node:util';
import { freePort } from '../support/free-port';
import type { WalkLine } from './walk-line';

const root = path.resolve(import.meta.dirname, '../..');
const data = path.join(root, '.results/walk-data');

/** The built app on a database of its own, without the demonstration line: what the walk changes troubles no other test. */
export interface WalkServer {
  origin: string;
  line: WalkLine;
  stop(): Promise<void>;
}

export async function startWalkServer(): Promise<WalkServer> {
  rmSync(data, { recursive: true, force: true });
  mkdirSync(data, { recursive: true });
  const port = await freePort();
  const env = {
    ...process.env,
    PORT: String(port),
    EVENOHM_DATA: data,
    EVENOHM_DEMO: 'off',
    DATABASE_URL: '',
    EVENOHM_URL: '',
  };
  const server = spawn(process.execPath, ['lib/command/evenohm.js', 'serve'], { cwd: root, env });
  await untilServing(server);
  const words = ['--import', 'tsx', 'tests/browser/walk-line.ts'];
  const made = await promisify(execFile)(process.execPath, words, { cwd: root, env });
  return {
    origin: `http://127.0.0.1:${port}`,
    line: JSON.parse(made.stdout) as WalkLine,
    stop: async () => {
      const ended = new Promise((resolve) => server.once('close', resolve));
      server.kill('SIGTERM');
      await ended;
    },
  };
}

function untilServing(server: ChildProcess): Promise<void> {
  return new Promise((resolve, reject) => {
    let said = '';
    const hear = (part: unknown) => {
      said += String(part);
      if (said.includes('Evenohm is at ')) resolve();
    };
    server.stdout?.on('data', hear);
    server.stderr?.on('data', hear);
    server.once('close', () => reject(new Error(`The server ended:\n${said}`)));
  });
}
