import type pg from 'pg'
import type { DataSource, EntitySchema } from 'typeorm'
import type { PostgresDriver } from 'typeorm/driver/postgres/PostgresDriver.js'
import { guardPool, OneConnectionSource } from './one-connection.ts'
import { PreparingClient } from './preparing-client.ts'
import { WrittenRows } from './written-rows.ts'

export type EntityClass = (new () => object) | EntitySchema

/** Enough to keep a machine of a few cores busy; on more, reads wait for processors and each has its own plans to make. */
const mostConnections = 6

/** Connects as the runtime role. Refuses a role that could get round the ledgers. */
export async function connectRuntime(
  url: string,
  entities: readonly EntityClass[],
  poolSize = mostConnections,
): Promise<DataSource> {
  const dataSource = new OneConnectionSource({
    type: 'postgres',
    url,
    entities: [...entities],
    subscribers: [WrittenRows],
    synchronize: false,
    installExtensions: false,
    poolSize,
    // Many short queries over many views: to compile or to plan one takes longer than running it. So none is compiled,
    // and each is planned once, for any parameters (preparing-client.ts)
    extra: {
      options: '-c timezone=UTC -c jit=off -c plan_cache_mode=force_generic_plan',
      Client: PreparingClient,
      idleTimeoutMillis: 600_000, // a new connection plans everything anew
    },
  })
  await dataSource.initialize()
  guardPool(poolOf(dataSource))
  const [role]: Record<string, boolean>[] = await dataSource.query(
    `SELECT r.rolsuper, r.rolcreatedb, r.rolcreaterole, r.rolreplication, r.rolbypassrls
       FROM pg_roles r WHERE r.rolname = current_user`,
  )
  const rights = Object.entries(role ?? {}).filter(([, held]) => held)
  if (rights.length > 0) {
    await dataSource.destroy()
    throw new Error(`The runtime role must not have ${rights.map(([right]) => right).join(', ')}.`)
  }
  return dataSource
}

/** The connection pool of a data source, shared with the session store. */
export function poolOf(dataSource: DataSource): pg.Pool {
  return (dataSource.driver as PostgresDriver).master as pg.Pool
}
