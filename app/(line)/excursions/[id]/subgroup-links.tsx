import Link from 'next/link';
import { subgroupLabel } from '@/lib/excursions/subgroup-label';
import type { CaseStream, NamedSubgroup } from '@/lib/excursions/types';
import styles from '../../cells.module.css';

/** A subgroup that leads to its wafer, or, where it has several, to its place on the stream's charts. */
export function SubgroupLink({ stream, subgroup }: { stream: CaseStream; subgroup: NamedSubgroup }) {
  const [wafer] = subgroup.wafers;
  const href =
    subgroup.wafers.length === 1 && wafer
      ? `/wafers/${wafer.id}`
      : `/streams/${stream.slug}?at=${subgroup.id}`;
  return (
    <Link href={href} prefetch={false} className={styles.line}>
      {subgroupLabel(stream.subgroup, subgroup.key)}
    </Link>
  );
}

/** The same with each of its wafers, where there are several. */
export function SubgroupWithWafers({ stream, subgroup }: { stream: CaseStream; subgroup: NamedSubgroup }) {
  return (
    <>
      <SubgroupLink stream={stream} subgroup={subgroup} />
      {subgroup.wafers.length > 1 && (
        <span className="quiet small">
          {' '}
          wafers{' '}
          {subgroup.wafers.map(({ id, wafer }, at) => (
            <span key={id}>
              {at > 0 && ', '}
              <Link href={`/wafers/${id}`} prefetch={false}>
                {wafer}
              </Link>
            </span>
          ))}
        </span>
      )}
    </>
  );
}
