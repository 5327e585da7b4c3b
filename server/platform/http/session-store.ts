import connectPgSimple from 'connect-pg-simple'
import session from 'express-session'
import type { SessionData } from 'express-session'
import type { Pool } from 'pg'

const PgStore = connectPgSimple(session)

/** A session lives on for hours after its last request; to the minute is exact enough. */
const prolongEveryMs = 60_000
const mostRemembered = 1000

/**
 * Sessions in PostgreSQL. That one lives on is written once a minute and not before every answer, where the write would
 * be most of what a short read costs.
 */
class SessionStore extends PgStore {
  readonly #prolongedMs = new Map<string, number>()

  override touch(sid: string, data: SessionData, done: () => void = () => undefined): void {
    const nowMs = Date.now()
    if (nowMs - (this.#prolongedMs.get(sid) ?? 0) < prolongEveryMs) {
      done()
      return
    }
    if (this.#prolongedMs.size >= mostRemembered) this.#prolongedMs.clear()
    this.#prolongedMs.set(sid, nowMs)
    super.touch(sid, data, done)
  }
}

export const createSessionStore = (pool: Pool) =>
  new SessionStore({ pool, tableName: 'session', pruneSessionInterval: 900 })
