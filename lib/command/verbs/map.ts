import { readFile } from 'node:fs/promises';
import { parseArgs } from 'node:util';
import { measureWafer, type Screen } from '@/lib/wafer/measure-wafer';
import { planGeometry, type PlanGeometry } from '@/lib/wafer/plan-geometry';
import { fileFailure } from '../file-failure';
import { UsageError, type Verb } from '../verb';
import { mapLines, mapResult } from './map-result';
import { readMapFile, type Refusal, type WaferRows } from './read-map-file';

const USAGE = `evenohm map FILE [--diameter-mm MM] [--edge-exclusion-mm MM]
                 [--screen off|impossible|outliers] [--all] [--json]

Measures the wafer in a wafer-map file without a database: figures, shape, bad
readings and places where neighbouring sites deviate together.

  --diameter-mm        wafer diameter; without it (and without a column
                       diameter_mm) there is no area mean
  --edge-exclusion-mm  ring at the rim to leave out (0); needs the diameter
  --screen             which readings to take out (outliers): off takes out what
                       is no number, impossible also zero and negative ones,
                       outliers also readings far from a smooth surface and alone
                       in it, on 25 sites or more
  --all                the file may hold several wafers
  --json               one JSON object on standard output`;

function isScreen(word: string): word is Screen {
  return word === 'off' || word === 'impossible' || word === 'outliers';
}

function millimetres(word: string | undefined, flag: string): number | null {
  if (word === undefined) return null;
  const value = word.trim() === '' ? NaN : Number(word);
  if (!Number.isFinite(value) || value < 0) throw new UsageError(`${flag} is no length in mm: "${word}"`);
  return value;
}

function parsed(args: string[]) {
  try {
    return parseArgs({
      args,
      allowPositionals: true,
      options: {
        'diameter-mm': { type: 'string' },
        'edge-exclusion-mm': { type: 'string' },
        screen: { type: 'string', default: 'outliers' },
        all: { type: 'boolean', default: false },
        json: { type: 'boolean', default: false },
      },
    });
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
}

/** Sites off the wafer or there twice, each with its line. */
function siteRefusals(file: string, rows: WaferRows, diameterMm: number | null): Refusal[] {
  const seen = new Map<string, number>();
  return rows.sites.flatMap(({ xMm, yMm }, i) => {
    const line = rows.lines[i]!;
    const place = `${xMm.toFixed(6)},${yMm.toFixed(6)}`;
    const before = seen.get(place);
    seen.set(place, line);
    const reason =
      before !== undefined
        ? `the site ${xMm}, ${yMm} mm is there already, in line ${before}`
        : diameterMm !== null && Math.hypot(xMm, yMm) > (diameterMm / 2) * (1 + 1e-6)
          ? `the site ${xMm}, ${yMm} mm lies off a wafer of ${diameterMm} mm`
          : null;
    return reason === null ? [] : [{ file, line, column: 1, reason }];
  });
}

/** `evenohm map FILE`: measures the wafer, or with `--all` each wafer, of a file without a database. */
export const map: Verb = {
  name: 'map',
  summary: 'measure the wafer in a file, without a database',
  usage: USAGE,
  async run(args, output) {
    const { values: flags, positionals } = parsed(args);
    const [file] = positionals;
    if (file === undefined || positionals.length > 1) throw new UsageError('map takes one file');
    const { screen } = flags;
    if (!isScreen(screen)) throw new UsageError(`--screen is off, impossible or outliers, not "${screen}"`);
    const diameterMm = millimetres(flags['diameter-mm'], '--diameter-mm');
    if (diameterMm === 0) throw new UsageError('--diameter-mm is more than 0');
    const edgeExclusionMm = millimetres(flags['edge-exclusion-mm'], '--edge-exclusion-mm') ?? 0;

    let bytes: Uint8Array;
    try {
      bytes = await readFile(file);
    } catch (error) {
      output.say(fileFailure(file, error));
      return 1;
    }
    const { wafers, refusals } = await readMapFile(file, [bytes]);
    if (refusals.length === 0 && wafers.length > 1 && !flags.all) {
      const line = wafers[1]!.lines[0]!;
      refusals.push({ file, line, column: 1, reason: `${wafers.length} wafers in the file: say --all` });
    }
    const measured = wafers.map((rows) => {
      if (diameterMm !== null && rows.diameterMm !== null && rows.diameterMm !== diameterMm) {
        const reason = `diameter_mm is ${rows.diameterMm}, --diameter-mm ${diameterMm}`;
        refusals.push({ file, line: rows.lines[0]!, column: 1, reason });
      }
      const diameter = diameterMm ?? rows.diameterMm;
      if (edgeExclusionMm > 0 && diameter === null) {
        throw new UsageError('--edge-exclusion-mm needs --diameter-mm: the file does not say it');
      }
      if (diameter !== null && edgeExclusionMm >= diameter / 2) {
        throw new UsageError(`--edge-exclusion-mm ${edgeExclusionMm} leaves nothing of ${diameter} mm`);
      }
      refusals.push(...siteRefusals(file, rows, diameter));
      return { rows, diameter };
    });
    if (refusals.length > 0) {
      for (const { line, column, reason } of refusals) {
        output.say(`${file}:${line}:${column}: ${reason}`);
      }
      if (flags.json) output.out(JSON.stringify({ refusals }));
      return 3;
    }
    const plans = new Map<string, PlanGeometry>();
    const results = measured.map(({ rows, diameter }) => {
      const key = JSON.stringify([diameter, rows.sites]);
      const geometry = plans.get(key) ?? planGeometry(rows.sites, { diameterMm: diameter, edgeExclusionMm });
      plans.set(key, geometry);
      return mapResult(rows, geometry, measureWafer(rows.values, geometry, { screen }));
    });
    if (flags.json) output.out(JSON.stringify(flags.all ? { wafers: results } : results[0]));
    else output.out(results.map((result) => mapLines(result).join('\n')).join('\n\n'));
    return 0;
  },
};
