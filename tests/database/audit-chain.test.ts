import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import pg from 'pg'
import type { DataSource } from 'typeorm'
import { verifyChain } from '../../server/platform/audit/verify-chain.ts'
import { systemClock } from '../../server/platform/clock.ts'
import { connectRuntime } from '../../server/platform/database/data-source.ts'
import { createTransactions } from '../../server/platform/database/transactions.ts'
import { installation } from '../../server/platform/http/request-context.ts'
import { cloneDatabase } from '../support/database.ts'

let dataSource: DataSource
let owner: pg.Client
/** What stands in the trail of a new installation: the marks of what its migrations put in. */
let before = 0
beforeAll(async () => {
  const database = await cloneDatabase()
  dataSource = await connectRuntime(database.runtimeUrl, [], 8)
  owner = new pg.Client({ connectionString: database.ownerUrl })
  await owner.connect()
  before = (await verifyChain(dataSource, 7)).entries
  const transactions = createTransactions({ dataSource, clock: systemClock })
  const note = (n: number) =>
    transactions.inTransaction({ actor: installation, requestId: `r${String(n)}` }, async (tx) => {
      tx.audit({
        action: 'test.note',
        subject: { kind: 'test', id: String(n), label: `µ ${String(n)}` },
        after: { n },
      })
      tx.audit({
        action: 'test.note',
        subject: { kind: 'test', id: String(n), label: 'second' },
        before: { n: 0.1 + 0.2 },
      })
    })
  // 40 writers at once: one chain all the same
  await Promise.all(Array.from({ length: 40 }, (_, n) => note(n)))
})
afterAll(async () => {
  await dataSource.destroy()
  await owner.end()
})

/** Damages the chain as the owner, verifies, and puts it back. */
async function verdictAfter(damage: string, repair: string) {
  await owner.query(damage)
  const report = await verifyChain(dataSource, 7)
  await owner.query(repair)
  return report.brokenAt
}

describe('the audit chain', () => {
  it('is one chain, whoever writes at the same time', async () => {
    expect(await verifyChain(dataSource, 7)).toMatchObject({ entries: before + 80, brokenAt: null })
  })

  it('shows where a text was changed', async () => {
    const broken = await verdictAfter(
      `UPDATE audit_entries SET text = replace(text, 'test.note', 'test.nota') WHERE seq = 23`,
      `UPDATE audit_entries SET text = replace(text, 'test.nota', 'test.note') WHERE seq = 23`,
    )
    expect(broken).toEqual({ seq: 23, why: 'hash' })
  })

  it('shows where a column no longer says what the text says', async () => {
    const broken = await verdictAfter(
      `UPDATE audit_entries SET actor_name = 'Somebody else' WHERE seq = 31`,
      `UPDATE audit_entries SET actor_name = 'Pratique' WHERE seq = 31`,
    )
    expect(broken).toEqual({ seq: 31, why: 'projection' })
  })

  it('shows a missing entry and a text that was changed together with its hash', async () => {
    await owner.query(`CREATE TEMP TABLE kept AS SELECT * FROM audit_entries WHERE seq = 50`)
    expect(
      await verdictAfter(
        `DELETE FROM audit_entries WHERE seq = 50`,
        `INSERT INTO audit_entries SELECT * FROM kept`,
      ),
    ).toEqual({ seq: 51, why: 'gap' })
    const broken = await verdictAfter(
      `UPDATE audit_entries SET text = text || ' ', hash = encode(sha256(convert_to(previous_hash || E'\\n' || text || ' ', 'UTF8')), 'hex') WHERE seq = 50`,
      `UPDATE audit_entries a SET text = k.text, hash = k.hash FROM kept k WHERE a.seq = k.seq`,
    )
    expect(broken).toEqual({ seq: 51, why: 'link' })
    expect((await verifyChain(dataSource)).brokenAt).toBeNull()
  })
})
