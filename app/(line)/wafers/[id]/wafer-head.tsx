import { KeyLink } from '@/app/_ui/key-link';
import { PageHead } from '@/app/_ui/page-head';
import { signalSentence } from '@/lib/excursions/signal-sentence';
import { formatDateTime, formatNumber } from '@/lib/format';
import { waferAnswer } from '@/lib/maps/wafer-answer';
import type { WaferNeighbour } from '@/lib/maps/wafer-record';
import { waferTitle } from '@/lib/maps/wafer-title';
import { waferHref } from './wafer-href';
import type { WaferShown } from './wafer-shown';
import styles from './page.module.css';

/** The wafer in one sentence, what it rests on, and the way to the wafers beside it. */
export function WaferHead({ shown }: { shown: WaferShown }) {
  const { wafer, study, view } = shown;
  const { stream } = shown.settings;
  const answer = waferAnswer({
    name: waferTitle(wafer.facts),
    notJudgedReason: wafer.notJudgedReason,
    outOfSpecification: wafer.specification.map(specificationWords),
    signal: openSignal(shown),
    differencePercent: study.against?.differencePercent ?? null,
    value: study.statistic === null ? null : shown.reading(study.statistic),
    habits: study.habits,
    whose: stream.chamber === '' ? 'this tool' : 'this chamber',
  });
  const href = ({ id }: WaferNeighbour) => waferHref(id, view);
  const { previous, next } = shown;
  return (
    <PageHead
      answer={answer}
      sub={subWords(shown)}
      back={{ href: `/streams/${stream.slug}`, label: stream.name }}
    >
      <nav aria-label="Wafers beside this one" className={styles.way}>
        {previous !== null && (
          <KeyLink href={href(previous)} shortcut="ArrowLeft">
            ← {neighbourName(previous)}
          </KeyLink>
        )}
        {next !== null && (
          <KeyLink href={href(next)} shortcut="ArrowRight">
            {neighbourName(next)} →
          </KeyLink>
        )}
        {next === null && <span className="quiet">the newest of its stream</span>}
      </nav>
    </PageHead>
  );
}

function subWords({ wafer, settings, timeZone }: WaferShown): string {
  const { facts } = wafer;
  const { tool, chamber } = settings.stream;
  const gauge = facts.gauge === null ? '' : ` on ${facts.gauge}`;
  const at = facts.temperatureC === null ? '' : ` at ${formatNumber(facts.temperatureC, 3)} °C`;
  return [
    [tool, chamber].filter((word) => word !== '').join(' '),
    ...(facts.slot === null ? [] : [`slot ${facts.slot}`]),
    `processed ${formatDateTime(facts.processedAt, timeZone)}, measured ${formatDateTime(facts.measuredAt, timeZone)}${gauge}${at}`,
  ].join(' · ');
}

function neighbourName({ wafer, runOrLot }: WaferNeighbour): string {
  return waferTitle({ wafer, run: runOrLot === '' ? null : runOrLot, lot: null });
}

/** The first signal of its point that still has a case to be answered. */
function openSignal({ signals, settings }: WaferShown): string | null {
  const { subgroup } = settings.stream;
  const open = signals.find(
    ({ chart, excursion }) => chart !== 'specification' && excursion !== null && excursion.state !== 'closed',
  );
  if (open === undefined) return null;
  return subgroup === 'wafer' ? signalSentence(open) : `${signalSentence(open)} with its ${subgroup}`;
}

function specificationWords(fault: string): string {
  const [rule = '', side] = fault.split(':');
  return signalSentence({
    chart: 'specification',
    rule,
    side: side === 'below' ? 'below' : 'above',
    participantIds: [],
    completions: 1,
  });
}
