import { describe, expect, it } from 'vitest';
import { UsageError } from '@/lib/command/verb';
import { runlength } from '@/lib/command/verbs/runlength';

async function run(...args: string[]): Promise<string> {
  let printed = '';
  expect(await runlength.run(args, { out: (text) => (printed += text), say: () => undefined })).toBe(0);
  return printed;
}

async function answer(...args: string[]) {
  return JSON.parse(await run(...args, '--json')) as {
    averageRunLength: number;
    standardError?: number;
    start: string;
    method: string;
    design: Record<string, number>;
    estimated?: { baseline: number; perPoint: number; low: number; high: number };
  };
}

describe('evenohm runlength', () => {
  it('tells the run lengths of Champ and Woodall, the four rules by default', async () => {
    // C. W. Champ and W. H. Woodall, Technometrics 29, 393 (1987).
    expect((await answer()).averageRunLength).toBeCloseTo(91.75, 2);
    expect((await answer('--shift', '1')).averageRunLength).toBeCloseTo(9.22, 2);
    const three = await answer('--rules', 'beyond-3-sigma,two-of-three-beyond-2-sigma');
    expect(Math.abs(three.averageRunLength - 225.44)).toBeLessThan(0.01);
    expect(three).toMatchObject({ method: 'markov-chain', start: 'zero' });
  });

  it('tells those of an EWMA and a CUSUM, from either state', async () => {
    // Lucas and Saccucci (1990) and Lucas (1976), from memory.
    expect((await answer('--ewma', '0.1,2.814', '--shift', '1')).averageRunLength).toBeCloseTo(10.3, 1);
    expect((await answer('--cusum', '0.5,5', '--shift', '1')).averageRunLength).toBeCloseTo(10.4, 1);
    const steady = await answer('--cusum', '0.5,5', '--shift', '1', '--steady');
    expect(steady.averageRunLength).toBeLessThan(10);
    expect(steady.start).toBe('steady');
  });

  it('simulates a trend, the same for the same seed, with its standard error', async () => {
    const words = ['--rules', 'six-in-a-trend', '--runs', '300'];
    const first = await answer(...words);
    expect(first.method).toBe('simulation');
    expect(first.standardError).toBeGreaterThan(0);
    expect(await answer(...words)).toEqual(first);
    expect(await answer(...words, '--seed', 'other')).not.toEqual(first);
    expect(await run(...words)).toContain('standard error');
  });

  it('chooses a CUSUM for a shift, and says what limits from a baseline make of the rules', async () => {
    const chosen = await answer('--choose', 'cusum', '--in-control', '465', '--shift', '1');
    expect(chosen.design).toMatchObject({ kind: 'cusum', reference: 0.5 });
    expect(chosen.design.decision).toBeCloseTo(5, 2);
    const { estimated } = await answer('--rules', 'beyond-3-sigma', '--baseline', '25');
    expect(estimated?.perPoint).toBeGreaterThan(1 / 370);
    expect(await run('--rules', 'beyond-3-sigma', '--baseline', '25')).toContain('limits from 25 points');
  });

  it.each([
    [['--rules', 'unheard-of']],
    [['--rules', 'beyond-3-sigma', '--ewma', '0.1,3']],
    [['--ewma', '0.1']],
    [['--ewma', '2,3']],
    [['--cusum', '0.5,0']],
    [['--choose', 'pie', '--shift', '1']],
    [['--choose', 'ewma']],
    [['--in-control', '370']],
    [['--shift', 'far']],
    [['--rules', 'six-in-a-trend', '--steady']],
    [['--cusum', '0.5,5', '--baseline', '2']],
    [['--runs', '1']],
    [['--unheard-of']],
  ])('calls %j wrong usage', async (args) => {
    await expect(async () => run(...args)).rejects.toThrow(UsageError);
  });
});
