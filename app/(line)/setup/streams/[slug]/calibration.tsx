import { Figures } from '@/app/_ui/figures';
import { SectionHead } from '@/app/_ui/section-head';
import { IfMay } from '@/app/if-may';
import type { Actor } from '@/lib/access/actor';
import { formatNumber, formatPercent } from '@/lib/format';
import { calibrationStudy, type CalibrationStudy } from '@/lib/limits/calibration-study';
import { findLatestSpan, listCalibrationWafers } from '@/lib/limits/data';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { siteTimeField } from '@/lib/site-time';
import type { Stream } from '@/lib/streams/types';
import { askedSpan } from './asked-span';
import { CalibrationForm } from './calibration-form';
import { SpanForm } from './span-form';

/** What a baseline says of the model of an implanted or diffused layer, and the way to make it the target's factor. */
export async function Calibration(props: {
  actor: Actor;
  stream: Stream;
  target: Target;
  latestWafers: readonly ExpectedWafer[] | null;
  asked: Record<string, string | string[]>;
  timeZone: string;
}) {
  const { actor, stream, target, timeZone } = props;
  const latest = await findLatestSpan(actor, stream.id, 25);
  const { span, typed, errors } = askedSpan(props.asked, latest, timeZone);
  const wafers =
    span === null ? [] : await listCalibrationWafers(actor, stream.id, stream.controlStatistic, span);
  const study = calibrationStudy(target, stream.kind, wafers);
  const { found } = study;
  return (
    <>
      <SectionHead id="calibration">Calibration from a baseline</SectionHead>
      <p className="quiet">
        No model knows how much of an implanted or diffused dopant is active. A factor, measured over model,
        takes that up; its uncertainty then is that of the expected value.
      </p>
      <SpanForm typed={typed} errors={errors} timeZone={timeZone} submit="Work it out" anchor="calibration" />
      {leftOutWords(study).map((words) => (
        <p key={words}>{words}</p>
      ))}
      {found === null ? (
        <p>Fewer than two subgroups of this span can serve: no factor comes of it.</p>
      ) : (
        <>
          <div style={{ maxWidth: 480 }}>
            <Figures
              figures={[
                {
                  name: 'measured over model',
                  value: formatNumber(found.factor, 4),
                  definition: 'Mean over the subgroups of the span of measured over expected from physics.',
                },
                {
                  name: 'standard uncertainty of the mean',
                  value: formatPercent(found.percent),
                  definition: 's of the subgroups’ ratios over √n; subgroups taken as independent.',
                },
                { name: 's from subgroup to subgroup', value: formatPercent(found.spreadPercent) },
                { name: 'from', value: `${found.subgroups} subgroups, ${found.wafers} wafers` },
              ]}
            />
          </div>
          <IfMay permission="revise-target" streamId={props.stream.id}>
            <CalibrationForm
              slug={stream.slug}
              target={target}
              wafers={props.latestWafers}
              found={found}
              now={siteTimeField(new Date(), timeZone)}
              timeZone={timeZone}
            />
          </IfMay>
        </>
      )}
    </>
  );
}

/** Which wafers of the span could not serve, and why. */
function leftOutWords({ beyond, lacking }: CalibrationStudy): string[] {
  const wafers = (count: number) => (count === 1 ? 'One wafer' : `${count} wafers`);
  return [
    beyond > 0 &&
      `${wafers(beyond)} of this span ${beyond === 1 ? 'lies' : 'lie'} beyond the range of the conversion and ${beyond === 1 ? 'is' : 'are'} left out: nothing is expected there.`,
    lacking > 0 &&
      `${wafers(lacking)} of this span came without what physics needs to expect anything, and ${lacking === 1 ? 'is' : 'are'} left out.`,
  ].filter((words) => words !== false);
}
