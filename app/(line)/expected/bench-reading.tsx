import { Figures } from '@/app/_ui/figures';
import { SectionHead } from '@/app/_ui/section-head';
import { formatDensityPerCm3, formatPercent, formatReading, formatSignedPercent } from '@/lib/format';
import { againstExpected } from '@/lib/physics/against-expected';
import type { Target } from '@/lib/physics/target';
import { causeRows } from '../cause-rows';
import { Causes } from '../causes';
import type { BenchQuestion } from './bench-question';

/** A reading held against what is expected, and what would explain the difference. */
export function BenchReading(props: { target: Target; question: BenchQuestion; measured: number }) {
  const { target, question, measured } = props;
  const against = againstExpected(target, measured, question.wafer);
  if (against === null) return null;
  const { expected } = against;
  return (
    <>
      <SectionHead id="reading">A reading of {formatReading(target.quantity, measured)}</SectionHead>
      <div style={{ maxWidth: 560 }}>
        <Figures
          figures={[
            {
              name: 'difference',
              value: `${formatSignedPercent(against.differencePercent)} ± ${formatPercent(against.differenceUncertaintyPercent, 1)}`,
            },
            { name: 'stands for', value: formatDensityPerCm3(against.densityPerCm3) },
            {
              name: 'against target',
              value:
                against.dopantPercent === null
                  ? '—'
                  : `${formatSignedPercent(against.dopantPercent)} dopant ± ${formatPercent(against.dopantUncertaintyPercent, 1)}`,
            },
          ]}
        />
      </div>
      <SectionHead level={3}>What would explain it</SectionHead>
      <Causes
        rows={causeRows(
          target,
          question.wafer,
          measured / expected.value,
          against.differenceUncertaintyPercent,
        )}
      />
    </>
  );
}
