import type { DataSource } from 'typeorm'
import type { Clock } from '../clock.ts'

export const triesBeforeLock = 5
export const lockMinutes = 15

export interface Lockout {
  /** Minutes until this e-mail may be tried again; 0 when it may be tried now. Counted whether or not the account exists. */
  minutesLocked(emailKey: string): Promise<number>
  note(tried: { emailKey: string; address: string; succeeded: boolean }): Promise<void>
}

/** Five wrong tries in a row lock an e-mail for 15 minutes after the last of them. */
export function createLockout(parts: { dataSource: DataSource; clock: Clock }): Lockout {
  return {
    async minutesLocked(emailKey) {
      const now = parts.clock.now()
      const since = new Date(now.getTime() - lockMinutes * 60_000)
      const recent: { tried_at: Date; succeeded: boolean }[] = await parts.dataSource.query(
        `SELECT t.tried_at, t.succeeded FROM sign_in_tries t
          WHERE t.email_key = $1 AND t.tried_at > $2 ORDER BY t.tried_at DESC, t.id DESC LIMIT $3`,
        [emailKey, since, triesBeforeLock],
      )
      if (recent.length < triesBeforeLock || recent.some((row) => row.succeeded)) return 0
      const lastAt = recent[0]?.tried_at ?? now
      return Math.ceil((lastAt.getTime() + lockMinutes * 60_000 - now.getTime()) / 60_000)
    },
    async note({ emailKey, address, succeeded }) {
      await parts.dataSource.query(
        `INSERT INTO sign_in_tries (email_key, address, tried_at, succeeded) VALUES ($1, $2, $3, $4)`,
        [emailKey, address, parts.clock.now(), succeeded],
      )
    },
  }
}
