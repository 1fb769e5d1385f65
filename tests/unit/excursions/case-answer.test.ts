import { describe, expect, it } from 'vitest';
import { caseAnswer, caseExtent, leadSignal } from '@/lib/excursions/case-answer';
import { whoWords } from '@/lib/excursions/excursion-words';
import { firstChecks } from '@/lib/excursions/first-checks';
import { excursionQuery, excursionStep } from '@/lib/excursions/schema';
import type { CasePoint, CaseSignal, NamedSubgroup } from '@/lib/excursions/types';

const day = (number: number) => new Date(Date.UTC(2031, 2, number));
const run = (number: number): NamedSubgroup => ({
  id: `${number}`,
  key: `R${number}`,
  at: day(number),
  wafers: [],
});
const stream = {
  id: '1',
  slug: 'a',
  name: 'N-epi',
  subgroup: 'run',
  quantity: 'resistivity',
  chartedValue: 'statistic',
} as const;

function signal(id: string, first: number, last: number, change: Partial<CaseSignal> = {}): CaseSignal {
  return {
    id,
    chart: 'level',
    rule: 'beyond-3-sigma',
    side: 'above',
    first: run(first),
    participants: [run(first)],
    participantIds: [`${first}`],
    last: run(last),
    completions: last - first + 1,
    limitsRevision: 1,
    raisedAt: day(first),
    withdrawnAt: null,
    withdrawnReason: null,
    ...change,
  };
}

const points = (count: number): CasePoint[] =>
  Array.from({ length: count }, (_, i) => ({
    id: `${i + 1}`,
    key: `R${i + 1}`,
    at: day(i + 1),
    state: 'judged',
    level: 1,
    movingRange: null,
    within: 1,
    between: null,
    limitsId: '1',
    completions: [],
    outOfSpecification: false,
    wafers: 1,
    firstWaferId: null,
  }));

describe('the answer of a case', () => {
  it('says since when, while the newest judged subgroup takes part', () => {
    expect(caseAnswer({ stream, points: points(9), signals: [signal('1', 7, 9)] })).toBe(
      'N-epi: 3 beyond the upper limit, since run R7',
    );
  });

  it('says from when to when once the stream has come back', () => {
    expect(caseAnswer({ stream, points: points(12), signals: [signal('1', 7, 9)] })).toMatch(
      /from run R7 to run R9$/,
    );
    expect(caseAnswer({ stream, points: points(12), signals: [signal('1', 7, 7)] })).toBe(
      'N-epi: beyond the upper limit, at run R7',
    );
  });

  it('begins at the first that took part, not at the one that completed it', () => {
    const eight = signal('1', 8, 8, {
      rule: 'eight-on-one-side',
      participants: [1, 2, 3, 4, 5, 6, 7, 8].map(run),
      participantIds: ['1', '2', '3', '4', '5', '6', '7', '8'],
    });
    expect(caseAnswer({ stream, points: points(8), signals: [eight] })).toBe(
      'N-epi: 8 in a row above the centre line, since run R1',
    );
  });

  it('passes over a subgroup that was not judged when it asks for the newest', () => {
    const given = points(9);
    const [last] = given.slice(-1);
    if (last) Object.assign(last, { state: 'not-judged', level: null });
    expect(caseAnswer({ stream, points: given, signals: [signal('1', 7, 8)] })).toMatch(/since run R7$/);
  });

  it('speaks by the signal that went on longest, then by the larger, and never by a withdrawn one', () => {
    const [long, short, gone] = [signal('1', 2, 9), signal('2', 9, 9), signal('3', 1, 12)];
    expect(leadSignal([short, long])?.id).toBe('1');
    expect(leadSignal([long, short])?.id).toBe('1');
    const withdrawn = { ...gone, withdrawnAt: day(13), withdrawnReason: 'a late wafer' };
    expect(leadSignal([withdrawn, short])?.id).toBe('2');
    expect(leadSignal([withdrawn])).toBeNull();
    expect(leadSignal([])).toBeNull();
    expect(caseAnswer({ stream, points: points(3), signals: [withdrawn] })).toMatch(/no longer hold$/);
  });

  it('speaks by the newer of two signals that tie, in whatever order they come', () => {
    const [older, newer] = [signal('9', 9, 9), signal('10', 9, 9)];
    expect(leadSignal([older, newer])?.id).toBe('10');
    expect(leadSignal([newer, older])?.id).toBe('10');
  });

  it('counts signals and subgroups', () => {
    const withdrawn = signal('2', 3, 3, { withdrawnAt: day(4), withdrawnReason: 'x' });
    const found = { points: points(9), first: run(3), last: run(7), signals: [signal('1', 3, 7), withdrawn] };
    expect(caseExtent(found)).toBe('1 signal, 1 withdrawn, over 5 subgroups');
    expect(caseExtent({ ...found, last: run(3), signals: [] })).toBe('0 signals, one subgroup');
    expect(caseExtent({ ...found, points: [] })).toBe('1 signal, 1 withdrawn');
  });
});

describe('who has a case', () => {
  it('names the person and how far it went', () => {
    expect(whoWords({ state: 'open', acknowledgedBy: null })).toBe('nobody yet');
    expect(whoWords({ state: 'under-investigation', acknowledgedBy: 'A' })).toBe('under investigation by A');
    expect(whoWords({ state: 'closed', acknowledgedBy: 'A', closedBy: 'B' })).toBe('closed by B');
  });

  it('looks at the gauge before the process, whatever the chart', () => {
    for (const chart of ['level', 'moving-range', 'within', 'between', 'specification']) {
      for (const side of ['above', 'below'] as const) {
        expect(firstChecks({ chart, side }).join(' ')).toMatch(/again|readings|gauge/);
      }
    }
  });
});

describe('a step of a case', () => {
  const fault = (sent: Record<string, unknown>) => {
    const parsed = excursionStep.safeParse(sent);
    return parsed.success
      ? null
      : `${String(parsed.error.issues[0]?.path[0])}: ${parsed.error.issues[0]?.message}`;
  };

  it('may be acknowledged without a note, but a note is not empty and a close has a cause', () => {
    expect(fault({ to: 'acknowledged', note: '' })).toBeNull();
    expect(fault({ to: 'noted', note: '   ' })).toBe('note: Write the note first.');
    expect(fault({ to: 'closed', note: '', cause: ' ' })).toMatch(/^cause: Say what the cause was/);
    expect(fault({ to: 'closed', note: '', cause: 'none found' })).toBeNull();
  });

  it('is refused where it is unknown, too long, or holds what cannot be kept', () => {
    expect(fault({ to: 'reopened', note: '' })).not.toBeNull();
    expect(fault({ note: '' })).not.toBeNull();
    expect(fault({ to: 'noted', note: 'x'.repeat(2001) })).toMatch(/^note: At most 2000/);
    expect(fault({ to: 'noted', note: 'a\u0000b' })).toMatch(/cannot be kept/);
  });
});

describe('the address of the list', () => {
  it('falls back to all that is not closed where it makes no sense', () => {
    const usual = { state: 'unclosed', stream: null, page: 1 };
    expect(excursionQuery.parse({})).toEqual(usual);
    expect(excursionQuery.parse({ state: 'x', stream: "' or 1", page: '-3' })).toEqual(usual);
    expect(excursionQuery.parse({ state: ['open', 'all'], stream: '', page: '1e9' })).toEqual(usual);
    expect(excursionQuery.parse({ state: 'closed', stream: 'n-epi', page: '2' })).toEqual({
      state: 'closed',
      stream: 'n-epi',
      page: 2,
    });
  });
});
