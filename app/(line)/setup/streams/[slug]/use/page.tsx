import type { Metadata } from 'next';
import { Figures } from '@/app/_ui/figures';
import { SectionHead } from '@/app/_ui/section-head';
import { IfMay } from '@/app/if-may';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { formatNumber } from '@/lib/format';
import { foundStream } from '../../../found-stream';
import { StreamHead } from '../../../stream-head';
import {
  CHARTED_WORDS,
  KIND_WORDS,
  QUANTITY_WORDS,
  SCREEN_WORDS,
  STATISTIC_WORDS,
  SUBGROUP_WORDS,
} from '../../../words';
import { RetireForm } from './retire-form';
import { ScreeningForm } from './screening-form';
import { ScreeningTable } from './screening-table';

export const metadata: Metadata = { title: 'Use' };

export default async function UsePage(props: { params: Promise<{ slug: string }> }) {
  const { stream, screenings } = await foundStream(await signedIn('see-line'), props.params);
  const { plan, subgroupSize } = stream;
  const wafers = subgroupSize === 1 ? '' : `, ${subgroupSize} wafers each`;
  return (
    <>
      <StreamHead
        stream={stream}
        place="Use"
        answer={
          stream.retiredAt === null
            ? `${stream.name} is in use: ${SCREEN_WORDS[stream.screening]}`
            : `${stream.name} is out of use: no file can name it`
        }
      />
      <SectionHead id="charting">How it is charted</SectionHead>
      <div style={{ maxWidth: 640 }}>
        <Figures
          figures={[
            { name: 'name in files', value: <code>{stream.slug}</code> },
            { name: 'makes', value: KIND_WORDS[stream.kind] },
            { name: 'measured', value: QUANTITY_WORDS[stream.quantity] },
            {
              name: 'site plan',
              value: `${plan.name}: ${plan.sites.length} sites, ${plan.diameterMm} mm, ${plan.orientation}`,
            },
            { name: 'one point is', value: `${SUBGROUP_WORDS[stream.subgroup]}${wafers}` },
            { name: 'control statistic', value: STATISTIC_WORDS[stream.controlStatistic] },
            { name: 'charted value', value: CHARTED_WORDS[stream.chartedValue] },
            {
              name: 'repeatability of the gauge',
              value: `${formatNumber(stream.repeatabilityPercent, 2)} %`,
            },
          ]}
        />
      </div>
      <p className="quiet small">These stay as they are: other settings are another stream.</p>
      <SectionHead id="change-screening">Screening</SectionHead>
      {screenings.length > 0 && (
        <ScreeningTable changes={screenings} timeZone={readEnvironment().siteTimeZone} />
      )}
      <IfMay permission="change-rules" streamId={stream.id}>
        <ScreeningForm slug={stream.slug} screening={stream.screening} />
      </IfMay>
      <SectionHead id="retire">
        {stream.retiredAt === null ? 'Take out of use' : 'Take back into use'}
      </SectionHead>
      <IfMay permission="retire-stream" streamId={stream.id}>
        <RetireForm slug={stream.slug} retired={stream.retiredAt !== null} />
      </IfMay>
    </>
  );
}
