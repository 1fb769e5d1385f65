import { spawn } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';

/**
 * Runs a verb of the command line in a process of its own and returns its peak resident memory in MB, as Linux keeps
 * it; null on other systems. Throws when the verb fails.
 */
export async function peakMemoryMb(
  words: readonly string[],
  environment: Record<string, string>,
): Promise<number | null> {
  const child = spawn(process.execPath, ['lib/command/evenohm.js', ...words], {
    env: { ...process.env, ...environment },
    stdio: ['ignore', 'ignore', 'pipe'],
  });
  const said: string[] = [];
  child.stderr.on('data', (chunk: Buffer) => said.push(chunk.toString()));
  const status = `/proc/${child.pid}/status`;
  let peak: number | null = null;
  const watch = setInterval(() => {
    if (!existsSync(status)) return;
    const found = /VmHWM:\s+(\d+) kB/.exec(readFileSync(status, 'utf8'));
    if (found) peak = Math.max(peak ?? 0, Number(found[1]) / 1000);
  }, 25);
  const code = await new Promise((resolve) => child.once('close', resolve));
  clearInterval(watch);
  if (code !== 0) throw new Error(`evenohm ${words.join(' ')} ended with ${code}: ${said.join('')}`);
  return peak;
}
