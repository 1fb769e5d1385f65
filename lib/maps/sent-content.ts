import { hash } from 'node:crypto';
import { detached } from './detached';
import { readingsLiteral } from './readings-literal';
import type { Measurement } from './types';

/** What was sent, as it is written and as it is told apart. */
export interface SentContent {
  /** The readings as an array literal of the database. */
  readings: string;
  /** A digest of all that was sent: the same measurement with the same content is recorded once. */
  hash: string;
}

const known = new WeakMap<Measurement, SentContent>();

/** The content of a measurement, worked out once. */
export function sentContent(measurement: Measurement): SentContent {
  const earlier = known.get(measurement);
  if (earlier !== undefined) return earlier;
  const { facts } = measurement;
  const { lot, run, wafer, slot, measuredAt, processedAt, stage, tool, chamber, recipe, gauge, operator } =
    facts;
  const { temperatureC, thicknessUm, ingotFraction, correctionsApplied, note } = facts;
  const words = [
    lot,
    run,
    wafer,
    slot,
    measuredAt.getTime(),
    processedAt.getTime(),
    stage,
    tool,
    chamber,
    recipe,
  ];
  const more = [
    gauge,
    operator,
    temperatureC,
    thicknessUm,
    ingotFraction,
    correctionsApplied.join(' '),
    note,
  ];
  const readings = readingsLiteral(measurement.readings);
  const text = JSON.stringify([words, more]) + readings;
  const content = { readings, hash: detached(hash('sha256', text).slice(0, 32)) };
  known.set(measurement, content);
  return content;
}

/**
 * Lets go of what was worked out. The collector clears a `WeakMap` only when it goes through the whole heap: until then
 * every wafer of a long file would stay.
 */
export function forgetContent(measurement: Measurement): void {
  known.delete(measurement);
}
