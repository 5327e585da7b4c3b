import { Logger, runMigrations } from 'graphile-worker'
import type pg from 'pg'

const quiet = new Logger(() => () => undefined)

/**
 * Makes the job queue's own schema as the owner and opens it to the runtime role. The queue's tables have row-level
 * security, so a policy is needed besides the grants.
 */
export async function prepareJobs(ownerUrl: string, guard: pg.Client, runtimeRole: string): Promise<void> {
  await runMigrations({ connectionString: ownerUrl, logger: quiet })
  await guard.query(`GRANT USAGE ON SCHEMA graphile_worker TO ${runtimeRole}`)
  await guard.query(`GRANT USAGE ON ALL SEQUENCES IN SCHEMA graphile_worker TO ${runtimeRole}`)
  await guard.query(
    `GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA graphile_worker TO ${runtimeRole}`,
  )
  const { rows } = await guard.query<{ name: string }>(
    `SELECT c.relname AS name FROM pg_class c JOIN pg_namespace n ON n.oid = c.relnamespace
      WHERE n.nspname = 'graphile_worker' AND c.relkind = 'r' AND c.relrowsecurity
        AND NOT EXISTS (SELECT 1 FROM pg_policy p WHERE p.polrelid = c.oid AND p.polname = 'runtime')`,
  )
  for (const { name } of rows)
    await guard.query(
      `CREATE POLICY runtime ON graphile_worker.${guard.escapeIdentifier(name)} TO ${runtimeRole}
         USING (true) WITH CHECK (true)`,
    )
}
