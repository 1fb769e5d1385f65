'use client';

import { Figures, type Figure } from '@/app/_ui/figures';
import { formatDensityPerCm3, formatReading, formatSignedPercent, formatWithUncertainty } from '@/lib/format';
import { expectedValue, type Expected } from '@/lib/physics/expected-value';
import { targetDensity } from '@/lib/physics/target-density';
import type { Target } from '@/lib/physics/target';
import { typedTarget } from '@/lib/streams/typed-target';
import { unitOf } from '@/lib/streams/types';
import styles from './expected-note.module.css';

const SEED_TO_TAIL = [0, 0.25, 0.5, 0.75, 0.9];

/** What physics expects of the target that stands in a form's fields now; said while it is typed. */
export function ExpectedNote(props: {
  words: Readonly<Record<string, FormDataEntryValue>>;
  quantity: Target['quantity'];
}) {
  const parsed = typedTarget(props.quantity).safeParse(props.words);
  if (!parsed.success) {
    const begun = String(props.words['densityPerCm3'] ?? '').trim() !== '';
    return (
      <section className={styles.note} aria-label="Expected value">
        <p className="phys">Expected</p>
        <p aria-live="polite">
          {begun
            ? `Nothing yet: ${parsed.error.issues[0]?.message ?? ''}`
            : 'Type a density: what a wafer should read then stands here.'}
        </p>
      </section>
    );
  }
  return (
    <section className={styles.note} aria-label="Expected value">
      <ExpectedFigures target={parsed.data} />
    </section>
  );
}

/** The expected value of a target, how well it is known, its tolerance and what a percent of dopant is worth. */
export function ExpectedFigures({ target }: { target: Target }) {
  if (target.alongCrystal) {
    return <CrystalFigures target={target} />;
  }
  if (target.quantity === 'sheet_resistance' && target.lengthUm === null) {
    const ofMicrometre = expectedValue(target, { layerThicknessUm: 1 });
    return (
      <>
        <p className="phys">Expected of a layer of 1 µm; each wafer brings its own thickness</p>
        <Figures figures={expectedFigures(target, ofMicrometre)} />
      </>
    );
  }
  const expected = expectedValue(target);
  return (
    <>
      <p className="phys">Expected</p>
      <p className={styles.value} aria-live="polite">
        {valueWords(target, expected)}
      </p>
      <Figures figures={expectedFigures(target, expected)} />
      <Notes expected={expected} />
    </>
  );
}

function CrystalFigures({ target }: { target: Target }) {
  const at = SEED_TO_TAIL.map((fraction) => {
    try {
      return { fraction, expected: expectedValue(target, { ingotFraction: fraction }) };
    } catch (error) {
      if (error instanceof RangeError) return { fraction, expected: null };
      throw error;
    }
  });
  const seed = at[0]?.expected;
  return (
    <>
      <p className="phys">Expected along the crystal</p>
      <Figures
        figures={at.map(({ fraction, expected }) => ({
          name: `at ${fraction}, ${formatDensityPerCm3(targetDensity(target, { ingotFraction: fraction }))}`,
          value: expected === null ? '—' : valueWords(target, expected),
          ink: 'expected' as const,
        }))}
      />
      {seed && (
        <Figures figures={expectedFigures(target, seed).filter((figure) => figure.name !== 'from physics')} />
      )}
      {seed && <Notes expected={seed} />}
    </>
  );
}

const valueWords = (target: Target, { value, uncertaintyPercent }: Expected) =>
  formatWithUncertainty(value, (value * uncertaintyPercent) / 100, unitOf(target.quantity));

function expectedFigures(target: Target, expected: Expected): Figure[] {
  const reading = (value: number | null) => formatReading(target.quantity, value);
  const { toleranceLower, toleranceUpper, sensitivity, value } = expected;
  const figures: Figure[] = [
    { name: 'standard uncertainty', value: `${expected.uncertaintyPercent.toFixed(2)} %` },
  ];
  if (target.calibrationFactor !== null) {
    figures.push({ name: 'from physics', value: reading(expected.fromPhysics), ink: 'expected' });
    figures.push({ name: 'calibrated', value: reading(value), ink: 'expected' });
  }
  if (target.tolerancePercent !== null) {
    figures.push({
      name: 'at the tolerance',
      value: `${reading(toleranceLower)} to ${reading(toleranceUpper)}`,
    });
  }
  figures.push({
    name: '1 % more dopant reads',
    value: `${formatSignedPercent(sensitivity, 2)}, ${signedReading(target, (sensitivity / 100) * value)}`,
  });
  return figures;
}

function signedReading(target: Target, difference: number): string {
  return `${difference < 0 ? '−' : '+'}${formatReading(target.quantity, Math.abs(difference), 3)}`;
}

function Notes({ expected }: { expected: Expected }) {
  return expected.notes.map((note) => (
    <p key={note} className="small quiet">
      {note}
    </p>
  ));
}
