import { createHash } from 'node:crypto'
import type { DataSource, EntityManager } from 'typeorm'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import { Problem } from '../http/problem.ts'
import type { Actor, RequestContext } from '../http/request-context.ts'
import type { Clock } from '../clock.ts'
import { appendToChain } from '../audit/append-to-chain.ts'
import type { AuditDraft } from '../audit/append-to-chain.ts'
import { marksOfWritten } from '../audit/row-marks.ts'
import { takeWritten } from './written-rows.ts'
import type { Written } from './written-rows.ts'
import { idAlreadyUsed } from './id-already-used.ts'
import { withinTransaction } from './one-connection.ts'
import { problemFromConstraint } from './constraint-problems.ts'

declare const made: unique symbol

/**
 * A transaction under way. Only {@link Transactions.inTransaction} makes one, and every write demands one, so a write
 * outside a transaction does not compile.
 */
export interface Tx {
  readonly [made]: true
  readonly manager: EntityManager
  readonly context: RequestContext
  readonly actor: Actor
  /** One reading of the clock: all rows of a change agree. */
  readonly at: Date
  /** Notes an audit entry; all are written last, under the chain's lock. */
  audit(entry: AuditDraft): void
  /** Runs after the commit: mail, files. Never for anything that must not be lost. */
  afterCommit(work: () => Promise<void> | void): void
}

export interface Transactions {
  /**
   * Runs `work` in one transaction: READ COMMITTED, retried from BEGIN on serialization failure or deadlock.
   * With a command in the context the work is done once; a repeated command gets the stored result of the first,
   * so `work` returns plain JSON.
   */
  inTransaction<T extends Json | void>(context: RequestContext, work: (tx: Tx) => Promise<T>): Promise<T>
}

const attempts = 3

/** Serialization failure, deadlock, or the same record id written by two requests at once. */
const isRetryable = ({ code, constraint }: { code?: string; constraint?: string }) =>
  code === '40001' || code === '40P01' || (code === '23505' && constraint?.startsWith('pk_') === true)

/** The driver's error code and constraint, where the error came from PostgreSQL. */
export function driverError(error: unknown): { code?: string; constraint?: string } {
  return (error as { driverError?: { code?: string; constraint?: string } }).driverError ?? {}
}

/**
 * Notes what was sent under the id of a record; the same again goes on, and its service finds the record there. Written
 * in the transaction of the record, so that a refused entry may be mended and sent under its id.
 */
async function claimRecord(manager: EntityManager, context: RequestContext, at: Date): Promise<void> {
  const { record } = context
  if (!record) return
  const key = [record.id, record.contractId]
  const claimed: unknown[] = await manager.query(
    `INSERT INTO record_requests (record_id, contract_id, content_hash, recorded_at)
     VALUES ($1, $2, $3, $4) ON CONFLICT (record_id, contract_id) DO NOTHING RETURNING record_id`,
    [...key, record.contentHash, at],
  )
  if (claimed.length > 0) return
  const [earlier]: { content_hash: string }[] = await manager.query(
    `SELECT r.content_hash FROM record_requests r WHERE r.record_id = $1 AND r.contract_id = $2`,
    key,
  )
  if (earlier?.content_hash !== record.contentHash) throw idAlreadyUsed()
}

/** An act, and what was written since the one before it. */
interface Act {
  entry: AuditDraft
  written: Written
}

/** What was written after the last act belongs to it; with none at all, the marks of the rows would be lost. */
function withRest(acts: readonly Act[], rest: Written): Act[] {
  if (rest.size === 0) return [...acts]
  const last = acts.at(-1)
  if (!last)
    throw new Error(`Rows were written without an act in the audit trail: ${[...rest.keys()].join(', ')}`)
  const written = new Map(last.written)
  for (const [table, keys] of rest) written.set(table, new Set([...(written.get(table) ?? []), ...keys]))
  return [...acts.slice(0, -1), { ...last, written }]
}

class Replayed extends Error {
  constructor(readonly result: Json | null) {
    super('replayed')
  }
}

async function claimCommand(manager: EntityManager, context: RequestContext, at: Date): Promise<void> {
  const { command, actor } = context
  if (!command) return
  const claimed: unknown[] = await manager.query(
    `INSERT INTO command_keys (key, actor_id, contract_id, body_hash, recorded_at)
     VALUES ($1, $2, $3, $4, $5) ON CONFLICT (key, actor_id) DO NOTHING RETURNING key`,
    [command.key, actor.personId, command.contractId, command.bodyHash, at],
  )
  if (claimed.length > 0) return
  const [earlier]: { contract_id: string; body_hash: string; result: string | null }[] = await manager.query(
    `SELECT k.contract_id, k.body_hash, k.result FROM command_keys k WHERE k.key = $1 AND k.actor_id = $2`,
    [command.key, actor.personId],
  )
  if (earlier?.contract_id !== command.contractId || earlier.body_hash !== command.bodyHash)
    throw new Problem('idempotency-key-reused')
  throw new Replayed(earlier.result === null ? null : (JSON.parse(earlier.result) as Json))
}

export const hashOf = (text: string): string => createHash('sha256').update(text).digest('hex')

/**
 * Hash of a command's content, kept to tell a repetition from another command under the same key. Passwords are left
 * out: a plain hash of one could be guessed from.
 */
export function bodyHashOf(parts: unknown): string {
  return hashOf(JSON.stringify(parts, (key, value: unknown) => (/password/i.test(key) ? undefined : value)))
}

export function createTransactions(parts: { dataSource: DataSource; clock: Clock }): Transactions {
  async function once<T extends Json | void>(context: RequestContext, work: (tx: Tx) => Promise<T>) {
    const runner = parts.dataSource.createQueryRunner()
    const later: (() => Promise<void> | void)[] = []
    const acts: Act[] = []
    await runner.connect()
    try {
      await runner.startTransaction('READ COMMITTED')
      await runner.query(`SET LOCAL lock_timeout = '5s'`)
      await runner.query(`SET LOCAL idle_in_transaction_session_timeout = '30s'`)
      const at = parts.clock.now()
      const manager = runner.manager
      await claimCommand(manager, context, at)
      await claimRecord(manager, context, at)
      const tx = {
        manager,
        context,
        actor: context.actor,
        at,
        audit: (entry: AuditDraft) => void acts.push({ entry, written: takeWritten(manager) }),
        afterCommit: (next: () => Promise<void> | void) => void later.push(next),
      } as unknown as Tx
      const result = await withinTransaction(runner, () => work(tx))
      if (context.command)
        await manager.query(`UPDATE command_keys SET result = $3 WHERE key = $1 AND actor_id = $2`, [
          context.command.key,
          context.actor.personId,
          result === undefined ? null : JSON.stringify(result),
        ])
      const told = withRest(acts, takeWritten(manager))
      const marks = await marksOfWritten(
        manager,
        told.map(({ written }) => written),
      )
      const entries = told.map(({ entry }, i) => ({ ...entry, rows: marks[i] }))
      await appendToChain(manager, { context, at, entries })
      await runner.commitTransaction()
      return { result, later }
    } catch (error) {
      if (runner.isTransactionActive) await runner.rollbackTransaction()
      throw error
    } finally {
      await runner.release()
    }
  }

  return {
    async inTransaction(context, work) {
      for (let attempt = 1; ; attempt++) {
        try {
          const { result, later } = await once(context, work)
          for (const next of later) await next()
          return result
        } catch (error) {
          if (error instanceof Replayed) return error.result as never
          const driver = driverError(error)
          if (isRetryable(driver) && attempt < attempts) continue
          // The id stands twice in one request, which no retry changes
          if (driver.code === '23505' && isRetryable(driver)) throw new Problem('id-already-used')
          if (driver.code === '55P03' || isRetryable(driver)) throw new Problem('busy')
          const problem = driver.constraint ? problemFromConstraint(driver.constraint) : null
          throw problem ?? error
        }
      }
    },
  }
}
