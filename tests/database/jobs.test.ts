import { afterAll, beforeAll, expect, it } from 'vitest'
import type { DataSource } from 'typeorm'
import { systemClock } from '../../server/platform/clock.ts'
import { connectRuntime, poolOf } from '../../server/platform/database/data-source.ts'
import { createTransactions } from '../../server/platform/database/transactions.ts'
import { installation } from '../../server/platform/http/request-context.ts'
import { enqueueJob, startJobs } from '../../server/platform/jobs/jobs.ts'
import { createLog } from '../../server/platform/log.ts'
import { cloneDatabase } from '../support/database.ts'

let dataSource: DataSource
beforeAll(async () => void (dataSource = await connectRuntime((await cloneDatabase()).runtimeUrl, [], 8)))
afterAll(() => dataSource.destroy())

it('runs a job of a transaction that was committed, as the runtime role, and none of one that failed', async () => {
  const transactions = createTransactions({ dataSource, clock: systemClock })
  const context = { actor: installation, requestId: 'r' }
  const seen: string[] = []
  let done: () => void = () => undefined
  const all = new Promise<void>((resolve) => (done = resolve))
  const jobs = await startJobs(
    poolOf(dataSource),
    {
      note: async ({ id }) => {
        seen.push(id)
        // The first try of this one fails; the queue tries again.
        if (id === 'second' && seen.filter((one) => one === 'second').length === 1) throw new Error('not yet')
        if (seen.length === 3) done()
      },
    },
    createLog('silent'),
  )
  await transactions.inTransaction(context, (tx) => enqueueJob(tx, 'note', 'first'))
  await expect(
    transactions.inTransaction(context, async (tx) => {
      await enqueueJob(tx, 'note', 'lost')
      throw new Error('no')
    }),
  ).rejects.toThrow('no')
  await transactions.inTransaction(context, (tx) => enqueueJob(tx, 'note', 'second'))
  await all
  await jobs.stop()
  expect(seen).toEqual(['first', 'second', 'second'])
})
