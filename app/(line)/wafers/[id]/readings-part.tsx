import { Beside } from '@/app/_ui/beside';
import { SectionHead } from '@/app/_ui/section-head';
import { IfMay } from '@/app/if-may';
import { formatDateTime } from '@/lib/format';
import { waferTitle } from '@/lib/maps/wafer-title';
import { BadReadings } from './bad-readings';
import { DecisionForm } from './decision-form';
import { decisionChoices } from './decision-choices';
import { ReadingTable } from './reading-table';
import type { WaferShown } from './wafer-shown';
import styles from './page.module.css';

/** Which readings are out and why, who decided so, the way to decide otherwise, and all readings as a table. */
export function ReadingsPart({ shown, site }: { shown: WaferShown; site: string }) {
  const { wafer, decisions, timeZone } = shown;
  const choices = decisionChoices(shown);
  const chosen = choices.some(({ value }) => value === site) ? site : '';
  return (
    <section aria-labelledby="readings">
      <SectionHead id="readings">Readings</SectionHead>
      <BadReadings shown={shown} />
      {decisions.length > 0 && (
        <>
          <SectionHead level={3}>Decided by people</SectionHead>
          <ol className={styles.list} reversed>
            {[...decisions].reverse().map(({ siteIndex, action, actor, reason, at }) => (
              <li key={`${at.toISOString()}-${siteIndex}`}>
                Site {siteIndex + 1} {action === 'out' ? 'taken out' : 'put back'} by {actor},{' '}
                {formatDateTime(at, timeZone)}: {reason}
              </li>
            ))}
          </ol>
        </>
      )}
      <div id="decide">
        <Beside summary="Take a reading out, or put one back" open={site !== ''} key={site}>
          <IfMay permission="exclude-reading" streamId={wafer.streamId}>
            <DecisionForm waferId={wafer.id} choices={choices} chosen={chosen} />
          </IfMay>
        </Beside>
      </div>
      <Beside summary={`All ${wafer.readings.length} readings as a table`}>
        <ReadingTable shown={shown} title={waferTitle(wafer.facts)} />
      </Beside>
      <p className="small">
        <a href={`/api/wafers/${wafer.id}/readings.csv`} download>
          Readings as CSV
        </a>
      </p>
    </section>
  );
}
