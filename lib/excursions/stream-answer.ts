import { limitsWords } from './limits-words';
import { SINCE_MOST, type StandingCase, type StandingLimits } from './stream-standing';
import { streamState } from './stream-state';
import { type SubgroupWord, subgroupLabel } from './subgroup-label';
import { toldWhen } from './told-when';

/** What the answer of a stream's page is made of. */
export interface StreamFigures {
  name: string;
  subgroup: SubgroupWord;
  cases: readonly StandingCase[];
  openCases: number;
  /** The revision in force now. */
  limits: StandingLimits | null;
  /** Subgroups judged since these took effect; without limits, ever. */
  judged: number;
  /** How many of these have a signal. */
  withSignal: number;
  /** Among the newest subgroups. */
  toMeasureAgain: number;
  /** Of the stretch shown. */
  shown: { subgroups: number; outOfSpecification: number };
  hasSpecification: boolean;
}

/**
 * The first sentence of a stream's page: its worst case not closed, from the first subgroup that took part to the last
 * that went on with it ("since" while that is the newest), else how steady it is and by what it can be told.
 *
 * @example streamAnswer(figures) // 'N-epi, Reactor 2: 8 in a row below the centre line, since run R1177'
 */
export function streamAnswer(figures: StreamFigures): string {
  return `${figures.name}: ${state(figures)}`;
}

function state({ cases, judged, limits, subgroup, toMeasureAgain }: StreamFigures): string {
  const worst = cases[0] ?? null;
  const { words } = streamState({
    worst,
    toMeasureAgain,
    hasWafers: true,
    hasLimits: limits !== null,
    judged,
  });
  return worst?.signal ? toldWhen(words, when(worst.signal, subgroup)) : words;
}

/** "at run R0042", "from run R0035 to run R0042", or "since run R0035" while it goes on. */
export function when(signal: NonNullable<StandingCase['signal']>, subgroup: SubgroupWord): string {
  const first = subgroupLabel(subgroup, signal.first.key);
  const last = subgroupLabel(subgroup, signal.last.key);
  if (signal.first.id === signal.last.id) return `at ${last}`;
  return signal.last.isNewest ? `since ${first}` : `from ${first} to ${last}`;
}

/** What stands under the answer: further cases, specification, and how far the limits can be trusted. */
export function streamRemarks(figures: StreamFigures): string[] {
  const { cases, openCases, limits, judged, withSignal, shown, hasSpecification } = figures;
  const remarks: string[] = [];
  const further = openCases - (cases.length > 0 ? 1 : 0);
  if (further > 0)
    remarks.push(further === 1 ? 'One more case is not closed.' : `${further} more cases are not closed.`);
  if (shown.outOfSpecification > 0) {
    const are = shown.outOfSpecification === 1 ? 'is' : 'are';
    remarks.push(
      `${shown.outOfSpecification} of ${shown.subgroups} subgroups shown ${are} out of specification.`,
    );
  } else if (hasSpecification && shown.subgroups > 0) {
    remarks.push(`Specification is not touched in the ${shown.subgroups} subgroups shown.`);
  }
  if (limits !== null) {
    const words = limitsWords({ ...limits, inherited: limits.origin === 'inherited' });
    remarks.push(`Limits are ${words}${judged === 0 ? '; they have judged nothing yet' : ''}.`);
    if (openCases === 0 && withSignal > 0) {
      remarks.push(
        `Of ${judged > SINCE_MOST ? `the last ${SINCE_MOST}` : judged} judged by them ${withSignal} ${
          withSignal === 1 ? 'has' : 'have'
        } a signal; every case is closed.`,
      );
    }
  }
  return remarks;
}
