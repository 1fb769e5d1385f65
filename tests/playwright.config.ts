import { mkdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { defineConfig } from '@playwright/test';
import { findChromium } from './support/chromium.js';
import { freePort } from './support/free-port';

const root = path.resolve(import.meta.dirname, '..');
const data = path.join(root, '.results/browser-data');

/** This file is read again in every worker: the port is chosen once and handed down by the environment. */
if (process.env.EVENOHM_BROWSER_PORT === undefined) {
  process.env.EVENOHM_BROWSER_PORT = String(await freePort());
  rmSync(data, { recursive: true, force: true });
  mkdirSync(data, { recursive: true });
}
const port = process.env.EVENOHM_BROWSER_PORT;
const executablePath = findChromium();
/** The session of the process owner of the demonstration line, made once: tests act as them unless they sign in anew. */
const storageState = path.join(root, '.results/process-owner.json');

/** The production build on a database of its own with the demonstration line, thrown away at the next run. */
export default defineConfig({
  testDir: 'browser',
  outputDir: '../.results/browser',
  forbidOnly: process.env.CI !== undefined,
  workers: 2,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  reporter: [['list'], ['json', { outputFile: '../.results/browser.json' }]],
  use: {
    baseURL: `http://127.0.0.1:${port}`,
    locale: 'en-GB',
    timezoneId: 'Asia/Kathmandu',
    trace: 'retain-on-failure',
    ...(executablePath === null ? {} : { launchOptions: { executablePath } }),
  },
  projects: [
    { name: 'sign-in', testMatch: 'process-owner.setup.ts' },
    {
      name: 'desktop',
      dependencies: ['sign-in'],
      use: { storageState, viewport: { width: 1440, height: 900 } },
    },
    // Tests marked @phone: elsewhere a narrow window adds nothing.
    {
      name: 'phone',
      dependencies: ['sign-in'],
      grep: /@phone/,
      use: { storageState, viewport: { width: 390, height: 844 }, hasTouch: true },
    },
  ],
  webServer: {
    command: 'exec node lib/command/evenohm.js serve',
    cwd: root,
    url: `http://127.0.0.1:${port}/`,
    env: { PORT: port, EVENOHM_DATA: data, EVENOHM_DEMO: 'on', DATABASE_URL: '', EVENOHM_URL: '' },
    timeout: 240_000,
    stdout: 'ignore',
    stderr: 'pipe',
    gracefulShutdown: { signal: 'SIGTERM', timeout: 20_000 },
  },
});
