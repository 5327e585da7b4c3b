import type { Db } from '../database/db.ts'
import type { Transactions, Tx } from '../database/transactions.ts'
import type { RequestContext } from '../http/request-context.ts'
import type { Clock } from '../clock.ts'
import type { Ids } from '../ids.ts'
import { lockMinutes, triesBeforeLock } from './lockout.ts'
import { SigningLockRow } from './signing-lock.entity.ts'

export interface SigningLock {
  /** Until when a person's signing is locked; null when it is not. */
  lockedUntil(personId: string): Promise<Date | null>
  /**
   * Counts a try as wrong before the password is looked at, so that many at once, in whatever process, are no more than one
   * after another.
   *
   * @returns until when it is locked, and nothing was counted; null when the password may be looked at
   */
  reserve(context: RequestContext, personId: string): Promise<Date | null>
  /** The try was right: those before it count no longer. */
  noteRight(personId: string): Promise<void>
  /** The try was wrong. @returns until when it is locked by it; null when it is not yet */
  noteWrong(context: RequestContext, personId: string): Promise<Date | null>
}

/** First part of the advisory lock under which the tries of one person are counted, in whatever process. */
const triesLock = 5_150_002
const keyOf = (personId: string) => `own:${personId}`

/**
 * Five wrong passwords in a row, however long between them and in whatever form, lock signing of a person for 15 minutes.
 * The lock stands in the database: a restart does not end it, and every process sees it. It is a row of its own with an
 * entry in the audit trail.
 */
export function createSigningLock(parts: {
  dataSource: Db
  transactions: Transactions
  clock: Clock
  ids: Ids
}): SigningLock {
  async function readUntil(db: Db, personId: string, now: Date): Promise<Date | null> {
    const [row]: { until_at: Date }[] = await db.query(
      `SELECT k.until_at FROM signing_locks k WHERE k.person_id = $1 AND k.until_at > $2
        ORDER BY k.until_at DESC LIMIT 1`,
      [personId, now],
    )
    return row?.until_at ?? null
  }

  async function wrongInARow(db: Db, personId: string): Promise<{ wrong: number; lastId: string }> {
    const [row]: { wrong: number; last_id: string | null }[] = await db.query(
      `SELECT count(*)::int AS wrong, max(t.id) AS last_id FROM sign_in_tries t
        WHERE t.email_key = $1 AND NOT t.succeeded AND t.id > coalesce(greatest(
          (SELECT max(s.id) FROM sign_in_tries s WHERE s.email_key = $1 AND s.succeeded),
          (SELECT max(k.last_try_id) FROM signing_locks k WHERE k.person_id = $2)), 0)`,
      [keyOf(personId), personId],
    )
    return { wrong: row?.wrong ?? 0, lastId: row?.last_id ?? '0' }
  }

  const note = (db: Db, personId: string, succeeded: boolean): Promise<unknown> =>
    db.query(`INSERT INTO sign_in_tries (email_key, address, tried_at, succeeded) VALUES ($1, '', $2, $3)`, [
      keyOf(personId),
      parts.clock.now(),
      succeeded,
    ])

  async function lockWhenDue(tx: Tx, personId: string): Promise<Date | null> {
    const { wrong, lastId } = await wrongInARow(tx.manager, personId)
    if (wrong < triesBeforeLock) return null
    const untilAt = new Date(tx.at.getTime() + lockMinutes * 60_000)
    await tx.manager.insert(SigningLockRow, {
      id: parts.ids.next(),
      personId,
      lockedAt: tx.at,
      untilAt,
      wrongTries: wrong,
      lastTryId: lastId,
    })
    tx.audit({
      action: 'signing.lock',
      subject: { kind: 'person', id: personId, label: tx.actor.printedName },
      after: { wrongTries: wrong, until: untilAt.toISOString() },
    })
    return untilAt
  }

  /** In a transaction of its own, kept whatever becomes of the request: no command's result is stored with it. */
  async function inTries(
    { actor, requestId }: RequestContext,
    personId: string,
    work: (tx: Tx) => Promise<Date | null>,
  ): Promise<Date | null> {
    const until = await parts.transactions.inTransaction({ actor, requestId }, async (tx) => {
      await tx.manager.query('SELECT pg_advisory_xact_lock($1, hashtext($2))', [triesLock, personId])
      return (await work(tx))?.toISOString() ?? null
    })
    return until === null ? null : new Date(until)
  }

  return {
    lockedUntil: (personId) => readUntil(parts.dataSource, personId, parts.clock.now()),
    reserve: (context, personId) =>
      inTries(context, personId, async (tx) => {
        // tries counted by a process that ended before it looked at them lock too
        const until = (await readUntil(tx.manager, personId, tx.at)) ?? (await lockWhenDue(tx, personId))
        if (until === null) await note(tx.manager, personId, false)
        return until
      }),
    noteRight: async (personId) => void (await note(parts.dataSource, personId, true)),
    noteWrong: (context, personId) =>
      inTries(
        context,
        personId,
        async (tx) => (await readUntil(tx.manager, personId, tx.at)) ?? (await lockWhenDue(tx, personId)),
      ),
  }
}
