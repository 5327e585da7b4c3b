import pg from 'pg'
import { DataSource } from 'typeorm'
import { migrations } from '../../migrations/index.ts'
import { prepareJobs } from '../jobs/prepare-jobs.ts'

export const runtimeRole = 'pratique_app'
const prepareLock = 4400_0002

/** The address of the same database for the runtime role. */
export function runtimeUrlOf(ownerUrl: string, runtimePassword: string): string {
  const url = new URL(ownerUrl)
  url.username = runtimeRole
  url.password = encodeURIComponent(runtimePassword)
  return url.href
}

/**
 * Makes the runtime role and its rights and migrates to the newest version, as the owner, under an advisory lock, so
 * that several processes may start at once. An older program refuses a database that a newer one has migrated.
 */
export async function prepareDatabase(ownerUrl: string, runtimePassword: string): Promise<void> {
  const guard = new pg.Client({ connectionString: ownerUrl })
  await guard.connect()
  try {
    await guard.query('SELECT pg_advisory_lock($1)', [prepareLock])
    // Before TypeORM makes its own table: default privileges reach only tables made later, by this same role.
    await guard.query(
      `DO $$ BEGIN CREATE ROLE ${runtimeRole}; EXCEPTION WHEN duplicate_object THEN NULL; WHEN unique_violation THEN NULL; END $$`,
    )
    await guard.query(`ALTER ROLE ${runtimeRole} LOGIN PASSWORD ${guard.escapeLiteral(runtimePassword)}`)
    await guard.query(`GRANT USAGE ON SCHEMA public TO ${runtimeRole}`)
    await guard.query(
      `ALTER DEFAULT PRIVILEGES IN SCHEMA public GRANT SELECT, INSERT ON TABLES TO ${runtimeRole}`,
    )
    await guard.query(`ALTER DEFAULT PRIVILEGES IN SCHEMA public GRANT USAGE ON SEQUENCES TO ${runtimeRole}`)
    await migrate(ownerUrl)
    await prepareJobs(ownerUrl, guard, runtimeRole)
    await guard.query(`REVOKE INSERT ON migrations FROM ${runtimeRole}`)
  } finally {
    await guard.end()
  }
}

async function migrate(ownerUrl: string): Promise<void> {
  const owner = new DataSource({
    type: 'postgres',
    url: ownerUrl,
    migrations,
    migrationsTransactionMode: 'each',
    synchronize: false,
    installExtensions: false,
  })
  await owner.initialize()
  try {
    await owner.runMigrations()
    const done: { name: string }[] = await owner.query('SELECT m.name FROM migrations m')
    const known = new Set(migrations.map((migration) => migration.name))
    const newer = done.filter((row) => !known.has(row.name))
    if (newer.length > 0)
      throw new Error(
        `The database was migrated by a newer Pratique (${newer.map((row) => row.name).join(', ')}). Start that version.`,
      )
  } finally {
    await owner.destroy()
  }
}
