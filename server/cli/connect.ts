import { compose } from '../composition.ts'
import type { Composition } from '../composition.ts'
import { ConfigError, readConfig } from '../config.ts'
import { entities } from '../entities.ts'
import { systemClock } from '../platform/clock.ts'
import { connectRuntime } from '../platform/database/data-source.ts'
import { prepareDatabase, runtimeUrlOf } from '../platform/database/prepare-database.ts'
import { createLog } from '../platform/log.ts'

/** Runs a command-line task against the installation's database, as the runtime role, and says plainly what failed. */
export async function withComposition(task: (composition: Composition) => Promise<number>): Promise<void> {
  try {
    const config = readConfig(process.env)
    await prepareDatabase(config.ownerDatabaseUrl, config.runtimePassword)
    const url = runtimeUrlOf(config.ownerDatabaseUrl, config.runtimePassword)
    const dataSource = await connectRuntime(url, entities, 3)
    try {
      const log = createLog(config.logLevel)
      process.exitCode = await task(
        compose({ dataSource, clock: systemClock, log, demo: config.demo, dataFolder: config.dataFolder }),
      )
    } finally {
      await dataSource.destroy()
    }
  } catch (error) {
    process.exitCode = 1
    process.stderr.write(
      `${error instanceof ConfigError || error instanceof Error ? error.message : String(error)}\n`,
    )
  }
}
