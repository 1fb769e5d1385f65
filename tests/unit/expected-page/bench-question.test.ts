import { describe, expect, it } from 'vitest';
import { benchBudget } from '@/app/(line)/expected/bench-budget';
import { benchAddress, benchQuestion, benchWords } from '@/app/(line)/expected/bench-question';
import { wordsOfTarget } from '@/lib/streams/words-of-target';
import { BORON, DRIVEN, EPI, GAUSSIAN, PAIRS } from '../physics/targets';

const IMPLANT = {
  kind: 'implant',
  dopant: 'boron',
  given: 'dose',
  dosePerCm2: '5e14',
  rangeUm: '0.1',
  lengthUm: '0.05',
  backgroundDopant: 'phosphorus',
  backgroundDensityPerCm3: '1e15',
};

describe('the words of the bench', () => {
  it('are those of its address, and none that it does not know', () => {
    const address = benchAddress({ ...IMPLANT, at: '30', stray: 'x' });
    const read = benchWords(Object.fromEntries(new URL(address, 'http://line').searchParams));
    expect(read).toEqual({ ...IMPLANT, at: '30' });
  });

  it('begin with a question where there are none', () => {
    expect(benchQuestion(benchWords({})).target).toEqual(BORON);
  });

  it.each([
    ['substrate', BORON],
    ['diffusion', GAUSSIAN],
    ['implant', DRIVEN],
    ['diffusion', PAIRS],
    ['epi', EPI],
  ] as const)('carry a whole target of a %s in the address', (kind, target) => {
    const address = benchAddress({ kind, ...wordsOfTarget(target) });
    const words = benchWords(Object.fromEntries(new URL(address, 'http://line').searchParams));
    expect(benchQuestion(words).target).toEqual(target);
  });
});

describe('a question of the bench', () => {
  it('takes the usual profile of its kind where none is said, and measures what its kind is measured by', () => {
    const { target, quantity } = benchQuestion(IMPLANT);
    expect([target?.profile, quantity]).toEqual(['implant', 'sheet_resistance']);
    expect(benchQuestion({ kind: 'epi', quantity: 'resistivity' }).quantity).toBe('resistivity');
    expect(benchQuestion({ kind: 'crystal', quantity: 'sheet_resistance' }).quantity).toBe('resistivity');
  });

  it('says in physics’ own words why there is no target', () => {
    const { target, fault } = benchQuestion({ ...IMPLANT, rangeUm: '' });
    expect(target).toBeNull();
    expect(fault).toBe('An implant needs its projected range.');
  });

  it('passes over a number that is none', () => {
    const { temperatureC, measured } = benchQuestion({ ...IMPLANT, at: '900', measured: 'much' });
    expect([temperatureC, measured]).toEqual([23, null]);
  });

  it('counts temperature and thickness once it is said how well they are known', () => {
    const question = benchQuestion({ ...benchWords({}), knownC: '0.5', knownPercent: '0.2' });
    const parts = benchBudget(BORON, question)?.parts.map(({ name, standardPercent }) => [
      name,
      standardPercent,
    ]);
    // 0.831 % per °C (ASTM F84 at 13.3 Ω·cm) times 0.5 °C; a resistivity goes with its thickness.
    expect(parts).toEqual([
      ['conversion', expect.closeTo(1.732, 3)],
      ['wafer temperature', expect.closeTo(0.415, 2)],
      ['thickness', expect.closeTo(0.2, 9)],
    ]);
    expect(benchBudget(BORON, benchQuestion(benchWords({})))?.parts).toHaveLength(1);
  });
});
