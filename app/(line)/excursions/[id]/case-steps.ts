import { may, type Actor } from '@/lib/access/actor';
import type { Permission } from '@/lib/access/permission';
import type { ExcursionState } from '@/lib/excursions/types';

export type CaseStep = 'acknowledged' | 'under-investigation' | 'noted';

/** The steps a state leaves open; the first is the one it waits for. */
const STEPS: Record<ExcursionState, readonly CaseStep[]> = {
  open: ['acknowledged', 'under-investigation', 'noted'],
  acknowledged: ['under-investigation', 'noted'],
  'under-investigation': ['noted'],
  closed: ['noted'],
};

const PERMISSION: Record<CaseStep, Permission> = {
  acknowledged: 'acknowledge-case',
  'under-investigation': 'investigate-case',
  noted: 'comment-case',
};

/** The steps that someone may take with a case as it stands. */
export function caseSteps(actor: Actor | null, state: ExcursionState, streamId: string): CaseStep[] {
  return STEPS[state].filter((step) => actor !== null && may(actor, PERMISSION[step], streamId));
}
