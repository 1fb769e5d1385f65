import { checkedBackground } from './checked-background';
import { conductionType } from './dopant';
import type { Layer } from './layer';
import { layerExtent } from './layer-extent';
import { layerIntegral } from './layer-integral';
import { standardResistivity } from './standard-resistivity';
import { temperatureCoefficientPercentPerC } from './temperature-coefficient';
import { temperatureRatio, temperatureSlopePercentPerC } from './temperature-ratio';

/** A temperature coefficient and what it rests on. */
export interface LayerCoefficient {
  percentPerC: number;
  /** `measured`: the published coefficient of every depth; `model`: the Arora model's, where some depth has none. */
  basis: 'measured' | 'model';
}

/** The mean over a layer's conductance of something that depends on the total doping. */
function meanOverConductance(layer: Layer, of: (total: number, resistivity: number) => number): number {
  const background = checkedBackground(layer);
  const extent = layerExtent(layer);
  const weighed = (mean: typeof of): number =>
    layerIntegral(layer, extent, (density) => {
      const total = density + background;
      const resistivity = standardResistivity(layer.dopant, total);
      return ((density - background) / total / resistivity) * mean(total, resistivity);
    });
  return weighed(of) / weighed(() => 1);
}

/**
 * d ln Rs/dT of a layer at 23 °C, in percent per °C: the coefficients of its depths, each weighed by its share of the
 * conductance. A layer that is heavy at the surface and light at its junction is no uniform silicon of any resistivity.
 *
 * By the published coefficients (ASTM F84 / SEMI MF84) where all depths lie within 0.001 to 500 Ω·cm, else by the Arora
 * model throughout. Throws RangeError where `sheetResistance` does.
 *
 * @example layerCoefficient(gaussian boron 1e19, L = 0.5 µm, in 1e15).percentPerC // 0.063
 */
export function layerCoefficient(layer: Layer): LayerCoefficient {
  const type = conductionType(layer.dopant);
  const heaviest = layer.peakDensityPerCm3 + checkedBackground(layer);
  const lightest = 2 * checkedBackground(layer);
  const isPublished =
    standardResistivity(layer.dopant, heaviest) >= 0.001 &&
    (lightest === 0 || standardResistivity(layer.dopant, lightest) <= 500);
  return isPublished
    ? {
        percentPerC: meanOverConductance(layer, (_, resistivity) =>
          temperatureCoefficientPercentPerC(type, Math.min(resistivity, 500)),
        ),
        basis: 'measured',
      }
    : {
        percentPerC: meanOverConductance(layer, (total) => temperatureSlopePercentPerC(layer.dopant, total)),
        basis: 'model',
      };
}

/**
 * Sheet resistance of a layer at a temperature over that at 23 °C by the Arora model at every depth, from −23 to 66 °C:
 * what serves outside 18 to 28 °C. Throws RangeError outside.
 */
export function layerTemperatureRatio(layer: Layer, temperatureC: number): number {
  return 1 / meanOverConductance(layer, (total) => 1 / temperatureRatio(layer.dopant, total, temperatureC));
}
