import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('..', import.meta.url));

/** An odd zone, so that a forgotten time zone shows. */
process.env.TZ = 'Asia/Kathmandu';
/** Keys that are the same in every run, and nothing written beside the sources. */
process.env.EVENOHM_SECRET = 'for tests alone, more than thirty-two characters';

export default defineConfig({
  root,
  resolve: { tsconfigPaths: true },
  test: {
    setupFiles: ['tests/support/no-console-error.ts'],
    /** Room for a machine that does much else: a hung test still ends. */
    testTimeout: 30_000,
    projects: [
      // What these test keeps nothing between files: modules are read once a worker, which halves the time.
      { extends: true, test: { name: 'unit', include: ['tests/unit/**/*.test.{ts,tsx}'], isolate: false } },
      {
        extends: true,
        test: { name: 'reference', include: ['tests/reference/**/*.test.ts'], isolate: false },
      },
      {
        extends: true,
        test: {
          name: 'store',
          include: ['tests/store/**/*.test.ts'],
          globalSetup: ['tests/support/store-server.ts'],
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
