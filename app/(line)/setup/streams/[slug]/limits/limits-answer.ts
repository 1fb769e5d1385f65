import { limitAge } from '@/lib/control/limit-age';
import { limitsInForce } from '@/lib/excursions/judged-points';
import { FIRST_BASELINE } from '@/lib/excursions/line';
import type { FirstLevels } from '@/lib/limits/data';
import type { LimitRevision } from '@/lib/limits/types';

/** The revision that judges a subgroup processed now. */
export function revisionInForce(revisions: readonly LimitRevision[], now: Date): LimitRevision | null {
  const judging = revisions.filter(({ state }) => state === 'provisional' || state === 'approved');
  return limitsInForce(judging, now.getTime());
}

/** Whether a stream has as many levels as first limits need, and no limits come of them. */
export function isStuck({ judged, alike }: FirstLevels): boolean {
  return judged === FIRST_BASELINE && alike;
}

/** How far a revision can be trusted, in a word: until it is approved it is provisional whatever its baseline. */
export function ageWord(revision: LimitRevision): string {
  return revision.state === 'provisional' ? 'provisional' : limitAge(revision.limits.n);
}

/** How many subgroups a revision rests on; inherited limits may not say. */
export function baselineWords({ limits: { n } }: Pick<LimitRevision, 'limits'>): string {
  return n === 0 ? 'number of subgroups unknown' : `${n} subgroups`;
}

/** What judges a stream, in one sentence; `begun` is how far it is where nothing does yet. */
export function limitsAnswer(name: string, current: LimitRevision | null, begun: FirstLevels | null): string {
  if (current === null && begun !== null && isStuck(begun)) {
    return `${name} has no limits: its first ${FIRST_BASELINE} levels are all equal`;
  }
  if (current === null) {
    const soFar = begun === null || begun.judged === 0 ? '' : `, ${begun.judged} so far`;
    return `${name} has no limits yet: the first ${FIRST_BASELINE} subgroups will make them${soFar}`;
  }
  const { revision, limits } = current;
  const from = limits.n === 0 ? 'a baseline of unknown size' : `${limits.n} subgroups`;
  const approved = current.state === 'provisional' ? ', not approved yet' : '';
  return `${name} is judged by revision ${revision}, ${ageWord(current)}, from ${from}${approved}`;
}
