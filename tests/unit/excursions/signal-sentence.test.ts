import { describe, expect, it } from 'vitest';
import { signalSentence } from '@/lib/excursions/signal-sentence';

const sentence = (chart: string, rule: string, side: 'above' | 'below', took = 1, completions = 1) =>
  signalSentence({ chart, rule, side, participantIds: Array.from({ length: took }, String), completions });

describe('a signal in words', () => {
  it('names the rule, how many took part and the side', () => {
    expect(sentence('level', 'eight-on-one-side', 'below', 8)).toBe('8 in a row below the centre line');
    expect(sentence('level', 'eight-on-one-side', 'below', 8, 4)).toBe('11 in a row below the centre line');
    expect(sentence('level', 'two-of-three-beyond-2-sigma', 'above', 2)).toBe(
      '2 of 3 in a row more than 2 σ above the centre line',
    );
    expect(sentence('level', 'beyond-3-sigma', 'above')).toBe('beyond the upper limit');
  });

  it('names the chart where it is not the level', () => {
    expect(sentence('moving-range', 'beyond-limit', 'above')).toBe(
      'change from one subgroup to the next beyond the upper limit',
    );
    expect(sentence('within', 'beyond-limit', 'above')).toBe(
      'spread within the wafer beyond the upper limit',
    );
    expect(sentence('within', 'beyond-limit', 'below')).toBe(
      'spread within the wafer suspiciously even: stuck gauge or copied readings?',
    );
    expect(sentence('between', 'beyond-limit', 'above')).toBe(
      'spread between the wafers of a subgroup beyond the upper limit',
    );
  });

  it('counts how often, and never so that it reads as how far', () => {
    expect(sentence('within', 'beyond-limit', 'above', 1, 24)).toBe(
      'spread within the wafer beyond the upper limit 24 times',
    );
    expect(sentence('within', 'beyond-limit', 'below', 1, 3)).toBe(
      'spread within the wafer 3 times suspiciously even: stuck gauge or copied readings?',
    );
  });

  it('says what is out of specification', () => {
    expect(sentence('specification', 'wafer-mean', 'above')).toBe('wafer mean above its specification');
    expect(sentence('specification', 'nonuniformity', 'above')).toBe('less even than specified');
    expect(sentence('specification', 'of a kind to come', 'below')).toBe('out of specification');
  });
});
