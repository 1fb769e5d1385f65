import { Figures } from '@/app/_ui/figures';
import { SectionHead } from '@/app/_ui/section-head';
import type { Actor } from '@/lib/access/actor';
import { formatNumber, formatPercent } from '@/lib/format';
import { calibrationFactor } from '@/lib/limits/calibration-factor';
import { findLatestSpan, listCalibrationWafers } from '@/lib/limits/data';
import type { Target } from '@/lib/physics/target';
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
  asked: Record<string, string | string[]>;
  timeZone: string;
}) {
  const { actor, stream, target, timeZone } = props;
  const latest = await findLatestSpan(actor, stream.id, 25);
  const { span, typed, errors } = askedSpan(props.asked, latest, timeZone);
  const wafers =
    span === null ? [] : await listCalibrationWafers(actor, stream.id, stream.controlStatistic, span);
  const found = calibrationFactor(target, stream.kind, wafers);
  return (
    <>
      <SectionHead id="calibration">Calibration from a baseline</SectionHead>
      <p className="quiet">
        No model knows how much of an implanted or diffused dopant is active. A factor, measured over model,
        takes that up; its uncertainty then is that of the expected value.
      </p>
      <SpanForm typed={typed} errors={errors} timeZone={timeZone} submit="Work it out" anchor="calibration" />
      {found === null ? (
        <p>Fewer than two judged subgroups lie in this span: no factor comes of it.</p>
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
          <CalibrationForm
            slug={stream.slug}
            target={target}
            found={found}
            now={siteTimeField(new Date(), timeZone)}
            timeZone={timeZone}
          />
        </>
      )}
    </>
  );
}
