import { describe, expect, it } from 'vitest';
import { limitsAnswer } from '@/app/(line)/setup/streams/[slug]/limits/limits-answer';

describe('what the limits page says of a stream without limits', () => {
  it('is how many subgroups are there, or that their levels are all equal', () => {
    const answer = (judged: number, alike: boolean) => limitsAnswer('Furnace 2', null, { judged, alike });
    expect(answer(0, false)).toBe('Furnace 2 has no limits yet: the first 25 subgroups will make them');
    expect(answer(7, true)).toBe(
      'Furnace 2 has no limits yet: the first 25 subgroups will make them, 7 so far',
    );
    expect(answer(25, true)).toBe('Furnace 2 has no limits: its first 25 levels are all equal');
  });
});
