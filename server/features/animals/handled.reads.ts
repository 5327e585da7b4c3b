import type { Db } from '../../platform/database/db.ts'
import { happenedBy, timeSeenAt } from '../../platform/database/happened-by.ts'

export interface WhereaboutsRow {
  animal_id: string
  /** The animal itself, or the group that it was part of then. */
  as_id: string
  enclosure_id: string
  from_at: Date
  until_at: Date | null
}

/**
 * Where animals were since an instant, each with the time before it was taken out of a group as the whereabouts of that
 * group: what was seen of the group then was seen of it.
 */
export function readWhereabouts(db: Db, animalIds: readonly string[], from: Date): Promise<WhereaboutsRow[]> {
  return db.query(
    `WITH RECURSIVE lines AS (
       SELECT a.id AS animal_id, a.id AS as_id, a.split_from_id, NULL::timestamptz AS ended
         FROM animals a WHERE a.id = ANY ($1::uuid[])
       UNION ALL
       SELECT l.animal_id, p.id, p.split_from_id,
              least(l.ended, (SELECT min(lower(s.during)) FROM stays s WHERE s.animal_id = l.as_id))
         FROM lines l JOIN animals p ON p.id = l.split_from_id)
     SELECT l.animal_id, l.as_id, s.enclosure_id, lower(s.during) AS from_at,
            least(upper(s.during), l.ended) AS until_at
       FROM lines l
       JOIN stays s ON s.animal_id = l.as_id
      WHERE s.during && tstzrange($2, NULL) AND (l.ended IS NULL OR lower(s.during) < l.ended)
      ORDER BY l.animal_id, lower(s.during)`,
    [[...animalIds], from],
  )
}

/** Handling of animals that a ledger knows of. */
export interface HandlingRow {
  what: 'moves' | 'weights' | 'joined groups'
  at: Date
}

/**
 * Moves, measured weights and joined groups of animals since an instant; an estimated weight needs no hand.
 *
 * @param exceptInto a treatment vessel whose own use is not counted: moves into and out of it are the handling of baths
 */
export async function readHandling(
  db: Db,
  animalIds: readonly string[],
  { from, at, exceptInto }: { from: Date; at: Date; exceptInto: string | null },
): Promise<HandlingRow[]> {
  const rows: { what: HandlingRow['what']; happened_at: Date; recorded_at: Date }[] = await db.query(
    `SELECT 'moves' AS what, m.happened_at, m.recorded_at FROM live_moves m
      WHERE m.animal_id = ANY ($1::uuid[]) AND NOT m.automatic AND m.happened_at >= $2 AND ${happenedBy('m', '$3')}
        AND ($4::uuid IS NULL OR (m.to_enclosure_id IS DISTINCT FROM $4 AND m.from_enclosure_id IS DISTINCT FROM $4))
     UNION ALL
     SELECT 'weights', w.happened_at, w.recorded_at FROM live_weights w
      WHERE w.animal_id = ANY ($1::uuid[]) AND w.basis = 'measured'
        AND w.happened_at >= $2 AND ${happenedBy('w', '$3')}
     UNION ALL
     SELECT 'joined groups', c.happened_at, c.recorded_at FROM live_count_entries c
      WHERE c.animal_id = ANY ($1::uuid[]) AND c.kind = 'merge-in'
        AND c.happened_at >= $2 AND ${happenedBy('c', '$3')}`,
    [[...animalIds], from, at, exceptInto],
  )
  return rows.map((row) => ({ what: row.what, at: timeSeenAt(row, at) }))
}
