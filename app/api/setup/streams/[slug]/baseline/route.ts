import { readEnvironment } from '@/lib/env';
import { AppError } from '@/lib/errors';
import { listBaselinePoints } from '@/lib/limits/data';
import { baselineSpan } from '@/lib/limits/schema';
import { streamCsv } from '../../../stream-csv';

const COLUMNS = ['subgroup', 'processed_at', 'level', 'within_percent', 'between', 'wafers'];

/** The judged subgroups of a span as a file. */
export const GET = streamCsv('baseline', COLUMNS, async (actor, { stream }, query) => {
  const span = baselineSpan(readEnvironment().siteTimeZone).safeParse(Object.fromEntries(query));
  if (!span.success) throw new AppError('invalid', 'Give the span as from and to, such as 2031-04-05T06:07.');
  const points = await listBaselinePoints(actor, stream.id, span.data);
  return points.map(({ key, at, level, within, between, wafers }) => [
    key,
    at,
    level,
    within,
    between,
    wafers,
  ]);
});
