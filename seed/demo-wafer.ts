/** One measured wafer of the demonstration line; `values` in the site plan's order, at 23 °C, 0 at a dead site. */
export interface DemoWafer {
  /** Lot, or the ingot's number where the subgroup is an ingot. */
  lot: string | null;
  run: string | null;
  wafer: string;
  slot: number | null;
  processedAt: Date;
  measuredAt: Date;
  temperatureC: number;
  thicknessUm: number | null;
  ingotFraction: number | null;
  gauge: string;
  operator: null;
  values: number[];
  note: string | null;
}
