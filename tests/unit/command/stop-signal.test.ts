import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { pathToFileURL } from 'node:url';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { expect, test } from 'vitest';

const FILE = pathToFileURL(path.resolve('lib/command/stop-signal.ts')).href;
/** Takes two seconds to stop in order, and then ends with 0. */
const PROGRAM = `
  const { stopSignal } = await import('${FILE}');
  const hold = setInterval(() => {}, 1000);
  stopSignal().addEventListener('abort', () => setTimeout(() => clearInterval(hold), 2000));
  console.log('ready');`;

/** How a program ends that gets two signals so far apart. */
async function endOf(apartMs: number): Promise<number | null> {
  const child = spawn(process.execPath, ['--import', 'tsx', '--input-type=module', '-e', PROGRAM], {
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const ended = once(child, 'exit');
  await once(child.stdout, 'data');
  child.kill('SIGINT');
  await pause(apartMs);
  child.kill('SIGINT');
  const [code] = (await ended) as [number | null];
  return code;
}

test('one press of Ctrl-C, which npm sends on, stops in order; a second press ends at once', async () => {
  expect(await Promise.all([endOf(20), endOf(1000)])).toEqual([0, 130]);
}, 30_000);
