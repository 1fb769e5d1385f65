import type { Actor } from './actor';

interface Bucket {
  left: number;
  at: number;
}

/** Beyond so many, those that are full again are forgotten: they allow what a new one would. */
const MOST_BUCKETS = 10_000;

/**
 * How often someone may ask: `burst` times at once and `perSecond` times a second in the long run (a token
 * bucket). Counts in this process alone.
 */
export class Allowance {
  readonly #buckets = new Map<string, Bucket>();

  constructor(readonly rate: { burst: number; perSecond: number }) {}

  /** Takes one of what an actor is allowed; returns 0, or in how many whole seconds there will be one again. */
  waitS(actor: Pick<Actor, 'kind' | 'id'>, now = Date.now()): number {
    const { burst, perSecond } = this.rate;
    const key = `${actor.kind} ${actor.id ?? ''}`;
    const before = this.#buckets.get(key) ?? { left: burst, at: now };
    const left = Math.min(burst, before.left + (Math.max(0, now - before.at) / 1000) * perSecond);
    if (this.#buckets.size > MOST_BUCKETS) this.#forgetFull(now);
    this.#buckets.set(key, { left: left >= 1 ? left - 1 : left, at: now });
    return left >= 1 ? 0 : Math.ceil((1 - left) / perSecond);
  }

  /** Gives back what was taken last: it turned out not to count. */
  giveBack(actor: Pick<Actor, 'kind' | 'id'>): void {
    const bucket = this.#buckets.get(`${actor.kind} ${actor.id ?? ''}`);
    if (bucket !== undefined) bucket.left = Math.min(this.rate.burst, bucket.left + 1);
  }

  #forgetFull(now: number): void {
    const fullAfterMs = (this.rate.burst / this.rate.perSecond) * 1000;
    for (const [key, { at }] of this.#buckets) if (now - at > fullAfterMs) this.#buckets.delete(key);
  }
}

/** Files that one person or machine may send: a shift's worth at once, then as fast as any gauge measures. */
export const intakeAllowance = new Allowance({ burst: 200, perSecond: 20 });
