import type { CaseSignal, NamedSubgroup } from './types';

/** A signal of a case as the database gives it. */
export interface SignalRecord extends Omit<CaseSignal, 'first' | 'last' | 'participants' | 'participantIds'> {
  participantIds: string[];
  firstId: string;
  lastId: string;
}

/** A subgroup and its wafers as the database gives them. */
export interface SubgroupRecord extends Omit<NamedSubgroup, 'wafers'> {
  wafers: NamedSubgroup['wafers'] | null;
}

/** Every subgroup that some signals name. */
export function namedSubgroupIds(signals: readonly SignalRecord[]): string[] {
  return signals.flatMap(({ participantIds, firstId, lastId }) => [...participantIds, firstId, lastId]);
}

/** The signals with the subgroups they name in place of ids. */
export function caseSignals(
  signals: readonly SignalRecord[],
  byId: ReadonlyMap<string, NamedSubgroup>,
): CaseSignal[] {
  return signals.flatMap(({ firstId, lastId, ...signal }) => {
    const [first, last] = [byId.get(firstId), byId.get(lastId)];
    if (first === undefined || last === undefined) return [];
    const participants = signal.participantIds.flatMap((id) => byId.get(id) ?? []);
    return [{ ...signal, first, last, participants }];
  });
}
