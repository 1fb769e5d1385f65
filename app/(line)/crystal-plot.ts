import type { CurvePlotProps } from '@/app/_charts/curve-plot';
import { formatNumber } from '@/lib/format';
import { COMPENSATED_MODEL } from '@/lib/physics/compensated-target';
import { typeChangeFraction, type MeltDopant } from '@/lib/physics/codoped-crystal';
import { crystalCurve } from '@/lib/physics/crystal-curve';
import type { Target } from '@/lib/physics/target';

const STEPS = 190;
const LAST = 0.95;
/** Beyond this many times its lowest value a curve runs off the drawing, as it does where the type changes. */
const MOST_TIMES = 300;

type Marks = CurvePlotProps['marks'];

/**
 * What is expected along a crystal against the solidified fraction, and marks on it, in Ω·cm. A co-doped melt runs up to
 * a peak where it changes its type; the place is named. A calibration factor lifts the whole curve.
 */
export function crystalPlot(target: Target, marks: Marks): CurvePlotProps {
  const melt = meltOf(target);
  const fractions = Array.from({ length: STEPS + 1 }, (_, i) => (LAST * i) / STEPS);
  const factor = target.calibrationFactor ?? 1;
  const places = crystalCurve(melt, fractions, COMPENSATED_MODEL).map(({ fraction, resistivityOhmCm }) =>
    resistivityOhmCm === null ? null : { x: fraction, y: factor * resistivityOhmCm },
  );
  const values = [
    ...places.flatMap((place) => (place === null ? [] : [place.y])),
    ...marks.map(({ y }) => y),
  ];
  const change = typeChangeFraction(melt);
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const isWide = high > 5 * low;
  return {
    title: `Expected resistivity along the crystal, from ${formatNumber(places[0]?.y ?? null)} Ω·cm at the seed end${
      change === null ? '' : `; it changes from p to n at a solidified fraction of ${formatNumber(change, 3)}`
    }. ${marks.length} points are marked.`,
    x: { label: 'solidified fraction', domain: [0, 1], isLog: false },
    y: {
      label: 'resistivity, Ω·cm',
      domain: isWide
        ? [low / 1.3, Math.min(high * 1.3, low * MOST_TIMES)]
        : [Math.min(low * 0.95, low), high * 1.05],
      isLog: isWide,
    },
    curves: [{ name: 'expected', isOwn: true, pieces: [places] }],
    marks,
    places: change === null ? [] : [{ x: change, label: 'p to n' }],
  };
}

/** The melt that a target along a crystal stands for. */
function meltOf(target: Target): MeltDopant[] {
  const { dopant, densityPerCm3, counterDopant, counterDensityPerCm3 } = target;
  const own = { dopant, seedDensityPerCm3: densityPerCm3 };
  return counterDopant == null || counterDensityPerCm3 == null
    ? [own]
    : [own, { dopant: counterDopant, seedDensityPerCm3: counterDensityPerCm3 }];
}
