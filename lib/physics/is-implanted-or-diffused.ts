import type { Target } from './target';

/** Whether a target is a layer made by implantation or diffusion, whose activation no conversion knows. */
export function isImplantedOrDiffused(target: Target): boolean {
  return target.quantity === 'sheet_resistance' && target.profile !== 'uniform';
}
