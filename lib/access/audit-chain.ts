import pg, { type ClientBase, type Pool } from 'pg';
import {
  entriesJson,
  linkedEntries,
  MAC_BEFORE_FIRST,
  type ChainEnd,
  type LinkedEntry,
  type Told,
} from './audit-entry';
import { plantKey } from './secret';

/** What this process knows of a database's chain: its end, which others may have moved on meanwhile. */
interface KnownChain {
  end: ChainEnd | null;
  /** Settles when nobody in this process is writing at the end it knows. */
  turn: Promise<unknown>;
  /** Whether the head that was kept outside the database was found in it; null where nobody has looked yet. */
  headHolds: boolean | null;
}

const chains = new WeakMap<Pool, KnownChain>();

export function knownChain(pool: Pool): KnownChain {
  const chain = chains.get(pool) ?? { end: null, turn: Promise.resolve(), headHolds: null };
  chains.set(pool, chain);
  return chain;
}

/** Remembers where the chain ends now, unless it is known to have gone further. */
export function learnEnd(pool: Pool, end: ChainEnd): void {
  const chain = knownChain(pool);
  if (chain.end === null || chain.end.name !== end.name || chain.end.id < end.id) chain.end = end;
}

export interface EndRow {
  name: string;
  id: string | null;
  mac: Buffer | null;
}

export function endOf({ name, id, mac }: EndRow): ChainEnd {
  return { name, id: Number(id ?? 0), mac: mac ?? MAC_BEFORE_FIRST };
}

/** Where the chain ends, held there until the transaction does. Nothing else may be done in it but to append and commit. */
export async function holdChain(client: ClientBase): Promise<ChainEnd> {
  const { rows } = await client.query<EndRow>({
    name: 'hold-audit-chain',
    text: 'SELECT name, id, mac FROM hold_audit_chain()',
  });
  return endOf(rows[0] as EndRow);
}

/**
 * Holds the chain and says by which statement what was done goes to its end: it is sent together with the commit, so
 * that the chain is held for one round trip. Returns its new end as well.
 */
export async function appending(
  client: ClientBase,
  told: readonly Told[],
): Promise<{ statement: string; end: ChainEnd }> {
  const end = await holdChain(client);
  const entries = linkedEntries(plantKey('audit'), end, told, new Date());
  const rows = pg.escapeLiteral(entriesJson(entries));
  const statement = `INSERT INTO audit_entry SELECT * FROM json_populate_recordset(NULL::audit_entry, ${rows})`;
  return { statement, end: endAfter(end, entries) };
}

/** Where a chain ends after entries that were linked to it. */
export function endAfter(end: ChainEnd, entries: readonly LinkedEntry[]): ChainEnd {
  const last = entries.at(-1);
  return last === undefined ? end : { name: end.name, id: last.id, mac: last.mac };
}
