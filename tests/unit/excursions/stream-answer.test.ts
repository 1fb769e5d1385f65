import { describe, expect, it } from 'vitest';
import { type StreamFigures, streamAnswer, streamRemarks } from '@/lib/excursions/stream-answer';
import type { StandingCase, StandingLimits } from '@/lib/excursions/stream-standing';

const limits: StandingLimits = {
  id: '1',
  revision: 1,
  state: 'approved',
  origin: 'chosen-span',
  effectiveFrom: new Date(0),
  supersededFrom: null,
  limits: {
    n: 61,
    level: { centre: 10, sigma: 0.1, lower: 9.7, upper: 10.3 },
    movingRange: { centre: 0.11, upper: 0.42 },
    within: null,
    between: null,
  },
  author: 'a',
  draftedAt: new Date(0),
  approvedBy: 'b',
  approvedAt: new Date(0),
};

const figures = (over: Partial<StreamFigures> = {}): StreamFigures => ({
  name: 'N-epi, Reactor 2',
  subgroup: 'run',
  cases: [],
  openCases: 0,
  limits,
  judged: 200,
  withSignal: 0,
  toMeasureAgain: 0,
  shown: { subgroups: 200, outOfSpecification: 0 },
  hasSpecification: false,
  ...over,
});

const open = (over: Partial<NonNullable<StandingCase['signal']>> = {}): StandingCase => ({
  id: '7',
  family: 'instability',
  state: 'open',
  openedAt: new Date(0),
  acknowledgedBy: null,
  signal: {
    chart: 'level',
    rule: 'eight-on-one-side',
    side: 'below',
    participantIds: Array.from({ length: 8 }, String),
    completions: 3,
    first: { id: '1', key: 'R1177' },
    last: { id: '9', key: 'R1186', isNewest: true },
    ...over,
  },
});

describe('the answer of a stream’s page', () => {
  it('is what happened and since when, while it goes on', () => {
    expect(streamAnswer(figures({ cases: [open()], openCases: 1 }))).toBe(
      'N-epi, Reactor 2: 10 in a row below the centre line, since run R1177',
    );
  });

  it('says from where to where once it has stopped, and where a single subgroup lay', () => {
    const last = { id: '9', key: 'R1186', isNewest: false };
    expect(streamAnswer(figures({ cases: [open({ last })] }))).toContain('from run R1177 to run R1186');
    const single = open({ rule: 'beyond-3-sigma', participantIds: ['9'], completions: 1, first: last, last });
    expect(streamAnswer(figures({ cases: [single] }))).toContain(': beyond the lower limit, at run R1186');
  });

  it('says so where the signals of an open case no longer hold', () => {
    expect(streamAnswer(figures({ cases: [{ ...open(), signal: null }] }))).toContain('no longer hold');
  });

  it('says steady only of a stream judged by limits', () => {
    expect(streamAnswer(figures())).toBe('N-epi, Reactor 2: steady');
    expect(streamAnswer(figures({ limits: null, judged: 12 }))).toContain(
      'no limits yet: 12 of 25 subgroups',
    );
    expect(streamAnswer(figures({ limits: null, judged: 30 }))).toMatch(/no limits yet$/);
    expect(streamAnswer(figures({ limits: null, judged: 0 }))).toContain('no limits yet: 0 of 25 subgroups');
    expect(streamAnswer(figures({ toMeasureAgain: 2 }))).toContain('2 wafers to measure again');
  });
});

describe('the remarks under it', () => {
  it('tell of specification only where there is one, or where it is broken', () => {
    expect(streamRemarks(figures()).join()).not.toContain('pecification');
    expect(streamRemarks(figures({ hasSpecification: true })).join()).toContain('is not touched in the 200');
    const broken = figures({ shown: { subgroups: 200, outOfSpecification: 1 } });
    expect(streamRemarks(broken)[0]).toBe('1 of 200 subgroups shown is out of specification.');
  });

  it('count further cases, and signals whose cases are closed', () => {
    expect(streamRemarks(figures({ cases: [open()], openCases: 3 }))[0]).toBe('2 more cases are not closed.');
    expect(streamRemarks(figures({ withSignal: 4 })).join()).toContain(
      'Of 200 judged by them 4 have a signal; every case',
    );
    expect(streamRemarks(figures({ cases: [open()], openCases: 1, withSignal: 4 })).join()).not.toContain(
      'every case',
    );
  });

  it('tell how far the limits can be trusted', () => {
    expect(streamRemarks(figures())).toContain('Limits are young (61 subgroups).');
    expect(streamRemarks(figures({ judged: 0 }))).toContain(
      'Limits are young (61 subgroups); they have judged nothing yet.',
    );
    expect(streamRemarks(figures({ limits: { ...limits, state: 'provisional' } })).join()).toContain(
      'provisional',
    );
    expect(streamRemarks(figures({ limits: { ...limits, origin: 'inherited' } }))).toContain(
      'Limits are inherited.',
    );
    expect(streamRemarks(figures({ limits: null }))).toEqual([]);
  });
});
