import { createReadStream } from 'node:fs';
import { access, constants, stat } from 'node:fs/promises';
import { basename } from 'node:path';
import { parseArgs } from 'node:util';
import { commandActor } from '@/lib/access/local-actor';
import { openDatabase } from '@/lib/database/connection';
import { intakeFile } from '@/lib/maps/intake-file';
import { WAFER_COLUMNS } from '@/lib/maps/map-columns';
import type { IntakeResult, MapProblem } from '@/lib/maps/types';
import { withSmallMemory } from '../small-memory';
import { UsageError, type ExitStatus, type Verb, type VerbOutput } from '../verb';

/** Flags that say of a wafer what its file does not: `--measured-at` for the column measured_at, and so on. */
const flagOf = (column: string) => column.replaceAll('_', '-');
const WORDS = Object.fromEntries(
  WAFER_COLUMNS.map((column) => [flagOf(column), { type: 'string' as const }]),
);

export const intake: Verb = {
  name: 'intake',
  summary: 'record wafer-map files',
  usage: `evenohm intake PATH… [--check] [--sound] [--history] [--json]

  --check     read and check, record nothing
  --sound     record the sound measurements of a file that has faults
  --history   old wafers: recorded, shown and studied, but they open no cases
  --json      one JSON object on standard output

What a file's columns do not say may be given for all its wafers:
  ${WAFER_COLUMNS.map((column) => `--${flagOf(column)}`).join(' ')}`,
  run: recordFiles,
};

async function recordFiles(args: string[], output: VerbOutput): Promise<ExitStatus> {
  const { values, positionals } = parsed(args);
  if (values.follow === true)
    throw new UsageError('--follow is not available yet: name the files, or run intake for each new one');
  if (positionals.length === 0) throw new UsageError('name at least one file');
  for (const path of positionals) {
    const found = await stat(path).catch(() => null);
    if (!found?.isFile()) {
      output.say(`${path}: this is no file.`);
      return 1;
    }
    const unreadable = await access(path, constants.R_OK).catch(() => 'unreadable');
    if (unreadable !== undefined) {
      output.say(`${path}: this file may not be read.`);
      return 1;
    }
  }
  const defaults = Object.fromEntries(
    WAFER_COLUMNS.flatMap((column) => {
      const word = (values as Record<string, string | boolean | undefined>)[flagOf(column)];
      return typeof word === 'string' ? [[column, word]] : [];
    }),
  );
  const database = await openDatabase({ say: output.say });
  const total: Omit<IntakeResult, 'batchId'> = {
    recorded: 0,
    repeated: 0,
    refused: 0,
    refusals: [],
    notices: [],
  };
  try {
    for (const path of positionals) {
      let toldAt = Date.now();
      const result = await withSmallMemory(() =>
        intakeFile(
          commandActor(),
          { name: basename(path), open: () => createReadStream(path, { highWaterMark: 1 << 17 }) },
          {
            origin: 'command',
            history: values.history === true,
            sound: values.sound === true,
            checkOnly: values.check === true,
            defaults,
            onProgress: (count) => {
              if (Date.now() - toldAt < 1000) return;
              toldAt = Date.now();
              output.say(`${basename(path)}: ${count} measurements so far.`);
            },
          },
        ),
      );
      total.recorded += result.recorded;
      total.repeated += result.repeated;
      total.refused += result.refused;
      total.refusals.push(...result.refusals.map((refusal) => ({ ...refusal, file: path })));
      total.notices.push(...result.notices);
    }
  } finally {
    await database.close();
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
        ...WORDS,
      },
    });
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
}

function refusalWords({ file, line, column, measurement, reason }: MapProblem) {
  return { file, line, column, measurement, reason };
}

function refusalLine({ file, line, column, measurement, reason }: MapProblem): string {
  const place = [file, line === null ? null : `line ${line}`, column === null ? null : `column ${column}`];
  const wafer = measurement === null ? '' : `${measurement}: `;
  return `${place.filter((part) => part !== null).join(', ')}: ${wafer}${reason}.`;
}
