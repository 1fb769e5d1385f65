import type { ListedEntry } from '@/lib/access/audit-trail';

/** The page of what an entry is about; null where it has none. */
export function subjectHref({
  subjectKind,
  subjectId,
  stream,
}: Pick<ListedEntry, 'subjectKind' | 'subjectId' | 'stream'>): string | null {
  switch (subjectKind) {
    case 'batch':
      return `/intake/batches/${subjectId}`;
    case 'wafer':
      return `/wafers/${subjectId}`;
    case 'excursion':
      return `/excursions/${subjectId}`;
    case 'stream':
      return stream && `/streams/${stream.slug}`;
    case 'event':
      return stream && `/setup/streams/${stream.slug}/events`;
    case 'limit-revision':
      return stream && `/setup/streams/${stream.slug}/limits`;
    case 'target-revision':
    case 'specification-revision':
      return stream && `/setup/streams/${stream.slug}`;
    default:
      return null;
  }
}
