import { describe, expect, it } from 'vitest';
import { targetChoices } from '@/app/(line)/setup/target-choices';

describe('targetChoices', () => {
  it('asks each kind for what is commonly known of it', () => {
    const usual = (kind: 'substrate' | 'epi' | 'implant' | 'diffusion') => {
      const { profile, givenNow } = targetChoices(kind, {}, undefined);
      return [profile, givenNow];
    };
    expect(usual('substrate')).toEqual(['uniform', 'density']);
    expect(usual('epi')).toEqual(['uniform', 'density']);
    expect(usual('implant')).toEqual(['implant', 'dose']);
    expect(usual('diffusion')).toEqual(['erfc', 'density']);
  });

  it('leaves the words of a kind that was chosen before', () => {
    for (const given of ['resistivity', 'density']) {
      const words = { profile: 'uniform', given, lengthGiven: 'junction' };
      const { profile, givenNow, lengthNow } = targetChoices('implant', words, undefined);
      expect([profile, givenNow, lengthNow]).toEqual(['implant', 'dose', 'length']);
    }
  });

  it('keeps the profile in force where its kind does not offer it', () => {
    const { profiles, profile } = targetChoices('epi', {}, 'box');
    expect(profiles).toEqual(['uniform', 'box']);
    expect(profile).toBe('box');
  });

  it('offers the depth of a junction for a profile that falls from the surface', () => {
    const words = { profile: 'gaussian', lengthGiven: 'junction' };
    expect(targetChoices('diffusion', words, undefined).lengthNow).toBe('junction');
  });
});
