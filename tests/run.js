/**
 * `npm test`: everything, in two lanes (one reads and builds, one runs tests), then the browser on the build.
 * The last line counts all: one for each of format, lint, build and types, and one for each test.
 */
import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { generatePrismaClient } from '../lib/database/generate.js';
import { ensureChromium } from './support/chromium.js';

const root = path.resolve(import.meta.dirname, '..');
const results = path.join(root, '.results');
const total = { passed: 0, failed: 0, skipped: 0 };
const running = new Set();

for (const name of ['SIGINT', 'SIGTERM']) {
  process.once(name, () => {
    for (const child of running) child.kill(name);
    process.exit(130);
  });
}

process.chdir(root);
rmSync(results, { recursive: true, force: true });
mkdirSync(results, { recursive: true });
generatePrismaClient();

await Promise.all([checks(), vitest()]);
await browser();

const skipped = total.skipped > 0 ? `, ${total.skipped} skipped` : '';
console.log(`${total.passed} passed, ${total.failed} failed${skipped}`);
process.exitCode = total.failed > 0 || total.passed === 0 ? 1 : 0;

/** Types come after the build, which writes the declarations of pages and style sheets. */
async function checks() {
  await check('format', 'prettier', ['--check', '.', '--log-level', 'warn']);
  await check('lint', 'eslint', ['--config', 'tests/eslint.config.mjs', '--max-warnings', '0', '.']);
  await check('build', 'node', ['lib/command/evenohm.js', 'build']);
  rmSync('.next/dev/types', { recursive: true, force: true });
  await check('types', 'tsc', ['--noEmit', '-p', 'tsconfig.json']);
}

async function check(name, program, words) {
  const done = await step(name, program, words);
  if (done.status === 0) total.passed += 1;
  else total.failed += 1;
}

/** Unit, reference and store tests. */
async function vitest() {
  const file = path.join(results, 'vitest.json');
  const words = ['run', '--config', 'tests/vitest.config.ts', '--reporter=json', '--reporter=dot'];
  const done = await step('unit, reference, store', 'vitest', [...words, `--outputFile.json=${file}`]);
  const report = readReport(file);
  count(done, {
    passed: report?.numPassedTests ?? 0,
    failed: report?.numFailedTests ?? 0,
    skipped: (report?.numPendingTests ?? 0) + (report?.numTodoTests ?? 0),
  });
}

async function browser() {
  try {
    ensureChromium();
  } catch (error) {
    console.log(error.message);
    total.failed += 1;
    return;
  }
  const done = await step('browser', 'playwright', ['test', '--config', 'tests/playwright.config.ts']);
  const stats = readReport(path.join(results, 'browser.json'))?.stats;
  count(done, {
    passed: stats?.expected ?? 0,
    failed: (stats?.unexpected ?? 0) + (stats?.flaky ?? 0),
    skipped: stats?.skipped ?? 0,
  });
}

/** A runner that fails without naming a failed test (a file that does not load, a server that dies) counts as one. */
function count(done, { passed, failed, skipped }) {
  total.passed += passed;
  total.failed += done.status !== 0 && failed === 0 ? 1 : failed;
  total.skipped += skipped;
}

/** Runs one program; says how long it took, and what it said if it failed. */
async function step(name, program, words) {
  const began = Date.now();
  const bin = path.join(root, 'node_modules/.bin', program);
  const child = spawn(program === 'node' ? process.execPath : bin, words, {
    stdio: ['ignore', 'pipe', 'pipe'],
    env: { ...process.env, FORCE_COLOR: '0' },
  });
  running.add(child);
  let said = '';
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (part) => (said += part));
  const status = await new Promise((resolve) => child.once('close', resolve));
  running.delete(child);
  const seconds = ((Date.now() - began) / 1000).toFixed(1);
  console.log(`${status === 0 ? 'ok    ' : 'FAILED'}  ${name}  ${seconds} s`);
  if (status !== 0) console.log(said.trim());
  return { status };
}

function readReport(file) {
  return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null;
}
