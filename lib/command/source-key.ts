import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, statSync } from 'node:fs';
import path from 'node:path';

/** What the built app is made of. */
const ingredients = ['app', 'lib', 'seed', 'prisma', 'package-lock.json', 'next.config.js', 'tsconfig.json'];

/**
 * One key for the content of every source of the app: the same sources give the same key on any machine and at any
 * time, so a build is made again exactly when something it is made of has changed.
 */
export function sourceKey(root: string): string {
  const hash = createHash('sha256');
  for (const file of ingredients.flatMap((name) => filesUnder(root, name))) {
    hash
      .update(`${file}\0`)
      .update(readFileSync(path.join(root, file)))
      .update('\0');
  }
  return hash.digest('hex');
}

function filesUnder(root: string, name: string): string[] {
  const whole = path.join(root, name);
  if (!existsSync(whole)) return [];
  if (!statSync(whole).isDirectory()) return [name];
  return readdirSync(whole, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative(root, path.join(entry.parentPath, entry.name)))
    .filter((file) => !file.includes(`${path.sep}generated${path.sep}`))
    .sort();
}
