import Link from 'next/link';
import { SectionHead } from '@/app/_ui/section-head';
import { StateMark } from '@/app/_ui/state-mark';
import { signalSentence } from '@/lib/excursions/signal-sentence';
import { when } from '@/lib/excursions/stream-answer';
import type { StandingCase } from '@/lib/excursions/stream-standing';
import { toldWhen } from '@/lib/excursions/told-when';
import { formatAge } from '@/lib/format';
import type { StreamView } from './stream-view';

/** The cases of the stream that are not closed, each with its newest signal and who has it. */
export function StreamCases({ view }: { view: StreamView }) {
  const { standing, settings, now } = view;
  if (standing.cases.length === 0) return null;
  const { subgroup, slug } = settings.stream;
  return (
    <section aria-labelledby="cases">
      <SectionHead id="cases" aside={<Link href={`/excursions?stream=${slug}`}>All cases</Link>}>
        {standing.openCases === 1 ? 'One case not closed' : `${standing.openCases} cases not closed`}
      </SectionHead>
      <ul className="plain-list">
        {standing.cases.map((one) => (
          <li key={one.id} style={{ padding: '4px 0' }}>
            <Link href={`/excursions/${one.id}`} prefetch={false}>
              <StateMark needsPerson>Case {one.id}</StateMark>
            </Link>
            {one.signal !== null && `: ${toldWhen(signalSentence(one.signal), when(one.signal, subgroup))}`}
            <br />
            <span className="quiet small">{stateWords(one, now)}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}

function stateWords({ state, openedAt, acknowledgedBy }: StandingCase, now: Date): string {
  const age = formatAge(now.getTime() - openedAt.getTime());
  if (state === 'open') return `Open ${age}, nobody yet.`;
  const words = state === 'acknowledged' ? 'Acknowledged' : 'Under investigation, acknowledged';
  return `${words} by ${acknowledgedBy ?? 'someone'}, open ${age}.`;
}
