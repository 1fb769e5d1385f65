import type { Pool } from 'pg';
import type { Actor } from '@/lib/access/actor';
import { listStreamSettings } from '@/lib/streams/data';
import type { StreamSettings } from '@/lib/streams/types';
import { readCompletedSignals } from './completed-signals';
import { readUsualWafers } from './usual-wafers';
import type {
  CompletedSignal,
  ReadingDecision,
  UsualWafers,
  WaferNeighbour,
  WaferRecord,
} from './wafer-record';
import { readWaferNeighbours } from './wafer-neighbours';
import { waferRecordOf, type WaferRecordRow } from './wafer-record-row';

/** A measured wafer as its page shows it: what is on record of it, and what stands around it. */
export interface WaferOnRecord {
  wafer: WaferRecord;
  settings: StreamSettings;
  /** The wafers of its subgroup in the order of processing, itself among them. */
  siblings: WaferNeighbour[];
  previous: WaferNeighbour | null;
  next: WaferNeighbour | null;
  decisions: ReadingDecision[];
  usual: UsualWafers;
  signals: CompletedSignal[];
  /** The largest diameter of any site plan: maps are drawn to scale with it. */
  largestDiameterMm: number;
}

const STATEMENT = `
SELECT w.*, r.reading, s.key AS subgroup_key, s.position_at, s.state AS subgroup_state,
  s.limit_revision_id, s.completions, cardinality(s.wafer_ids) AS subgroup_wafers, b.source AS batch_source,
  (SELECT json_agg(json_build_array(site_index, action, actor, reason, at) ORDER BY id) FROM reading_exclusion e
   WHERE e.stream_id = w.stream_id AND e.wafer_id = w.id) AS decisions,
  (SELECT max(diameter_mm) FROM site_plan) AS largest_diameter_mm
FROM wafer_measurement w
JOIN wafer_reading r ON r.stream_id = w.stream_id AND r.wafer_id = w.id
JOIN subgroup s ON s.stream_id = w.stream_id AND s.id = w.subgroup_id
JOIN intake_batch b ON b.id = w.batch_id
WHERE w.id = $1`;

/**
 * Reads one wafer with its surroundings: by key and by position, a bounded number of rows however long its stream is.
 * Null when there is none.
 */
export async function waferOnRecord(actor: Actor, pool: Pool, id: string): Promise<WaferOnRecord | null> {
  const { rows } = await pool.query<WaferRecordRow>(STATEMENT, [id]);
  const row = rows[0];
  if (row === undefined) return null;
  const { wafer, decisions } = waferRecordOf(row);
  const [found, around, usual, signals] = await Promise.all([
    listStreamSettings(actor, [wafer.streamId]),
    readWaferNeighbours(pool, wafer),
    readUsualWafers(pool, wafer),
    readCompletedSignals(pool, wafer),
  ]);
  const settings = found[0] as StreamSettings;
  return {
    wafer,
    settings,
    ...around,
    decisions,
    usual,
    signals,
    largestDiameterMm: row.largest_diameter_mm,
  };
}
