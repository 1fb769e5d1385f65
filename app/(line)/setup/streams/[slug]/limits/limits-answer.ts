import { limitAge } from '@/lib/control/limit-age';
import { limitsInForce } from '@/lib/excursions/judged-points';
import type { LimitRevision } from '@/lib/limits/types';

/** The revision that judges a subgroup processed now. */
export function revisionInForce(revisions: readonly LimitRevision[], now: Date): LimitRevision | null {
  const judging = revisions.filter(({ state }) => state === 'provisional' || state === 'approved');
  return limitsInForce(judging, now.getTime());
}

/** How far a revision can be trusted, in a word: until it is approved it is provisional whatever its baseline. */
export function ageWord(revision: LimitRevision): string {
  return revision.state === 'provisional' ? 'provisional' : limitAge(revision.limits.n);
}

/** How many subgroups a revision rests on; inherited limits may not say. */
export function baselineWords({ limits: { n } }: Pick<LimitRevision, 'limits'>): string {
  return n === 0 ? 'number of subgroups unknown' : `${n} subgroups`;
}

/** What judges a stream, in one sentence. */
export function limitsAnswer(name: string, current: LimitRevision | null): string {
  if (current === null) return `${name} has no limits yet: the first 25 subgroups will make them`;
  const { revision, limits } = current;
  const from = limits.n === 0 ? 'a baseline of unknown size' : `${limits.n} subgroups`;
  const approved = current.state === 'provisional' ? ', not approved yet' : '';
  return `${name} is judged by revision ${revision}, ${ageWord(current)}, from ${from}${approved}`;
}
