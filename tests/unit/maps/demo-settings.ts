import type { RawMap } from '@/lib/maps/raw-maps';
import type { SitePlan, Specification, Stream, StreamSettings } from '@/lib/streams/types';
import type { Target } from '@/lib/physics/target';
import { polarSites } from '@/lib/wafer/polar-sites';
import { uniformBoron as target } from '../../support/uniform-boron';

export const plan: SitePlan = {
  id: '1',
  name: 'polar 9',
  diameterMm: 200,
  edgeExclusionMm: 0,
  orientation: 'notch',
  sites: polarSites(1, 90),
};

/** The settings of an invented stream of boron wafers, some of them otherwise. */
export function settings(
  stream: Partial<Stream> = {},
  more: { target?: Partial<Target> | null; specification?: Partial<Specification> } = {},
): StreamSettings {
  const meta = {
    id: '1',
    revision: 1,
    effectiveFrom: new Date(0),
    author: '',
    reason: '',
    createdAt: new Date(0),
  };
  const specification: Specification = {
    meanLower: null,
    meanUpper: null,
    siteLower: null,
    siteUpper: null,
    nonuniformityMetric: null,
    nonuniformityUpper: null,
    ...more.specification,
  };
  return {
    stream: {
      id: '7',
      slug: 'boron-a',
      name: 'Boron A',
      kind: 'substrate',
      step: '',
      tool: '',
      chamber: '',
      recipe: '',
      quantity: 'resistivity',
      plan,
      subgroup: 'wafer',
      subgroupSize: 1,
      controlStatistic: 'areaMean',
      chartedValue: 'statistic',
      screening: 'outliers',
      repeatabilityPercent: 0.2,
      retiredAt: null,
      ...stream,
    },
    targets:
      more.target === null
        ? []
        : [{ ...meta, target: { ...target, ...more.target }, calibrationWafers: null }],
    specifications: more.specification === undefined ? [] : [{ ...meta, specification }],
    screenings: [],
  };
}

/** Rows of a whole wafer on the plan, as reading a file gives them; the header is line 1. */
export function rawMap(words: RawMap['words'] = {}, change: Partial<RawMap> = {}): RawMap {
  return {
    firstLine: 2,
    words: { stream: 'boron-a', wafer: 'W1', measured_at: '2031-04-05T06:07:08Z', ...words },
    xMm: plan.sites.map((site) => site.xMm),
    yMm: plan.sites.map((site) => site.yMm),
    values: plan.sites.map((_, i) => 13 + i / 10),
    lines: plan.sites.map((_, i) => i + 2),
    faults: [],
    ...change,
  };
}
