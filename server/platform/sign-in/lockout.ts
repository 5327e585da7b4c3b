import type { DataSource } from 'typeorm'
import type { Clock } from '../clock.ts'
import type { Db } from '../database/db.ts'
import { Problem } from '../http/problem.ts'
import { createTurns } from '../in-turn.ts'

/** Wrong tries in a row at one account from one address. */
export const triesBeforeLock = 5
/** Wrong tries in a row at one account from all addresses together: more than a house makes, fewer than guessing needs. */
export const triesBeforeLockAnywhere = 50
export const lockMinutes = 15

/** What is tried: an account, whether or not it exists, from an address. */
export interface Tried {
  emailKey: string
  address: string
}

export interface Lockout {
  /** Minutes until this may be tried again; 0 when it may be tried now. */
  minutesLocked(tried: Tried): Promise<number>
  /**
   * One try: counted before the password is looked at, so that many tries at once are no more tries than one after
   * another.
   *
   * @param check what the password opens; null when it was wrong
   * @param sayLocked the words of the refusal while it is locked
   * @refuses sign-in-locked
   */
  attempt<T>(
    tried: Tried,
    check: () => Promise<T | null>,
    sayLocked: (minutes: number) => string,
  ): Promise<T | null>
}

/** First part of the advisory lock under which the tries at one account are counted, in whatever process. */
const triesLock = 5_150_001

/**
 * Five wrong tries in a row lock an account for 15 minutes after the last of them, for the address they came from: whoever
 * guesses from elsewhere does not lock out the person at the tank.
 */
export function createLockout(parts: { dataSource: DataSource; clock: Clock }): Lockout {
  const inTurn = createTurns()

  async function minutesAfter(
    db: Db,
    limit: number,
    emailKey: string,
    address: string | null,
  ): Promise<number> {
    const now = parts.clock.now()
    const since = new Date(now.getTime() - lockMinutes * 60_000)
    const recent: { tried_at: Date; succeeded: boolean }[] = await db.query(
      `SELECT t.tried_at, t.succeeded FROM sign_in_tries t
        WHERE t.email_key = $1 AND t.tried_at > $2 AND ($4::text IS NULL OR t.address = $4)
        ORDER BY t.tried_at DESC, t.id DESC LIMIT $3`,
      [emailKey, since, limit, address],
    )
    if (recent.length < limit || recent.some((row) => row.succeeded)) return 0
    const lastAt = recent[0]?.tried_at ?? now
    return Math.ceil((lastAt.getTime() + lockMinutes * 60_000 - now.getTime()) / 60_000)
  }

  const minutesLocked = async ({ emailKey, address }: Tried, db: Db = parts.dataSource) =>
    Math.max(
      await minutesAfter(db, triesBeforeLock, emailKey, address),
      await minutesAfter(db, triesBeforeLockAnywhere, emailKey, null),
    )

  async function note(db: Db, { emailKey, address }: Tried, succeeded: boolean): Promise<void> {
    await db.query(
      `INSERT INTO sign_in_tries (email_key, address, tried_at, succeeded) VALUES ($1, $2, $3, $4)`,
      [emailKey, address, parts.clock.now(), succeeded],
    )
  }

  /** Counts a try as wrong until it is known to be right. Minutes of the lock, and nothing counted, while it is locked. */
  const reserve = (tried: Tried): Promise<number> =>
    parts.dataSource.transaction(async (manager) => {
      await manager.query('SELECT pg_advisory_xact_lock($1, hashtext($2))', [triesLock, tried.emailKey])
      const minutes = await minutesLocked(tried, manager)
      if (minutes === 0) await note(manager, tried, false)
      return minutes
    })

  return {
    minutesLocked: (tried) => minutesLocked(tried),
    // One after another in this process: people who sign in rightly at the same moment do not count against each other
    attempt: (tried, check, sayLocked) =>
      inTurn(`${tried.emailKey} ${tried.address}`, async () => {
        const minutes = await reserve(tried)
        if (minutes > 0)
          throw new Problem('sign-in-locked', {
            detail: sayLocked(minutes),
            extra: { retry_after_seconds: minutes * 60 },
          })
        const found = await check()
        if (found !== null) await note(parts.dataSource, tried, true)
        return found
      }),
  }
}
