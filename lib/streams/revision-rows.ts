import type { ClientBase } from 'pg';
import type { Actor } from '@/lib/access/actor';
import type { AuditFacts } from '@/lib/access/audit-entry';
import type { Target } from '@/lib/physics/target';
import type { Specification } from './types';

/** A revision that was written, and small facts of the one before it. */
export interface WrittenRevision {
  id: string;
  revision: number;
  before: AuditFacts | null;
}

interface RevisionMeta {
  effectiveFrom: Date;
  reason: string;
}

/** What the audit trail tells of a target, and where it stands; of a profile of pairs, how many there are. */
const TARGET_FACTS = {
  dopant: 'dopant',
  densityPerCm3: 'density_per_cm3',
  tolerancePercent: 'tolerance_percent',
  profile: 'profile',
  lengthUm: 'length_um',
  rangeUm: 'range_um',
  driveInC: 'drive_in_c',
  driveInMin: 'drive_in_min',
  backgroundDopant: 'background_dopant',
  backgroundDensityPerCm3: 'background_density_per_cm3',
  counterDopant: 'counter_dopant',
  counterDensityPerCm3: 'counter_density_per_cm3',
  temperatureCoefficientPercentPerC: 'temperature_coefficient_percent_per_c',
  method: 'method',
  calibrationFactor: 'calibration_factor',
  calibrationPercent: 'calibration_percent',
} as const satisfies Partial<Record<keyof Target, string>>;

/** What the audit trail tells of a target: what it says, without what it leaves open. */
export function targetFacts(target: Target): AuditFacts {
  const names = Object.keys(TARGET_FACTS) as (keyof typeof TARGET_FACTS)[];
  const facts = Object.fromEntries(names.map((name) => [name, target[name] ?? null]));
  return withoutOpen({ ...facts, pairs: target.pairs?.length ?? null });
}

/** What the audit trail tells of a specification. */
export function specificationFacts(specification: Specification): AuditFacts {
  return withoutOpen({ ...specification });
}

function withoutOpen(facts: AuditFacts): AuditFacts {
  return Object.fromEntries(Object.entries(facts).filter(([, value]) => value !== null));
}

/** Writes the next revision of a target. */
export async function insertTarget(
  actor: Actor,
  client: ClientBase,
  streamId: string,
  target: Target,
  meta: RevisionMeta & { calibrationWafers?: number | null },
): Promise<WrittenRevision> {
  const { rows } = await client.query<WrittenRevision>(
    `INSERT INTO target_revision (stream_id, revision, effective_from, dopant, density_per_cm3, tolerance_percent,
       along_crystal, profile, length_um, background_dopant, background_density_per_cm3, calibration_factor,
       calibration_percent, calibration_wafers, author, reason, range_um, drive_in_c, drive_in_min, profile_pairs,
       temperature_coefficient_percent_per_c, method, counter_dopant, counter_density_per_cm3)
     VALUES ($1, ${nextRevision('target_revision')}, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12, $13, $14, $15,
       $16, $17, $18, $19, $20, $21, $22, $23)
     RETURNING id, revision, ${factsBefore('target_revision', [
       ...Object.entries(TARGET_FACTS).map(([name, column]) => `'${name}', p.${column}`),
       "'pairs', jsonb_array_length(p.profile_pairs)",
     ])}`,
    [
      ...[streamId, meta.effectiveFrom, target.dopant, target.densityPerCm3, target.tolerancePercent],
      ...[target.alongCrystal, target.profile, target.lengthUm],
      ...[target.backgroundDopant, target.backgroundDensityPerCm3],
      ...[target.calibrationFactor, target.calibrationPercent, meta.calibrationWafers ?? null],
      ...[actor.name, meta.reason],
      ...[target.rangeUm, target.driveInC, target.driveInMin],
      ...[target.pairs ? JSON.stringify(target.pairs) : null],
      ...[target.temperatureCoefficientPercentPerC, target.method],
      ...[target.counterDopant, target.counterDensityPerCm3],
    ],
  );
  return rows[0] as WrittenRevision;
}

/** Writes the next revision of a specification. */
export async function insertSpecification(
  actor: Actor,
  client: ClientBase,
  streamId: string,
  specification: Specification,
  meta: RevisionMeta,
): Promise<WrittenRevision> {
  const { rows } = await client.query<WrittenRevision>(
    `INSERT INTO specification_revision (stream_id, revision, effective_from, mean_lower, mean_upper, site_lower,
       site_upper, nonuniformity_metric, nonuniformity_upper, author, reason)
     VALUES ($1, ${nextRevision('specification_revision')}, $2, $3, $4, $5, $6, $7, $8, $9, $10)
     RETURNING id, revision, ${factsBefore('specification_revision', [
       "'meanLower', p.mean_lower, 'meanUpper', p.mean_upper, 'siteLower', p.site_lower, 'siteUpper', p.site_upper",
       "'nonuniformityMetric', p.nonuniformity_metric, 'nonuniformityUpper', p.nonuniformity_upper",
     ])}`,
    [
      streamId,
      meta.effectiveFrom,
      specification.meanLower,
      specification.meanUpper,
      specification.siteLower,
      specification.siteUpper,
      specification.nonuniformityMetric,
      specification.nonuniformityUpper,
      actor.name,
      meta.reason,
    ],
  );
  return rows[0] as WrittenRevision;
}

function nextRevision(table: string): string {
  return `(SELECT coalesce(max(revision), 0) + 1 FROM ${table} WHERE stream_id = $1)`;
}

/** Within RETURNING a query does not yet see the row that is written: the newest is the one before it. */
function factsBefore(table: string, facts: readonly string[]): string {
  return `(SELECT json_strip_nulls(json_build_object('revision', p.revision, ${facts.join(', ')})) FROM ${table} p
    WHERE p.stream_id = $1 ORDER BY p.revision DESC LIMIT 1) AS before`;
}
