import type { Prisma } from '@/lib/database/generated/client';
import type { Dopant } from '@/lib/physics/dopant';
import type { DepthDensity } from '@/lib/physics/pairs-shape';
import type { Target } from '@/lib/physics/target';
import { furtherTarget } from './further-target';
import type {
  SitePlan,
  SpecificationRevision,
  Stream,
  StreamEvent,
  StreamSettings,
  TargetRevision,
} from './types';

type SitePlanRow = Prisma.SitePlanGetPayload<object>;
type StreamRow = Prisma.StreamGetPayload<{ include: { sitePlan: true } }>;

export function sitePlanOf(row: SitePlanRow): SitePlan {
  return {
    id: row.id.toString(),
    name: row.name,
    diameterMm: row.diameterMm,
    edgeExclusionMm: row.edgeExclusionMm,
    orientation: row.orientation as SitePlan['orientation'],
    sites: row.xMm.map((xMm, i) => ({ xMm, yMm: row.yMm[i] as number })),
  };
}

/** The columns' CHECK constraints hold the words to those of the types. */
export function streamOf(row: StreamRow): Stream {
  return {
    id: row.id.toString(),
    slug: row.slug,
    name: row.name,
    kind: row.kind as Stream['kind'],
    step: row.step,
    tool: row.tool,
    chamber: row.chamber,
    recipe: row.recipe,
    quantity: row.quantity as Stream['quantity'],
    plan: sitePlanOf(row.sitePlan),
    subgroup: row.subgroup as Stream['subgroup'],
    subgroupSize: row.subgroupSize,
    controlStatistic: row.controlStatistic as Stream['controlStatistic'],
    chartedValue: row.chartedValue as Stream['chartedValue'],
    screening: row.screening as Stream['screening'],
    repeatabilityPercent: row.repeatabilityPercent,
    retiredAt: row.retiredAt,
  };
}

export function targetRevisionOf(
  row: Prisma.TargetRevisionGetPayload<object>,
  quantity: Target['quantity'],
): TargetRevision {
  return {
    id: row.id.toString(),
    revision: row.revision,
    effectiveFrom: row.effectiveFrom,
    target: {
      quantity,
      dopant: row.dopant as Dopant,
      densityPerCm3: row.densityPerCm3,
      tolerancePercent: row.tolerancePercent,
      alongCrystal: row.alongCrystal,
      profile: row.profile as Target['profile'],
      lengthUm: row.lengthUm,
      backgroundDopant: row.backgroundDopant as Dopant | null,
      backgroundDensityPerCm3: row.backgroundDensityPerCm3,
      calibrationFactor: row.calibrationFactor,
      calibrationPercent: row.calibrationPercent,
      ...furtherTarget({
        counterDopant: row.counterDopant as Dopant | null,
        counterDensityPerCm3: row.counterDensityPerCm3,
        rangeUm: row.rangeUm,
        driveInC: row.driveInC,
        driveInMin: row.driveInMin,
        pairs: row.profilePairs as readonly DepthDensity[] | null,
        temperatureCoefficientPercentPerC: row.temperatureCoefficientPercentPerC,
        method: row.method as 'four-point' | 'other' | null,
      }),
    },
    calibrationWafers: row.calibrationWafers,
    author: row.author,
    reason: row.reason,
    createdAt: row.createdAt,
  };
}

export function specificationRevisionOf(
  row: Prisma.SpecificationRevisionGetPayload<object>,
): SpecificationRevision {
  const { meanLower, meanUpper, siteLower, siteUpper, nonuniformityMetric, nonuniformityUpper } = row;
  return {
    id: row.id.toString(),
    revision: row.revision,
    effectiveFrom: row.effectiveFrom,
    specification: {
      meanLower,
      meanUpper,
      siteLower,
      siteUpper,
      nonuniformityMetric:
        nonuniformityMetric as SpecificationRevision['specification']['nonuniformityMetric'],
      nonuniformityUpper,
    },
    author: row.author,
    reason: row.reason,
    createdAt: row.createdAt,
  };
}

export function streamEventOf(row: Prisma.StreamEventGetPayload<object>): StreamEvent {
  const { kind, at, restart, text, actor, recordedAt } = row;
  return { id: row.id.toString(), kind: kind as StreamEvent['kind'], at, restart, text, actor, recordedAt };
}

export const SETTINGS_INCLUDE = {
  sitePlan: true,
  targets: { orderBy: { revision: 'asc' } },
  specifications: { orderBy: { revision: 'asc' } },
  screenings: { orderBy: { id: 'asc' } },
} as const;

export function streamSettingsOf(
  row: Prisma.StreamGetPayload<{ include: typeof SETTINGS_INCLUDE }>,
): StreamSettings {
  const stream = streamOf(row);
  return {
    stream,
    targets: row.targets.map((target) => targetRevisionOf(target, stream.quantity)),
    specifications: row.specifications.map(specificationRevisionOf),
    screenings: row.screenings.map(({ at, former, screening, author, reason }) => ({
      at,
      former: former as Stream['screening'],
      screening: screening as Stream['screening'],
      author,
      reason,
    })),
  };
}
