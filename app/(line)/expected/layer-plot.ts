import type { CurvePlotProps } from '@/app/_charts/curve-plot';
import { formatDensityPerCm3, formatNumber } from '@/lib/format';
import { layerOfTarget } from '@/lib/physics/layer-of-target';
import { layerProfile } from '@/lib/physics/layer-profile';
import type { ExpectedWafer, Target } from '@/lib/physics/target';

const DEPTHS = 240;
/** Below the background, or of a box the peak, a drawing shows so many decades. */
const DECADES_BELOW = 1;

/** A layer against its depth: its own density, what lies underneath, and where one meets the other. */
export function layerPlot(target: Target, densityPerCm3: number, wafer: ExpectedWafer): CurvePlotProps {
  const layer = layerOfTarget(target, densityPerCm3, wafer);
  const { points, topUm, junctionUm, backgroundPerCm3 } = layerProfile(layer, DEPTHS);
  const depths = points.map(({ depthUm }) => depthUm);
  const highest = Math.max(...points.map((point) => point.densityPerCm3), backgroundPerCm3 ?? 0);
  const lowest = backgroundPerCm3 ?? Math.min(...points.map((point) => point.densityPerCm3));
  const end = Math.max(...depths, 1.1 * junctionUm);
  const junction = `${formatNumber(junctionUm)} µm`;
  return {
    title: `Density of ${target.dopant} against depth: at most ${formatDensityPerCm3(highest)}, the layer ends at ${junction}.`,
    x: { label: 'depth, µm', domain: [0, end], isLog: false },
    y: {
      label: 'density, cm⁻³',
      domain: [
        10 ** (Math.floor(Math.log10(lowest)) - DECADES_BELOW),
        10 ** Math.ceil(Math.log10(highest * 1.2)),
      ],
      isLog: true,
    },
    curves: [
      {
        name: target.dopant,
        isOwn: true,
        pieces: [points.map((point) => ({ x: point.depthUm, y: point.densityPerCm3 }))],
      },
    ],
    marks: [],
    places: [
      ...(topUm > 0 ? [{ x: topUm, label: `begins at ${formatNumber(topUm)} µm` }] : []),
      { x: junctionUm, label: `${backgroundPerCm3 === null ? 'ends' : 'junction'} at ${junction}` },
    ],
    levels:
      backgroundPerCm3 === null
        ? []
        : [{ y: backgroundPerCm3, label: `${target.backgroundDopant} underneath` }],
  };
}
