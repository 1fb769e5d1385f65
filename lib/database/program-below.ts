import pg from 'pg';
import { AppError } from '@/lib/errors';

/**
 * Whether a role can undo what it is not granted: a superuser, a member of the other role, or the owner of anything in
 * the schema or of the schema itself (PostgreSQL documentation, 5.8 Privileges; the owner of the database stands for
 * pg_database_owner, 22.5). Ownership is what a database brings along that the program migrated by itself before.
 */
const IS_ABOVE = `
SELECT rolsuper OR pg_has_role(rolname, current_user, 'MEMBER') OR EXISTS (
    SELECT FROM (
      SELECT nspowner AS owner FROM pg_namespace WHERE oid = current_schema()::regnamespace
      UNION ALL SELECT relowner FROM pg_class WHERE relnamespace = current_schema()::regnamespace
      UNION ALL SELECT proowner FROM pg_proc WHERE pronamespace = current_schema()::regnamespace) owned
    WHERE pg_has_role(rolname, owned.owner, 'MEMBER')) AS above
FROM pg_roles WHERE rolname = $1`;

/**
 * The role that the program signs in as. Throws `AppError` where the tables of the owner would not be safe from it, so
 * that a grant would promise what does not hold.
 */
export async function programBelow(ownerUrl: string, programUrl: string): Promise<string> {
  const [program] = await rowsOf<{ role: string }>(programUrl, 'SELECT current_user AS role');
  const role = program?.role ?? '';
  const [owner] = await rowsOf<{ role: string }>(ownerUrl, 'SELECT current_user AS role');
  const [found] = await rowsOf<{ above: boolean }>(ownerUrl, IS_ABOVE, [role]);
  if (found?.above === false) return role;
  const names = `${pg.escapeIdentifier(role)} TO ${pg.escapeIdentifier(owner?.role ?? '')}`;
  throw new AppError(
    'conflict',
    `DATABASE_URL signs in as ${role}, which is above the tables of EVENOHM_OWNER_URL: give the program a role of its own, or, where it owned the database before, hand that over as a superuser: REASSIGN OWNED BY ${names}.`,
  );
}

async function rowsOf<Row extends object>(
  url: string,
  sql: string,
  values: readonly string[] = [],
): Promise<Row[]> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<Row>(sql, [...values])).rows;
  } finally {
    await client.end();
  }
}
