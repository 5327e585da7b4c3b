import type { DataSource } from 'typeorm'
import type { Clock } from '../clock.ts'

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
  note(tried: Tried & { succeeded: boolean }): Promise<void>
}

/**
 * Five wrong tries in a row lock an account for 15 minutes after the last of them, for the address they came from: whoever
 * guesses from elsewhere does not lock out the person at the tank.
 */
export function createLockout(parts: { dataSource: DataSource; clock: Clock }): Lockout {
  async function minutesAfter(limit: number, emailKey: string, address: string | null): Promise<number> {
    const now = parts.clock.now()
    const since = new Date(now.getTime() - lockMinutes * 60_000)
    const recent: { tried_at: Date; succeeded: boolean }[] = await parts.dataSource.query(
      `SELECT t.tried_at, t.succeeded FROM sign_in_tries t
        WHERE t.email_key = $1 AND t.tried_at > $2 AND ($4::text IS NULL OR t.address = $4)
        ORDER BY t.tried_at DESC, t.id DESC LIMIT $3`,
      [emailKey, since, limit, address],
    )
    if (recent.length < limit || recent.some((row) => row.succeeded)) return 0
    const lastAt = recent[0]?.tried_at ?? now
    return Math.ceil((lastAt.getTime() + lockMinutes * 60_000 - now.getTime()) / 60_000)
  }
  return {
    minutesLocked: async ({ emailKey, address }) =>
      Math.max(
        await minutesAfter(triesBeforeLock, emailKey, address),
        await minutesAfter(triesBeforeLockAnywhere, emailKey, null),
      ),
    async note({ emailKey, address, succeeded }) {
      await parts.dataSource.query(
        `INSERT INTO sign_in_tries (email_key, address, tried_at, succeeded) VALUES ($1, $2, $3, $4)`,
        [emailKey, address, parts.clock.now(), succeeded],
      )
    },
  }
}
