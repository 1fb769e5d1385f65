import { streamCsv } from '../../../stream-csv';

const COLUMNS = [
  'revision',
  'in_force_from',
  'mean_lower',
  'mean_upper',
  'site_lower',
  'site_upper',
  'nonuniformity_metric',
  'nonuniformity_upper_percent',
  'author',
  'reason',
  'created_at',
];

/** The revisions of a stream's specification as a file. */
export const GET = streamCsv('specifications', COLUMNS, (_actor, { specifications }) =>
  specifications.map(({ revision, effectiveFrom, specification: s, author, reason, createdAt }) => [
    revision,
    effectiveFrom,
    s.meanLower,
    s.meanUpper,
    s.siteLower,
    s.siteUpper,
    s.nonuniformityMetric,
    s.nonuniformityUpper,
    author,
    reason,
    createdAt,
  ]),
);
