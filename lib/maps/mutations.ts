import type { Actor } from '@/lib/access/actor';
import { audited } from '@/lib/access/audited';
import { refuse } from '@/lib/access/refusal';
import { placeMember, summarise } from '@/lib/excursions/joined-members';
import { holdStream, judgeAgain } from '@/lib/excursions/mutations';
import { listStreamSettings } from '@/lib/streams/data';
import { measuredWafer, measuringStream } from './measured-wafer';
import {
  changedSiblings,
  loadSiblings,
  notCharted,
  writeChangedSiblings,
  writeMeasured,
} from './measured-again';
import { loadStoredWafers } from './stored-wafers';

export { intakeFile } from './intake-file';
export { recordMeasurements } from './record-measurements';

/**
 * Takes a reading out of a wafer's figures or puts it back, with who and why. The reading itself stays as it was; the
 * wafer is measured again and its stream judged again from there.
 */
export async function decideReading(
  actor: Actor,
  streamId: string,
  waferId: string,
  decision: { siteIndex: number; action: 'out' | 'in'; reason: string },
): Promise<{ ok: true } | { ok: false; reason: string }> {
  const { siteIndex, action, reason } = decision;
  const refusal = refuse(actor, 'exclude-reading', streamId);
  if (refusal) return refusal;
  return audited(actor, async (client, tell) => {
    await holdStream(client, streamId);
    const [settings] = await listStreamSettings(actor, [streamId], client);
    if (settings === undefined) return { ok: false, reason: 'There is no such stream.' };
    const before = (await loadStoredWafers(actor, client, streamId, [waferId])).get(waferId);
    if (before === undefined) return { ok: false, reason: 'There is no such wafer.' };
    const value = before.readings[siteIndex];
    if (value === undefined) return { ok: false, reason: 'The wafer has no such site.' };
    if (action === 'in' && !(value !== null && value > 0 && Number.isFinite(value))) {
      return { ok: false, reason: 'This reading is impossible: it stays out.' };
    }
    await client.query(
      'INSERT INTO reading_exclusion (stream_id, wafer_id, site_index, action, actor, reason) VALUES ($1, $2, $3, $4, $5, $6)',
      [streamId, waferId, siteIndex, action, actor.name, reason],
    );
    before.overrides.set(siteIndex, action);
    const by = measuringStream(settings);
    const measured = measuredWafer(by, before.facts, before.readings, {
      screen: before.screening,
      overrides: before.overrides,
    });
    const siblings =
      settings.stream.subgroup === 'wafer' ? [] : await loadSiblings(actor, client, streamId, [before]);
    const changed = changedSiblings(
      siblings.map((one) => (one.id === waferId ? { ...one, judgeable: measured.level !== null } : one)),
    );
    const isChanged = changed.some(({ id }) => id === waferId);
    const wasCharted = siblings.find(({ id }) => id === waferId)?.isCharted ?? true;
    const charted = wasCharted === isChanged ? null : measured;
    await writeMeasured(client, streamId, waferId, charted ?? notCharted(measured));
    const others = changed.filter(({ id }) => id !== waferId);
    const standing = [{ id: waferId, charted }, ...(await writeChangedSiblings(actor, client, by, others))];
    tell({
      action: action === 'out' ? 'took out a reading' : 'put back a reading',
      subject: { kind: 'wafer', id: waferId },
      streamId,
      after: { siteIndex, reading: value, level: measured.level },
      why: reason,
    });
    const words = action === 'out' ? 'taken out' : 'put back';
    const why = `a reading of one of its wafers was ${words}: ${reason}`;
    await judgeAgain(actor, client, streamId, Infinity, why, (line) => {
      const point = line.points.find((one) => one.id === before.subgroupId);
      if (point === undefined) return [];
      for (const one of standing) placeMember(point, one.id, one.charted);
      summarise(point);
      return [point];
    });
    return { ok: true };
  });
}
