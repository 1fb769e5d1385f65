import Link from 'next/link';
import { CurvePlot } from '@/app/_charts/curve-plot';
import { SectionHead } from '@/app/_ui/section-head';
import { formatPercent, formatSignedPercent } from '@/lib/format';
import { expectedWafer } from '@/lib/maps/measured-wafer';
import { waferTitle } from '@/lib/maps/wafer-title';
import { wordsOfTarget } from '@/lib/streams/words-of-target';
import { causeRows } from '../../cause-rows';
import { Causes } from '../../causes';
import { crystalPlot } from '../../crystal-plot';
import { benchAddress } from '../../expected/bench-question';
import type { WaferShown } from './wafer-shown';
import styles from './page.module.css';

/** What would explain the difference from what physics expects, and the wafer's place along its crystal. */
export function ExplainPart({ shown }: { shown: WaferShown }) {
  const { study, wafer } = shown;
  const { stream } = shown.settings;
  const { against, statistic } = study;
  const target = study.target?.target ?? null;
  if (against === null || target === null || statistic === null) return null;
  const { differencePercent, differenceUncertaintyPercent } = against;
  const brought = expectedWafer(stream, wafer.facts);
  const isWithin = Math.abs(differencePercent) <= 2 * differenceUncertaintyPercent;
  const fraction = wafer.facts.ingotFraction;
  const question = benchAddress({
    kind: stream.kind,
    quantity: stream.quantity,
    ...wordsOfTarget(target),
    ...(target.lengthUm === null &&
      brought.layerThicknessUm && { lengthUm: String(brought.layerThicknessUm) }),
    ...(fraction !== null && { fraction: String(fraction) }),
    measured: String(statistic),
  });
  return (
    <section aria-labelledby="explain">
      <SectionHead
        id="explain"
        aside={
          <Link href={question} prefetch={false}>
            on the bench
          </Link>
        }
      >
        What would explain this difference
      </SectionHead>
      <p className={styles.note}>
        {formatSignedPercent(differencePercent)} ± {formatPercent(differenceUncertaintyPercent, 1)}
        {isWithin
          ? ' lies within twice what is not known of the expected value: it asks for no explanation.'
          : ' lies beyond twice what is not known of the expected value.'}
      </p>
      <Causes
        rows={causeRows(target, brought, statistic / against.expected.value, differenceUncertaintyPercent)}
      />
      {target.alongCrystal && fraction !== null && (
        <>
          <SectionHead level={3}>Along the crystal</SectionHead>
          <CurvePlot
            {...crystalPlot(target, [
              { x: fraction, y: statistic, label: `${waferTitle(wafer.facts)}, measured`, kind: 'measured' },
              { x: fraction, y: against.expected.value, label: 'expected here', kind: 'expected' },
            ])}
          />
        </>
      )}
    </section>
  );
}
