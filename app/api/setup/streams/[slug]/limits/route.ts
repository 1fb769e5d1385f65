import { listLimitRevisions } from '@/lib/limits/data';
import { streamCsv } from '../../../stream-csv';

const COLUMNS = [
  'revision',
  'state',
  'origin',
  'in_force_from',
  'subgroups',
  'level_lower',
  'level_centre',
  'level_upper',
  'level_sigma',
  'moving_range_centre',
  'moving_range_upper',
  'within_lower_percent',
  'within_centre_percent',
  'within_upper_percent',
  'between_centre',
  'between_upper',
  'author',
  'reason',
  'drafted_at',
  'approved_by',
  'approved_at',
  'approval_reason',
  'superseded_from',
];

/** The revisions of a stream's limits as a file. */
export const GET = streamCsv('limits', COLUMNS, async (actor, { stream }) => {
  const revisions = await listLimitRevisions(actor, stream.id);
  return revisions.map(({ limits: { n, level, movingRange, within, between }, ...one }) => [
    one.revision,
    one.state,
    one.origin,
    one.effectiveFrom,
    n,
    level.lower,
    level.centre,
    level.upper,
    level.sigma,
    movingRange.centre,
    movingRange.upper,
    within?.lower ?? null,
    within?.centre ?? null,
    within?.upper ?? null,
    between?.centre ?? null,
    between?.upper ?? null,
    one.author,
    one.reason,
    one.draftedAt,
    one.approvedBy,
    one.approvedAt,
    one.approvalReason,
    one.supersededFrom,
  ]);
});
