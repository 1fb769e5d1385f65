import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { listLimitsInForce } from '@/lib/limits/data';
import { listStreams, listStreamSettings } from '@/lib/streams/data';
import { inForce } from '@/lib/streams/in-force';

const COLUMNS = [
  'stream',
  'name',
  'kind',
  'step',
  'tool',
  'chamber',
  'recipe',
  'quantity',
  'site_plan',
  'subgroup',
  'subgroup_size',
  'control_statistic',
  'charted_value',
  'screening',
  'repeatability_percent',
  'dopant',
  'density_per_cm3',
  'tolerance_percent',
  'limit_revision',
  'limit_state',
  'limit_subgroups',
  'retired_at',
];

/** Every stream as it stands now, as a file. */
export async function GET(request: Request): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const streams = await listStreams(actor, { retired: true });
  const settings = await listStreamSettings(
    actor,
    streams.map(({ id }) => id),
  );
  const limits = new Map((await listLimitsInForce(actor)).map((one) => [one.streamId, one]));
  const now = new Date();
  const rows = settings.map(({ stream, targets }) => {
    const target = inForce(targets, now)?.target;
    const limit = limits.get(stream.id);
    return [
      stream.slug,
      stream.name,
      stream.kind,
      stream.step,
      stream.tool,
      stream.chamber,
      stream.recipe,
      stream.quantity,
      stream.plan.name,
      stream.subgroup,
      stream.subgroupSize,
      stream.controlStatistic,
      stream.chartedValue,
      stream.screening,
      stream.repeatabilityPercent,
      target?.dopant ?? null,
      target?.densityPerCm3 ?? null,
      target?.tolerancePercent ?? null,
      limit?.revision ?? null,
      limit?.state ?? null,
      limit?.subgroups ?? null,
      stream.retiredAt,
    ];
  });
  return csvResponse('streams.csv', COLUMNS, rows);
}
