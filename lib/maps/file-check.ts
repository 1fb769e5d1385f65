import { may, type Actor } from '@/lib/access/actor';
import { getPool } from '@/lib/database/client';
import { listSettingsInUse } from '@/lib/streams/data';
import type { StreamSettings } from '@/lib/streams/types';
import { checkedMeasurement } from './checked-measurement';
import { csvPieces } from './csv-rows';
import { earlierOutcomes } from './earlier-outcomes';
import { mapPreview, type MapPreview } from './map-preview';
import { rawMaps, type RawMap } from './raw-maps';
import type { MapHeader } from './map-columns';
import type { MapProblem, Measurement } from './types';
import { forgetContent, sentContent } from './sent-content';
import { unreadable, UnreadableFile } from './unreadable-file';

/** A file that can be read more than once, from its beginning. */
export interface FileSource {
  name: string;
  open: () => AsyncIterable<Uint8Array>;
}

/** What reading a whole file found, before anything is recorded. At most so many problems and previews are kept. */
export interface FileCheck {
  measurements: number;
  /** Places in the file, from 0, of the measurements that cannot be recorded. */
  faulty: Set<number>;
  /** Sound measurements that are on record already, with the same content. */
  repeated: number;
  problems: MapProblem[];
  problemCount: number;
  previews: MapPreview[];
  notices: string[];
  /** The first measurements, where they are wanted, so that a file of ordinary size need not be read twice. */
  kept: (FileMeasurement | undefined)[];
  /** So many places are covered by them. */
  keptTo: number;
}

export const MOST_PROBLEMS = 1000;
export const MOST_PREVIEWS = 50;

/** So many readings are kept between checking and recording; beyond them the file is read again. */
const MOST_KEPT_READINGS = 1_000_000;

/** For so many measurements at a time the database is asked what it has of them. */
const ASKED_AT_ONCE = 2000;

/** A measurement as a file holds it: its place among the others, the line it begins on, and what checking made of it. */
export interface FileMeasurement {
  place: number;
  line: number;
  name: string;
  identity: string;
  found: Measurement | MapProblem[];
}

/** A fault that spoils the whole file: it cannot be read, or its header cannot serve. */
export class SpoiltFile extends Error {
  readonly problems: MapProblem[];

  constructor(problems: MapProblem[]) {
    super(problems.map((problem) => problem.reason).join('; '));
    this.problems = problems;
  }
}

/** The settings of every stream in use, by the name that stands in files. */
export async function settingsBySlug(actor: Actor): Promise<Map<string, StreamSettings>> {
  const settings = await listSettingsInUse(actor);
  return new Map(settings.map((one) => [one.stream.slug, one]));
}

/**
 * The measurements of a file one after another, each checked against its stream; some at a time. Throws `SpoiltFile`
 * where the file as a whole cannot be read.
 */
export async function* fileMeasurements(
  actor: Actor,
  file: FileSource,
  settings: ReadonlyMap<string, StreamSettings>,
  defaults: RawMap['words'],
  onHeader: (header: MapHeader) => void = () => undefined,
): AsyncGenerator<FileMeasurement[]> {
  let header: MapHeader | null = null;
  let place = 0;
  const now = new Date();
  try {
    for await (const parts of rawMaps(csvPieces(file.open()))) {
      const some: FileMeasurement[] = [];
      for (const part of parts) {
        if (part.kind === 'header') {
          header = part.header;
          onHeader(header);
          continue;
        }
        const checked = checkedMeasurement(part.map, {
          file: file.name,
          valueColumn: (header as MapHeader).valueColumn,
          defaults,
          settingsOf: (slug) => settings.get(slug),
          mayRecord: (streamId) => may(actor, 'record-maps', streamId),
          now,
        });
        some.push({
          place: place++,
          line: part.map.firstLine,
          name: checked.name,
          identity: checked.identity,
          found: 'measurement' in checked ? checked.measurement : checked.problems,
        });
      }
      yield some;
    }
    if (place === 0) throw unreadable('there are no readings below the header', 1);
  } catch (error) {
    if (!(error instanceof UnreadableFile)) throw error;
    throw new SpoiltFile(error.faults.map((fault) => ({ ...fault, file: file.name, measurement: null })));
  }
}

/**
 * Reads a file from beginning to end and records nothing: what it holds and every problem with its line and column; to
 * `show` it also pictures of the first maps, to `record` it its first measurements. Memory does not grow with the file,
 * but for a few bytes a measurement.
 */
export async function checkFile(
  actor: Actor,
  file: FileSource,
  defaults: RawMap['words'],
  purpose: 'show' | 'record',
): Promise<FileCheck> {
  const settings = await settingsBySlug(actor);
  const check: FileCheck = {
    measurements: 0,
    faulty: new Set(),
    repeated: 0,
    problems: [],
    problemCount: 0,
    previews: [],
    notices: [],
    kept: [],
    keptTo: 0,
  };
  let readings = 0;
  const seen = new Map<string, { place: number; line: number; hash: string | null; repeats?: number[] }>();
  const refuse = (place: number, problems: readonly MapProblem[]) => {
    check.faulty.add(place);
    check.problemCount += problems.length;
    check.problems.push(...problems.slice(0, Math.max(0, MOST_PROBLEMS - check.problems.length)));
  };
  const byId = new Map([...settings.values()].map((one) => [one.stream.id, one]));
  const onHeader = (header: MapHeader) => {
    if (header.unread.length > 0)
      check.notices.push(`columns that are not read: ${header.unread.join(', ')}`);
  };
  let sound: { place: number; line: number; name: string; measurement: Measurement }[] = [];
  const askWhatIsThere = async () => {
    const asked = sound;
    sound = [];
    const earlier = await earlierOutcomes(
      actor,
      getPool(),
      asked.map((one) => one.measurement),
    );
    asked.forEach(({ place, line, name, measurement }, i) => {
      const outcome = earlier[i];
      if (place >= check.keptTo) forgetContent(measurement);
      if (outcome?.kind === 'repeated') check.repeated += 1;
      if (outcome?.kind === 'refused') {
        refuse(place, [{ file: file.name, line, column: null, measurement: name, reason: outcome.reason }]);
      }
    });
  };
  for await (const some of fileMeasurements(actor, file, settings, defaults, onHeader)) {
    check.measurements += some.length;
    if (purpose === 'record' && readings < MOST_KEPT_READINGS) {
      check.kept.push(...some);
      check.keptTo = check.measurements;
    }
    for (const { place, line, name, identity, found } of some) {
      const hash = Array.isArray(found) ? null : sentContent(found).hash;
      const earlier = seen.get(identity);
      if (earlier === undefined) seen.set(identity, { place, line, hash });
      else (earlier.repeats ??= [earlier.place]).push(place);
      if (Array.isArray(found)) {
        refuse(place, found);
        for (const other of earlier?.repeats ?? []) check.faulty.add(other);
        continue;
      }
      readings += found.readings.length;
      if (earlier !== undefined && earlier.hash === hash && !check.faulty.has(earlier.place)) {
        check.repeated += 1;
      } else if (earlier !== undefined) {
        const reason = `the same measurement begins on line ${earlier.line} already: its rows stand apart, or contradict each other`;
        refuse(place, [{ file: file.name, line, column: null, measurement: name, reason }]);
        for (const other of earlier.repeats ?? []) check.faulty.add(other);
      } else {
        sound.push({ place, line, name, measurement: found });
        const own = byId.get(found.streamId);
        if (own && purpose === 'show' && check.previews.length < MOST_PREVIEWS)
          check.previews.push(mapPreview(own, found, name));
      }
    }
    if (sound.length >= ASKED_AT_ONCE) await askWhatIsThere();
  }
  await askWhatIsThere();
  check.problems.sort((a, b) => (a.line ?? 0) - (b.line ?? 0));
  return check;
}
