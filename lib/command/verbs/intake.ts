import { open, stat } from 'node:fs/promises';
import { parseArgs } from 'node:util';
import { openDatabase } from '@/lib/database/connection';
import { columnFlag, WAFER_COLUMNS } from '@/lib/maps/map-columns';
import { sentOptions } from '@/lib/maps/schema';
import type { MapProblem } from '@/lib/maps/types';
import { fileFailure } from '../file-failure';
import { UsageError, type ExitStatus, type Verb, type VerbOutput } from '../verb';
import { intakeAtServer, type Taken } from './intake-at-server';
import { intakeHere } from './intake-here';

/** Flags that say of a wafer what its file does not. */
const WORDS = Object.fromEntries(
  WAFER_COLUMNS.map((column) => [columnFlag(column), { type: 'string' as const }]),
);

export const intake: Verb = {
  name: 'intake',
  summary: 'record wafer-map files',
  usage: `evenohm intake PATH… [--check] [--sound] [--history] [--json]

  --check     read and check, record nothing
  --sound     record the sound measurements of a file that has faults
  --history   old wafers: recorded, shown and studied, but they open no cases
  --json      one JSON object on standard output
  --server    the address of another server to record there, with its token in EVENOHM_TOKEN

What a file's columns do not say may be given for all its wafers:
  ${WAFER_COLUMNS.map((column) => `--${columnFlag(column)}`).join(' ')}`,
  run: recordFiles,
};

async function recordFiles(args: string[], output: VerbOutput): Promise<ExitStatus> {
  const { values, positionals } = parsed(args);
  if (values.follow === true)
    throw new UsageError('--follow is not available yet: name the files, or run intake for each new one');
  if (positionals.length === 0) throw new UsageError('name at least one file');
  for (const path of positionals) {
    const fault = await whyNoFile(path);
    if (fault === null) continue;
    output.say(fault);
    return 1;
  }
  const total: Taken = { recorded: 0, repeated: 0, refused: 0, refusals: [], notices: [] };
  const recordAll = async (record: (path: string) => Promise<Taken>) => {
    for (const path of positionals) {
      const result = await record(path);
      total.recorded += result.recorded;
      total.repeated += result.repeated;
      total.refused += result.refused;
      total.refusals.push(...result.refusals.map((refusal) => ({ ...refusal, file: path })));
      total.notices.push(...result.notices);
    }
  };
  const query = flagsQuery(values);
  if (typeof values.server === 'string') await recordAll(intakeAtServer(values.server, query, output.say));
  else {
    const options = sentOptions(query);
    if ('faults' in options) throw new UsageError(options.faults.join('; '));
    const database = await openDatabase({ say: output.say });
    try {
      await recordAll(intakeHere(options, output.say));
    } finally {
      await database.close();
    }
  }
  for (const notice of total.notices) output.say(`${notice}.`);
  if (values.json === true)
    output.out(JSON.stringify({ ...total, refusals: total.refusals.map(refusalWords) }));
  else {
    for (const refusal of total.refusals) output.say(refusalLine(refusal));
    const check = values.check === true ? ' Nothing was recorded: this was a check.' : '';
    output.out(`${total.recorded} recorded, ${total.repeated} repeated, ${total.refused} refused.${check}`);
  }
  return total.refused > 0 ? 3 : 0;
}

/** Why a path cannot be taken in; a file is read twice, so what can be read only once is none. */
async function whyNoFile(path: string): Promise<string | null> {
  try {
    const found = await stat(path);
    if (!found.isDirectory() && !found.isFile()) return `${path}: this is no file.`;
    const file = await open(path);
    await file.read({ length: 1 }).finally(() => file.close());
    return null;
  } catch (error) {
    return fileFailure(path, error);
  }
}

function parsed(args: string[]) {
  try {
    return parseArgs({
      args,
      allowPositionals: true,
      options: {
        check: { type: 'boolean' },
        sound: { type: 'boolean' },
        history: { type: 'boolean' },
        follow: { type: 'boolean' },
        json: { type: 'boolean' },
        server: { type: 'string' },
        ...WORDS,
      },
    });
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
}

/** The flags as the address of a server carries them: both ways they are read alike. */
function flagsQuery(values: ReturnType<typeof parsed>['values']): URLSearchParams {
  const query = new URLSearchParams();
  for (const flag of ['check', 'sound', 'history'] as const) if (values[flag] === true) query.set(flag, '');
  for (const flag of Object.keys(WORDS)) {
    const word = (values as Record<string, string | boolean | undefined>)[flag];
    if (typeof word === 'string') query.set(flag, word);
  }
  return query;
}

function refusalWords({ file, line, column, measurement, reason }: MapProblem) {
  return { file, line, column, measurement, reason };
}

function refusalLine({ file, line, column, measurement, reason }: MapProblem): string {
  const place = [file, line === null ? null : `line ${line}`, column === null ? null : `column ${column}`];
  const wafer = measurement === null ? '' : `${measurement}: `;
  return `${place.filter((part) => part !== null).join(', ')}: ${wafer}${reason}.`;
}
