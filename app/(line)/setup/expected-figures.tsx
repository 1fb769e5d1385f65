import { Figures } from '@/app/_ui/figures';
import { formatDensityPerCm3, formatReading } from '@/lib/format';
import { expectedNotes } from '@/lib/physics/expected-notes';
import { expectedOrNull } from '@/lib/physics/expected-or-null';
import { expectedValue } from '@/lib/physics/expected-value';
import { isOrderOfMagnitude } from '@/lib/physics/is-order-of-magnitude';
import { modelValue } from '@/lib/physics/model-value';
import { targetDensity } from '@/lib/physics/target-density';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { carrierRows } from './carrier-rows';
import { budgetRows, expectedWords, knownRows, layerRows, worthRows } from './expected-rows';
import styles from './expected-note.module.css';

const SEED_TO_TAIL = [0, 0.25, 0.5, 0.75, 0.9];
/** At which a layer is shown whose thickness each wafer brings: what a junction depletes leaves some of it. */
const THICK_UM = 10;

/** The expected value of a target, how well it is known, its tolerance, and what a percent and a degree are worth. */
export function ExpectedFigures({ target }: { target: Target }) {
  if (isOrderOfMagnitude(target)) return <OrderOfMagnitude target={target} />;
  if (target.alongCrystal) return <CrystalFigures target={target} />;
  const bringsOwn =
    target.quantity === 'sheet_resistance' && target.profile === 'uniform' && target.lengthUm === null;
  return (
    <OneValue
      target={target}
      wafer={bringsOwn ? { layerThicknessUm: THICK_UM } : {}}
      heading={
        bringsOwn ? `Expected of a layer of ${THICK_UM} µm; each wafer brings its own thickness` : 'Expected'
      }
    />
  );
}

function OneValue({ target, wafer, heading }: { target: Target; wafer: ExpectedWafer; heading: string }) {
  const expected = expectedOrNull(target, wafer);
  if (expected === null) return <p className="quiet">{heading}: nothing; its junction depletes it.</p>;
  return (
    <>
      <p className="phys">{heading}</p>
      <p className={styles.value} aria-live="polite">
        {expectedWords(target, expected)}
      </p>
      <Figures figures={[...knownRows(target, expected), ...worthRows(target, expected.value, wafer)]} />
      <Behind target={target} wafer={wafer} model={expected.model} />
      <Notes notes={expected.notes} />
    </>
  );
}

/** What stands behind the value: model, parts of the uncertainty, layer and carriers. */
function Behind({ target, wafer, model }: { target: Target; wafer: ExpectedWafer; model: string }) {
  const density = targetDensity(target, wafer);
  return (
    <details>
      <summary>What it is made of</summary>
      <Figures
        figures={[
          { name: 'model', value: model === 'standard' ? 'ASTM F723 / SEMI MF723' : model },
          ...budgetRows(target, wafer),
          ...layerRows(target, density, wafer),
          ...carrierRows(target, density, 23, wafer),
        ]}
      />
    </details>
  );
}

function OrderOfMagnitude({ target }: { target: Target }) {
  const value = modelValue(target, target.densityPerCm3);
  return (
    <>
      <p className="phys">Order of magnitude only, no band</p>
      <p className={styles.value} aria-live="polite">
        about {formatReading(target.quantity, value, 1)}
      </p>
      <Figures figures={layerRows(target, target.densityPerCm3)} />
      <Notes notes={expectedNotes(target, target.densityPerCm3)} />
    </>
  );
}

function CrystalFigures({ target }: { target: Target }) {
  const seed = expectedValue(target, { ingotFraction: 0 });
  return (
    <>
      <p className="phys">Expected along the crystal</p>
      <Figures
        figures={SEED_TO_TAIL.map((ingotFraction) => {
          const expected = expectedOrNull(target, { ingotFraction });
          return {
            name: `at ${ingotFraction}, ${formatDensityPerCm3(targetDensity(target, { ingotFraction }))}`,
            value: expected === null ? '—' : expectedWords(target, expected),
            ink: 'expected' as const,
          };
        })}
      />
      <Figures
        figures={[
          ...knownRows({ ...target, calibrationFactor: null }, seed),
          ...worthRows(target, seed.value, { ingotFraction: 0 }),
        ]}
      />
      <Behind target={target} wafer={{ ingotFraction: 0 }} model={seed.model} />
      <Notes notes={seed.notes} />
    </>
  );
}

function Notes({ notes }: { notes: readonly string[] }) {
  return notes.map((note) => (
    <p key={note} className="small quiet">
      {note}
    </p>
  ));
}
