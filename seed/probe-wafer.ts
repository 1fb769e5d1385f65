import type { DemoStream } from './demo-stream';
import type { DemoWafer } from './demo-wafer';
import type { MadeWafer } from './make-wafer';
import type { SeededRandom } from '@/lib/stats/seeded-random';

/** Share of wafers on which one site finds no contact and reads nothing. */
const DEAD_SITE_SHARE = 0.006;

/** Nominal thickness of polished wafers, µm (SEMI M1). */
const NOMINAL_THICKNESS_UM: Readonly<Record<number, number>> = { 150: 675, 200: 725, 300: 775 };

/**
 * Measures a made wafer: noise at every site, an offset common to this occasion, a gauge that may read wrong, now and
 * then a dead site (0). Values to five digits, as a gauge prints them.
 *
 * The thickness reported is the layer's, with the error of its own gauge, or the wafer's. A resistivity of a layer is
 * what the gauge makes of sheet resistance times that thickness, so it carries the error too.
 */
export function probeWafer(
  stream: DemoStream,
  wafer: MadeWafer,
  readingPercent: number,
  random: SeededRandom,
): Pick<DemoWafer, 'values' | 'thicknessUm' | 'temperatureC'> {
  const { probing } = stream;
  const thicknessError = probing.thicknessPercent * random.normal();
  const common = readingPercent + probing.occasionPercent * random.normal();
  const carried = wafer.layerThicknessUm !== null && stream.quantity === 'resistivity' ? thicknessError : 0;
  const values = wafer.values.map((value) => {
    const percent = common + carried + probing.repeatabilityPercent * random.normal();
    return Number((value * (1 + percent / 100)).toPrecision(5));
  });
  const [isDead, where] = [random.uniform() < DEAD_SITE_SHARE, random.uniform()];
  if (isDead) values[Math.floor(where * values.length)] = 0;
  const thicknessUm =
    wafer.layerThicknessUm === null
      ? (NOMINAL_THICKNESS_UM[stream.diameterMm] ?? null)
      : Number((wafer.layerThicknessUm * (1 + thicknessError / 100)).toFixed(3));
  return { values, thicknessUm, temperatureC: Number((23 + 0.3 * random.normal()).toFixed(2)) };
}
