import Link from 'next/link';
import { STATUS_WORDS } from '@/lib/maps/bad-reason-words';
import { badSiteGroups } from '@/lib/maps/bad-site-groups';
import { formatSite } from './format-site';
import { waferHref } from './wafer-href';
import type { WaferShown } from './wafer-shown';
import styles from './page.module.css';

/** The readings that are out of the figures, each with its reason and, where it can be, the way back. */
export function BadReadings({ shown }: { shown: WaferShown }) {
  const { wafer, study, decisions } = shown;
  const count = wafer.badSites.length;
  if (count === 0) return <p>Every reading counts.</p>;
  return (
    <>
      <p>
        {count} {count === 1 ? 'reading is' : 'readings are'} kept and shown, crossed on the map, and left out
        of the figures:
      </p>
      <ul className={styles.list}>
        {badSiteGroups(wafer.badSites).map(({ reason, siteIndices }) => {
          const [first = 0] = siteIndices;
          const word = decisions.findLast((one) => one.siteIndex === first);
          const value = study.values[first] ?? null;
          return (
            <li key={`${reason}-${first}`}>
              {siteIndices.length === 1
                ? formatSite(shown, first)
                : siteIndices.length === wafer.readings.length
                  ? `All ${siteIndices.length} sites`
                  : `Sites ${siteIndices.map((site) => site + 1).join(', ')}`}
              : {STATUS_WORDS[reason]}
              {reason === 'by-hand' && word !== undefined && ` (${word.actor}: ${word.reason})`}
              {siteIndices.length === 1 && value !== null && value > 0 && (
                <>
                  .{' '}
                  <Link href={waferHref(wafer.id, shown.view, `in-${first}`)} prefetch={false}>
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
