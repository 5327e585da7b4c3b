import { Logger, run } from 'graphile-worker'
import type { Runner } from 'graphile-worker'
import type pg from 'pg'
import type { Tx } from '../database/transactions.ts'
import type { Log } from '../log.ts'

/** A kind of background work. Handlers are idempotent: a job may run twice. */
export type JobHandlers = Record<string, (payload: { id: string }) => Promise<void>>

/** How often a job is tried; the waits between grow from seconds to hours. */
const tries = 10

/**
 * Enqueues a job in the transaction that causes it: both happen or neither does.
 *
 * @param id the record that the job is about; also its key, so that one record never has two such jobs waiting
 */
export async function enqueueJob(tx: Tx, name: string, id: string): Promise<void> {
  await tx.manager.query(
    `SELECT graphile_worker.add_job($1, payload := $2::json, job_key := $3, max_attempts := $4)`,
    [name, JSON.stringify({ id }), `${name}:${id}`, tries],
  )
}

/** Works the queue in this process until it is stopped. */
export async function startJobs(
  pool: pg.Pool,
  handlers: JobHandlers,
  log: Log,
): Promise<{ stop(): Promise<void> }> {
  const logger = new Logger(() => (level, message, meta) => {
    if (level === 'error' || level === 'warning') log.warn({ meta }, message)
  })
  const taskList = Object.fromEntries(
    Object.entries(handlers).map(([name, handle]) => [
      name,
      (payload: unknown) => handle(payload as { id: string }),
    ]),
  )
  // A connection lost between two queries must be logged, not end the process
  const lost = (error: Error) => log.warn({ err: error }, 'database connection lost')
  pool.on('error', lost)
  pool.on('connect', (client) => void client.on('error', lost))
  const runner: Runner = await run({
    pgPool: pool,
    concurrency: 2,
    noHandleSignals: true,
    pollInterval: 1000,
    taskList,
    logger,
  })
  return { stop: () => runner.stop() }
}
