import { ESLint } from 'eslint';
import path from 'node:path';
import { describe, expect, it } from 'vitest';

const root = path.resolve(import.meta.dirname, '../..');
const eslint = new ESLint({ cwd: root, overrideConfigFile: path.join(root, 'tests/eslint.config.mjs') });

/** What the lint rules say of a snippet, as if it stood in that file. */
async function complaints(filePath: string, snippet: string): Promise<string[]> {
  const [result] = await eslint.lintText(snippet, { filePath: path.join(root, filePath) });
  return result?.messages.map((message) => message.message) ?? [];
}

const use = (from: string) => `import { x } from '${from}';\nexport const y = x;\n`;

/** The first file waits for the linter to load. */
const patience = { timeout: 60_000 };

describe('the import law refuses', patience, () => {
  it.each([
    ['lib/physics/a.ts', use('simple-statistics'), 'Only lib/stats'],
    ['app/(line)/a/page.tsx', use('simple-statistics'), 'Only lib/stats'],
    ['lib/stats/a.ts', use('../physics/b'), 'Write @/lib/room/file'],
    ['lib/wafer/a.ts', use('@/lib/maps/types'), 'A pure room imports pure rooms only'],
    ['lib/wafer/a.ts', use('@/lib/env'), 'A pure room imports pure rooms only'],
    ['lib/control/a.ts', use('react'), 'A pure room is arithmetic'],
    ['lib/control/a.ts', use('node:crypto'), 'A pure room is arithmetic'],
    ['lib/probe/a.ts', use('pg'), 'A pure room is arithmetic'],
    ['lib/stats/a.ts', 'export const y = Math.random();\n', 'draws no random numbers'],
    ['lib/stats/a.ts', 'export const y = new Date();\n', 'has no clock'],
    ['lib/stats/a.ts', 'export const y = Date.now();\n', 'has no clock'],
    ['lib/stats/a.ts', 'export const y = process.env.TZ;\n', 'has no environment'],
    ['lib/maps/a.ts', use('@/app/_ui/button'), 'lib never imports app'],
    ['lib/database/a.ts', use('@/app/_ui/button'), 'lib never imports app'],
    ['lib/streams/a.ts', use('@/lib/maps/types'), 'Service rooms stand one above another'],
    ['lib/excursions/data.ts', use('@/lib/streams/data'), 'Service rooms stand one above another'],
    ['app/(line)/a/page.tsx', use('pg'), 'Pages and drawing never touch tables'],
    ['app/(line)/a/page.tsx', use('@/lib/database/generated/client'), 'Pages and drawing never touch tables'],
    ['lib/maps/data.ts', use('next/headers'), 'Only lib/access reads cookies'],
    ['lib/maps/mutations.ts', use('@/lib/database/transaction'), 'goes into the audit trail with it'],
    ['app/_charts/a.tsx', use('@/lib/maps/data'), 'Drawing takes plain props'],
    ['app/_ui/a.tsx', use('@/lib/env'), 'Drawing takes plain props'],
    ['lib/maps/a.ts', 'export enum Side { Up }\n', 'union of words'],
    ['lib/maps/index.ts', `export * from './types';\n`, 'No barrels'],
    ['lib/maps/a.ts', 'export default 1;\n', 'Export by name'],
    ['app/a.ts', 'export const y = (x: any) => x;\n', 'Unexpected any'],
  ])('in %s: %s', async (filePath, snippet, message) => {
    expect(await complaints(filePath, snippet)).toContainEqual(expect.stringContaining(message));
  });

  it('any comment that would switch a rule off', async () => {
    const snippet = '/* eslint-disable */\nexport const y = (x: any) => x;\n';
    expect(await complaints('app/a.ts', snippet)).toContainEqual(expect.stringContaining('Unexpected any'));
  });
});

describe('the import law allows', patience, () => {
  it.each([
    ['lib/stats/a.ts', use('simple-statistics')],
    ['lib/wafer/a.ts', use('@/lib/stats/mean')],
    ['lib/wafer/a.ts', use('./b')],
    ['lib/maps/data.ts', use('@/lib/database/client')],
    ['lib/maps/a.ts', `import type { PoolClient } from 'pg';\nexport type C = PoolClient;\n`],
    ['lib/maps/a.ts', use('@/lib/streams/data')],
    ['lib/limits/a.ts', use('@/lib/maps/measured-wafer')],
    ['lib/access/request.ts', use('next/headers')],
    ['lib/access/a.ts', use('@/lib/database/transaction')],
    ['app/_charts/a.tsx', use('@/lib/maps/types')],
    ['app/_charts/a.tsx', use('@/lib/format')],
    ['app/(line)/a/page.tsx', 'export default function Page() {\n  return null;\n}\n'],
  ])('in %s: %s', async (filePath, snippet) => {
    expect(await complaints(filePath, snippet)).toEqual([]);
  });
});
