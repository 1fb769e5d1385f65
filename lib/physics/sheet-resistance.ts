import { checkedBackground } from './checked-background';
import type { Layer } from './layer';
import { layerDose } from './layer-dose';
import { layerExtent } from './layer-extent';
import { layerIntegral } from './layer-integral';
import { standardResistivity } from './standard-resistivity';

/** What physics expects of a layer: Ω per square, µm, and atoms per cm². */
export interface LayerFigures {
  sheetResistanceOhmSq: number;
  junctionDepthUm: number;
  dosePerCm2: number;
  /** Where the layer begins; above 0 it is buried, and pins on the surface meet the background. */
  topUm: number;
}

/**
 * The sheet resistance of a layer above its junction: Rs = 1/∫ q·µ(N total)·|N net| dx, from the surface to the
 * junction (J. C. Irvin, Bell Syst. Tech. J. 41, 387 (1962)), with the mobility of the standard conversion at the
 * total doping, at 23 °C. For a box without background it is ρ/t.
 *
 * Every dopant atom counts as active: implanted and diffused layers miss by 5 to 20 % in practice (activation,
 * segregation, loss to the oxide; common practice, no source), so a calibration factor belongs beside it.
 *
 * Throws RangeError where `layerExtent` does and outside the densities of the standard conversion.
 *
 * @example a gaussian of boron, 1e19, L = 0.5 µm, in 1e15 n-type // 170.0 Ω/□
 */
export function sheetResistance(layer: Layer): LayerFigures {
  const background = checkedBackground(layer);
  const extent = layerExtent(layer);
  // q·µ(total)·net, with the charge and mobility of 1/(ρ(total)·total).
  const conductance = layerIntegral(layer, extent, (density) => {
    const total = density + background;
    return (density - background) / total / standardResistivity(layer.dopant, total);
  });
  return {
    sheetResistanceOhmSq: 1 / conductance,
    junctionDepthUm: extent.junctionUm,
    dosePerCm2: layerDose(layer),
    topUm: extent.topUm,
  };
}
