import type { CurvePlotProps } from '@/app/_charts/curve-plot';
import { modelsOf } from '@/lib/excursions/point-expected';
import type { ToolWafer } from '@/lib/excursions/tool-wafers';
import { formatSignedPercent } from '@/lib/format';
import { dopantScalePercent } from '@/lib/physics/dopant-scale-percent';
import { mean } from '@/lib/stats/mean';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';
import type { StreamSettings } from '@/lib/streams/types';

/** One recipe on the scale of its tool, in percent of dopant or dose. */
export interface ToolRecipe {
  slug: string;
  name: string;
  /** By which its wafers are told on the chart; none of the stream whose page it is. */
  letter: string | null;
  wafers: { id: string; at: number; percent: number; label: string }[];
  meanPercent: number;
  /** Null with one wafer. */
  standardDeviationPercent: number | null;
  /** Of what is expected of its newest wafer, as dopant: common to all its wafers. */
  expectedPercent: number;
}

/**
 * The recipes of one tool on one scale, 100·ln(measured/expected)/sensitivity: a step of the tool's dose by 1 % is a
 * step of 1 on each, so that a rare product is judged from its first wafer. Recipes without such a wafer are left out.
 */
export function toolScale(
  settings: readonly StreamSettings[],
  wafers: readonly ToolWafer[],
  ownStreamId: string,
): ToolRecipe[] {
  let letters = 0;
  return settings.flatMap(({ stream, targets }): ToolRecipe[] => {
    const modelOf = modelsOf(targets);
    const placed = wafers.flatMap((wafer) => {
      const model = wafer.streamId === stream.id ? modelOf(wafer.targetId, wafer.ingotFraction) : null;
      if (model === null || !(wafer.ratio > 0)) return [];
      const percent = dopantScalePercent(wafer.ratio, model.sensitivity);
      const label = `${stream.recipe}, wafer ${wafer.wafer}: ${formatSignedPercent(percent, 2)}`;
      const expectedPercent = wafer.expectedUncertaintyPercent / Math.abs(model.sensitivity);
      return [{ id: wafer.id, at: wafer.at, percent, label, expectedPercent }];
    });
    const newest = placed.at(-1);
    if (newest === undefined) return [];
    const percents = placed.map(({ percent }) => percent);
    return [
      {
        slug: stream.slug,
        name: stream.name,
        letter: stream.id === ownStreamId ? null : String.fromCharCode(97 + (letters++ % 26)),
        wafers: placed.map(({ id, at, percent, label }) => ({ id, at, percent, label })),
        meanPercent: mean(percents),
        standardDeviationPercent: sampleStandardDeviation(percents),
        expectedPercent: newest.expectedPercent,
      },
    ];
  });
}

const DAY_MS = 86_400_000;

/** The drawing of a tool's scale: days before the newest wafer across, percent of dopant up. */
export function toolPlot(recipes: readonly ToolRecipe[], dopantWord: string): CurvePlotProps {
  const all = recipes.flatMap(({ wafers }) => wafers);
  const newest = Math.max(...all.map(({ at }) => at));
  const days = Math.max(1, ...all.map(({ at }) => (newest - at) / DAY_MS));
  const most = Math.max(1, ...all.map(({ percent }) => Math.abs(percent))) * 1.1;
  return {
    title: `${all.length} wafers of ${recipes.length} recipes of one tool in percent of ${dopantWord} off their targets, from ${formatSignedPercent(Math.min(...all.map(({ percent }) => percent)))} to ${formatSignedPercent(Math.max(...all.map(({ percent }) => percent)))}.`,
    x: { label: 'days before the newest wafer', domain: [-1.03 * days, 0.03 * days], isLog: false },
    y: { label: `% ${dopantWord} off target`, domain: [-most, most], isLog: false },
    curves: [],
    marks: recipes.flatMap(({ wafers, letter }) =>
      wafers.map(({ at, percent, label }) => ({
        x: (at - newest) / DAY_MS,
        y: percent,
        label,
        kind: 'measured' as const,
        ...(letter === null ? {} : { letter }),
      })),
    ),
    levels: [{ y: 0, label: '' }],
  };
}
