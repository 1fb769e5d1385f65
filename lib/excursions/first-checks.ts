import type { ExcursionCase } from './types';

/**
 * What is worth looking at first, by the kind of signal: the gauge before the process, the cheap before the dear.
 * Common practice, no source.
 */
export function firstChecks({ chart, side }: Pick<ExcursionCase, 'chart' | 'side'>): string[] {
  switch (chart) {
    case 'level':
      return [
        'Measure the last wafer again, and a reference wafer on the same gauge: a gauge that reads wrong looks like a process that moved.',
        'Look whether other streams of the same gauge or the same tool moved in the same days.',
        'Hold the beginning of the signal against adjustments, maintenance, and changes of gas, source or batch.',
      ];
    case 'moving-range':
      return [
        'Look whether a single subgroup stands out and the next is back: then a misrouted wafer or a wrong recipe comes first to mind.',
        'Measure that wafer again before anything else.',
      ];
    case 'within':
      return side === 'below'
        ? [
            'Compare the readings of these wafers site by site: equal ones mean a stuck gauge or copied readings.',
            'Measure one of the wafers again.',
          ]
        : [
            'Compare the maps from before and after: which zone changed tells more than the figure.',
            'Measure the wafer again, and look at its bad sites and the probe’s contact, before the tool.',
          ];
    case 'between':
      return [
        'Compare the wafers of the subgroup by slot or place: one that stands alone, or a gradient?',
        'Measure the farthest of them again.',
      ];
    default:
      return [
        'Measure the wafer again on a gauge whose reference wafer reads right.',
        'Find out which product the same run or lot carried, and let its owner decide about it.',
      ];
  }
}
