/** Columns that hold one value per reading, beside the place. Exactly one of them stands in a file. */
export const VALUE_COLUMNS = {
  resistivity_ohm_cm: 'resistivity',
  sheet_resistance_ohm_sq: 'sheet_resistance',
} as const;

export type ValueColumn = keyof typeof VALUE_COLUMNS;

/** Columns of raw readings. They need a gauge's pin spacing and order to become a resistivity. */
export const RAW_COLUMNS = [
  'voltage_v',
  'current_a',
  'voltage_reverse_v',
  'current_reverse_a',
  'voltage_b_v',
  'current_b_a',
  'voltage_reverse_b_v',
  'current_reverse_b_a',
  'voltage_v_b',
  'current_a_b',
];

/** Columns that say something of the wafer and repeat on each of its rows. */
export const WAFER_COLUMNS = [
  'stream',
  'lot',
  'run',
  'wafer',
  'slot',
  'measured_at',
  'processed_at',
  'stage',
  'tool',
  'chamber',
  'recipe',
  'gauge',
  'operator',
  'temperature_c',
  'thickness_um',
  'diameter_mm',
  'ingot_fraction',
  'corrections_applied',
  'note',
] as const;

export type WaferColumn = (typeof WAFER_COLUMNS)[number];

/** What a column is called as a flag of the command and in an address: `measured-at` for measured_at. */
export function columnFlag(column: WaferColumn): string {
  return column.replaceAll('_', '-');
}

/** What the header of a wafer-map file says: where each column stands. */
export interface MapHeader {
  x: number;
  y: number;
  value: number;
  valueColumn: ValueColumn;
  wafer: { column: WaferColumn; index: number }[];
  unread: string[];
  width: number;
}

/**
 * Reads a header row. Returns the faults instead when it cannot serve: no places, no value column or two that
 * contradict each other, a column that stands twice, raw readings.
 */
export function mapHeader(
  cells: readonly string[],
): MapHeader | { faults: { column: string | null; reason: string }[] } {
  const names = cells.map((cell) => cell.trim());
  const separator = /[;\t]/.exec(names[0] ?? '')?.[0];
  if (names.length === 1 && separator !== undefined) {
    const word = separator === ';' ? 'semicolons' : 'tabs';
    return {
      faults: [
        { column: null, reason: `the cells are parted by ${word}: part them by commas, with decimal points` },
      ],
    };
  }
  const faults: { column: string | null; reason: string }[] = [];
  const seen = new Set<string>();
  for (const name of names) {
    if (name !== '' && seen.has(name))
      faults.push({ column: name, reason: 'this column stands twice in the header' });
    seen.add(name);
  }
  for (const name of ['x_mm', 'y_mm']) {
    if (!seen.has(name)) faults.push({ column: name, reason: `the header has no column ${name}` });
  }
  const values = names.filter((name): name is ValueColumn => Object.hasOwn(VALUE_COLUMNS, name));
  const raw = names.filter((name) => RAW_COLUMNS.includes(name));
  if (values.length > 1) {
    faults.push({
      column: values[1] ?? null,
      reason: `${values.join(' and ')} contradict each other: give one of them`,
    });
  }
  if (values.length === 0 && raw.length > 0) {
    const reason =
      'raw voltages need a gauge with its pin spacing on record, which is not available yet: give a corrected value';
    faults.push({ column: raw[0] ?? null, reason });
  } else if (values.length === 0) {
    faults.push({
      column: null,
      reason: `the header has neither ${Object.keys(VALUE_COLUMNS).join(' nor ')}`,
    });
  }
  if (faults.length > 0) return { faults };
  const wafer = WAFER_COLUMNS.map((column) => ({ column, index: names.indexOf(column) })).filter(
    ({ index }) => index >= 0,
  );
  const read = new Set<string>(['x_mm', 'y_mm', values[0] as string, ...WAFER_COLUMNS]);
  return {
    x: names.indexOf('x_mm'),
    y: names.indexOf('y_mm'),
    value: names.indexOf(values[0] as string),
    valueColumn: values[0] as ValueColumn,
    wafer,
    unread: names.filter((name) => name !== '' && !read.has(name)),
    width: cells.length,
  };
}
