import type { Target } from './target';

/** Whether a wafer's own layer thickness may stand in for the target's. */
export function isUniform(target: Target): boolean {
  return target.profile === 'uniform' || target.profile === 'box';
}
