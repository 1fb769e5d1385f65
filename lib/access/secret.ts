import { hkdfSync, randomBytes } from 'node:crypto';
import { linkSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { type Environment, readEnvironment } from '@/lib/env';
import { AppError } from '@/lib/errors';

/** What a key is for: each purpose has its own, so that none can be used for another. */
export type KeyPurpose = 'sessions' | 'audit' | 'first administrator';

const KEY_BYTES = 32;
const keys = new Map<string, Buffer>();

/**
 * The plant's key for a purpose: 32 bytes drawn from the secret by HKDF-SHA256 (RFC 5869) with the purpose as its info.
 * Throws `AppError` where the database is given and EVENOHM_SECRET is not.
 */
export function plantKey(purpose: KeyPurpose): Buffer {
  const environment = readEnvironment();
  const name = `${environment.secret ?? ''}\n${environment.dataFolder}\n${purpose}`;
  let key = keys.get(name);
  if (key === undefined) {
    key = Buffer.from(hkdfSync('sha256', plantSecret(environment), '', `evenohm ${purpose}`, KEY_BYTES));
    keys.set(name, key);
  }
  return key;
}

/** EVENOHM_SECRET; with the embedded server, where it is not set, a random one kept beside the database. */
function plantSecret({ secret, databaseUrl, dataFolder }: Environment): string {
  if (secret !== null) return secret;
  if (databaseUrl !== null) {
    throw new AppError(
      'unavailable',
      'EVENOHM_SECRET is not set: with DATABASE_URL it must be, at least 32 characters, the same for every instance.',
    );
  }
  return readSecretFile(dataFolder) ?? makeSecretFile(dataFolder);
}

function readSecretFile(dataFolder: string): string | null {
  try {
    return readFileSync(path.join(dataFolder, 'secret'), 'utf8').trim();
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
    throw error;
  }
}

/** Two processes that start together keep the same one: whichever file has the name first. */
function makeSecretFile(dataFolder: string): string {
  mkdirSync(dataFolder, { recursive: true });
  const draft = path.join(dataFolder, `secret.${randomBytes(6).toString('hex')}`);
  writeFileSync(draft, `${randomBytes(KEY_BYTES).toString('base64url')}\n`, { mode: 0o600, flag: 'wx' });
  try {
    linkSync(draft, path.join(dataFolder, 'secret'));
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
  } finally {
    rmSync(draft);
  }
  return readSecretFile(dataFolder) ?? '';
}
