import { describe, expect, it } from 'vitest';
import { callPlace } from '@/app/_charts/call-place';

describe('the words at a point of a drawing', () => {
  it('reach into the wider side', () => {
    expect(callPlace('beyond the upper limit', 100, 980)).toEqual({ x: 96, anchor: 'start' });
    expect(callPlace('beyond the upper limit', 800, 980)).toEqual({ x: 804, anchor: 'end' });
  });

  it('are moved so that a narrow drawing cuts nothing of them', () => {
    const words = 'spread within the wafer beyond the upper limit 24 times';
    const from = callPlace(words, 170, 356);
    expect(from?.anchor).toBe('start');
    expect(from?.x).toBeLessThan(356 - 5.8 * words.length);
    expect(callPlace(words, 200, 356)).toMatchObject({ anchor: 'end', x: expect.closeTo(345, 0) });
  });

  it('are left out where there is no room at all', () => {
    expect(callPlace('word '.repeat(20), 170, 356)).toBeNull();
  });
});
