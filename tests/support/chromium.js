import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { chromium } from '@playwright/test';

const usualPlaces = [
  '/usr/bin/chromium',
  '/usr/bin/chromium-browser',
  '/usr/bin/google-chrome',
  '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
];

/** A Chromium on this machine: Playwright's own, else the system's; null where there is none. */
export function findChromium() {
  return [chromium.executablePath(), ...usualPlaces].find((file) => existsSync(file)) ?? null;
}

/** Installs one where there is none: the system's package for root on Debian, else Playwright's download. */
export function ensureChromium() {
  const found = findChromium();
  if (found !== null) return found;
  console.log('No Chromium found; installing one…');
  const root = process.getuid?.() === 0;
  if (root && existsSync('/usr/bin/apt-get')) {
    run('apt-get', ['update', '-q']);
    run('apt-get', ['install', '-q', '-y', '--no-install-recommends', 'chromium']);
  }
  if (findChromium() === null) run('npx', ['playwright', 'install', 'chromium']);
  const installed = findChromium();
  if (installed === null) {
    throw new Error('No Chromium: install it (Debian: apt-get install chromium) and run again.');
  }
  return installed;
}

function run(program, words) {
  spawnSync(program, words, { stdio: ['ignore', 'ignore', 'inherit'] });
}
