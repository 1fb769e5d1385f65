import Link from 'next/link';
import styles from './cells.module.css';

/** A wafer that leads to its page, and quietly the run or lot that carried it. */
export function WaferLink({ id, wafer, runOrLot }: { id: string; wafer: string; runOrLot: string }) {
  return (
    <span className={styles.line}>
      <Link href={`/wafers/${id}`} prefetch={false}>
        {wafer}
      </Link>{' '}
      <span className="quiet">{runOrLot}</span>
    </span>
  );
}
