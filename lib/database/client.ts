import { PrismaPg } from '@prisma/adapter-pg';
import pg from 'pg';
import { AppError } from '@/lib/errors';
import { PrismaClient } from './generated/client';

interface OpenClients {
  url: string;
  pool: pg.Pool;
  prisma: PrismaClient | null;
}

/** One for the whole process: the pages' bundle and the command line hold separate copies of this module. */
const holder = globalThis as typeof globalThis & { evenohmDatabase?: OpenClients };

const dateOid = 1082;

/** Points `getPool` and `getPrisma` at a database. Called once by `openDatabase`. */
export function openClients(url: string): void {
  const pool = new pg.Pool({
    connectionString: url,
    max: 20,
    /** Prisma writes moments without their offset and takes those it reads for UTC, whatever zone the server lives in. */
    onConnect: async (client) => {
      await client.query("SET TIME ZONE 'UTC'");
    },
    types: { getTypeParser: typeParser as typeof pg.types.getTypeParser },
  });
  /** A connection lost while idle is replaced at the next query; of one lost in use its query tells. */
  pool.on('error', () => undefined);
  pool.on('connect', (client) => client.on('error', () => undefined));
  holder.evenohmDatabase = { url, pool, prisma: null };
}

/** Closes what `openClients` opened, after the queries that run. */
export async function closeClients(): Promise<void> {
  const open = holder.evenohmDatabase;
  if (open === undefined) return;
  delete holder.evenohmDatabase;
  await open.prisma?.$disconnect();
  await open.pool.end();
}

/**
 * Plain connections, for the hot paths. int8 (our ids) comes as a decimal string, float8 as a number, timestamptz
 * as a Date, date as text; arrays likewise.
 */
export function getPool(): pg.Pool {
  return openOrThrow().pool;
}

/** The Prisma client, on the same connections. Ids come as BigInt here. */
export function getPrisma(): PrismaClient {
  const open = openOrThrow();
  open.prisma ??= new PrismaClient({ adapter: new PrismaPg(open.pool) });
  return open.prisma;
}

function openOrThrow(): OpenClients {
  const open = holder.evenohmDatabase;
  if (open === undefined) {
    throw new AppError('unavailable', 'The database is not open: openDatabase comes first.');
  }
  return open;
}

function typeParser(oid: number, format?: 'text' | 'binary'): unknown {
  if (oid === dateOid) return (text: string) => text;
  return format === 'binary' ? pg.types.getTypeParser(oid, 'binary') : pg.types.getTypeParser(oid, 'text');
}
