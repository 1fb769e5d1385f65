import { setTimeout as sleep } from 'node:timers/promises';
import { readEnvironment } from '@/lib/env';
import { AppError } from '@/lib/errors';
import { closeClients, openClients } from './client';
import { startEmbeddedServer, stopEmbeddedServer } from './embedded-server';
import { grantProgram } from './grant-program';
import { applyMigrations } from './migration-runner';
import { type Presence, enterDatabase } from './presence';
import { programBelow } from './program-below';

/** A database at the newest migration, with `getPool` and `getPrisma` pointed at it. */
export interface OpenDatabase {
  url: string;
  embedded: boolean;
  /** Whether the connection to the server was lost and is being opened again. */
  isAway(): boolean;
  /** Leaves; the last process to leave an embedded server stops it. */
  close(): Promise<void>;
}

interface Entered {
  url: string;
  pid: number | null;
  presence: Presence;
}

/** How long to wait before the database is looked for once more: twice as long each time, up to half a minute. */
const LEAST_PAUSE_MS = 1000;
const MOST_PAUSE_MS = 30_000;

/** Another process is the web server of this embedded database already. */
export class AlreadyServing extends AppError {
  constructor() {
    super('conflict', 'Another process serves this folder already.');
  }
}

interface OpeningOptions {
  say(text: string): void;
  /** Claim to be the one web server of an embedded database; throws `AlreadyServing` where there is one. */
  serving?: boolean;
  /** Absent: from the environment. */
  databaseUrl?: string | null;
  ownerUrl?: string | null;
  dataFolder?: string;
}

/**
 * Opens the database: that of `DATABASE_URL`, else the embedded server, which is started where it does not run.
 * If an embedded server dies under us it is started again on the same port, and pools reconnect by themselves.
 */
export async function openDatabase(options: OpeningOptions): Promise<OpenDatabase> {
  const environment = readEnvironment();
  const databaseUrl = options.databaseUrl === undefined ? environment.databaseUrl : options.databaseUrl;
  const ownerUrl = options.ownerUrl === undefined ? environment.ownerUrl : options.ownerUrl;
  const dataFolder = options.dataFolder ?? environment.dataFolder;
  const enter = () =>
    databaseUrl === null ? enterEmbedded(dataFolder, options.say) : enterGiven(databaseUrl);

  let entered = await enter();
  let closing = false;
  let away = false;
  const watch = ({ presence }: Entered) => {
    presence.client.once('end', () => {
      if (closing) return;
      away = true;
      options.say('The connection to the database was lost; opening it again.');
      void reenter();
    });
  };
  const reenter = async () => {
    for (let pauseMs = LEAST_PAUSE_MS; !closing; pauseMs = Math.min(2 * pauseMs, MOST_PAUSE_MS)) {
      try {
        const before = entered.url;
        entered = await enter();
        if (options.serving === true) await entered.presence.serve();
        if (entered.url !== before) {
          await closeClients();
          openClients(entered.url);
        }
        away = false;
        options.say('The database is back.');
        watch(entered);
        return;
      } catch (error) {
        options.say(`The database does not come back: ${error instanceof Error ? error.message : error}`);
        await sleep(pauseMs);
      }
    }
  };
  const leave = async () => {
    closing = true;
    await closeClients();
    const last = await entered.presence.leaveAsLast().catch(() => false);
    if (last && entered.pid !== null) await stopEmbeddedServer(entered.pid);
    await entered.presence.client.end().catch(() => undefined);
  };

  try {
    const alone = options.serving !== true || entered.pid === null || (await entered.presence.serve());
    if (!alone) throw new AlreadyServing();
    const role = ownerUrl === null ? null : await programBelow(ownerUrl, entered.url);
    const applied = await applyMigrations(ownerUrl ?? entered.url);
    if (ownerUrl !== null && role !== null) await grantProgram(ownerUrl, role);
    if (applied.length > 0) options.say(`Database brought to ${applied.at(-1)}.`);
  } catch (error) {
    await leave();
    throw error;
  }
  watch(entered);
  openClients(entered.url);
  return {
    url: entered.url,
    embedded: databaseUrl === null,
    isAway: () => away,
    close: leave,
  };
}

async function enterEmbedded(dataFolder: string, say: (text: string) => void): Promise<Entered> {
  for (;;) {
    const server = await startEmbeddedServer(dataFolder, say);
    const presence = await enterDatabase(server.url);
    if (presence !== null) return { url: server.url, pid: server.pid, presence };
    await sleep(100);
  }
}

async function enterGiven(url: string): Promise<Entered> {
  const presence = await enterDatabase(url).catch((error: unknown) => {
    const reason = error instanceof Error ? error.message : String(error);
    throw new AppError('unavailable', `The database of DATABASE_URL cannot be opened: ${reason}`, {
      cause: error,
    });
  });
  if (presence === null) throw new AppError('unavailable', 'The database of DATABASE_URL does not answer.');
  return { url, pid: null, presence };
}
