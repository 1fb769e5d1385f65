import type { CurvePlotProps } from '@/app/_charts/curve-plot';
import { formatDensityPerCm3, formatNumber } from '@/lib/format';
import { conductingThicknessUm } from '@/lib/physics/conducting-thickness';
import { layerOfTarget, targetLengthUm } from '@/lib/physics/layer-of-target';
import { layerProfile } from '@/lib/physics/layer-profile';
import type { ExpectedWafer, Target } from '@/lib/physics/target';

const DEPTHS = 240;
/** A grown layer is drawn with so much of its substrate, over its thickness. */
const WITH_SUBSTRATE = 1.3;

/** A layer against its depth: its own density, what lies underneath, and where one meets the other. */
export function layerPlot(target: Target, densityPerCm3: number, wafer: ExpectedWafer): CurvePlotProps {
  return target.profile === 'uniform'
    ? grownPlot(target, densityPerCm3, wafer)
    : madePlot(target, densityPerCm3, wafer);
}

/** A grown layer on its substrate; what the junction depletes conducts nothing. */
function grownPlot(target: Target, densityPerCm3: number, wafer: ExpectedWafer): CurvePlotProps {
  const { dopant, backgroundDopant, backgroundDensityPerCm3: under } = target;
  const thicknessUm = targetLengthUm(target, wafer) ?? 1;
  const conductingUm = conductingThicknessUm(target, densityPerCm3, thicknessUm);
  const flat = (from: number, to: number, y: number) => [[from, to].map((x) => ({ x: x * thicknessUm, y }))];
  const thickness = `${formatNumber(thicknessUm)} µm`;
  return {
    title: `${dopant} of ${formatDensityPerCm3(densityPerCm3)}, ${thickness} thick; ${formatNumber(conductingUm)} µm of it conduct.`,
    ...axes(WITH_SUBSTRATE * thicknessUm, [densityPerCm3, under ?? densityPerCm3]),
    curves: [
      { name: dopant, isOwn: true, pieces: flat(0, 1, densityPerCm3) },
      ...(under === null || backgroundDopant === null
        ? []
        : [
            {
              name: `${backgroundDopant} of the substrate`,
              isOwn: false,
              pieces: flat(1, WITH_SUBSTRATE, under),
            },
          ]),
    ],
    marks: [],
    places: [
      { x: thicknessUm, label: `grown to ${thickness}` },
      ...(conductingUm < thicknessUm
        ? [{ x: conductingUm, label: `conducts to ${formatNumber(conductingUm)} µm` }]
        : []),
    ],
  };
}

function madePlot(target: Target, densityPerCm3: number, wafer: ExpectedWafer): CurvePlotProps {
  const layer = layerOfTarget(target, densityPerCm3, wafer);
  const { points, topUm, junctionUm, backgroundPerCm3 } = layerProfile(layer, DEPTHS);
  const densities = points.map((point) => point.densityPerCm3);
  const highest = Math.max(...densities);
  const junction = `${formatNumber(junctionUm)} µm`;
  return {
    title: `Density of ${target.dopant} against depth: at most ${formatDensityPerCm3(highest)}, the layer ends at ${junction}.`,
    ...axes(Math.max(...points.map(({ depthUm }) => depthUm), 1.1 * junctionUm), [
      highest,
      backgroundPerCm3 ?? Math.min(...densities),
    ]),
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

/** Axes from the surface down, and over whole decades around the densities, one more below. */
function axes(endUm: number, densities: readonly number[]): Pick<CurvePlotProps, 'x' | 'y'> {
  const lowest = 10 ** (Math.floor(Math.log10(Math.min(...densities))) - 1);
  const highest = 10 ** Math.ceil(Math.log10(1.2 * Math.max(...densities)));
  return {
    x: { label: 'depth, µm', domain: [0, endUm], isLog: false },
    y: { label: 'density, cm⁻³', domain: [lowest, highest], isLog: true },
  };
}
