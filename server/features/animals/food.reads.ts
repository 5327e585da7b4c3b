import { foodOrRelease } from '../../../shared/domain/animals/food-or-release.ts'
import type { FoodAnswer, FoodTies } from '../../../shared/domain/animals/food-or-release.ts'
import type { Db } from '../../platform/database/db.ts'
import { happenedBy, timeSeenAt } from '../../platform/database/happened-by.ts'

/** What is known of an animal, with who said it, of which animal or group, and when it was written down. */
export interface FoodFact {
  answer: FoodAnswer
  accession: string
  reason: string
  happenedOn: string
  recordedAt: string
  recordedBy: string
}

interface StatementRow {
  id: string
  animal_id: string
  accession: string
  answer: FoodAnswer
  reason: string
  happened_at: Date
  happened_on: string
  recorded_at: Date
  recorded_by_name: string
}

/** The animals, with every group that they were taken out of and that joined them or those. */
const reach = `
  WITH RECURSIVE reach AS (
    SELECT a.id FROM animals a WHERE a.id = ANY ($1::uuid[])
     UNION
    SELECT x.id FROM reach r
      CROSS JOIN LATERAL (
        SELECT a.split_from_id AS id FROM animals a WHERE a.id = r.id AND a.split_from_id IS NOT NULL
         UNION ALL
        SELECT o.animal_id FROM live_count_entries c
          JOIN live_count_entries o ON o.transfer_id = c.transfer_id AND o.id <> c.id
         WHERE c.animal_id = r.id AND c.kind = 'merge-in') x)`

/**
 * Whether these animals may be eaten or set free, as it was known at an instant.
 *
 * @returns nothing for those of whom nobody said
 */
export async function readFoodOrRelease(
  db: Db,
  animalIds: readonly string[],
  at: Date,
): Promise<Map<string, FoodFact>> {
  const ids = [...animalIds]
  const statements: StatementRow[] = await db.query(
    `${reach}
     SELECT f.id, f.animal_id, a.accession, f.answer, f.reason, f.happened_at, f.happened_on::text AS happened_on,
            f.recorded_at, p.printed_name AS recorded_by_name
       FROM reach JOIN food_statements f ON f.animal_id = reach.id
       JOIN animals a ON a.id = f.animal_id JOIN people p ON p.id = f.recorded_by
      WHERE ${happenedBy('f', '$2')} ORDER BY f.happened_at DESC, f.recorded_at DESC, f.id DESC`,
    [ids, at],
  )
  if (statements.length === 0) return new Map()
  const splits: { animal_id: string; from_id: string; at: Date }[] = await db.query(
    `${reach}
     SELECT a.id AS animal_id, a.split_from_id AS from_id, coalesce(min(lower(s.during)), a.recorded_at) AS at
       FROM reach JOIN animals a ON a.id = reach.id LEFT JOIN stays s ON s.animal_id = a.id
      WHERE a.split_from_id IS NOT NULL GROUP BY a.id`,
    [ids],
  )
  const merges: { animal_id: string; other_id: string; at: Date }[] = await db.query(
    `${reach}
     SELECT c.animal_id, o.animal_id AS other_id, c.happened_at AS at
       FROM reach JOIN live_count_entries c ON c.animal_id = reach.id AND c.kind = 'merge-in'
       JOIN live_count_entries o ON o.transfer_id = c.transfer_id AND o.id <> c.id`,
    [ids],
  )
  const ties: FoodTies = {
    statements: statements.map((row) => ({
      id: row.id,
      animalId: row.animal_id,
      answer: row.answer,
      at: timeSeenAt(row, at).toISOString(),
    })),
    splits: splits.map((row) => ({
      animalId: row.animal_id,
      fromId: row.from_id,
      at: row.at.toISOString(),
    })),
    merges: merges.map((row) => ({
      animalId: row.animal_id,
      otherId: row.other_id,
      at: row.at.toISOString(),
    })),
  }
  const known = new Map<string, FoodFact>()
  for (const id of ids) {
    const found = foodOrRelease(id, ties, at.toISOString())
    const row = found && statements.find((one) => one.id === found.id)
    if (row)
      known.set(id, {
        answer: row.answer,
        accession: row.accession,
        reason: row.reason,
        happenedOn: row.happened_on,
        recordedAt: row.recorded_at.toISOString(),
        recordedBy: row.recorded_by_name,
      })
  }
  return known
}

/** An animal with every group that joined it, or joined those: what these were given it carries. */
export async function readJoined(db: Db, animalId: string): Promise<string[]> {
  const rows: { id: string }[] = await db.query(
    `WITH RECURSIVE joined AS (
       SELECT $1::uuid AS id
        UNION
       SELECT o.animal_id FROM joined j
         JOIN live_count_entries c ON c.animal_id = j.id AND c.kind = 'merge-in'
         JOIN live_count_entries o ON o.transfer_id = c.transfer_id AND o.id <> c.id)
     SELECT id FROM joined`,
    [animalId],
  )
  return rows.map(({ id }) => id)
}
