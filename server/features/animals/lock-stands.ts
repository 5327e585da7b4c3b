import { happenedBy } from '../../platform/database/happened-by.ts'

/**
 * SQL: whether a lock was on at an instant. A lift ends it only while the record behind the lift stands.
 *
 * @param lock  alias of a row of `movement_locks`
 * @param param the instant, as a parameter
 */
export const lockStands = (lock: string, param: string): string =>
  `(${happenedBy(lock, param)}
    AND NOT EXISTS (SELECT 1 FROM standing_lock_lifts f WHERE f.lock_id = ${lock}.id AND ${happenedBy('f', param)}))`
