/** Where in a file a fault lies; lines and columns count from 1, `column` is the header's word. */
export interface MapProblem {
  file: string;
  line: number | null;
  column: string | null;
  /** Which measurement it spoils, as people name it; null when the whole file is. */
  measurement: string | null;
  reason: string;
}

/** What the columns of a wafer-map file say of a wafer beside its readings. */
export interface MeasurementFacts {
  lot: string | null;
  run: string | null;
  wafer: string;
  slot: number | null;
  measuredAt: Date;
  processedAt: Date;
  stage: 'pre' | 'post' | null;
  tool: string | null;
  chamber: string | null;
  recipe: string | null;
  gauge: string | null;
  operator: string | null;
  temperatureC: number | null;
  thicknessUm: number | null;
  ingotFraction: number | null;
  /** Which corrections the sender has made: words of `CORRECTIONS`, or none. */
  correctionsApplied: string[];
  note: string | null;
}

/** One wafer on its way into the store: its stream, its facts and its readings in the order of the site plan. */
export interface Measurement {
  streamId: string;
  facts: MeasurementFacts;
  /** As sent; null where the site has no reading. */
  readings: (number | null)[];
}

/** The corrections a reading may have had before it came. */
export const CORRECTIONS = ['temperature', 'thickness', 'geometry', 'spacing'] as const;

/** How a measurement is named to people. */
export function measurementName(facts: { wafer: string; run: string | null; lot: string | null }): string {
  const carrier = facts.run ?? facts.lot;
  return carrier === null ? facts.wafer : `${facts.wafer} (${carrier})`;
}

export type Origin = 'page' | 'command' | 'network' | 'demonstration';

/** What became of one measurement. */
export type Outcome =
  { kind: 'recorded'; waferId: string } | { kind: 'repeated' } | { kind: 'refused'; reason: string };

/** The result of taking a file. */
export interface IntakeResult {
  batchId: string | null;
  recorded: number;
  repeated: number;
  refused: number;
  refusals: MapProblem[];
  /** Remarks that refuse nothing, such as a column that is not read. */
  notices: string[];
}
