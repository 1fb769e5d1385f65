import { isUniform } from './is-uniform';
import type { Target } from './target';

/**
 * Whether wafers of one target may differ in what is expected of them: along a crystal, and where a wafer's own layer
 * thickness counts. Where they do not, the expected value is worth computing once: that of a gaussian or erfc layer
 * takes a few tenths of a millisecond.
 */
export function variesByWafer(target: Target): boolean {
  return target.alongCrystal || (target.quantity === 'sheet_resistance' && isUniform(target));
}
