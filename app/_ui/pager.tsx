import Link from 'next/link';

/** Where the reader is in a long list, and the way on. A null address has no further page. */
export function Pager(props: { label: string; where: string; newer: string | null; older: string | null }) {
  return (
    <nav aria-label={props.label} style={{ display: 'flex', gap: 16, margin: '12px 0', minHeight: 36 }}>
      {props.newer !== null && (
        <Link href={props.newer} prefetch={false}>
          ← newer
        </Link>
      )}
      <span className="quiet">{props.where}</span>
      {props.older !== null && (
        <Link href={props.older} prefetch={false}>
          older →
        </Link>
      )}
    </nav>
  );
}
