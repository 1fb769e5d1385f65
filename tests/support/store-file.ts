import { getPool } from '@/lib/database/client';
import { intakeFile, type IntakeOptions } from '@/lib/maps/intake-file';
import { actor } from './store-line';

/** A file in chunks of a size that cuts rows anywhere. */
export const source = (text: string, chunk = 1000) => ({
  name: 'monday.csv',
  open: () =>
    (async function* () {
      const bytes = new TextEncoder().encode(text);
      for (let i = 0; i < bytes.length; i += chunk) yield bytes.subarray(i, i + chunk);
    })(),
});

/** Takes a file as the command line does. */
export const take = (text: string, options: Partial<IntakeOptions> = {}, chunk?: number) =>
  intakeFile(actor, source(text, chunk), {
    origin: 'command',
    history: false,
    sound: false,
    defaults: {},
    ...options,
  });

/** What is on record of one taking of a file. */
export const batchOf = async (id: string | null) =>
  (
    await getPool().query(
      `SELECT b.recorded, b.repeated, b.refused, b.history, b.source, b.finished_at IS NOT NULL AS finished,
         (SELECT count(*)::integer FROM intake_refusal r WHERE r.batch_id = b.id) AS listed FROM intake_batch b WHERE id = $1`,
      [id],
    )
  ).rows[0];
