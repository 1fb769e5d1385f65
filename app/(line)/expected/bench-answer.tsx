import { CurvePlot } from '@/app/_charts/curve-plot';
import { SectionHead } from '@/app/_ui/section-head';
import { isCompensated } from '@/lib/physics/compensated-target';
import { expectedOrNull } from '@/lib/physics/expected-or-null';
import { standardResistivity } from '@/lib/physics/standard-resistivity';
import type { Target } from '@/lib/physics/target';
import { targetDensity } from '@/lib/physics/target-density';
import { crystalPlot } from '../crystal-plot';
import { AtTemperature } from './at-temperature';
import { benchBudget } from './bench-budget';
import type { BenchQuestion } from './bench-question';
import { BenchReading } from './bench-reading';
import { BudgetTable, DopantTable, ModelTable } from './bench-tables';
import { conversionPlot } from './conversion-plot';
import { layerPlot } from './layer-plot';
import { modelRows } from './model-rows';

/** All that the bench says of a target: its place on the curves, its depth or crystal, temperature, uncertainty. */
export function BenchAnswer(props: { target: Target; question: BenchQuestion; query: string }) {
  const { target, question, query } = props;
  const { wafer, temperatureC } = question;
  const density = targetDensity(target, wafer);
  const expected = expectedOrNull(target, wafer);
  const budget = expected && benchBudget(target, question);
  const isLayer = target.quantity === 'sheet_resistance';
  const isMixed = isCompensated(target);
  const ohmCm = isMixed ? null : standardOrNull(target, density);
  return (
    <>
      {question.measured !== null && expected !== null && (
        <BenchReading target={target} question={question} measured={question.measured} />
      )}
      <SectionHead id="conversion">Doping and resistivity</SectionHead>
      <p className="quiet small">
        ASTM F723 / SEMI MF723, one line for each published fit. Below 10¹⁹ cm⁻³ the phosphorus data serve for
        arsenic and antimony.{isLayer && ' The mark is the peak of the layer.'}
        {isMixed && ' Silicon of two dopants has no point on the curves of one.'}
      </p>
      <CurvePlot {...conversionPlot(target.dopant, isMixed ? null : density, temperatureC)} />
      <div className="columns">
        {ohmCm !== null && (
          <DopantTable
            densityPerCm3={density}
            resistivityOhmCm={ohmCm}
            href={`/api/expected/curves.csv?at=${temperatureC}`}
          />
        )}
        <ModelTable rows={modelRows(target, density, wafer.ingotFraction ?? null)} />
      </div>
      {isLayer && (
        <>
          <SectionHead id="depth">In depth</SectionHead>
          <CurvePlot {...layerPlot(target, density, wafer)} />
        </>
      )}
      {target.alongCrystal && (
        <>
          <SectionHead id="crystal">Along the crystal</SectionHead>
          <CurvePlot
            {...crystalPlot(
              target,
              expected === null
                ? []
                : [
                    {
                      x: wafer.ingotFraction ?? 0,
                      y: expected.value,
                      label: 'expected here',
                      kind: 'expected',
                    },
                  ],
            )}
          />
        </>
      )}
      {expected !== null && (
        <>
          <SectionHead id="temperature">Away from 23 °C</SectionHead>
          <div style={{ maxWidth: 560 }}>
            <AtTemperature
              {...{ target, wafer, temperatureC }}
              value={expected.value}
              densityPerCm3={density}
            />
          </div>
        </>
      )}
      {budget && (
        <>
          <SectionHead id="uncertainty">How well it is known</SectionHead>
          <p className="quiet small">
            The target’s tolerance is no part of it (JCGM 106:2012). Temperature and thickness enter once it
            is said how well they are known.
          </p>
          <BudgetTable budget={budget} href={`/api/expected/budget.csv?${query}`} />
        </>
      )}
    </>
  );
}

/** The resistivity of the target's own dopant at a density; null outside the conversion. */
function standardOrNull(target: Target, densityPerCm3: number): number | null {
  try {
    return standardResistivity(target.dopant, densityPerCm3);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
