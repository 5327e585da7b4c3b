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
/** Wrong tries at one address over all accounts from which on it is slowed: a whole house may stand behind one. */
export const triesBeforeSlow = 300
/** Wrong tries in a row at one account from an address that is slowed. */
export const triesBeforeLockWhereSlow = 2

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
   * @refuses sign-in-locked, too-many-requests (it was wrong, and the address is slowed)
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
 * guesses from elsewhere does not lock out the person at the tank. An address from which many accounts are guessed at is
 * slowed, never shut: nobody may keep a house from its records. Each account then takes fewer wrong tries from there, and
 * passwords are looked at one after another; the right one still opens.
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

  /** A try that was right was counted as wrong before, and once more as right. The forms of who is signed in have no address. */
  async function isSlowed(db: Db, address: string): Promise<boolean> {
    if (address === '') return false
    const since = new Date(parts.clock.now().getTime() - lockMinutes * 60_000)
    const [row]: { wrong: number }[] = await db.query(
      `SELECT (count(*) FILTER (WHERE NOT succeeded) - count(*) FILTER (WHERE succeeded))::int AS wrong
         FROM sign_in_tries WHERE address = $1 AND tried_at > $2`,
      [address, since],
    )
    return (row?.wrong ?? 0) >= triesBeforeSlow
  }

  const minutesLocked = async (
    { emailKey, address }: Tried,
    slowed: boolean,
    db: Db = parts.dataSource,
  ): Promise<number> =>
    Math.max(
      await minutesAfter(db, slowed ? triesBeforeLockWhereSlow : triesBeforeLock, emailKey, address),
      await minutesAfter(db, triesBeforeLockAnywhere, emailKey, null),
    )

  async function note(db: Db, { emailKey, address }: Tried, succeeded: boolean): Promise<void> {
    await db.query(
      `INSERT INTO sign_in_tries (email_key, address, tried_at, succeeded) VALUES ($1, $2, $3, $4)`,
      [emailKey, address, parts.clock.now(), succeeded],
    )
  }

  /** Counts a try as wrong until it is known to be right. Minutes of the lock, and nothing counted, while it is locked. */
  const reserve = (tried: Tried, slowed: boolean): Promise<number> =>
    parts.dataSource.transaction(async (manager) => {
      await manager.query('SELECT pg_advisory_xact_lock($1, hashtext($2))', [triesLock, tried.emailKey])
      const minutes = await minutesLocked(tried, slowed, manager)
      if (minutes === 0) await note(manager, tried, false)
      return minutes
    })

  return {
    minutesLocked: async (tried) => minutesLocked(tried, await isSlowed(parts.dataSource, tried.address)),
    // One after another in this process: people who sign in rightly at the same moment do not count against each other
    attempt: (tried, check, sayLocked) =>
      inTurn(`${tried.emailKey} ${tried.address}`, async () => {
        const slowed = await isSlowed(parts.dataSource, tried.address)
        const minutes = await reserve(tried, slowed)
        if (minutes > 0)
          throw new Problem('sign-in-locked', {
            detail: sayLocked(minutes),
            extra: { retry_after_seconds: minutes * 60 },
          })
        const found = slowed ? await inTurn(`slowed ${tried.address}`, check) : await check()
        if (found !== null) await note(parts.dataSource, tried, true)
        else if (slowed)
          throw new Problem('too-many-requests', {
            detail: `E-mail and password do not fit. Many sign-ins failed at this address, for instance in the network of one house. The right password still opens each account; ${String(triesBeforeLockWhereSlow)} wrong ones lock it here for ${String(lockMinutes)} minutes.`,
            extra: { retry_after_seconds: lockMinutes * 60 },
          })
        return found
      }),
  }
}
