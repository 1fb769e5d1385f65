import { arrayLiteral, type Column } from '@/lib/database/columnar';
import type { LineExcursion, LineLimits, LineSignal } from './line';

/** How the first limits of a stream, proposed by its first baseline, are written. */
export const LIMIT_COLUMNS: readonly Column<{
  streamId: string;
  limits: LineLimits;
  author: string;
  at: Date;
}>[] = [
  { name: 'stream_id', type: 'bigint', value: (row) => row.streamId },
  { name: 'id', type: 'bigint', value: (row) => row.limits.id },
  { name: 'revision', type: 'integer', value: (row) => row.limits.revision },
  { name: 'state', type: 'text', value: () => 'provisional' },
  { name: 'origin', type: 'text', value: () => 'first-baseline' },
  {
    name: 'effective_from',
    type: 'timestamptz',
    value: (row) => new Date(row.limits.effectiveFrom).toISOString(),
  },
  { name: 'subgroups', type: 'integer', value: (row) => row.limits.limits.n },
  { name: 'baseline_ids', type: 'bigint[]', value: (row) => arrayLiteral(row.limits.baselineIds) },
  { name: 'centre', type: 'float8', value: (row) => row.limits.limits.level.centre },
  { name: 'sigma', type: 'float8', value: (row) => row.limits.limits.level.sigma },
  { name: 'lower', type: 'float8', value: (row) => row.limits.limits.level.lower },
  { name: 'upper', type: 'float8', value: (row) => row.limits.limits.level.upper },
  { name: 'moving_range_centre', type: 'float8', value: (row) => row.limits.limits.movingRange.centre },
  { name: 'moving_range_upper', type: 'float8', value: (row) => row.limits.limits.movingRange.upper },
  { name: 'within_log_mean', type: 'float8', value: (row) => row.limits.limits.within?.logMean ?? null },
  { name: 'within_log_sigma', type: 'float8', value: (row) => row.limits.limits.within?.logSigma ?? null },
  { name: 'within_lower', type: 'float8', value: (row) => row.limits.limits.within?.lower ?? null },
  { name: 'within_centre', type: 'float8', value: (row) => row.limits.limits.within?.centre ?? null },
  { name: 'within_upper', type: 'float8', value: (row) => row.limits.limits.within?.upper ?? null },
  { name: 'between_centre', type: 'float8', value: (row) => row.limits.limits.between?.centre ?? null },
  { name: 'between_upper', type: 'float8', value: (row) => row.limits.limits.between?.upper ?? null },
  { name: 'between_wafers', type: 'integer', value: (row) => row.limits.limits.between?.wafers ?? null },
  { name: 'author', type: 'text', value: (row) => row.author },
  { name: 'drafted_at', type: 'timestamptz', value: (row) => row.at.toISOString() },
  {
    name: 'reason',
    type: 'text',
    value: (row) => `the first ${row.limits.limits.n} subgroups of the stream`,
  },
];

/** How a case that a signal opened or joined is written. */
export const EXCURSION_COLUMNS: readonly Column<{ streamId: string; excursion: LineExcursion; at: Date }>[] =
  [
    { name: 'stream_id', type: 'bigint', value: (row) => row.streamId },
    { name: 'id', type: 'bigint', value: (row) => row.excursion.id },
    { name: 'chart', type: 'text', value: (row) => row.excursion.chart },
    { name: 'side', type: 'text', value: (row) => row.excursion.side },
    { name: 'family', type: 'text', value: (row) => row.excursion.family },
    { name: 'first_subgroup_id', type: 'bigint', value: (row) => row.excursion.firstId },
    { name: 'last_subgroup_id', type: 'bigint', value: (row) => row.excursion.lastId },
    { name: 'opened_at', type: 'timestamptz', value: (row) => row.at.toISOString() },
  ];

type EntryRow = {
  streamId: string;
  excursion: LineExcursion;
  entry: LineExcursion['entries'][number];
  author: string;
  at: Date;
};

export const ENTRY_COLUMNS: readonly Column<EntryRow>[] = [
  { name: 'stream_id', type: 'bigint', value: (row) => row.streamId },
  { name: 'excursion_id', type: 'bigint', value: (row) => row.excursion.id },
  { name: 'at', type: 'timestamptz', value: (row) => row.at.toISOString() },
  { name: 'actor', type: 'text', value: (row) => row.author },
  { name: 'action', type: 'text', value: (row) => row.entry.action },
  { name: 'note', type: 'text', value: (row) => row.entry.note },
];

export const SIGNAL_COLUMNS: readonly Column<{ streamId: string; signal: LineSignal; at: Date }>[] = [
  { name: 'stream_id', type: 'bigint', value: (row) => row.streamId },
  { name: 'id', type: 'bigint', value: (row) => row.signal.id },
  { name: 'chart', type: 'text', value: (row) => row.signal.chart },
  { name: 'rule', type: 'text', value: (row) => row.signal.rule },
  { name: 'side', type: 'text', value: (row) => row.signal.side },
  { name: 'first_subgroup_id', type: 'bigint', value: (row) => row.signal.firstId },
  { name: 'participant_ids', type: 'bigint[]', value: (row) => arrayLiteral(row.signal.participantIds) },
  { name: 'last_subgroup_id', type: 'bigint', value: (row) => row.signal.lastId },
  { name: 'completions', type: 'integer', value: (row) => row.signal.completions },
  { name: 'limit_revision_id', type: 'bigint', value: (row) => row.signal.limits?.id ?? null },
  { name: 'excursion_id', type: 'bigint', value: (row) => row.signal.excursion?.id ?? null },
  { name: 'raised_at', type: 'timestamptz', value: (row) => row.at.toISOString() },
  {
    name: 'withdrawn_at',
    type: 'timestamptz',
    value: (row) => (row.signal.withdrawn === null ? null : row.at.toISOString()),
  },
  { name: 'withdrawn_reason', type: 'text', value: (row) => row.signal.withdrawn },
];
