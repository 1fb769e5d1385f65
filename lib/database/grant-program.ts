import pg from 'pg';
import { prismaMigrationLock } from './migration-runner';

/** Tables that the program only reads, only adds to, and may delete from; it changes rows of all others. */
const READ = ['_prisma_migrations', 'audit_chain'];
const APPEND = [
  ...[
    'audit_entry',
    'excursion_entry',
    'intake_refusal',
    'reading_exclusion',
    'screening_change',
    'site_plan',
  ],
  ...['specification_revision', 'stream_event', 'target_revision', 'wafer_reading'],
];
const DELETE = ['access_event', 'rate_limit', 'role_grant', 'session', 'verification'];

/**
 * Grants the role that the program signs in as (`programBelow`) just what it needs of the owner's tables: what is only
 * ever added to it can neither change nor delete, nor switch off the triggers that refuse it.
 */
export async function grantProgram(ownerUrl: string, role: string): Promise<void> {
  const owner = new pg.Client({ connectionString: ownerUrl });
  await owner.connect();
  try {
    await owner.query('BEGIN');
    await owner.query('SELECT pg_advisory_xact_lock($1)', [prismaMigrationLock]);
    await owner.query(await grants(owner, pg.escapeIdentifier(role)));
    await owner.query('COMMIT');
  } finally {
    await owner.end();
  }
}

async function grants(owner: pg.Client, role: string): Promise<string> {
  const { rows } = await owner.query<{ schema: string; table: string }>(
    'SELECT schemaname AS schema, tablename AS table FROM pg_tables WHERE schemaname = current_schema()',
  );
  const schema = pg.escapeIdentifier(rows[0]?.schema ?? 'public');
  return [
    `REVOKE ALL ON ALL TABLES IN SCHEMA ${schema} FROM ${role}`,
    `GRANT USAGE ON SCHEMA ${schema} TO ${role}`,
    `GRANT USAGE, SELECT ON ALL SEQUENCES IN SCHEMA ${schema} TO ${role}`,
    ...rows.map(({ table }) => {
      const rights = READ.includes(table)
        ? 'SELECT'
        : APPEND.includes(table)
          ? 'SELECT, INSERT'
          : `SELECT, INSERT, UPDATE${DELETE.includes(table) ? ', DELETE' : ''}`;
      return `GRANT ${rights} ON ${schema}.${pg.escapeIdentifier(table)} TO ${role}`;
    }),
  ].join('; ');
}
