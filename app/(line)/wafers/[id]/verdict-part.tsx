import Link from 'next/link';
import { Figures } from '@/app/_ui/figures';
import { SectionHead } from '@/app/_ui/section-head';
import { StateMark } from '@/app/_ui/state-mark';
import { MEASURED_AGAIN } from '@/lib/excursions/charted-measurements';
import { signalSentence } from '@/lib/excursions/signal-sentence';
import { formatDateTime, formatNumber, formatPercent } from '@/lib/format';
import { specificationVerdicts, type SpecificationVerdict } from '@/lib/maps/specification-verdicts';
import { subgroupWords } from './subgroup-words';
import { waferHref } from './wafer-href';
import type { WaferShown } from './wafer-shown';
import styles from './page.module.css';

/** What was judged of the wafer: specification, the signals its subgroup completes, and its place among its siblings. */
export function VerdictPart({ shown }: { shown: WaferShown }) {
  const { wafer, study, signals, siblings } = shown;
  const { stream } = shown.settings;
  return (
    <section aria-labelledby="judged">
      <SectionHead id="judged">Judged</SectionHead>
      {wafer.notJudgedReason !== null && (
        <p>
          <StateMark needsPerson={wafer.notJudgedReason !== MEASURED_AGAIN}>
            Not judged: {wafer.notJudgedReason}.
          </StateMark>
        </p>
      )}
      <p>{subgroupWords(wafer, stream)}</p>
      {signals.length > 0 && (
        <ul className={styles.list}>
          {signals.map((signal) => (
            <li key={signal.id}>
              <StateMark needsPerson={signal.excursion?.state === 'open'}>{signalSentence(signal)}</StateMark>
              {signal.excursion !== null && (
                <>
                  , <Link href={`/excursions/${signal.excursion.id}`}>excursion {signal.excursion.id}</Link>,{' '}
                  {signal.excursion.state.replaceAll('-', ' ')}
                </>
              )}
            </li>
          ))}
        </ul>
      )}
      {study.specification === null ? (
        <p className="quiet">No specification is set for this stream.</p>
      ) : (
        <Figures
          figures={specificationVerdicts(
            study.specification.specification,
            study.measure.figures,
            stream.controlStatistic,
            study.isSpecified ? wafer.specification : null,
          ).map((verdict) => ({
            name: `${verdict.name}, specified ${limitWords(verdict, shown)}`,
            value: verdictWords(verdict, shown),
            ink: verdict.verdict === 'above' || verdict.verdict === 'below' ? 'call' : 'measured',
          }))}
        />
      )}
      {siblings.length > 1 && (
        <>
          <SectionHead level={3}>The wafers of its {stream.subgroup}</SectionHead>
          <ol className={styles.siblings}>
            {siblings.map((sibling) => (
              <li key={sibling.id}>
                <Link
                  href={waferHref(sibling.id, shown.view)}
                  aria-current={sibling.id === wafer.id ? 'page' : undefined}
                  title={`processed ${formatDateTime(sibling.processedAt, shown.timeZone)}`}
                >
                  {sibling.id === wafer.id ? <strong>{sibling.wafer}</strong> : sibling.wafer}
                </Link>{' '}
                <span className="quiet small">
                  {sibling.notJudgedReason === null || sibling.notJudgedReason === MEASURED_AGAIN
                    ? `${shown.reading(sibling[stream.controlStatistic])}, s ${formatPercent(sibling.relativeStandardDeviationPercent)}`
                    : 'not judged'}
                  {sibling.notJudgedReason === MEASURED_AGAIN && ', measured again, not charted'}
                  {sibling.isOutOfSpecification && ', out of specification'}
                </span>
              </li>
            ))}
          </ol>
        </>
      )}
    </section>
  );
}

function verdictWords({ kind, value, verdict }: SpecificationVerdict, shown: WaferShown): string {
  const text = kind === 'reading' ? shown.reading(value) : formatPercent(value);
  return `${text}, ${verdict}`;
}

function limitWords({ kind, lower, upper }: SpecificationVerdict, shown: WaferShown): string {
  const text = (value: number | null) => (kind === 'reading' ? shown.reading(value) : formatPercent(value));
  if (lower === null) return `at most ${text(upper)}`;
  if (upper === null) return `at least ${text(lower)}`;
  return `${kind === 'reading' ? formatNumber(lower / shown.scale) : formatNumber(lower)} to ${text(upper)}`;
}
