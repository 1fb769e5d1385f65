import { describe, expect, it } from 'vitest';
import { firstStep } from '@/app/(line)/setup/first-step';

describe('what somebody does first where no stream is set up', () => {
  it('is a site plan, and then a stream', () => {
    expect(firstStep(true, 0)).toBe('A stream needs a site plan: draw one up first.');
    expect(firstStep(true, 1)).toContain('Set up the first one');
  });

  it('is to be given the role, for an administrator who has no other', () => {
    expect(firstStep(false, 0)).toContain('process owner');
    expect(firstStep(false, 1)).toContain('under People');
  });
});
