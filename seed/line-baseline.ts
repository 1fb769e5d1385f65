import type { Actor } from '@/lib/access/actor';
import { calibrationStudy } from '@/lib/limits/calibration-study';
import { listCalibrationWafers, listLimitRevisions } from '@/lib/limits/data';
import { approveLimits, draftLimits } from '@/lib/limits/mutations';
import { findStreamSettings } from '@/lib/streams/data';
import { inForce } from '@/lib/streams/in-force';
import { reviseTarget } from '@/lib/streams/mutations';

/** On this evening the process owner settles what the first weeks have shown. */
export const BASELINE_DAY = 35;

/** Streams with so many subgroups by then get limits from all of them; on the others the first limits are approved. */
const ENOUGH_SUBGROUPS = 60;

/**
 * What the process owner of the demonstration line does after the first weeks: approves limits, and for implants and
 * diffusions sets the calibration factor between the model of their layers and what is measured.
 */
export async function settleBaseline(actor: Actor, slug: string, from: Date, evening: Date): Promise<void> {
  const settings = await findStreamSettings(actor, slug);
  if (settings === null) return;
  const { stream, targets } = settings;
  const span = { from, to: evening };
  const target = inForce(targets, evening)?.target;
  if (target !== undefined && (stream.kind === 'implant' || stream.kind === 'diffusion')) {
    const wafers = await listCalibrationWafers(actor, stream.id, stream.controlStatistic, span);
    const { found } = calibrationStudy(target, stream.kind, wafers);
    if (found !== null) {
      const calibrated = { ...target, calibrationFactor: found.factor, calibrationPercent: found.percent };
      const reason = `calibrated on the ${found.subgroups} subgroups of the first five weeks`;
      await reviseTarget(actor, stream.id, calibrated, {
        effectiveFrom: evening,
        reason,
        calibrationWafers: found.wafers,
      });
    }
  }
  const first = (await listLimitRevisions(actor, stream.id))[0];
  if (first === undefined) return;
  const drafted =
    first.state === 'provisional' &&
    (await draftLimits(actor, stream.id, span, 'all subgroups of the first five weeks', evening)).ok
      ? (await listLimitRevisions(actor, stream.id))[0]
      : undefined;
  const chosen = drafted !== undefined && drafted.limits.n >= ENOUGH_SUBGROUPS ? drafted : first;
  const reason = chosen === drafted ? 'more subgroups, steadier limits' : 'the first baseline was quiet';
  await approveLimits(actor, chosen.id, { reason, effectiveFrom: evening, at: evening });
}
