import { describe, expect, it } from 'vitest';
import { waferAnswer, type WaferAnswerFacts } from '@/lib/maps/wafer-answer';

const habit = (name: string, isUnusual: boolean | null, isSeen = true) => ({
  name,
  percent: 1,
  isSeen,
  isUnusual,
});
const facts: WaferAnswerFacts = {
  name: 'W-2207',
  notJudgedReason: null,
  outOfSpecification: [],
  signal: null,
  differencePercent: -1.62,
  value: '5.514 Ω·cm',
  habits: [habit('bowl', false), habit('tilt', false), habit('ring', false, false)],
  whose: 'this chamber',
};

describe('the answer of a wafer', () => {
  it('says where it lies and that its shape is as usual', () => {
    expect(waferAnswer(facts)).toBe(
      'W-2207: 1.6\u00a0% below expected, bowl and tilt as usual for this chamber',
    );
  });

  it('names what is unusual, and then says of nothing that it is usual', () => {
    const habits = [habit('bowl', false), habit('tilt', true), habit('ring', true)];
    expect(waferAnswer({ ...facts, habits })).toBe(
      'W-2207: 1.6\u00a0% below expected, tilt and ring unlike the usual for this chamber',
    );
    const many = ['a', 'b', 'c', 'd', 'e'].map((name) => habit(name, true));
    expect(waferAnswer({ ...facts, habits: many })).toContain('a, b, c and 2 more unlike the usual');
  });

  it('says nothing of habits where any is not known', () => {
    expect(waferAnswer({ ...facts, habits: [habit('bowl', null), habit('tilt', false)] })).toBe(
      'W-2207: 1.6\u00a0% below expected',
    );
    expect(waferAnswer({ ...facts, habits: [] })).toBe('W-2207: 1.6\u00a0% below expected');
  });

  it('says "shape" where no shape stands out of its noise', () => {
    const habits = ['bowl', 'tilt', 'ring'].map((name) => habit(name, false, false));
    expect(waferAnswer({ ...facts, habits })).toContain('shape as usual');
  });

  it('does not speak for the whole shape where the plan tells only tilt', () => {
    expect(waferAnswer({ ...facts, habits: [habit('tilt', false, false)] })).toContain('tilt as usual');
  });

  it('calls a difference that rounds to nothing "as expected", and drops decimals from a large one', () => {
    expect(waferAnswer({ ...facts, habits: [], differencePercent: -0.04 })).toBe('W-2207: as expected');
    expect(waferAnswer({ ...facts, habits: [], differencePercent: 9.97 })).toBe(
      'W-2207: 10\u00a0% above expected',
    );
    expect(waferAnswer({ ...facts, habits: [], differencePercent: 9.94 })).toBe(
      'W-2207: 9.9\u00a0% above expected',
    );
  });

  it('gives the value where nothing is expected', () => {
    expect(waferAnswer({ ...facts, differencePercent: null, habits: [] })).toBe('W-2207: 5.514 Ω·cm');
  });

  it('puts out of specification before all else, then not judged', () => {
    const out = ['wafer mean above its specification', 'a site above its specification'];
    expect(waferAnswer({ ...facts, notJudgedReason: 'measure again' })).toBe(
      'W-2207: not judged, measure again',
    );
    expect(waferAnswer({ ...facts, outOfSpecification: out, notJudgedReason: 'nothing is expected' })).toBe(
      'W-2207: wafer mean above its specification, not judged, nothing is expected',
    );
    const signal = 'beyond the upper limit';
    expect(waferAnswer({ ...facts, signal, habits: [] })).toBe(
      'W-2207: beyond the upper limit, 1.6\u00a0% below expected',
    );
    expect(waferAnswer({ ...facts, signal, outOfSpecification: out, habits: [] })).toBe(
      'W-2207: wafer mean above its specification, 1.6\u00a0% below expected',
    );
  });
});
