import type { ClientBase } from 'pg';
import type { Actor } from '@/lib/access/actor';
import type { SubgroupPoint } from '@/lib/control/limit-set';
import { judgedWafers } from '@/lib/excursions/judged-points';
import { summarise } from '@/lib/excursions/joined-members';
import { judgesAfter } from '@/lib/excursions/line-rows';
import { measuredWafer, measuringStream } from '@/lib/maps/measured-wafer';
import { loadStoredWafers } from '@/lib/maps/stored-wafers';
import { listStreamSettings } from '@/lib/streams/data';
import type { Screen } from '@/lib/wafer/measure-wafer';

/**
 * The baseline of the limits in force, its wafers measured again under another screening; null where the stream has
 * no limits yet. Limits that were inherited have no baseline here: the latest 25 judged subgroups stand in.
 */
export async function remeasuredBaseline(
  actor: Actor,
  client: ClientBase,
  streamId: string,
  screen: Screen,
): Promise<(SubgroupPoint & { id: string })[] | null> {
  const { rows: inForce } = await client.query<{ baseline_ids: string[] }>(
    `SELECT baseline_ids FROM limit_revision WHERE stream_id = $1 AND ${judgesAfter('now()')}
     ORDER BY effective_from DESC, revision DESC LIMIT 1`,
    [streamId],
  );
  const found = inForce[0];
  if (found === undefined) return null;
  const { rows: subgroups } = await client.query<{ id: string; wafer_ids: string[] }>(
    found.baseline_ids.length > 0
      ? 'SELECT id, wafer_ids FROM subgroup WHERE stream_id = $1 AND id = ANY($2::bigint[]) ORDER BY position_at, key'
      : `SELECT id, wafer_ids FROM (SELECT * FROM subgroup WHERE stream_id = $1 AND state = 'judged'
           AND cardinality($2::bigint[]) = 0 ORDER BY position_at DESC, key DESC LIMIT 25) latest ORDER BY position_at, key`,
    [streamId, found.baseline_ids],
  );
  const [settings] = await listStreamSettings(actor, [streamId], client);
  if (settings === undefined) return [];
  const by = measuringStream(settings);
  const wafers = await loadStoredWafers(
    actor,
    client,
    streamId,
    subgroups.flatMap((subgroup) => subgroup.wafer_ids),
  );
  return subgroups.flatMap(({ id, wafer_ids: waferIds }) => {
    const members = waferIds.flatMap((waferId) => {
      const wafer = wafers.get(waferId);
      if (wafer === undefined) return [];
      const { level, within } = measuredWafer(by, wafer.facts, wafer.readings, {
        screen,
        overrides: wafer.overrides,
      });
      return { waferId, level, within };
    });
    const point = {
      members,
      level: null as number | null,
      within: null as number | null,
      between: null as number | null,
    };
    summarise(point);
    if (point.level === null) return [];
    return {
      id,
      level: point.level,
      within: point.within,
      between: point.between,
      wafers: judgedWafers(point),
    };
  });
}
