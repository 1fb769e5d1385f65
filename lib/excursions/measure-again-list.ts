import type { Pool } from 'pg';
import { TO_MEASURE } from './to-measure-statement';
import type { MeasureAgainList } from './types';

export interface MeasureAgainWish {
  /** The name of a stream in addresses; null for all in use. */
  stream: string | null;
  skip: number;
  most: number;
}

/** Reached by `wafer_measurement_not_judged`, which holds no judged wafer: a list costs what was ever not judged. */
const WAFERS = `
SELECT w.id::text, w.wafer, w.run_or_lot AS "runOrLot", w.measured_at AS "measuredAt", w.not_judged_reason AS reason,
  w.gauge, w.good_sites AS "goodSites", w.good_sites + w.bad_sites AS "countedSites",
  json_build_object('slug', s.slug, 'name', s.name) AS stream
FROM stream s JOIN wafer_measurement w ON w.stream_id = s.id
WHERE s.retired_at IS NULL AND ($1::text IS NULL OR s.slug = $1) AND ${TO_MEASURE}
ORDER BY w.measured_at DESC, w.id DESC LIMIT $2 OFFSET $3`;

const COUNTS = `
SELECT s.slug, s.name, count(*)::integer AS count FROM stream s JOIN wafer_measurement w ON w.stream_id = s.id
WHERE s.retired_at IS NULL AND ${TO_MEASURE} GROUP BY s.id ORDER BY s.name, s.id`;

/** The wafers of streams in use that wait to be measured again, the newest first. */
export async function measureAgainList(pool: Pool, wish: MeasureAgainWish): Promise<MeasureAgainList> {
  const [wafers, streams] = await Promise.all([
    pool.query<MeasureAgainList['wafers'][number]>(WAFERS, [wish.stream, wish.most, wish.skip]),
    pool.query<MeasureAgainList['streams'][number]>(COUNTS),
  ]);
  return { wafers: wafers.rows, streams: streams.rows };
}
