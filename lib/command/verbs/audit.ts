import { existsSync } from 'node:fs';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { verifyAudit, type AuditVerdict, type BrokenPlace } from '@/lib/access/verify-audit';
import { openDatabase } from '@/lib/database/connection';
import { readEnvironment } from '@/lib/env';
import { AppError } from '@/lib/errors';
import { UsageError, type ExitStatus, type Verb, type VerbOutput } from '../verb';

export const audit: Verb = {
  name: 'audit',
  summary: 'verify the audit trail',
  usage: `evenohm audit --verify [--head FILE]… [--json]

  --verify     follow the chain of entries and name each place where it does not hold
  --head FILE  hold it against the head that another instance kept (audit-head-… in its data folder) as well
  --json       one JSON object on standard output: entries, heads, strangers, broken

Needs the secret that the entries were written with: EVENOHM_SECRET, or the file in the data folder. Ends with 3 where
the chain is broken, and where no head is there to hold its end against.`,
  run: verify,
};

async function verify(args: string[], output: VerbOutput): Promise<ExitStatus> {
  const { verify: asked, head = [], json } = parsed(args);
  if (asked !== true) throw new UsageError('say --verify');
  refuseNothing();
  const database = await openDatabase({ say: output.say });
  try {
    const verdict = await verifyAudit(head);
    if (json === true) output.out(JSON.stringify(verdict));
    else for (const line of verdictLines(verdict)) output.out(line);
    return verdictStatus(verdict, database.embedded);
  } finally {
    await database.close();
  }
}

/**
 * Of a folder that is named wrongly an empty database would be made, and its chain, of nothing, would hold. In the place
 * of a secret that is lost another would be made, which no entry bears.
 */
function refuseNothing(): void {
  const { databaseUrl, dataFolder, secret } = readEnvironment();
  if (databaseUrl !== null) return;
  if (!existsSync(path.join(dataFolder, 'postgres'))) {
    throw new AppError(
      'not-found',
      `There is no database in ${dataFolder}. EVENOHM_DATA names another folder, DATABASE_URL a database of your own.`,
    );
  }
  if (secret === null && !existsSync(path.join(dataFolder, 'secret'))) {
    throw new AppError(
      'not-found',
      `There is no secret in ${dataFolder}: without the one that the entries were written with none can be verified. Put it back, or give it as EVENOHM_SECRET.`,
    );
  }
}

function parsed(args: string[]) {
  try {
    const { values } = parseArgs({
      args,
      options: {
        verify: { type: 'boolean' },
        head: { type: 'string', multiple: true },
        json: { type: 'boolean' },
      },
    });
    return values;
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
}

/**
 * Whether a verdict is a good one. A chain whose end is held against nothing is not, nor one in an embedded database,
 * which is alone in its folder, beside the head of another.
 */
export function verdictStatus(verdict: AuditVerdict, embedded: boolean): ExitStatus {
  const { entries, heads, strangers, broken } = verdict;
  const isHeld = heads > 0 || entries === 0;
  return broken.length > 0 || !isHeld || (embedded && strangers.length > 0) ? 3 : 0;
}

/** What a verdict says, a line for each broken place. */
export function verdictLines(verdict: AuditVerdict): string[] {
  const others = verdict.strangers.map(
    (file) =>
      `${file} keeps the head of another chain: unless that is of another database, this one was put in its place.`,
  );
  return [...chainLines(verdict), ...others];
}

function chainLines({ entries, heads, broken }: AuditVerdict): string[] {
  const kept = heads === 0 ? ' No head of it is kept here, so that a cut end would not show.' : '';
  if (broken.length === 0) return [`${counted(entries)}, and the chain holds.${kept}`];
  const [first] = broken;
  if (first?.fault === 'altered' && first.from === 1 && first.to === entries && entries > 1)
    return [`${counted(entries)}, and none bears this key: the secret is another, or so is the chain.`];
  return [
    `${counted(entries)}, and the chain is broken:${kept}`,
    ...broken.map((place) => `  ${placeLine(place)}`),
  ];
}

function counted(entries: number): string {
  return `${entries} ${entries === 1 ? 'entry' : 'entries'}`;
}

const FAULTS: Record<BrokenPlace['fault'], string> = {
  altered: 'not as written: edited, moved, or written with another key',
  missing: 'missing',
  unproven: 'linked to one that is missing: whether it is as written cannot be told',
  cut: 'missing: cut off the end after they were kept as written',
  replaced: 'not the one that was kept outside the database',
};

function placeLine({ from, to, fault }: BrokenPlace): string {
  return `${from === to ? `entry ${from}` : `entries ${from} to ${to}`}: ${FAULTS[fault]}`;
}
