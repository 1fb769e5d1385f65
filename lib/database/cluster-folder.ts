import { execFile } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import {
  chownSync,
  existsSync,
  linkSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  readdirSync,
  realpathSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import path from 'node:path';
import { promisify } from 'node:util';
import { AppError } from '@/lib/errors';
import type { EmbeddedBinaries } from './embedded-binaries';
import { type PostgresUser, postgresUser } from './postgres-user';
import { isAlive } from './postmaster';

/** Everything the embedded server keeps, inside the data folder. */
export interface ClusterFolder {
  /** PostgreSQL's own folder. */
  cluster: string;
  logs: string;
  portFile: string;
  password: string;
  user: PostgresUser;
}

/** The major version of the embedded binaries; a folder made by another one cannot be opened. */
const majorVersion = '18';

/**
 * Opens the data folder, and makes it on first use: the password (only its owner can read it) and a database
 * cluster. `initdb` works in a folder beside and the finished one is renamed into place, because a killed `initdb`
 * leaves a folder that looks finished. Of two processes that do so at once, one wins and both use its folder.
 */
export async function openClusterFolder(
  dataFolder: string,
  binaries: EmbeddedBinaries,
  say: (text: string) => void,
): Promise<ClusterFolder> {
  mkdirSync(dataFolder, { recursive: true, mode: 0o700 });
  const root = realpathSync(dataFolder);
  const user = postgresUser(root);
  const folder: ClusterFolder = {
    cluster: path.join(root, 'postgres'),
    logs: path.join(root, 'logs'),
    portFile: path.join(root, 'port'),
    password: settledPassword(path.join(root, 'password'), user),
    user,
  };
  ownedFolder(folder.logs, user);
  if (!existsSync(folder.cluster)) {
    say('Making the database folder…');
    await makeCluster(root, folder, binaries);
  }
  const version = readFileSync(path.join(folder.cluster, 'PG_VERSION'), 'utf8').trim();
  if (version !== majorVersion) {
    throw new AppError(
      'unavailable',
      `The folder ${folder.cluster} was made by PostgreSQL ${version}; this version of Evenohm brings PostgreSQL ${majorVersion}. Make a backup with the version that made it and restore it here.`,
    );
  }
  return folder;
}

async function makeCluster(root: string, folder: ClusterFolder, binaries: EmbeddedBinaries): Promise<void> {
  removeAbandoned(root);
  const side = mkdtempSync(path.join(root, `making-${process.pid}-`));
  chownTo(side, folder.user);
  const made = path.join(side, 'cluster');
  const [program = '', ...words] = [
    ...folder.user.prefix,
    binaries.initdb,
    ...['-D', made, '-U', 'evenohm', `--pwfile=${path.join(root, 'password')}`, '-A', 'scram-sha-256'],
    ...['--encoding=UTF8', '--locale=C', '--locale-provider=builtin', '--builtin-locale=C.UTF-8'],
  ];
  try {
    const { uid, gid } = folder.user;
    await promisify(execFile)(program, words, { ...(uid === undefined ? {} : { uid, gid }) });
    renameSync(made, folder.cluster);
  } catch (error) {
    if (existsSync(path.join(folder.cluster, 'PG_VERSION'))) return;
    throw new AppError('unavailable', `PostgreSQL could not make its folder: ${lastLine(error)}`, {
      cause: error,
    });
  } finally {
    rmSync(side, { recursive: true, force: true });
  }
}

/** Side folders of processes that were killed while they made a cluster. */
function removeAbandoned(root: string): void {
  for (const name of readdirSync(root)) {
    const maker = /^making-(\d+)-/.exec(name)?.[1];
    if (maker !== undefined && !isAlive(Number(maker))) {
      rmSync(path.join(root, name), { recursive: true, force: true });
    }
  }
}

/** A random password, written whole by whoever comes first (a link never replaces a file) and read by all. */
function settledPassword(file: string, user: PostgresUser): string {
  if (!existsSync(file)) {
    const draft = `${file}.${process.pid}`;
    writeFileSync(draft, randomBytes(24).toString('base64url'), { mode: 0o600 });
    chownTo(draft, user);
    try {
      linkSync(draft, file);
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
    }
    rmSync(draft);
  }
  return readFileSync(file, 'utf8').trim();
}

function ownedFolder(folder: string, user: PostgresUser): void {
  if (existsSync(folder)) return;
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  chownTo(folder, user);
}

function chownTo(file: string, user: PostgresUser): void {
  if (user.uid !== undefined && user.gid !== undefined) chownSync(file, user.uid, user.gid);
}

function lastLine(error: unknown): string {
  const text = String((error as { stderr?: string }).stderr || error).trim();
  return text.split('\n').slice(-2).join(' ');
}
