import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { readEnvironment } from '@/lib/env';
import { AppError, problemResponse } from '@/lib/errors';
import { checkedFile } from '@/lib/maps/checked-file';
import { givenWords } from '@/lib/maps/schema';
import { findWaitingFile } from '@/lib/maps/waiting-file';

/** The problems of a file that waits to be recorded, as a file. */
export async function GET(request: Request, { params }: { params: Promise<{ token: string }> }) {
  const actor = await routeActor(request, 'record-maps');
  if (actor instanceof Response) return actor;
  const file = await findWaitingFile(actor, (await params).token);
  if (file === null) return problemResponse(new AppError('not-found', 'No such file waits here.'));
  const query = Object.fromEntries(new URL(request.url).searchParams);
  const { words } = givenWords(query, readEnvironment().siteTimeZone);
  const { problems } = await checkedFile(actor, file, words);
  return csvResponse(
    `problems-of-${file.name}.csv`,
    ['file', 'line', 'column', 'measurement', 'reason'],
    problems.map((one) => [one.file, one.line, one.column, one.measurement, one.reason]),
  );
}
