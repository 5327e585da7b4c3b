import type { Db } from '../../platform/database/db.ts'

export interface StayReadRow {
  animal_id: string
  enclosure_id: string
  from_at: Date
  until_at: Date | null
}

/** Stays by animal, by enclosure, or by the time they touch; the earliest first. */
export function readStaysIn(
  db: Db,
  by: { animalIds?: readonly string[]; enclosureIds?: readonly string[]; from?: Date; until?: Date },
): Promise<StayReadRow[]> {
  return db.query(
    `SELECT s.animal_id, s.enclosure_id, lower(s.during) AS from_at, upper(s.during) AS until_at
       FROM stays s
      WHERE ($1::uuid[] IS NULL OR s.animal_id = ANY ($1)) AND ($2::uuid[] IS NULL OR s.enclosure_id = ANY ($2))
        AND s.during && tstzrange($3::timestamptz, $4::timestamptz)
      ORDER BY lower(s.during), s.animal_id`,
    [by.animalIds ?? null, by.enclosureIds ?? null, by.from ?? null, by.until ?? null],
  )
}
