import { spawn } from 'node:child_process';
import path from 'node:path';
import { expect, it } from 'vitest';

const program = path.resolve(import.meta.dirname, '../../../lib/command/evenohm.js');

/** Talks on and on once the program listens for writes that fail, or has had processor time enough to do so. */
const TALKS = `setInterval(() => {
  const { user, system } = process.cpuUsage();
  if (process.stdout.listenerCount('error') > 0 || user + system > 600_000) process.stdout.write('still here');
}, 5)`;

it('ends as if it had been read where nobody reads any more', { timeout: 60_000 }, async () => {
  const words = ['--import', `data:text/javascript,${TALKS}`, program, 'expect'];
  const child = spawn(process.execPath, [...words, '--dopant', 'boron', '--density', '1e15']);
  child.stdout.destroy();
  child.stderr.destroy();
  const status = await new Promise((resolve) =>
    child.once('exit', (code, signal) => resolve(signal ?? code)),
  );
  expect(status).toBe(0);
});
