import { routeActor } from '@/app/route-actor';
import { listAuditEntries } from '@/lib/access/audit-trail';
import { auditQuery } from '@/lib/access/schema';
import { csvResponse } from '@/lib/csv-response';
import { readEnvironment } from '@/lib/env';

const MOST = 100_000;

/** The entries of the audit trail that the page's filters ask for, as a file. */
export async function GET(request: Request): Promise<Response> {
  const actor = await routeActor(request, 'read-audit');
  if (actor instanceof Response) return actor;
  const asked = Object.fromEntries(new URL(request.url).searchParams);
  const query = auditQuery(readEnvironment().siteTimeZone).parse(asked);
  const entries = await listAuditEntries(actor, query, { skip: 0, most: MOST });
  return csvResponse(
    'audit-trail.csv',
    [
      ...['entry', 'at', 'actor_kind', 'actor_id', 'actor', 'action', 'subject_kind', 'subject_id'],
      ...['subject', 'stream', 'before', 'after', 'why', 'mac'],
    ],
    entries.map((entry) => [
      ...[entry.id, entry.at, entry.actorKind, entry.actorId, entry.actorName, entry.action],
      ...[entry.subjectKind, entry.subjectId, entry.subjectName, entry.stream?.slug ?? null],
      ...[entry.before && JSON.stringify(entry.before), entry.after && JSON.stringify(entry.after)],
      ...[entry.why, entry.mac.toString('hex')],
    ]),
  );
}
