import { updateVersioned } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Animal, AnimalDescription, Identifier, IdentifierEnd } from './animal.entity.ts'

/** Locks the heads of animals, in one order, until the transaction ends. */
export async function lockAnimals(tx: Tx, ids: readonly string[]): Promise<Map<string, Animal>> {
  const locked = new Map<string, Animal>()
  for (const id of [...new Set(ids)].sort()) {
    const row = await tx.manager.findOne(Animal, { where: { id }, lock: { mode: 'pessimistic_write' } })
    if (row) locked.set(id, row)
  }
  return locked
}

export async function findAnimalId(tx: Tx, accession: string): Promise<string | null> {
  return (await tx.manager.findOneBy(Animal, { accession }))?.id ?? null
}

export function findAnimal(tx: Tx, id: string): Promise<Animal | null> {
  return tx.manager.findOneBy(Animal, { id })
}

export async function insertAnimal(tx: Tx, row: Animal): Promise<void> {
  await tx.manager.insert(Animal, row)
}

export async function insertDescription(tx: Tx, row: AnimalDescription): Promise<void> {
  await tx.manager.insert(AnimalDescription, row)
}

const described = `d.taxon_id AS "taxonId", d.name, d.sex, d.stage, d.birth_kind AS "birthKind",
  d.birth_date AS "birthDate", d.birth_approximate AS "birthApproximate"`

export type Description = Pick<
  AnimalDescription,
  'taxonId' | 'name' | 'sex' | 'stage' | 'birthKind' | 'birthDate' | 'birthApproximate'
>

/** The description in force at an instant; the earliest one before that. */
export async function descriptionAt(tx: Tx, animalId: string, at: Date): Promise<Description | null> {
  const [row]: Description[] = await tx.manager.query(
    `SELECT ${described} FROM animal_descriptions d WHERE d.animal_id = $1
      ORDER BY d.happened_at <= $2 DESC, CASE WHEN d.happened_at <= $2 THEN d.happened_at END DESC,
               d.happened_at, d.position DESC LIMIT 1`,
    [animalId, at],
  )
  return row ?? null
}

/** Makes the head of an animal say what its newest description says. */
export async function takeNewestDescription(tx: Tx, key: { id: string; version: number }): Promise<void> {
  const [newest]: [Description] = await tx.manager.query(
    `SELECT ${described} FROM animal_descriptions d WHERE d.animal_id = $1
      ORDER BY d.happened_at DESC, d.position DESC LIMIT 1`,
    [key.id],
  )
  await updateVersioned(tx, Animal, key, newest)
}

export async function insertIdentifier(tx: Tx, row: Identifier): Promise<void> {
  await tx.manager.insert(Identifier, row)
}

export function findIdentifier(tx: Tx, id: string): Promise<Identifier | null> {
  return tx.manager.findOneBy(Identifier, { id })
}

/** Accession of another animal that carries the mark now; null when none does. */
export async function whoCarries(tx: Tx, valueKey: string, otherThan: string): Promise<string | null> {
  const [row]: { accession: string }[] = await tx.manager.query(
    `SELECT a.accession FROM identifiers i JOIN animals a ON a.id = i.animal_id
      WHERE i.value_key = $1 AND i.animal_id <> $2
        AND NOT EXISTS (SELECT 1 FROM identifier_ends x WHERE x.identifier_id = i.id)
      ORDER BY i.recorded_at LIMIT 1`,
    [valueKey, otherThan],
  )
  return row?.accession ?? null
}

/** Marks are compared one at a time, so that two people cannot put one on two animals at the same moment. */
export async function lockMark(tx: Tx, valueKey: string): Promise<void> {
  await tx.manager.query(`SELECT pg_advisory_xact_lock(hashtextextended('mark ' || $1, 0))`, [valueKey])
}

export function hasIdentifierEnded(tx: Tx, identifierId: string): Promise<boolean> {
  return tx.manager.existsBy(IdentifierEnd, { identifierId })
}

export async function insertIdentifierEnd(tx: Tx, row: IdentifierEnd): Promise<void> {
  await tx.manager.insert(IdentifierEnd, row)
}

/** The animals in some enclosures at an instant, but for one. */
export async function findOthersIn(
  tx: Tx,
  enclosureIds: readonly string[],
  given: { at: Date; but: string | null },
): Promise<string[]> {
  const rows: { animal_id: string }[] = await tx.manager.query(
    `SELECT s.animal_id FROM stays s
      WHERE s.enclosure_id = ANY ($1) AND s.during @> $2::timestamptz AND s.animal_id IS DISTINCT FROM $3`,
    [enclosureIds, given.at, given.but],
  )
  return rows.map((row) => row.animal_id)
}

/** Whether an animal was cleared while it stood where it stands at an instant. */
export async function wasClearedHere(tx: Tx, animalId: string, at: Date): Promise<boolean> {
  const rows: unknown[] = await tx.manager.query(
    `SELECT 1 FROM stays s
       JOIN movement_locks k ON k.animal_id = s.animal_id AND k.kind = 'boundary'
       JOIN standing_lock_lifts f ON f.lock_id = k.id
      WHERE s.animal_id = $1 AND s.during @> $2::timestamptz AND f.happened_at >= lower(s.during)
        AND f.happened_at <= $2`,
    [animalId, at],
  )
  return rows.length > 0
}

/**
 * Where an animal has been without a break inside the quarantine boundary that it stands in, from when each time; none
 * when it stands in none, or was cleared since it came.
 */
export async function findArrivalsInBoundary(
  tx: Tx,
  animalId: string,
  at: Date,
): Promise<{ enclosure_id: string; since: Date }[]> {
  return tx.manager.query(
    `WITH RECURSIVE run AS (
       SELECT s.animal_id, s.enclosure_id, lower(s.during) AS since, e.boundary
         FROM stays s JOIN enclosures e ON e.id = s.enclosure_id
        WHERE s.animal_id = $1 AND s.during @> $2::timestamptz AND e.boundary IS NOT NULL
       UNION ALL
       SELECT s.animal_id, s.enclosure_id, lower(s.during), e.boundary
         FROM run r
         JOIN stays s ON s.animal_id = r.animal_id AND upper(s.during) = r.since
         JOIN enclosures e ON e.id = s.enclosure_id AND e.boundary = r.boundary)
     SELECT run.enclosure_id, run.since FROM run
      WHERE NOT EXISTS (
        SELECT 1 FROM movement_locks k JOIN standing_lock_lifts f ON f.lock_id = k.id
         WHERE k.animal_id = $1 AND k.kind = 'boundary' AND f.happened_at <= $2
           AND f.happened_at >= (SELECT min(first.since) FROM run first))`,
    [animalId, at],
  )
}

export interface EnclosureRow {
  id: string
  code: string
  boundary: string | null
  in_use_until: Date | null
  treatment_vessel: boolean
}

/** Enclosures as far as moves are judged by them. */
export async function findEnclosures(tx: Tx, ids: readonly string[]): Promise<Map<string, EnclosureRow>> {
  const rows: EnclosureRow[] = await tx.manager.query(
    `SELECT e.id, e.code, e.boundary, e.in_use_until, e.treatment_vessel FROM enclosures e WHERE e.id = ANY ($1)`,
    [ids],
  )
  return new Map(rows.map((row) => [row.id, row]))
}
