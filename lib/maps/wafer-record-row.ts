import type { BadReason } from '@/lib/wafer/measure-wafer';
import type { ReadingDecision, WaferRecord } from './wafer-record';

/** What `waferOnRecord` selects. */
export interface WaferRecordRow {
  id: string;
  stream_id: string;
  batch_id: string;
  batch_source: string;
  lot: string | null;
  run: string | null;
  wafer: string;
  slot: number | null;
  measured_at: Date;
  processed_at: Date;
  stage: 'pre' | 'post' | null;
  tool: string | null;
  chamber: string | null;
  recipe: string | null;
  gauge: string | null;
  operator: string | null;
  temperature_c: number | null;
  thickness_um: number | null;
  ingot_fraction: number | null;
  corrections_applied: string;
  corrected_by: string;
  note: string | null;
  history: boolean;
  recorded_at: Date;
  recorded_by: string;
  screening: WaferRecord['screening'];
  not_judged_reason: string | null;
  bad_site_indices: number[];
  bad_site_reasons: BadReason[];
  target_revision_id: string | null;
  specification: string[];
  reading: (number | null)[];
  subgroup_id: string;
  subgroup_key: string;
  position_at: Date;
  subgroup_state: WaferRecord['subgroup']['state'];
  subgroup_wafers: number;
  limit_revision_id: string | null;
  completions: string[];
  decisions: [number, 'out' | 'in', string, string, string][] | null;
  largest_diameter_mm: number;
}

/** The words of the corrections column as a list. */
export function correctionsOf(words: string): string[] {
  return words === 'none' ? [] : words.split(' ');
}

export function waferRecordOf(row: WaferRecordRow): { wafer: WaferRecord; decisions: ReadingDecision[] } {
  const { lot, run, wafer, slot, stage, tool, chamber, recipe, gauge, operator, note } = row;
  return {
    wafer: {
      id: row.id,
      streamId: row.stream_id,
      facts: {
        lot,
        run,
        wafer,
        slot,
        measuredAt: row.measured_at,
        processedAt: row.processed_at,
        stage,
        tool,
        chamber,
        recipe,
        gauge,
        operator,
        temperatureC: row.temperature_c,
        thicknessUm: row.thickness_um,
        ingotFraction: row.ingot_fraction,
        correctionsApplied: correctionsOf(row.corrections_applied),
        note,
      },
      correctedBy: row.corrected_by,
      batch: { id: row.batch_id, source: row.batch_source },
      history: row.history,
      recordedAt: row.recorded_at,
      recordedBy: row.recorded_by,
      screening: row.screening,
      notJudgedReason: row.not_judged_reason,
      readings: row.reading,
      badSites: row.bad_site_indices.map((siteIndex, i) => ({
        siteIndex,
        reason: row.bad_site_reasons[i] as BadReason,
      })),
      targetRevisionId: row.target_revision_id,
      specification: row.specification,
      subgroup: {
        id: row.subgroup_id,
        key: row.subgroup_key,
        positionAt: row.position_at,
        state: row.subgroup_state,
        wafers: row.subgroup_wafers,
        limitRevisionId: row.limit_revision_id,
        completions: row.completions,
      },
    },
    decisions: (row.decisions ?? []).map(([siteIndex, action, actor, reason, at]) => ({
      siteIndex,
      action,
      actor,
      reason,
      at: new Date(at),
    })),
  };
}
