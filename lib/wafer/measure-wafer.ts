import { featureDescription } from './feature-description';
import { heldAgainstFlexible } from './held-against-flexible';
import { partOfPlan, type PlanGeometry } from './plan-geometry';
import { robustDeviations } from './robust-deviations';
import { screenOutliers } from './screen-outliers';
import { waferFigures, type WaferFigures } from './wafer-figures';
import { NO_SHAPE, waferShape, type WaferShape } from './wafer-shape';

export type { Extreme, WaferFigures } from './wafer-figures';
export type { ShapeTerm, WaferShape } from './wafer-shape';

/**
 * How far readings are screened. `off` takes out only what is no number; `impossible` also zero and
 * negative ones; `outliers` also, on plans of 25 counted sites or more, those far from a robust smooth
 * surface and alone in it.
 */
export type Screen = 'off' | 'impossible' | 'outliers';
export type BadReason = 'missing' | 'zero' | 'negative' | 'not-a-number' | 'outlier' | 'by-hand';
export type SiteStatus = 'good' | 'excluded' | BadReason;

/** Neighbouring sites that deviate together: on the wafer, not in the probe. They stay in the figures. */
export interface WaferFeature {
  sites: number[];
  description: string;
}

export interface WaferMeasure {
  sites: number;
  badSites: number;
  excludedSites: number;
  goodSites: number;
  status: SiteStatus[];
  figures: WaferFigures;
  features: WaferFeature[];
  shape: WaferShape;
  judgeable: boolean;
  notJudgeableReason: string | null;
}

const LEAST_SITES_FOR_OUTLIERS = 25;
const MOST_OUTLIER_SHARE = 0.05;
const LEAST_GOOD_SHARE = 0.8;

function impossible(value: number | null | undefined, screen: Screen): BadReason | null {
  if (value === null || value === undefined) return 'missing';
  if (!Number.isFinite(value)) return 'not-a-number';
  if (screen === 'off') return null;
  return value > 0 ? null : value === 0 ? 'zero' : 'negative';
}

function pick(values: readonly (number | null)[], indices: Int32Array): Float64Array {
  const picked = new Float64Array(indices.length);
  for (let i = 0; i < indices.length; i++) picked[i] = values[indices[i]!]!;
  return picked;
}

/**
 * Measures one wafer: screens its readings, then works out figures and shape of the good ones.
 * `values` follows the plan's sites, one unit throughout; null for a reading that was not taken.
 *
 * At most 5 % of the counted sites are taken out as outliers. Where more stand alone, the farthest
 * 5 % are taken out, the others stay, and the wafer is not judged: it is to be measured again. The
 * same below 80 % good sites. `overrides` is a person's word on a site: `out` takes a reading out,
 * `in` keeps one in that the surface would take out; an impossible reading stays out.
 *
 * Throws a RangeError when there are not as many values as sites.
 */
export function measureWafer(
  values: readonly (number | null)[],
  geometry: PlanGeometry,
  options: { screen: Screen; overrides?: ReadonlyMap<number, 'in' | 'out'>; shape?: boolean },
): WaferMeasure {
  const sites = geometry.sites.length;
  if (values.length !== sites) throw new RangeError(`${values.length} values for ${sites} sites`);
  const status = new Array<SiteStatus>(sites).fill('good');
  const isGood = new Uint8Array(sites);
  for (let i = 0; i < sites; i++) {
    if (geometry.excluded[i] === 1) status[i] = 'excluded';
    else {
      const reason =
        impossible(values[i], options.screen) ?? (options.overrides?.get(i) === 'out' ? 'by-hand' : null);
      if (reason === null) isGood[i] = 1;
      else status[i] = reason;
    }
  }
  const counted = geometry.whole.indices.length;
  let tooMany: number | null = null;
  let features: WaferFeature[] = [];
  let part = partOfPlan(geometry, isGood);
  let readings = pick(values, part.indices);
  if (options.screen === 'outliers' && counted >= LEAST_SITES_FOR_OUTLIERS) {
    const deviations = robustDeviations(readings, part);
    if (deviations !== null) {
      const far = screenOutliers(deviations, part.indices, geometry);
      const { lone, together } = heldAgainstFlexible(far, deviations, readings, part);
      const out = lone.filter((i) => options.overrides?.get(i) !== 'in');
      const most = Math.floor(MOST_OUTLIER_SHARE * counted);
      if (out.length > most) tooMany = out.length;
      for (const i of out.slice(0, most)) {
        status[i] = 'outlier';
        isGood[i] = 0;
      }
      const percentAt = new Map<number, number>();
      part.indices.forEach((site, i) => {
        percentAt.set(site, (100 * deviations.deviation[i]!) / deviations.surface[i]!);
      });
      features = together.map((group) => ({
        sites: group,
        description: featureDescription(
          group,
          group.map((site) => percentAt.get(site)!),
          geometry,
        ),
      }));
      part = partOfPlan(geometry, isGood);
      readings = pick(values, part.indices);
    }
  }
  const figures = waferFigures(readings, part, geometry, isGood, values);
  const goodSites = readings.length;
  const reason = notJudgeableReason(goodSites, counted, tooMany);
  return {
    sites,
    badSites: counted - goodSites,
    excludedSites: geometry.excludedSites,
    goodSites,
    status,
    figures,
    features,
    shape: options.shape === false ? NO_SHAPE : waferShape(readings, part, figures.mean),
    judgeable: reason === null,
    notJudgeableReason: reason,
  };
}

function notJudgeableReason(goodSites: number, counted: number, tooMany: number | null): string | null {
  if (counted === 0) return 'no site lies inside the quality area';
  if (goodSites < LEAST_GOOD_SHARE * counted) {
    return `only ${goodSites} of ${counted} sites are good, under 80 %: measure again`;
  }
  if (tooMany !== null) {
    return `${tooMany} readings stand alone, more than 5 % of ${counted} sites: measure again`;
  }
  return null;
}
