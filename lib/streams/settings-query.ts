import type { ClientBase, Pool } from 'pg';
import { getPool } from '@/lib/database/client';
import { streamSettingsOf, type SETTINGS_INCLUDE } from './stream-rows';
import type { StreamSettings } from './types';

type SettingsRow = Parameters<typeof streamSettingsOf>[0];
type Json = Record<string, unknown>;

/** What `SETTINGS_INCLUDE` asks for, in one plain statement: recording a wafer waits for it. */
const SELECTION: Record<keyof typeof SETTINGS_INCLUDE | 'stream', string> = {
  stream: 'to_jsonb(s)',
  sitePlan: 'to_jsonb(p)',
  targets: `(SELECT coalesce(jsonb_agg(to_jsonb(t) ORDER BY t.revision), '[]')
    FROM target_revision t WHERE t.stream_id = s.id)`,
  specifications: `(SELECT coalesce(jsonb_agg(to_jsonb(c) ORDER BY c.revision), '[]')
    FROM specification_revision c WHERE c.stream_id = s.id)`,
  screenings: `(SELECT coalesce(jsonb_agg(to_jsonb(h) ORDER BY h.id), '[]')
    FROM screening_change h WHERE h.stream_id = s.id)`,
};

const STATEMENT = `SELECT ${Object.entries(SELECTION)
  .map(([name, expression]) => `${expression} AS "${name}"`)
  .join(', ')} FROM stream s JOIN site_plan p ON p.id = s.site_plan_id`;

/** The settings of the streams that a condition on `s` picks, by name. */
export async function settingsWhere(
  condition: string,
  parameters: unknown[],
  client: ClientBase | Pool = getPool(),
): Promise<StreamSettings[]> {
  const { rows } = await client.query<{
    stream: Json;
    sitePlan: Json;
    targets: Json[];
    specifications: Json[];
    screenings: Json[];
  }>(`${STATEMENT} WHERE ${condition} ORDER BY s.name`, parameters);
  return rows.map(({ stream, sitePlan, targets, specifications, screenings }) =>
    streamSettingsOf({
      ...named(stream),
      sitePlan: named(sitePlan),
      targets: targets.map(named),
      specifications: specifications.map(named),
      screenings: screenings.map(named),
    } as unknown as SettingsRow),
  );
}

/** A row as JSON, its columns named as in the program and its times as times. */
function named(json: Json): Json {
  return Object.fromEntries(
    Object.entries(json).map(([column, value]) => [
      column.replace(/_([a-z])/g, (_, letter: string) => letter.toUpperCase()),
      /(^|_)(at|from)$/.test(column) && typeof value === 'string' ? new Date(value) : value,
    ]),
  );
}
