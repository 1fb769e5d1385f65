import { BaselineChart } from '@/app/_charts/baseline-chart';
import { IfMay } from '@/app/if-may';
import type { Actor } from '@/lib/access/actor';
import { limitAge } from '@/lib/control/limit-age';
import { findLatestSpan, listBaselinePoints } from '@/lib/limits/data';
import type { LimitRevision } from '@/lib/limits/types';
import type { Stream } from '@/lib/streams/types';
import { askedSpan } from '../asked-span';
import { SpanForm } from '../span-form';
import { baselineStudy } from './baseline-study';
import { BeyondTable } from './beyond-table';
import type { ChartedText } from './charted-text';
import { DraftForm } from './draft-form';
import { LimitFigures } from './limit-figures';

const OFFERED = 50;

/** A chosen span of judged subgroups, the limits that would come of it, and the points that lie beyond them. */
export async function DraftFromSpan(props: {
  actor: Actor;
  stream: Stream;
  current: LimitRevision | null;
  asked: Record<string, string | string[]>;
  text: ChartedText;
  timeZone: string;
}) {
  const { actor, stream, current, text, timeZone } = props;
  const latest = await findLatestSpan(actor, stream.id, OFFERED);
  const { span, typed, errors } = askedSpan(props.asked, latest, timeZone);
  const points = span === null ? [] : await listBaselinePoints(actor, stream.id, span);
  const study = baselineStudy(points);
  const wish = (
    <SpanForm typed={typed} errors={errors} timeZone={timeZone} submit="Look at this span" anchor="draft" />
  );
  if (study.limits === null) {
    return (
      <>
        {wish}
        <p>{study.reason}</p>
      </>
    );
  }
  const { limits, beyond } = study;
  const query = new URLSearchParams(typed).toString();
  return (
    <>
      {wish}
      <p>
        {points.length} judged subgroups: these limits would be {limitAge(points.length)}.{' '}
        {beyond.length === 0
          ? 'No point lies beyond them.'
          : `${beyond.length} ${beyond.length === 1 ? 'point lies' : 'points lie'} beyond them: find out why before these become the measure of the rest.`}
      </p>
      <BaselineChart
        title={`Levels of ${points.length} subgroups with the limits drawn from them`}
        points={points.map(({ level, id }) => ({ level, beyond: beyond.some((one) => one.point.id === id) }))}
        limits={limits.level}
        current={current?.limits.level ?? null}
        text={text.level}
      />
      {beyond.length > 0 && (
        <BeyondTable
          beyond={beyond}
          subgroup={stream.subgroup}
          text={text}
          timeZone={timeZone}
          href={`/api/setup/streams/${stream.slug}/baseline?${query}`}
        />
      )}
      <LimitFigures
        caption="What would come of it"
        candidate={limits}
        current={current?.limits ?? null}
        text={text}
      />
      <IfMay permission="draft-limits" streamId={stream.id}>
        <DraftForm slug={stream.slug} span={typed} />
      </IfMay>
    </>
  );
}
