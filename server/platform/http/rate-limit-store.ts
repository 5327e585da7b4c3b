import type { Store } from 'express-rate-limit'
import type { DataSource } from 'typeorm'

/** Keeps the hits of express-rate-limit in PostgreSQL, so that several processes count together. */
export function createRateLimitStore(dataSource: DataSource, prefix: string): Store {
  let windowMs = 60_000
  const keyOf = (key: string) => `${prefix}:${key}`
  return {
    init: (options) => void (windowMs = options.windowMs),
    async increment(key) {
      const [row]: { hits: number; resets_at: Date }[] = await dataSource.query(
        `INSERT INTO rate_limits AS r (key, hits, resets_at)
         VALUES ($1, 1, now() + $2 * interval '1 millisecond')
         ON CONFLICT (key) DO UPDATE SET
           hits = CASE WHEN r.resets_at <= now() THEN 1 ELSE r.hits + 1 END,
           resets_at = CASE WHEN r.resets_at <= now() THEN EXCLUDED.resets_at ELSE r.resets_at END
         RETURNING hits, resets_at`,
        [keyOf(key), windowMs],
      )
      return { totalHits: row?.hits ?? 1, resetTime: row?.resets_at }
    },
    async decrement(key) {
      await dataSource.query(`UPDATE rate_limits SET hits = greatest(hits - 1, 0) WHERE key = $1`, [
        keyOf(key),
      ])
    },
    async resetKey(key) {
      await dataSource.query(`DELETE FROM rate_limits WHERE key = $1`, [keyOf(key)])
    },
  }
}
