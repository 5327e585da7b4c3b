import type { Db } from '../../platform/database/db.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { WaterQuestions } from '../water/index.ts'
import { findCasesIn } from './read-clocks.ts'

/**
 * The running cases in the water of an enclosure, so that nobody puts an animal to them unawares.
 *
 * @refuses not-found
 */
export async function readCasesInWater(
  parts: { water: WaterQuestions },
  db: Db,
  enclosureId: string,
  at: Date,
): Promise<{ number: string; batchClosed: boolean }[]> {
  const known: unknown[] = await db.query(`SELECT 1 FROM enclosures e WHERE e.id = $1`, [enclosureId])
  if (known.length === 0) throw new Problem('not-found')
  const there = await findCasesIn(db, await parts.water.enclosuresSharing(enclosureId, at, db), at)
  const closed: { case_id: string }[] = await db.query(
    `SELECT DISTINCT e.case_id FROM live_case_events e WHERE e.kind = 'closed' AND e.case_id = ANY ($1::uuid[])`,
    [there.map(({ id }) => id)],
  )
  const closedIds = new Set(closed.map(({ case_id }) => case_id))
  return there.map(({ id, number }) => ({ number, batchClosed: closedIds.has(id) }))
}
