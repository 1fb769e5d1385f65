import type { Permission } from '@/lib/access/permission';
import type { WalkLine } from './walk-line';

/** What someone needs: a permission, to be a person who signed in, or nothing. */
export type Need = Permission | 'person' | 'anyone';

/** What the walk knows of the line it walks on, and the token of a file that waits to be recorded. */
export type WalkPlace = WalkLine & { waiting: string };

/** Every page, by its name in Next's manifest. */
export const PAGES: Record<string, Need> = {
  '/(line)/account/page': 'person',
  '/(line)/audit/page': 'read-audit',
  '/(line)/excursions/[id]/page': 'see-line',
  '/(line)/excursions/page': 'see-line',
  '/(line)/expected/page': 'see-line',
  '/(line)/intake/[token]/page': 'record-maps',
  '/(line)/intake/batches/[id]/page': 'see-line',
  '/(line)/intake/page': 'see-line',
  '/(line)/measure-again/page': 'see-line',
  '/(line)/methods/page': 'see-line',
  '/(line)/page': 'see-line',
  '/(line)/setup/page': 'see-line',
  '/(line)/setup/people/[id]/page': 'manage-people',
  '/(line)/setup/people/page': 'manage-people',
  '/(line)/setup/permissions/page': 'change-settings',
  '/(line)/setup/plans/new/page': 'create-stream',
  '/(line)/setup/streams/[slug]/events/page': 'see-line',
  '/(line)/setup/streams/[slug]/limits/page': 'see-line',
  '/(line)/setup/streams/[slug]/page': 'see-line',
  '/(line)/setup/streams/[slug]/specification/page': 'see-line',
  '/(line)/setup/streams/[slug]/use/page': 'see-line',
  '/(line)/setup/streams/new/page': 'create-stream',
  '/(line)/setup/tokens/page': 'manage-tokens',
  '/(line)/streams/[slug]/page': 'see-line',
  '/(line)/streams/page': 'see-line',
  '/(line)/wafers/[id]/page': 'see-line',
  '/choose-password/page': 'anyone',
  '/sign-in/page': 'anyone',
};

/** Pages that are not there, whoever asks: the first administrator was entered, and two that Next makes itself. */
export const ABSENT_PAGES = ['/_global-error/page', '/_not-found/page', '/first-administrator/page'];

type Method = 'GET' | 'POST';

/** Every route, by its name in Next's manifest, with each method that it answers. */
export const ROUTES: Record<string, Partial<Record<Method, Need>>> = {
  '/api/audit.csv/route': { GET: 'read-audit' },
  '/api/board/route': { GET: 'see-line' },
  '/api/excursions/[id]/[table]/route': { GET: 'see-line' },
  '/api/excursions/csv/route': { GET: 'see-line' },
  '/api/expected/budget.csv/route': { GET: 'see-line' },
  '/api/expected/curves.csv/route': { GET: 'see-line' },
  '/api/intake/[token]/problems/route': { GET: 'record-maps' },
  '/api/intake/batches/[id]/refusals/route': { GET: 'see-line' },
  '/api/intake/batches/[id]/streams/route': { GET: 'see-line' },
  '/api/intake/batches/route': { GET: 'see-line' },
  '/api/intake/route': { POST: 'record-maps' },
  '/api/maps/route': { POST: 'record-maps' },
  '/api/measure-again/route': { GET: 'see-line' },
  '/api/setup/plans/route': { GET: 'see-line' },
  '/api/setup/streams/[slug]/baseline/route': { GET: 'see-line' },
  '/api/setup/streams/[slug]/events/route': { GET: 'see-line' },
  '/api/setup/streams/[slug]/limits/route': { GET: 'see-line' },
  '/api/setup/streams/[slug]/specifications/route': { GET: 'see-line' },
  '/api/setup/streams/[slug]/targets/route': { GET: 'see-line' },
  '/api/setup/streams/route': { GET: 'see-line' },
  '/api/streams.csv/route': { GET: 'see-line' },
  '/api/streams/[slug]/points.csv/route': { GET: 'see-line' },
  '/api/streams/[slug]/wafers.csv/route': { GET: 'see-line' },
  '/api/streams/route': { GET: 'see-line' },
  '/api/wafers/[id]/readings.csv/route': { GET: 'see-line' },
  '/icon.svg/route': { GET: 'anyone' },
};

/** The accounts library's endpoints have a table of their own; this one route leads to all of them. */
export const LIBRARY_ROUTE = '/api/auth/[...all]/route';

/** What the library's endpoints in use answer to nobody, with a body that holds nothing. */
export const LIBRARY_TO_NOBODY: Record<string, number> = {
  'POST /sign-in/email': 400,
  'POST /sign-in/social': 400,
  'POST /sign-in/demonstration': 400,
  'GET /callback/plant': 302,
  'POST /sign-out': 200,
  'POST /change-password': 401,
  'POST /reset-password': 400,
  'POST /revoke-sessions': 401,
  'POST /revoke-other-sessions': 401,
};

/** The address of a page or route on the line that is walked. */
export function addressOf(name: string, { own, spare, waiting }: WalkPlace): string {
  return (
    name
      .replace(/\/(page|route)$/, '')
      .replace('/(line)', '')
      .replace('/excursions/[id]', `/excursions/${own.excursionId}`)
      .replace('/wafers/[id]', `/wafers/${own.waferId}`)
      .replace('/batches/[id]', `/batches/${own.batchId}`)
      .replace('/people/[id]', `/people/${spare.id}`)
      .replace('[slug]', own.slug)
      .replace('[token]', waiting)
      .replace('[table]', 'log') || '/'
  );
}
