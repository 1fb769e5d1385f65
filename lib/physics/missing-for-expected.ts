import { isUniform } from './is-uniform';
import type { ExpectedWafer, Target } from './target';

/**
 * What a wafer must still bring before physics can expect anything of it, or null when nothing is missing: its
 * place along the crystal, or the thickness of a layer whose sheet resistance is measured.
 *
 * @example missingForExpected(crystalTarget, {}) // 'ingotFraction'
 */
export function missingForExpected(
  target: Target,
  wafer: ExpectedWafer = {},
): 'ingotFraction' | 'layerThicknessUm' | null {
  if (target.alongCrystal && (wafer.ingotFraction ?? null) === null) return 'ingotFraction';
  if (target.quantity === 'resistivity' || target.profile === 'pairs') return null;
  const thick = target.lengthUm ?? (isUniform(target) ? (wafer.layerThicknessUm ?? null) : null);
  return thick === null ? 'layerThicknessUm' : null;
}
