#!/usr/bin/env node
import { fileURLToPath } from 'node:url';
import { register } from 'tsx/esm/api';
import { generatePrismaClient } from '../database/generate.js';

/** Whoever reads may go away (`npm start | tee log`): a server then goes on, and does not tell of each write that failed. */
for (const stream of [process.stdout, process.stderr]) stream.on('error', () => undefined);

register({ tsconfig: fileURLToPath(new URL('../../tsconfig.json', import.meta.url)) });
generatePrismaClient();

const { runCommand } = await import('./main.ts');
const status = await runCommand(process.argv.slice(2), {
  out: (text) => void process.stdout.write(`${text}\n`),
  say: (text) => void process.stderr.write(`${text}\n`),
});
/** Next's watchers in development would keep a finished process alive; writes to standard output are done by now. */
process.exit(status);
