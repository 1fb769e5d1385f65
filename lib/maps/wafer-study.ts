import { againstExpected, type AgainstExpected } from '@/lib/physics/against-expected';
import type { SpecificationRevision, Stream, TargetRevision } from '@/lib/streams/types';
import { inForce } from '@/lib/streams/in-force';
import { measureWafer, type SiteStatus, type WaferMeasure } from '@/lib/wafer/measure-wafer';
import { planGeometry, type PlanGeometry } from '@/lib/wafer/plan-geometry';
import { shapeHabits, usualReaches, type ShapeHabit, type UsualReach } from '@/lib/wafer/shape-habits';
import { usualMap, type UsualMap } from '@/lib/wafer/usual-map';
import { expectedWafer } from './measured-wafer';
import { valuesAt23C } from './values-at-23c';
import type { WaferOnRecord } from './wafer-on-record';

/** Everything the page of a wafer says in figures, worked out from what is on record. */
export interface WaferStudy {
  geometry: PlanGeometry;
  /** Readings at 23 °C, in the plan's order, and what became of each. */
  values: readonly (number | null)[];
  status: readonly SiteStatus[];
  /** Figures and shape of the readings that count by the record. */
  measure: WaferMeasure;
  features: WaferMeasure['features'];
  /** The value that is charted and held against expectation and specification. */
  statistic: number | null;
  target: TargetRevision | null;
  specification: SpecificationRevision | null;
  /** Whether the wafer is fit to be held against it: one of which nothing is expected is, one to measure again is not. */
  isSpecified: boolean;
  against: AgainstExpected | null;
  /** The same without the calibration factor; null where the target has none. */
  fromPhysics: AgainstExpected | null;
  usual: UsualMap | null;
  habits: ShapeHabit[];
  reaches: Map<string, UsualReach>;
}

const geometries = new Map<string, PlanGeometry>();
const MOST_GEOMETRIES = 100;

/** A site plan's geometry from the process's own stock: plans never change. */
function geometryOf({ sites, diameterMm, edgeExclusionMm }: Stream['plan']): PlanGeometry {
  const key = JSON.stringify([sites, diameterMm, edgeExclusionMm]);
  const known = geometries.get(key);
  if (known) return known;
  const geometry = planGeometry(sites, { diameterMm, edgeExclusionMm });
  if (geometries.size >= MOST_GEOMETRIES) geometries.clear();
  geometries.set(key, geometry);
  return geometry;
}

/**
 * Studies a wafer on record: figures and shape of the readings that count, what physics expects, what is usual. Which
 * readings count, the target and the specification are those on record, whatever has been revised since.
 */
export function waferStudy({ wafer, settings, decisions, usual: past }: WaferOnRecord): WaferStudy {
  const { stream } = settings;
  const geometry = geometryOf(stream.plan);
  const target = settings.targets.find(({ id }) => id === wafer.targetRevisionId) ?? null;
  const brought = expectedWafer(stream, wafer.facts);
  const values = valuesAt23C(wafer.readings, wafer.facts, target?.target ?? null, brought);
  const out = new Map(wafer.badSites.map(({ siteIndex }) => [siteIndex, 'out' as const]));
  const measure = measureWafer(values, geometry, { screen: 'off', overrides: out, shape: true });
  const reasons = new Map(wafer.badSites.map(({ siteIndex, reason }) => [siteIndex, reason]));
  const overrides = new Map(decisions.map(({ siteIndex, action }) => [siteIndex, action]));
  const screened = measureWafer(values, geometry, { screen: wafer.screening, overrides, shape: false });
  const statistic = measure.figures[stream.controlStatistic];
  const hold = (calibrated: boolean): AgainstExpected | null => {
    if (target === null || statistic === null || statistic <= 0) return null;
    const bare = { ...target.target, calibrationFactor: null, calibrationPercent: null };
    return againstExpected(calibrated ? target.target : bare, statistic, brought);
  };
  const usual = usualMap(
    past.wafers.map((one) => ({
      values: valuesAt23C(one.readings, one, target?.target ?? null, brought),
      badSites: one.badSites,
    })),
    geometry,
  );
  const lastWord = decisions.reduce((latest, { at }) => (at > latest ? at : latest), wafer.recordedAt);
  const known = settings.specifications.filter(({ createdAt }) => createdAt <= lastWord);
  return {
    geometry,
    values,
    status: measure.status.map((status, site) => reasons.get(site) ?? status),
    measure,
    features: screened.features,
    statistic,
    target,
    specification:
      inForce(known, wafer.facts.processedAt) ?? inForce(settings.specifications, wafer.facts.processedAt),
    isSpecified: screened.judgeable && statistic !== null && statistic > 0,
    against: hold(true),
    fromPhysics: (target?.target.calibrationFactor ?? null) === null ? null : hold(false),
    usual,
    habits: shapeHabits(measure.shape, usual),
    reaches: usual === null ? new Map<string, UsualReach>() : usualReaches(measure.shape, usual),
  };
}
