import type { WaferColumn } from '@/lib/maps/map-columns';

interface ColumnWords {
  label: string;
  /** Asked for openly; the others stand folded away. */
  usual: boolean;
  unit?: string;
  hint?: string;
  choices?: readonly string[];
}

/** How each column of a wafer-map file is asked for. */
export const COLUMN_WORDS: Record<WaferColumn, ColumnWords> = {
  stream: { label: 'Stream', usual: true },
  wafer: { label: 'Wafer', usual: true },
  lot: { label: 'Lot', usual: true },
  run: { label: 'Run', usual: true },
  measured_at: { label: 'Measured at', usual: true },
  processed_at: { label: 'Processed at', usual: true },
  gauge: { label: 'Gauge', usual: true },
  temperature_c: { label: 'Temperature', usual: true, unit: '°C', hint: 'Of the wafer at the probe' },
  thickness_um: { label: 'Thickness', usual: true, unit: 'µm' },
  ingot_fraction: {
    label: 'Solidified fraction',
    usual: true,
    hint: 'Along the crystal: 0 at the seed, below 1',
  },
  slot: { label: 'Slot', usual: false },
  stage: { label: 'Stage', usual: false, choices: ['pre', 'post'] },
  tool: { label: 'Tool', usual: false },
  chamber: { label: 'Chamber', usual: false },
  recipe: { label: 'Recipe', usual: false },
  operator: { label: 'Operator', usual: false },
  diameter_mm: {
    label: 'Diameter',
    usual: false,
    unit: 'mm',
    hint: 'Must agree with the stream’s site plan',
  },
  corrections_applied: {
    label: 'Corrections applied',
    usual: false,
    hint: 'Any of temperature thickness geometry spacing, or none. Not said: all of them',
  },
  note: { label: 'Note', usual: false },
};
