import { describe, expect, it } from 'vitest';
import { toldWhen } from '@/lib/excursions/told-when';

describe('toldWhen', () => {
  it('goes on after what happened, and begins anew after a question', () => {
    expect(toldWhen('8 in a row below the centre line', 'since run R1177')).toBe(
      '8 in a row below the centre line, since run R1177',
    );
    expect(toldWhen('stuck gauge or copied readings?', 'at run R0042')).toBe(
      'stuck gauge or copied readings? At run R0042',
    );
  });
});
