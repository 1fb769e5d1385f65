import Link from 'next/link';
import { STATUS_WORDS } from '@/lib/maps/bad-reason-words';
import { formatSite } from './format-site';
import type { WaferShown } from './wafer-shown';
import styles from './page.module.css';

/** The readings that are out of the figures, each with its reason and, where it can be, the way back. */
export function BadReadings({ shown }: { shown: WaferShown }) {
  const { wafer, study, decisions } = shown;
  if (wafer.badSites.length === 0) return <p>Every reading counts.</p>;
  const outOf = (siteIndex: number) => decisions.findLast((one) => one.siteIndex === siteIndex);
  return (
    <>
      <p>
        {wafer.badSites.length} {wafer.badSites.length === 1 ? 'reading is' : 'readings are'} kept and shown,
        crossed on the map, and left out of the figures:
      </p>
      <ul className={styles.list}>
        {wafer.badSites.map(({ siteIndex, reason }) => {
          const word = outOf(siteIndex);
          const value = study.values[siteIndex] ?? null;
          return (
            <li key={siteIndex}>
              {formatSite(shown, siteIndex)}: {STATUS_WORDS[reason]}
              {reason === 'by-hand' && word !== undefined && ` (${word.actor}: ${word.reason})`}
              {value !== null && value > 0 && (
                <>
                  .{' '}
                  <Link href={`/wafers/${wafer.id}?site=in-${siteIndex}#decide`} scroll>
                    Put back…
                  </Link>
                </>
              )}
            </li>
          );
        })}
      </ul>
    </>
  );
}
