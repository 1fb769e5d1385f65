import { routeActor } from '@/app/route-actor';
import { tooManyFiles } from '../too-many-files';
import { sentName } from '../sent-name';
import { AppError, problemResponse } from '@/lib/errors';
import { keepWaitingFile, MOST_FILE_BYTES, tooLargeWords } from '@/lib/maps/waiting-file';

/** Takes the file that the intake page sends, as the body, and answers with the address of its check. */
export async function POST(request: Request): Promise<Response> {
  try {
    const actor = await routeActor(request, 'record-maps');
    if (actor instanceof Response) return actor;
    const tooMany = tooManyFiles(actor);
    if (tooMany !== null) return tooMany;
    if (Number(request.headers.get('content-length') ?? 0) > MOST_FILE_BYTES) {
      throw new AppError('invalid', tooLargeWords());
    }
    if (request.body === null) throw new AppError('invalid', 'No file came: the body is empty.');
    const kept = await keepWaitingFile(actor, sentName(request.headers), request.body);
    if (!kept.ok) throw new AppError('invalid', kept.reason);
    return Response.json({ href: `/intake/${kept.token}` }, { status: 201 });
  } catch (error) {
    return problemResponse(error);
  }
}
