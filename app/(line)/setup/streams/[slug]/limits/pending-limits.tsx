import { SectionHead } from '@/app/_ui/section-head';
import { IfMay } from '@/app/if-may';
import { ORIGIN_WORDS, type LimitRevision } from '@/lib/limits/types';
import type { Stream } from '@/lib/streams/types';
import { ApproveForm } from './approve-form';
import type { ChartedText } from './charted-text';
import { LimitFigures } from './limit-figures';
import { baselineWords } from './limits-answer';

/** The revisions that wait for someone's word: the provisional one that judges already, and the drafts. */
export function PendingLimits(props: {
  stream: Stream;
  revisions: readonly LimitRevision[];
  current: LimitRevision | null;
  text: ChartedText;
  now: string;
  timeZone: string;
}) {
  const { current } = props;
  const waiting = props.revisions.filter(
    (one) =>
      one.state === 'draft' ||
      (one.state === 'provisional' && one.id === current?.id && one.supersededFrom === null),
  );
  return waiting.map((one) => (
    <section key={one.id} aria-labelledby={`pending-${one.id}`}>
      <SectionHead id={`pending-${one.id}`}>
        {one.state === 'draft'
          ? `Draft: revision ${one.revision}`
          : `Revision ${one.revision} judges, provisional`}
      </SectionHead>
      <p>
        {ORIGIN_WORDS[one.origin]}, {baselineWords(one)}, drawn up by {one.author}: {one.reason}
      </p>
      {one.state === 'draft' && (
        <LimitFigures
          caption={`Revision ${one.revision} beside the limits in force`}
          candidate={one.limits}
          current={current?.limits ?? null}
          text={props.text}
        />
      )}
      <IfMay permission="approve-limits" streamId={props.stream.id}>
        <ApproveForm
          slug={props.stream.slug}
          revisionId={one.id}
          revision={one.revision}
          isDraft={one.state === 'draft'}
          now={props.now}
          timeZone={props.timeZone}
        />
      </IfMay>
    </section>
  ));
}
