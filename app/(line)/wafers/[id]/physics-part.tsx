import { Figures, type Figure } from '@/app/_ui/figures';
import { SectionHead } from '@/app/_ui/section-head';
import {
  formatDensityPerCm3,
  formatNumber,
  formatPercent,
  formatSignedPercent,
  formatWithUncertainty,
  undefinedMark,
} from '@/lib/format';
import { missingWords } from '@/lib/maps/measured-wafer';
import type { AgainstExpected } from '@/lib/physics/against-expected';
import { isUniform } from '@/lib/physics/is-uniform';
import { figureDefinition } from '@/lib/wafer/figure-definition';
import type { WaferShown } from './wafer-shown';
import styles from './page.module.css';

/** Measured, expected and their difference, in the reading and in dopant; from physics and calibrated where there is a factor. */
export function PhysicsPart({ shown }: { shown: WaferShown }) {
  const { study, wafer } = shown;
  const { stream } = shown.settings;
  const { against, fromPhysics, target } = study;
  const measured = {
    name: `measured, ${figureDefinition(stream.controlStatistic).label}`,
    value: shown.reading(study.statistic),
  };
  if (against === null || target === null) {
    return (
      <section aria-labelledby="physics">
        <SectionHead id="physics">Physics</SectionHead>
        <Figures figures={[measured]} />
        <p className={styles.note}>
          {study.statistic === null
            ? 'No reading counts, so there is nothing to hold against what physics expects.'
            : `Nothing to hold it against: ${missingWords(target, stream, wafer.facts)}.`}
        </p>
      </section>
    );
  }
  const { calibrationFactor, calibrationPercent } = target.target;
  const factor = formatWithUncertainty(
    calibrationFactor,
    ((calibrationFactor ?? 0) * (calibrationPercent ?? 0)) / 100,
  );
  return (
    <section aria-labelledby="physics">
      <SectionHead id="physics">Physics</SectionHead>
      <Figures figures={[measured, ...(fromPhysics === null ? expectedRows(shown, against) : [])]} />
      {fromPhysics !== null && (
        <>
          <SectionHead level={3}>
            Calibrated, factor {factor}
            {target.calibrationWafers !== null && ` from ${target.calibrationWafers} wafers`}
          </SectionHead>
          <Figures figures={expectedRows(shown, against)} />
          <SectionHead level={3}>From physics alone</SectionHead>
          <Figures figures={expectedRows(shown, fromPhysics, { bare: true })} />
        </>
      )}
      <p className={styles.note}>
        ± is one standard uncertainty (k = 1) of what is expected; the gauge’s own is not in it. Target
        revision {target.revision}, {target.target.dopant}
        {target.target.alongCrystal &&
          `, at a solidified fraction of ${formatNumber(wafer.facts.ingotFraction, 3)}`}
        .
      </p>
      {against.expected.notes.map((note) => (
        <p key={note} className={styles.note}>
          {note}
        </p>
      ))}
    </section>
  );
}

/** The rows of one expectation; `bare` leaves out what the calibrated one beside it says already. */
function expectedRows(shown: WaferShown, against: AgainstExpected, options = { bare: false }): Figure[] {
  const { expected, densityPerCm3, dopantPercent } = against;
  const { target } = shown.study;
  const value = expected.value / shown.scale;
  const peak = target && !isUniform(target.target) ? ', at the peak' : '';
  const dopant =
    dopantPercent === null
      ? undefinedMark
      : `${formatSignedPercent(dopantPercent)} dopant ± ${formatPercent(against.dopantUncertaintyPercent, 1)}`;
  const targetRow: Figure = {
    name: `target${peak}`,
    ink: 'expected',
    value: formatDensityPerCm3(against.targetDensityPerCm3),
  };
  return [
    {
      name: 'expected',
      ink: 'expected',
      value: formatWithUncertainty(value, (value * expected.uncertaintyPercent) / 100, shown.unit),
    },
    {
      name: 'difference',
      value: `${formatSignedPercent(against.differencePercent)} ± ${formatPercent(against.differenceUncertaintyPercent, 1)}`,
      definition: '100 · (measured / expected − 1), with the uncertainty of expected.',
    },
    ...(options.bare ? [] : toleranceRow(shown, against)),
    ...(options.bare ? [] : [targetRow]),
    {
      name: `measured as dopant${peak}`,
      value: formatDensityPerCm3(densityPerCm3),
      definition:
        'The density that would make a wafer of this target read so: the inverse of the conversion.',
    },
    {
      name: 'against target',
      value: dopant,
      definition: `100 · (density / target − 1). Here 1 % more dopant moves the reading by ${formatSignedPercent(expected.sensitivity, 2)}.`,
    },
  ];
}

function toleranceRow(shown: WaferShown, { expected }: AgainstExpected): Figure[] {
  const { toleranceLower, toleranceUpper } = expected;
  const { statistic, target } = shown.study;
  if (toleranceLower === null || toleranceUpper === null || statistic === null) return [];
  const isInside = statistic >= toleranceLower && statistic <= toleranceUpper;
  return [
    {
      name: `target’s tolerance, ±${formatNumber(target?.target.tolerancePercent ?? null, 2)} % dopant`,
      value: `${formatNumber(toleranceLower / shown.scale, 4)} to ${shown.reading(toleranceUpper)}, ${isInside ? 'inside' : 'outside'}`,
      definition: 'What the target accepts; neither the specification nor an uncertainty.',
    },
  ];
}
