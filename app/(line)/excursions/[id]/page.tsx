import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { CaseChart } from '@/app/_charts/case-chart';
import { Notice } from '@/app/_ui/notice';
import { PageHead } from '@/app/_ui/page-head';
import { SectionHead } from '@/app/_ui/section-head';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { caseAnswer, caseExtent, leadSignal } from '@/lib/excursions/case-answer';
import { findExcursion } from '@/lib/excursions/data';
import { whoWords } from '@/lib/excursions/excursion-words';
import { formatAge, formatDateTime } from '@/lib/format';
import styles from './case.module.css';
import { CaseAside } from './case-aside';
import { caseChartName, caseChartProps } from './case-chart-props';
import { CaseEvents } from './case-events';
import { chartAxis } from './chart-figure';
import { LogTable } from './log-table';
import { PointTable } from './point-table';
import { SignalTable } from './signal-table';
import { streamSpanAddress } from './stream-span-address';

type Props = { params: Promise<{ id: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Case ${(await params).id.slice(0, 18)}` };
}

export default async function ExcursionPage({ params }: Props) {
  const found = await findExcursion(await signedIn('see-line'), (await params).id);
  if (found === null) notFound();
  const timeZone = readEnvironment().siteTimeZone;
  const age = formatAge(Math.max(0, Date.now() - found.openedAt.getTime()));
  return (
    <>
      <PageHead
        back={{ href: '/excursions', label: 'Excursions' }}
        answer={caseAnswer(found)}
        sub={`Case ${found.id} · ${whoWords(found)} · opened ${formatDateTime(found.openedAt, timeZone)}, ${age} ago · ${caseExtent(found)}`}
      >
        <p>
          <Link href={streamSpanAddress(found)}>The stream over these subgroups</Link>
          {' · '}
          <a href="#answer">{found.state === 'closed' ? 'State' : 'Answer this case'}</a>
        </p>
      </PageHead>
      {leadSignal(found.signals) === null && (
        <Notice kind="note">
          Every signal of this case was withdrawn; the reasons stand below. The case itself stays until
          someone closes it.
        </Notice>
      )}
      <div className={styles.case}>
        <section className={styles.happened}>
          <SectionHead>What happened</SectionHead>
          <CaseChart
            {...caseChartProps(found, timeZone)}
            axis={chartAxis(found.stream, caseChartName(found))}
          />
          <CaseEvents events={found.events} timeZone={timeZone} />
          <PointTable found={found} timeZone={timeZone} />
        </section>
        <CaseAside found={found} timeZone={timeZone} />
        <section className={styles.tables}>
          <SectionHead>Signals</SectionHead>
          <SignalTable found={found} timeZone={timeZone} />
          <SectionHead>Log</SectionHead>
          <LogTable found={found} timeZone={timeZone} />
        </section>
      </div>
    </>
  );
}
