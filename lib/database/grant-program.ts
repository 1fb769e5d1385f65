import pg from 'pg';
import { AppError } from '@/lib/errors';
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
 * Grants the role that the program signs in as just what it needs of the owner's tables: what is only ever added to it
 * can neither change nor delete, nor switch off the triggers that refuse it. Throws `AppError` where that role could all
 * the same, because it is the owner, belongs to it, or is a superuser.
 */
export async function grantProgram(ownerUrl: string, programUrl: string): Promise<void> {
  const role = await roleOf(programUrl);
  const owner = new pg.Client({ connectionString: ownerUrl });
  await owner.connect();
  try {
    const { rows } = await owner.query<{ above: boolean }>(
      `SELECT rolsuper OR pg_has_role(rolname, current_user, 'MEMBER') AS above FROM pg_roles WHERE rolname = $1`,
      [role],
    );
    if (rows[0]?.above !== false) {
      throw new AppError(
        'conflict',
        `DATABASE_URL signs in as ${role}, which is above the tables of EVENOHM_OWNER_URL: give the program a role of its own.`,
      );
    }
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

async function roleOf(url: string): Promise<string> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    const { rows } = await client.query<{ role: string }>('SELECT current_user AS role');
    return rows[0]?.role ?? '';
  } finally {
    await client.end();
  }
}
