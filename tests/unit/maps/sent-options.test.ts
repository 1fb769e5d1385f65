import { describe, expect, it } from 'vitest';
import { sentOptions } from '@/lib/maps/schema';

const read = (query: string) => sentOptions(new URLSearchParams(query));

describe('the address that a file is sent to', () => {
  it('holds what the flags of the command say', () => {
    expect(read('sound&history=on&stream=n-epi&measured-at=2031-04-05T06:07:08Z')).toEqual({
      checkOnly: false,
      sound: true,
      history: true,
      defaults: { stream: 'n-epi', measured_at: '2031-04-05T06:07:08Z' },
    });
    expect(read('')).toEqual({ checkOnly: false, sound: false, history: false, defaults: {} });
  });

  it('is refused with a word that is not understood, so that none is passed over', () => {
    expect(read('histroy&sound')).toEqual({ faults: ['the address holds what is not understood: histroy'] });
    expect(read('history=yes')).toEqual({ faults: ['“history” in the address is not understood'] });
    expect(read('measured_at=2031')).toEqual({
      faults: ['the address holds what is not understood: measured_at'],
    });
  });
});
