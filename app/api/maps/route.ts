import { AppError, problemResponse } from '@/lib/errors';
import { sentOptions } from '@/lib/maps/schema';
import { MOST_SENT_BYTES, takeSentFile } from '@/lib/maps/take-sent-file';
import { tooLargeWords } from '@/lib/maps/waiting-file';
import { routeActor } from '@/app/route-actor';
import { sentName } from '../sent-name';
import { tooManyFiles } from '../too-many-files';

/**
 * Records the wafer maps of a CSV file that is sent as the body, with the command's flags in the address. Answers as
 * `intake --json` prints: 200, or 422 where something was refused.
 */
export async function POST(request: Request): Promise<Response> {
  const actor = await routeActor(request, 'record-maps');
  if (actor instanceof Response) return actor;
  try {
    const tooMany = tooManyFiles(actor);
    if (tooMany !== null) return tooMany;
    const options = sentOptions(new URL(request.url).searchParams);
    if ('faults' in options) throw new AppError('invalid', `${options.faults.join('; ')}.`);
    if (Number(request.headers.get('content-length') ?? 0) > MOST_SENT_BYTES) {
      throw new AppError('invalid', tooLargeWords(MOST_SENT_BYTES));
    }
    if (request.body === null) throw new AppError('invalid', 'No file came: the body is empty.');
    const file = { name: sentName(request.headers), body: request.body };
    const taken = await takeSentFile(actor, file, options);
    if (!taken.ok) throw new AppError('invalid', taken.reason);
    const { recorded, repeated, refused, refusals, notices } = taken.result;
    const answer = { recorded, repeated, refused, refusals, notices };
    return Response.json(answer, { status: refused > 0 ? 422 : 200 });
  } catch (error) {
    return problemResponse(error);
  }
}
