import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import pg from 'pg'
import type { DataSource } from 'typeorm'
import { systemClock } from '../../server/platform/clock.ts'
import { connectRuntime } from '../../server/platform/database/data-source.ts'
import { createTransactions } from '../../server/platform/database/transactions.ts'
import type { Transactions } from '../../server/platform/database/transactions.ts'
import { noteWritten } from '../../server/platform/database/written-rows.ts'
import { installation } from '../../server/platform/http/request-context.ts'
import { cloneDatabase } from '../support/database.ts'

let dataSource: DataSource
let owner: pg.Client
let transactions: Transactions
const context = {
  actor: { ...installation, personId: '019a0000-0000-7000-8000-000000000001' },
  requestId: 'r',
}
beforeAll(async () => {
  const database = await cloneDatabase()
  dataSource = await connectRuntime(database.runtimeUrl, [], 6)
  transactions = createTransactions({ dataSource, clock: systemClock })
  owner = new pg.Client({ connectionString: database.ownerUrl })
  await owner.connect()
  await owner.query(`INSERT INTO counters (kind, last_number) VALUES ('a', 0), ('b', 0), ('slow', 0)`)
})
afterAll(async () => {
  await dataSource.destroy()
  await owner.end()
})

const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms))
const numberOf = async (kind: string) =>
  (await owner.query<{ last_number: number }>('SELECT last_number FROM counters WHERE kind = $1', [kind]))
    .rows[0]?.last_number

describe('a transaction', () => {
  it('starts again from BEGIN after a deadlock, and both changes are made', async () => {
    let begins = 0
    let holding = 0
    const cross = (first: string, second: string) =>
      transactions.inTransaction(context, async (tx) => {
        begins += 1
        await tx.manager.query('UPDATE counters SET last_number = last_number + 1 WHERE kind = $1', [first])
        holding += 1
        // each holds what the other wants
        while (holding < 2) await pause(5)
        await tx.manager.query('UPDATE counters SET last_number = last_number + 1 WHERE kind = $1', [second])
      })
    await Promise.all([cross('a', 'b'), cross('b', 'a')])
    expect([await numberOf('a'), await numberOf('b')]).toEqual([2, 2])
    expect(begins).toBe(3)
  })

  it('reads through the pool over its own connection: as many as there are connections do not wait for one another', async () => {
    const one = (kind: string) =>
      transactions.inTransaction(context, async (tx) => {
        await tx.manager.query(`INSERT INTO counters (kind, last_number) VALUES ($1, 7)`, [kind])
        await pause(20)
        return dataSource.query<{ last_number: number }[]>(
          `SELECT last_number FROM counters WHERE kind = $1`,
          [kind],
        )
      })
    const kinds = Array.from({ length: 12 }, (_, index) => `own-${String(index)}`)
    expect(await Promise.all(kinds.map(one))).toEqual(kinds.map(() => [{ last_number: 7 }]))
  })

  it('is refused a second connection', async () => {
    const second = transactions.inTransaction(context, async () => {
      const runner = dataSource.createQueryRunner()
      await runner.connect()
    })
    await expect(second).rejects.toThrow('second connection')
  })

  it('is refused when it wrote a row that the trail marks and told of no act: the mark would be lost', async () => {
    const silent = transactions.inTransaction(context, (tx) => {
      noteWritten(tx.manager.queryRunner, 'products', '019a0000-0000-7000-8000-0000000000aa')
      return Promise.resolve()
    })
    await expect(silent).rejects.toThrow('without an act in the audit trail: products')
  })

  it('answers busy when a lock is held too long', async () => {
    await owner.query('BEGIN')
    await owner.query(`UPDATE counters SET last_number = 1 WHERE kind = 'slow'`)
    const waiting = transactions.inTransaction(context, async (tx) => {
      await tx.manager.query(`SET LOCAL lock_timeout = '100ms'`)
      await tx.manager.query(`UPDATE counters SET last_number = 2 WHERE kind = 'slow'`)
    })
    await expect(waiting).rejects.toMatchObject({ code: 'busy' })
    await owner.query('ROLLBACK')
  })

  it('does a command once, however often it is sent, also at the same moment', async () => {
    const command = { key: 'k1', contractId: 'test', bodyHash: 'h' }
    const send = () =>
      transactions.inTransaction({ ...context, command }, async (tx) => {
        const [row]: [{ last_number: number }] = await tx.manager.query(
          `INSERT INTO counters AS c (kind, last_number) VALUES ('cmd', 1)
           ON CONFLICT (kind) DO UPDATE SET last_number = c.last_number + 1 RETURNING last_number`,
        )
        return { number: row.last_number }
      })
    const replies = await Promise.all([send(), send(), send()])
    expect(replies).toEqual([{ number: 1 }, { number: 1 }, { number: 1 }])
    expect(await numberOf('cmd')).toBe(1)
  })

  it('forgets a command that failed, so that it can be sent again', async () => {
    const command = { key: 'k2', contractId: 'test', bodyHash: 'h' }
    const fail = transactions.inTransaction({ ...context, command }, async () => {
      throw new Error('no')
    })
    await expect(fail).rejects.toThrow('no')
    expect(await transactions.inTransaction({ ...context, command }, async () => 'done')).toBe('done')
  })

  it('keeps nothing and runs nothing afterwards when the work fails', async () => {
    let ran = false
    await expect(
      transactions.inTransaction(context, async (tx) => {
        tx.audit({ action: 'test.lost', subject: { kind: 't', id: '1', label: '1' } })
        tx.afterCommit(() => void (ran = true))
        await tx.manager.query(`INSERT INTO counters (kind, last_number) VALUES ('lost', 1)`)
        throw new Error('no')
      }),
    ).rejects.toThrow('no')
    expect(ran).toBe(false)
    expect(await numberOf('lost')).toBeUndefined()
    expect((await owner.query(`SELECT 1 FROM audit_entries WHERE action = 'test.lost'`)).rowCount).toBe(0)
  })
})
