import { describe, expect, it } from 'vitest';
import { boardAnswer } from '@/lib/excursions/board-answer';
import { boardExpected } from '@/lib/excursions/board-expected';
import { boardRows } from '@/lib/excursions/board-rows';
import { boardState, limitWords } from '@/lib/excursions/board-state';
import { boardStrip } from '@/lib/excursions/board-strip';
import { foundStreams } from '@/lib/excursions/found-streams';
import { sizeInSigma } from '@/lib/excursions/size-in-sigma';
import type { BoardStream } from '@/lib/excursions/types';
import { expectedValue } from '@/lib/physics/expected-value';
import type { Target } from '@/lib/physics/target';
import { boardCase, boardLimits, boardPoint, boardStream, LIMITS } from './board-stream';

const again = { id: '5', wafer: '1', runOrLot: 'R', measuredAt: new Date(0), reason: 'too few sites' };
const specification = boardCase({
  family: 'specification',
  chart: 'specification',
  signal: {
    chart: 'specification',
    rule: 'wafer-mean',
    side: 'below',
    participantIds: ['1'],
    completions: 1,
  },
});
const names = (streams: readonly BoardStream[]) => boardRows(streams).map((row) => row.stream.name);

describe('the order of the board', () => {
  it('puts out of specification first, then unanswered, then the farther in σ, then the longer waiting', () => {
    const far = boardCase({
      at: { level: 19, movingRange: null, within: null, between: null, limits: LIMITS },
    });
    const acknowledged = { state: 'acknowledged', acknowledgedBy: 'someone' } as const;
    const older = boardCase({ openedAt: new Date('2031-03-01T00:00:00Z') });
    expect(
      names([
        boardStream({ name: 'steady' }),
        boardStream({ name: 'near', worst: boardCase() }),
        boardStream({ name: 'acknowledged, far', worst: { ...far, ...acknowledged } }),
        boardStream({ name: 'near, older', worst: older }),
        boardStream({ name: 'far', worst: far }),
        boardStream({ name: 'out', worst: { ...specification, ...acknowledged } }),
        boardStream({ name: 'not judged', limits: [] }),
      ]),
    ).toEqual(['out', 'far', 'near, older', 'near', 'acknowledged, far', 'steady', 'not judged']);
  });

  it('does not depend on the order in which streams come', () => {
    const streams = ['c', 'a', 'b'].map((name) => boardStream({ name }));
    expect(names(streams)).toEqual(['a', 'b', 'c']);
    expect(names([...streams].reverse())).toEqual(['a', 'b', 'c']);
  });

  it('measures each chart by its own limits', () => {
    const figures = { level: 8, movingRange: 2, within: 0.5, between: 1 };
    expect(sizeInSigma('level', figures, LIMITS)).toBe(2);
    expect(sizeInSigma('specification', figures, LIMITS)).toBe(2);
    expect(sizeInSigma('moving-range', figures, LIMITS)).toBe(1.5);
    expect(sizeInSigma('within', figures, LIMITS)).toBeCloseTo(3, 12);
    expect(sizeInSigma('between', figures, LIMITS)).toBe(2);
    expect(sizeInSigma('level', figures, null)).toBeNull();
    expect(sizeInSigma('within', { ...figures, within: 0 }, LIMITS)).toBeNull();
    expect(sizeInSigma('between', figures, { ...LIMITS, between: null })).toBeNull();
  });
});

describe('the state of a stream in words', () => {
  it('says the newest signal of its worst case', () => {
    expect(boardState(boardStream({ worst: boardCase() }))).toEqual({
      group: 'needs-someone',
      words: 'beyond the upper limit',
    });
    expect(boardState(boardStream({ worst: specification })).words).toBe(
      'wafer mean below its specification',
    );
  });

  it('keeps a case whose signals were all withdrawn until someone closes it', () => {
    const { group, words } = boardState(boardStream({ worst: boardCase({ signal: null, at: null }) }));
    expect(group).toBe('needs-someone');
    expect(words).toMatch(/no longer hold/);
  });

  it('asks for wafers to be measured again', () => {
    expect(boardState(boardStream({ toMeasureAgain: [again] })).words).toBe('1 wafer to measure again');
    expect(boardState(boardStream({ toMeasureAgain: [again, again] })).words).toBe(
      '2 wafers to measure again',
    );
  });

  it('counts judged subgroups towards the first limits, and calls nothing steady before', () => {
    const points = [
      ...Array.from({ length: 12 }, () => boardPoint(10, { limitsId: null })),
      boardPoint(null),
    ];
    expect(boardState(boardStream({ limits: [], points }))).toEqual({
      group: 'not-judged',
      words: 'no limits yet: 12 of 25 subgroups',
    });
    expect(boardState(boardStream({ limits: [], points: [] })).words).toBe('no wafer yet');
  });

  it('says how far limits can be trusted until they are established', () => {
    const of = (n: number, change = {}) =>
      limitWords({ limits: [boardLimits({ limits: { ...LIMITS, n }, ...change })] });
    expect(of(25, { state: 'provisional' })).toBe('limits provisional (25 subgroups)');
    expect(of(24)).toBe('limits provisional (24 subgroups)');
    expect(of(61)).toBe('limits young (61 subgroups)');
    expect(of(101)).toBeNull();
    expect(of(0, { inherited: true })).toBe('limits inherited');
  });
});

describe('the small chart of levels', () => {
  it('draws each level by the limits it was judged by, the first baseline by those it made', () => {
    const second = boardLimits({
      id: '2',
      state: 'approved',
      limits: { ...LIMITS, level: { centre: 20, sigma: 2, lower: 14, upper: 26 } },
    });
    const points = [boardPoint(12, { limitsId: null }), boardPoint(12), boardPoint(24, { limitsId: '2' })];
    const strip = boardStrip({ points, limits: [boardLimits({ state: 'provisional' }), second] });
    expect(strip.points.map(({ z }) => z)).toEqual([2, 2, 2]);
    expect(strip.limits).toBe('approved');
  });

  it('leaves a gap where a subgroup was not judged, and a ring where it is not complete', () => {
    const points = [
      boardPoint(null),
      boardPoint(10, { state: 'open' }),
      boardPoint(14, { levelCalls: true }),
    ];
    expect(boardStrip({ points, limits: [boardLimits()] }).points).toEqual([
      { z: null, signal: false, open: false },
      { z: 0, signal: false, open: true },
      { z: 4, signal: true, open: false },
    ]);
  });

  it('draws a stream without limits about its mean, and no limits', () => {
    const points = [1, 3, 1, 3].map((level) => boardPoint(level, { limitsId: null }));
    const strip = boardStrip({ points, limits: [] });
    expect(strip.limits).toBeNull();
    expect(strip.points.map(({ z }) => z)).toEqual([-1, 1, -1, 1].map((side) => (side * 1.128) / 2));
  });

  it('stays finite for none, one and all equal', () => {
    expect(boardStrip({ points: [], limits: [] }).points).toEqual([]);
    for (const count of [1, 5]) {
      const points = Array.from({ length: count }, () => boardPoint(1e9, { limitsId: null }));
      for (const { z } of boardStrip({ points, limits: [] }).points) expect(z).toBe(0);
    }
  });
});

describe('level against expected', () => {
  const boron: Target = {
    quantity: 'resistivity',
    dopant: 'boron',
    densityPerCm3: 1e15,
    tolerancePercent: 5,
    alongCrystal: false,
    profile: 'uniform',
    lengthUm: null,
    backgroundDopant: null,
    backgroundDensityPerCm3: null,
    calibrationFactor: null,
    calibrationPercent: null,
  };
  const target = { id: 'boron', target: boron };
  const expected = expectedValue(boron);
  const charted = { expected: expected.value, uncertaintyPercent: 3, ingotFraction: null };

  it('reads a value above expected as less dopant', () => {
    const stream = boardStream({ target, charted, points: [boardPoint(expected.value * 1.02)] });
    const found = boardExpected(stream);
    expect(found?.differencePercent).toBeCloseTo(2, 10);
    expect(found?.dopantPercent).toBeCloseTo(100 * (1.02 ** (1 / expected.sensitivity) - 1), 10);
    expect(found?.dopantPercent).toBeLessThan(0);
    expect(found?.tolerancePercent).toBe(5);
    expect(found?.charted.value).toBeCloseTo(expected.value, 10);
  });

  it('takes the newest level there is, past a wafer that was not judged', () => {
    const stream = boardStream({ target, charted, points: [boardPoint(expected.value), boardPoint(null)] });
    expect(boardExpected(stream)?.differencePercent).toBeCloseTo(0, 10);
  });

  it('is held against what its wafers were measured against, known as well as it was then', () => {
    const stream = boardStream({ target, points: [boardPoint(10)], charted: { ...charted, expected: 8 } });
    expect(boardExpected(stream)).toMatchObject({ differencePercent: 25, uncertaintyPercent: 3 });
    expect(boardExpected(stream)?.charted).toEqual({ lower: 8 * 0.97, value: 8, upper: 8 * 1.03 });
    expect(boardExpected({ ...stream, charted: { ...charted, expected: null } })).toBeNull();
  });

  it('needs no value on a relative chart: the level says it itself', () => {
    const crystal = { id: 'crystal', target: { ...boron, alongCrystal: true } };
    const cut = { expected: null, uncertaintyPercent: 3, ingotFraction: 0.4 };
    const points = [boardPoint(100 * Math.log(1.03))];
    const stream = boardStream({ chartedValue: 'relative', target: crystal, charted: cut, points });
    expect(boardExpected(stream)?.differencePercent).toBeCloseTo(3, 10);
    expect(boardExpected(stream)?.charted.value).toBe(0);
    expect(boardExpected({ ...stream, charted: { ...cut, ingotFraction: null } })).toBeNull();
  });

  it('is nothing without a target, a level, or a conversion', () => {
    expect(boardExpected(boardStream())).toBeNull();
    expect(boardExpected(boardStream({ target, charted, points: [] }))).toBeNull();
    expect(boardExpected(boardStream({ target, points: [boardPoint(10)] }))).toBeNull();
    const beyond = { id: 'beyond', target: { ...boron, densityPerCm3: 1e23 } };
    expect(boardExpected(boardStream({ target: beyond, charted }))).toBeNull();
  });

  it('places the band in units of the limits', () => {
    const limits = [
      boardLimits({
        limits: { ...LIMITS, level: { centre: expected.value, sigma: 1, lower: 0, upper: 99 } },
      }),
    ];
    const [row] = boardRows([boardStream({ target, charted, limits, points: [boardPoint(expected.value)] })]);
    const half = (expected.value * charted.uncertaintyPercent) / 100;
    expect(row?.strip.band?.upperZ).toBeCloseTo(half, 10);
    expect(row?.strip.band?.lowerZ).toBeCloseTo(-half, 10);
  });
});

describe('the answer of the board', () => {
  const rows = (needs: number, steady: number, unjudged = 0) => [
    ...Array.from({ length: needs }, () => ({ state: { group: 'needs-someone' as const, words: '' } })),
    ...Array.from({ length: steady }, () => ({ state: { group: 'steady' as const, words: '' } })),
    ...Array.from({ length: unjudged }, () => ({ state: { group: 'not-judged' as const, words: '' } })),
  ];

  it.each([
    [rows(3, 9), 'Three streams need someone. Nine are steady.'],
    [rows(1, 1), 'One stream needs someone. One is steady.'],
    [rows(0, 12), 'All twelve streams are steady.'],
    [rows(2, 0), 'Both streams need someone.'],
    [rows(0, 14, 1), 'No stream needs someone. 14 are steady. One is not judged yet.'],
    [rows(0, 0, 2), 'Both streams are not judged yet.'],
    [rows(1, 0), 'The one stream needs someone.'],
    [rows(0, 2, 1), 'No stream needs someone. Two are steady. One is not judged yet.'],
    [rows(0, 0), 'There is no stream yet.'],
  ])('is true of its rows, %#', (given, answer) => {
    expect(boardAnswer(given)).toBe(answer);
  });

  it('says what was looked for', () => {
    expect(boardAnswer(rows(1, 2), 'epi')).toBe(
      'Three streams match “epi”. One needs someone. Two are steady.',
    );
    expect(boardAnswer(rows(0, 1), 'epi')).toBe('One stream matches “epi”. It is steady.');
    expect(boardAnswer(rows(0, 3), 'epi')).toBe('Three streams match “epi”. All are steady.');
    expect(boardAnswer(rows(0, 2, 1), 'epi')).toBe(
      'Three streams match “epi”. None needs someone. Two are steady. One is not judged yet.',
    );
    expect(boardAnswer([], 'epi')).toBe('No stream matches “epi”.');
  });

  it('finds every word in any case and order', () => {
    const streams = [
      boardStream({ name: 'N-epi 5 Ω·cm' }),
      boardStream({ name: 'Implant', tool: 'Implanter 2', step: 'Implant' }),
    ];
    expect(foundStreams(streams, '')).toHaveLength(2);
    expect(foundStreams(streams, 'reactor EPI')).toEqual([streams[0]]);
    expect(foundStreams(streams, 'epi implanter')).toEqual([]);
  });
});
