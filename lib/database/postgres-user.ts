import { execFileSync, spawnSync } from 'node:child_process';
import { chmodSync, chownSync, statSync } from 'node:fs';
import { AppError } from '@/lib/errors';

/** How to run PostgreSQL's programs: words put before the command, and the user to run as. */
export interface PostgresUser {
  prefix: readonly string[];
  uid?: number;
  gid?: number;
}

/**
 * PostgreSQL refuses to run as root. An ordinary user runs it as is. Root runs it in a user namespace that shows
 * root's files as those of an ordinary user, so no file changes owner; where namespaces are forbidden, as the user
 * `postgres`, who is then given the folder. A folder that belongs to somebody else is served as that somebody.
 */
export function postgresUser(folder: string): PostgresUser {
  if (process.getuid?.() !== 0) return { prefix: [] };
  const owner = statSync(folder);
  if (owner.uid !== 0) return { prefix: [], uid: owner.uid, gid: owner.gid };
  const prefix = ['unshare', '--user', '--map-user=1000', '--map-group=1000'];
  const trial = spawnSync('unshare', [...prefix.slice(1), 'true'], { stdio: 'ignore' });
  if (trial.status === 0) return { prefix };
  const postgres = systemUser('postgres');
  if (postgres === null) {
    throw new AppError(
      'unavailable',
      'PostgreSQL does not run as root and user namespaces are forbidden here: start as an ordinary user, or set DATABASE_URL.',
    );
  }
  chownSync(folder, postgres.uid, postgres.gid);
  chmodSync(folder, 0o700);
  return { prefix: [], ...postgres };
}

function systemUser(name: string): { uid: number; gid: number } | null {
  try {
    const number = (flag: string) => Number(execFileSync('id', [flag, name], { stdio: 'pipe' }).toString());
    return { uid: number('-u'), gid: number('-g') };
  } catch {
    return null;
  }
}
