import { describe, expect, it } from 'vitest';
import { toolPlot, toolScale } from '@/app/(line)/streams/[slug]/tool-scale';
import type { ToolWafer } from '@/lib/excursions/tool-wafers';
import { targetModel } from '@/lib/excursions/target-model';
import { settings } from '../maps/demo-settings';

const heavy = settings(
  { id: '8', slug: 'heavy', name: 'Heavy', recipe: 'H' },
  { target: { densityPerCm3: 1e18 } },
);
const light = settings({ id: '9', slug: 'light', name: 'Light', recipe: 'L' });
const wafer = (streamId: string, ratio: number, at = 0): ToolWafer => ({
  id: `${streamId}-${at}`,
  streamId,
  wafer: '01',
  at,
  ratio,
  expectedUncertaintyPercent: 1.7,
  targetId: '1',
  ingotFraction: null,
});

/** What a wafer reads over expected where its tool gives 1 % more dopant, additive as a chart wants it. */
const oneMore = (densityPerCm3: number) =>
  Math.exp(0.01 * (targetModel({ ...light.targets[0]!.target, densityPerCm3 }, null)?.sensitivity ?? 0));

describe('the one scale of a tool', () => {
  it('shows a step of the tool by 1 % as 1 on every recipe, whatever its doping', () => {
    const recipes = toolScale([heavy, light], [wafer('8', oneMore(1e18)), wafer('9', oneMore(1e15))], '9');
    expect(recipes.map(({ meanPercent }) => meanPercent)).toEqual([
      expect.closeTo(1, 9),
      expect.closeTo(1, 9),
    ]);
    // d ln ρ/d ln N is −0.623 at 1e18 and −0.986 at 1e15 (SP 400-64): the heavy recipe's band is wider in dopant.
    expect(recipes.map(({ expectedPercent }) => expectedPercent)).toEqual([
      expect.closeTo(1.7 / 0.623, 2),
      expect.closeTo(1.7 / 0.986, 2),
    ]);
  });

  it('tells recipes by letters, the own one by none, and leaves out those without a wafer', () => {
    const recipes = toolScale([heavy, light], [wafer('8', 1), wafer('8', 1.01, 5), wafer('9', 1)], '9');
    expect(recipes.map(({ letter }) => letter)).toEqual(['a', null]);
    expect(recipes[0]?.standardDeviationPercent).toBeGreaterThan(0);
    expect(recipes[1]?.standardDeviationPercent).toBeNull();
    expect(toolScale([heavy, light], [wafer('9', 1)], '9')).toHaveLength(1);
  });

  it('is drawn in days before the newest wafer', () => {
    const recipes = toolScale([heavy, light], [wafer('8', 1.02), wafer('9', 1, 86_400_000)], '9');
    expect(toolPlot(recipes, 'dose').marks.map(({ x }) => x)).toEqual([-1, 0]);
  });
});
