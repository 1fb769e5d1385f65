import { execFileSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../../', import.meta.url));
const generated = path.join(root, 'lib/database/generated');
const noteFile = path.join(generated, 'schema.sha256');

/**
 * Writes the Prisma client from prisma/schema.prisma into lib/database/generated where it is missing or older than
 * the schema; returns whether it did. Works offline: generating never needs Prisma's schema engine, but looks for
 * it and would download it, so a stand-in is named.
 */
export function generatePrismaClient() {
  const schema = readFileSync(path.join(root, 'prisma/schema.prisma'));
  const require = createRequire(import.meta.url);
  const { version } = require('prisma/package.json');
  const key = createHash('sha256').update(schema).update(version).digest('hex');
  if (existsSync(noteFile) && readFileSync(noteFile, 'utf8') === key) return false;
  const prisma = require.resolve('prisma/build/index.js');
  try {
    execFileSync(process.execPath, [prisma, 'generate', '--config', 'prisma/prisma.config.ts'], {
      cwd: root,
      stdio: 'pipe',
      env: { ...process.env, PRISMA_SCHEMA_ENGINE_BINARY: process.execPath, PRISMA_HIDE_UPDATE_MESSAGE: '1' },
    });
  } catch (error) {
    throw new Error(`prisma generate failed:\n${error.stdout}${error.stderr}`);
  }
  mkdirSync(generated, { recursive: true });
  writeFileSync(noteFile, key);
  return true;
}

if (process.argv[1] === fileURLToPath(import.meta.url)) generatePrismaClient();
