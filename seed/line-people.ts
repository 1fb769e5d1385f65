import type { Actor } from '@/lib/access/actor';
import { getPool } from '@/lib/database/client';
import { inTransaction } from '@/lib/database/transaction';
import type { Mishap } from './mishap';

/** The roles that act on the demonstration line; nobody in particular. */
const SHIFT_LEAD = 'shift lead (demonstration)';
const PROCESS_OWNER = 'process owner (demonstration)';

const DAY_MS = 86_400_000;

/** What the process owner wrote when the cause of a mishap had been found, and for how long it made cases. */
const FOUND: Partial<
  Record<Mishap['effect']['kind'], { afterDays: number; lastsDays: number; cause: string }>
> = {
  'gauge-offset': {
    afterDays: 4,
    lastsDays: 4,
    cause: 'Gauge 4 read high; its probe head was changed. The wafers are good.',
  },
  'misrouted-wafer': {
    afterDays: 1,
    lastsDays: 1.5,
    cause: 'A wafer of another recipe was measured as a monitor of this one.',
  },
};

interface OpenCase {
  streamId: string;
  id: string;
  slug: string;
  state: string;
  openedAt: Date;
}

/**
 * What people did on one day of the demonstration line: the shift lead acknowledges what is new, the process owner
 * closes what was chance after a day, and a mishap once its cause is found; what is still wrong stays open. Written
 * straight into the log because it happened on that day, not today.
 */
export async function lineDay(
  _actor: Actor,
  now: Date,
  mishapDays: ReadonlyMap<string, { mishap: Mishap; onset: Date }>,
): Promise<void> {
  const { rows } = await getPool().query<OpenCase>(
    `SELECT e.stream_id AS "streamId", e.id, s.slug, e.state, e.opened_at AS "openedAt"
     FROM excursion e JOIN stream s ON s.id = e.stream_id WHERE e.state <> 'closed' ORDER BY e.id`,
  );
  for (const open of rows) {
    const known = mishapDays.get(open.slug);
    const cause = known && FOUND[known.mishap.effect.kind];
    const sinceOnset = known === undefined ? -1 : open.openedAt.getTime() - known.onset.getTime();
    const isMishap = sinceOnset >= 0 && sinceOnset <= (cause?.lastsDays ?? Infinity) * DAY_MS;
    const found = isMishap ? cause : { afterDays: 1, cause: 'No cause found: what chance brings.' };
    const age = now.getTime() - open.openedAt.getTime();
    if (open.state === 'open' && age >= DAY_MS / 2) {
      await write(open, now, 'acknowledged', SHIFT_LEAD, '', null);
    }
    if (isMishap && open.state === 'acknowledged' && age >= 2 * DAY_MS) {
      await write(
        open,
        now,
        'under-investigation',
        PROCESS_OWNER,
        'Looking at what changed on the tool.',
        null,
      );
    }
    if (found !== undefined && age >= found.afterDays * DAY_MS) {
      await write(open, now, 'closed', PROCESS_OWNER, '', found.cause);
    }
  }
}

async function write(
  open: OpenCase,
  at: Date,
  state: 'acknowledged' | 'under-investigation' | 'closed',
  who: string,
  note: string,
  cause: string | null,
): Promise<void> {
  const action = state === 'under-investigation' ? 'investigating' : state;
  await inTransaction(async (client) => {
    await client.query(
      `UPDATE excursion SET state = $3::text, acknowledged_at = coalesce(acknowledged_at, $4),
         acknowledged_by = coalesce(acknowledged_by, $5::text), cause = $6::text,
         closed_at = CASE WHEN $3::text = 'closed' THEN $4::timestamptz END,
         closed_by = CASE WHEN $3::text = 'closed' THEN $5::text END
       WHERE stream_id = $1 AND id = $2`,
      [open.streamId, open.id, state, at, who, cause],
    );
    await client.query('UPDATE stream SET version = version + 1 WHERE id = $1', [open.streamId]);
    await client.query(
      `INSERT INTO excursion_entry (stream_id, excursion_id, at, actor, action, note) VALUES ($1, $2, $3, $4, $5, $6)`,
      [open.streamId, open.id, at, who, action, cause ?? note],
    );
  });
  open.state = state;
}
