import { limitsState } from '@/lib/control/limits-state';
import type { LimitSet } from '@/lib/control/limit-set';

/** "provisional (25 subgroups)", "young (61 subgroups)", "inherited", "established (214 subgroups)". */
export function limitsWords(revision: { state: string; inherited: boolean; limits: LimitSet }): string {
  return revision.inherited ? 'inherited' : `${limitsState(revision)} (${revision.limits.n} subgroups)`;
}
