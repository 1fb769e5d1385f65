import type { AuditQuery } from '@/lib/access/schema';
import { siteTimeField } from '@/lib/site-time';

/** An address that asks for these entries of the audit trail; what asks for nothing is left out. */
export function auditAddress(path: string, query: AuditQuery, timeZone: string): string {
  const { who, stream, action, from, to, page } = query;
  const asked = {
    who,
    stream,
    action,
    from: from && siteTimeField(from, timeZone),
    to: to && siteTimeField(to, timeZone),
    page: page > 1 ? String(page) : null,
  };
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(asked)) if (value !== null) search.set(name, value);
  const text = search.toString();
  return text === '' ? path : `${path}?${text}`;
}
