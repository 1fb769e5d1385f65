import { describe, expect, it } from 'vitest';
import { batchSentence, newestSentence } from '@/app/(line)/intake/batches/[id]/batch-sentence';
import { checkSentence } from '@/app/(line)/intake/[token]/check-sentence';

const check = (measurements: number, faulty: number, repeated: number, spoilt = false) => ({
  measurements,
  faulty: new Set(Array.from({ length: faulty }, (_, i) => i)),
  repeated,
  problems: [],
  problemCount: faulty,
  previews: [],
  notices: [],
  spoilt,
  fresh: measurements - faulty - repeated,
});
const answer = (...figures: Parameters<typeof check>) => checkSentence('a.csv', check(...figures));

describe('checkSentence', () => {
  it('says what can be recorded', () => {
    expect(answer(12, 0, 0).answer).toBe('12 wafer maps in a.csv can be recorded');
    expect(answer(1, 0, 0).answer).toBe('1 wafer map in a.csv can be recorded');
    expect(answer(12, 0, 2)).toEqual({
      answer: '10 wafer maps in a.csv can be recorded',
      sub: 'No problem was found. 2 are on record already.',
    });
  });

  it('says what cannot, before what can', () => {
    expect(answer(6, 2, 0)).toEqual({
      answer: '2 of 6 wafer maps in a.csv cannot be recorded',
      sub: '4 can. A map is recorded whole or not at all.',
    });
    expect(answer(6, 2, 4).sub).toContain('None of the others is new. 4 are on record already.');
    expect(answer(1, 1, 0).answer).toBe('The map in a.csv cannot be recorded');
    expect(answer(3, 3, 0).answer).toBe('None of the 3 wafer maps in a.csv can be recorded');
    expect(answer(0, 0, 0, true).answer).toBe('a.csv cannot be read as a wafer-map file');
  });

  it('promises nothing where all is on record', () => {
    expect(answer(3, 0, 3).answer).toBe('a.csv is on record already');
  });
});

describe('batchSentence', () => {
  const of = (recorded: number, repeated: number, refused: number) =>
    batchSentence({ recorded, repeated, refused });

  it('says what became of a batch and leaves out what did not happen', () => {
    expect(of(12, 0, 0)).toBe('12 wafer maps were recorded');
    expect(of(1, 0, 2)).toBe('1 wafer map was recorded, 2 were refused');
    expect(of(3, 1, 1)).toBe('3 wafer maps were recorded, 1 was on record before, 1 was refused');
    expect(of(0, 2, 0)).toBe('2 wafer maps were on record before');
    expect(of(0, 0, 1)).toBe('1 wafer map was refused');
    expect(of(0, 0, 0)).toBe('Nothing was recorded');
  });
});

describe('what the newest file brought', () => {
  it('tells of maps that were on record before, and of those refused', () => {
    expect(newestSentence({ recorded: 0, repeated: 1, refused: 0 })).toBe(
      'The newest file: 1 wafer map was on record before',
    );
    expect(newestSentence({ recorded: 0, repeated: 0, refused: 0 })).toBe(
      'The newest file: nothing was recorded',
    );
  });
});
