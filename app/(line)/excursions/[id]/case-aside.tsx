import { Beside } from '@/app/_ui/beside';
import { Caution } from '@/app/_ui/caution';
import { Figures } from '@/app/_ui/figures';
import { SectionHead } from '@/app/_ui/section-head';
import { StateMark } from '@/app/_ui/state-mark';
import { IfMay } from '@/app/if-may';
import { findActor } from '@/lib/access/request-actor';
import { CHART_WORDS, STATE_WORDS } from '@/lib/excursions/excursion-words';
import { firstChecks } from '@/lib/excursions/first-checks';
import type { ExcursionCase } from '@/lib/excursions/types';
import { formatDateTime } from '@/lib/format';
import { takeStep } from './actions';
import { AnswerForm } from './answer-form';
import { caseSteps } from './case-steps';
import { CloseForm } from './close-form';

/** Beside the evidence of a case: its state, what to look at first, and the ways to answer it. */
export async function CaseAside({ found, timeZone }: { found: ExcursionCase; timeZone: string }) {
  const { state } = found;
  const action = takeStep.bind(null, found.id);
  const streamId = found.stream.id;
  const [first, ...others] = caseSteps(await findActor(), state, streamId);
  const time = (at: Date | null) => formatDateTime(at, timeZone);
  return (
    <aside id="answer" tabIndex={-1}>
      <SectionHead>State</SectionHead>
      <Figures
        figures={[
          {
            name: 'State',
            value: <StateMark needsPerson={state === 'open'}>{STATE_WORDS[state]}</StateMark>,
          },
          { name: 'About', value: CHART_WORDS[found.chart] ?? found.chart },
          { name: 'Opened', value: time(found.openedAt) },
          { name: 'Acknowledged', value: time(found.acknowledgedAt) },
          { name: 'Acknowledged by', value: found.acknowledgedBy ?? 'nobody yet' },
          ...(state === 'closed'
            ? [
                { name: 'Closed', value: time(found.closedAt) },
                { name: 'Closed by', value: found.closedBy ?? '—' },
              ]
            : []),
        ]}
      />
      {found.cause !== null && (
        <p style={{ overflowWrap: 'anywhere' }}>
          <span className="quiet">Cause: </span>
          {found.cause}
        </p>
      )}
      <SectionHead>{state === 'closed' ? 'Add to the log' : 'Answer'}</SectionHead>
      <IfMay permission="comment-case" streamId={streamId}>
        {first !== undefined && <AnswerForm action={action} state={state} steps={[first, ...others]} />}
      </IfMay>
      {state !== 'closed' && (
        <>
          <Beside summary="Close with its cause">
            <IfMay permission="close-case" streamId={streamId}>
              <CloseForm action={action} />
            </IfMay>
          </Beside>
          <SectionHead>Worth looking at first</SectionHead>
          <Caution>
            <ul>
              {firstChecks(found).map((check) => (
                <li key={check}>{check}</li>
              ))}
            </ul>
          </Caution>
        </>
      )}
    </aside>
  );
}
