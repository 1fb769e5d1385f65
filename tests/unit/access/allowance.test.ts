import { describe, expect, it } from 'vitest';
import { Allowance } from '@/lib/access/allowance';

const gauge = { kind: 'token', id: '1' } as const;

describe('an allowance', () => {
  it('gives so many at once, then says in how many seconds there is one again', () => {
    const allowance = new Allowance({ burst: 3, perSecond: 0.5 });
    expect([0, 0, 0, 0].map(() => allowance.waitS(gauge, 1000))).toEqual([0, 0, 0, 2]);
    expect(allowance.waitS(gauge, 2000)).toBe(1);
    expect(allowance.waitS(gauge, 3000)).toBe(0);
    expect(allowance.waitS(gauge, 3000)).toBe(2);
  });

  it('grows no further than what may be had at once', () => {
    const allowance = new Allowance({ burst: 2, perSecond: 1 });
    expect(allowance.waitS(gauge, 0)).toBe(0);
    expect([0, 0, 0].map(() => allowance.waitS(gauge, 3_600_000))).toEqual([0, 0, 1]);
  });

  it('takes back what did not count, and no more than may be had at once', () => {
    const allowance = new Allowance({ burst: 1, perSecond: 1 });
    expect(allowance.waitS(gauge, 0)).toBe(0);
    allowance.giveBack(gauge);
    allowance.giveBack(gauge);
    expect([0, 0].map(() => allowance.waitS(gauge, 0))).toEqual([0, 1]);
  });

  it('is each one’s own', () => {
    const allowance = new Allowance({ burst: 1, perSecond: 1 });
    expect(allowance.waitS(gauge, 0)).toBe(0);
    expect(allowance.waitS({ kind: 'person', id: '1' }, 0)).toBe(0);
    expect(allowance.waitS({ kind: 'token', id: '2' }, 0)).toBe(0);
    expect(allowance.waitS(gauge, 0)).toBe(1);
  });

  it('does not take a clock that was set back for a long wait', () => {
    const allowance = new Allowance({ burst: 1, perSecond: 1 });
    expect(allowance.waitS(gauge, 10_000)).toBe(0);
    expect(allowance.waitS(gauge, 0)).toBe(1);
    expect(allowance.waitS(gauge, 1000)).toBe(0);
  });
});
