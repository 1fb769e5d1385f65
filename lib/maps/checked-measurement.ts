import { inForce } from '@/lib/streams/in-force';
import type { StreamSettings } from '@/lib/streams/types';
import { expectedWafer } from './measured-wafer';
import { VALUE_COLUMNS, type ValueColumn } from './map-columns';
import type { RawMap } from './raw-maps';
import { readFacts } from './read-facts';
import { inSiteOrder } from './site-order';
import { temperatureFaults } from './temperature-faults';
import { runOrLot } from './wafer-rows';
import { measurementName, type MapProblem, type Measurement } from './types';

/** What a file's own words leave to the caller: flags of the command, fields of the page. */
export interface CheckContext {
  file: string;
  valueColumn: ValueColumn;
  defaults: RawMap['words'];
  /** The stream by the name in the file; undefined for one that does not exist. */
  settingsOf: (slug: string) => StreamSettings | undefined;
  /** Whether whoever sent the file may record wafers of a stream. */
  mayRecord: (streamId: string) => boolean;
  now: Date;
}

/** Clocks of gauges and of this machine may differ by so much. */
const CLOCKS_DIFFER_MS = 10 * 60_000;
/** A measurement wrong on every row says so so often. */
const MOST_ROWS_TOLD = 20;

/** What checking made of a measurement; `identity` tells it from the others of a file, whatever its faults. */
export type Checked = { name: string; identity: string } & (
  { measurement: Measurement } | { problems: MapProblem[] }
);

/** A measurement checked against its stream, or every fault found in it. */
export function checkedMeasurement(map: RawMap, context: CheckContext): Checked {
  const { facts, diameterMm, faults: words } = readFacts(map.words, context.defaults);
  const name = facts.wafer === '' ? '' : measurementName(facts);
  const problems: MapProblem[] = [];
  const problem = (line: number, column: string | null, reason: string) =>
    problems.push({ file: context.file, line, column, measurement: name === '' ? null : name, reason });
  for (const fault of map.faults) problem(fault.line, fault.column, fault.reason);
  for (const fault of words) problem(map.firstLine, fault.column, fault.reason);
  for (const [column, at] of [
    ['measured_at', facts.measuredAt],
    ['processed_at', facts.processedAt],
  ] as const) {
    const isFuture = at.getTime() > context.now.getTime() + CLOCKS_DIFFER_MS;
    if (isFuture && (column === 'measured_at' || facts.processedAt !== facts.measuredAt))
      problem(map.firstLine, column, 'this time lies in the future');
  }
  const slug = map.words.stream || context.defaults.stream?.trim() || '';
  const identity = JSON.stringify([slug, runOrLot(facts), facts.wafer, facts.measuredAt.getTime()]);
  const settings = context.settingsOf(slug);
  if (!settings) {
    const reason = slug === '' ? 'no stream is named' : `there is no stream "${slug.slice(0, 60)}"`;
    problem(map.firstLine, 'stream', reason);
    return { problems, name, identity };
  }
  const { stream } = settings;
  if (!context.mayRecord(stream.id)) {
    problem(map.firstLine, 'stream', `you may not record wafers of the stream "${stream.slug}"`);
    return { problems, name, identity };
  }
  const quantity = VALUE_COLUMNS[context.valueColumn];
  if (quantity !== stream.quantity) {
    const wanted = stream.quantity === 'resistivity' ? 'resistivity_ohm_cm' : 'sheet_resistance_ohm_sq';
    problem(map.firstLine, context.valueColumn, `the stream ${stream.slug} is measured as ${wanted}`);
  }
  if (diameterMm !== null && diameterMm !== stream.plan.diameterMm) {
    problem(
      map.firstLine,
      'diameter_mm',
      `${diameterMm} mm, but the stream's plan is for ${stream.plan.diameterMm} mm`,
    );
  }
  if (stream.subgroup === 'run' && facts.run === null)
    problem(map.firstLine, 'run', 'this stream counts runs: name the run');
  if ((stream.subgroup === 'lot' || stream.subgroup === 'ingot') && facts.lot === null) {
    problem(map.firstLine, 'lot', `this stream counts ${stream.subgroup}s: name the lot`);
  }
  const missing = ['thickness', 'geometry', 'spacing'].filter(
    (word) => !facts.correctionsApplied.includes(word),
  );
  if (missing.length > 0) {
    const reason = `not corrected for ${missing.join(' and ')}: that needs the raw voltages, only temperature can be corrected here`;
    problem(map.firstLine, 'corrections_applied', reason);
  } else if (!facts.correctionsApplied.includes('temperature')) {
    if (facts.temperatureC === null)
      problem(map.firstLine, 'temperature_c', 'not corrected for temperature, and none is given');
    else {
      const target = inForce(settings.targets, facts.processedAt)?.target;
      if (target === undefined) {
        const reason =
          'the stream has no target: what its wafers are, which decides the correction, is not known';
        problem(map.firstLine, 'corrections_applied', reason);
      } else {
        const found = temperatureFaults(target, map.values, facts.temperatureC, expectedWafer(stream, facts));
        for (const { row, reason } of found.slice(0, MOST_ROWS_TOLD)) {
          if (row === null) problem(map.firstLine, 'temperature_c', reason);
          else problem(map.lines[row] as number, context.valueColumn, reason);
        }
      }
    }
  }
  const { readings, faults } = inSiteOrder(stream.plan, map);
  if (map.faults.length === 0) {
    for (const fault of faults.slice(0, MOST_ROWS_TOLD))
      problem(map.lines[fault.row] as number, fault.column, fault.reason);
  }
  if (problems.length > 0) return { problems, name, identity };
  return { measurement: { streamId: stream.id, facts, readings }, name, identity };
}
