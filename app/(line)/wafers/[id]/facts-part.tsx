import Link from 'next/link';
import { Figures, type Figure } from '@/app/_ui/figures';
import { SectionHead } from '@/app/_ui/section-head';
import { formatDateTime, formatNumber } from '@/lib/format';
import type { WaferShown } from './wafer-shown';
import styles from './page.module.css';

const SCREENING_WORDS = {
  off: 'off',
  impossible: 'impossible readings',
  outliers: 'impossible readings and outliers',
};

/** What is on record of how the wafer was made, measured, corrected and brought here. */
export function FactsPart({ shown }: { shown: WaferShown }) {
  const { wafer, timeZone } = shown;
  const { stream } = shown.settings;
  const { facts } = wafer;
  const sent = [facts.tool, facts.chamber, facts.recipe].filter((word) => word !== null);
  const rows: (Figure | null)[] = [
    fact('lot', facts.lot),
    fact('run', facts.run),
    fact('slot', facts.slot),
    fact('stage', facts.stage),
    fact('step, recipe', [stream.step, stream.recipe].filter((word) => word !== '').join(', ')),
    fact('tool, chamber, recipe as sent', sent.length === 0 ? null : sent.join(', ')),
    fact('processed', formatDateTime(facts.processedAt, timeZone)),
    fact('measured', formatDateTime(facts.measuredAt, timeZone)),
    fact('gauge', facts.gauge),
    fact('operator', facts.operator),
    fact('temperature', facts.temperatureC === null ? null : `${formatNumber(facts.temperatureC)}\u00a0°C`),
    fact('thickness', facts.thicknessUm === null ? null : `${formatNumber(facts.thicknessUm)}\u00a0µm`),
    fact('solidified fraction', facts.ingotFraction === null ? null : formatNumber(facts.ingotFraction, 3)),
    fact('corrected before it came for', facts.correctionsApplied.join(', ') || 'nothing'),
    fact('corrections', wafer.correctedBy),
    fact('screening', SCREENING_WORDS[wafer.screening]),
    fact('recorded', `${formatDateTime(wafer.recordedAt, timeZone)} by ${wafer.recordedBy}`),
    {
      name: 'came with',
      value: <Link href={`/intake/batches/${wafer.batch.id}`}>batch {wafer.batch.id}</Link>,
    },
    wafer.history ? fact('recorded as', 'history') : null,
  ];
  return (
    <section aria-labelledby="facts" className={styles.facts}>
      <SectionHead id="facts">On record</SectionHead>
      <Figures figures={rows.filter((row) => row !== null)} />
      {facts.note !== null && <p className="small">Note: {facts.note}</p>}
    </section>
  );
}

function fact(name: string, value: string | number | null): Figure | null {
  return value === null || value === '' ? null : { name, value };
}
