import type { DiscrepancyKind, DiscrepancyOutcome } from '../../../shared/domain/animals/discrepancy.ts'
import type {
  CarcassPlace,
  CarcassState,
  DeathKind,
  IdentifierKind,
} from '../../../shared/domain/animals/description.ts'
import type { Db } from '../../platform/database/db.ts'
import { knownOn } from './known-on.ts'
import { lockStands } from './lock-stands.ts'

/** The times of a fact and its recorder's name, as every read here gives them. */
export interface FactRow {
  id: string
  happened_at: Date
  happened_on: string
  recorded_at: Date
  recorded_by_name: string | null
}

/** What a row adds that a transaction of the register may have written. */
export interface KnownOnRow {
  known_on: string | null
}

/** What a struck-out row adds. */
export interface StruckRow {
  struck_reason: string | null
  struck_at: Date | null
  struck_by_name: string | null
}

const fact = (x: string) =>
  `${x}.id, ${x}.happened_at, ${x}.happened_on::text AS happened_on, ${x}.recorded_at,
   (SELECT p.printed_name FROM people p WHERE p.id = ${x}.recorded_by) AS recorded_by_name`
const struck = `v.reason AS struck_reason, v.recorded_at AS struck_at,
   (SELECT p.printed_name FROM people p WHERE p.id = v.recorded_by) AS struck_by_name`
const newestFirst = (x: string) => `ORDER BY ${x}.happened_at DESC, ${x}.recorded_at DESC, ${x}.id DESC`

export interface WeightReadRow extends FactRow, StruckRow {
  entered_value: string
  entered_unit: string
  animals_weighed: number
  weight_kg: number
  basis: 'measured' | 'estimated'
  method: string | null
  doubt: string | null
  confirmed_reason: string | null
}

export function readWeights(db: Db, by: { animalId?: string; id?: string }): Promise<WeightReadRow[]> {
  return db.query(
    `SELECT ${fact('w')}, w.entered_value, w.entered_unit, w.animals_weighed, w.weight_kg, w.basis, w.method, w.doubt,
            w.confirmed_reason, ${struck}
       FROM weights w LEFT JOIN animal_voids v ON v.weight_id = w.id
      WHERE ($1::uuid IS NULL OR w.animal_id = $1) AND ($2::uuid IS NULL OR w.id = $2) ${newestFirst('w')}`,
    [by.animalId ?? null, by.id ?? null],
  )
}

export interface PlaceReadRow {
  id: string
  code: string
  name: string
  area: string
  boundary: string | null
}

export interface MoveReadRow extends FactRow, KnownOnRow, StruckRow {
  kind: 'arrival' | 'move' | 'departure'
  from_place: PlaceReadRow | null
  to_place: PlaceReadRow | null
  reason: string | null
  documented_transfer: string | null
  against_rule: string | null
}

const placeJson = (e: string) =>
  `CASE WHEN ${e}.id IS NOT NULL THEN json_build_object('id', ${e}.id, 'code', ${e}.code, 'name', ${e}.name,
     'area', ${e}.area, 'boundary', ${e}.boundary) END`

export function readMoves(db: Db, animalId: string): Promise<MoveReadRow[]> {
  return db.query(
    `SELECT ${fact('m')}, m.kind, ${placeJson('f')} AS from_place, ${placeJson('t')} AS to_place, m.reason,
            m.documented_transfer, m.against_rule, ${knownOn('$1', 'm.happened_at')} AS known_on, ${struck}
       FROM moves m
       LEFT JOIN enclosures f ON f.id = m.from_enclosure_id
       LEFT JOIN enclosures t ON t.id = m.to_enclosure_id
       LEFT JOIN animal_voids v ON v.move_id = m.id
      WHERE m.animal_id = $1 ${newestFirst('m')}`,
    [animalId],
  )
}

export interface CountLineReadRow extends FactRow, KnownOnRow, StruckRow {
  kind: string
  delta: number
  balance: number | null
  other: string | null
  reason: string | null
}

export function readCountLines(db: Db, animalId: string): Promise<CountLineReadRow[]> {
  return db.query(
    `SELECT ${fact('c')}, c.kind, c.delta, b.balance, c.reason, ${struck},
            ${knownOn('$1', 'c.happened_at')} AS known_on,
            (SELECT o.accession FROM count_entries h JOIN animals o ON o.id = h.animal_id
              WHERE h.transfer_id = c.transfer_id AND h.id <> c.id LIMIT 1) AS other
       FROM count_entries c
       LEFT JOIN animal_voids v ON v.count_entry_id = c.id
       LEFT JOIN (SELECT l.id, sum(l.delta) OVER (ORDER BY l.happened_at, l.delta < 0, l.id
                                                  ROWS BETWEEN UNBOUNDED PRECEDING AND CURRENT ROW)::int AS balance
                    FROM live_count_entries l WHERE l.animal_id = $1) b ON b.id = c.id
      WHERE c.animal_id = $1 ORDER BY c.happened_at DESC, c.delta < 0 DESC, c.id DESC`,
    [animalId],
  )
}

export interface CountStatementReadRow extends FactRow {
  basis: 'counted' | 'estimated'
  low: number
  high: number
  note: string | null
}

export function readCountStatements(db: Db, animalId: string): Promise<CountStatementReadRow[]> {
  return db.query(
    `SELECT ${fact('s')}, s.basis, s.low, s.high, s.note FROM count_statements s WHERE s.animal_id = $1
      ${newestFirst('s')}`,
    [animalId],
  )
}

export interface DeathReadRow extends FactRow, StruckRow {
  animal_id: string
  accession: string
  kind: DeathKind
  seen_count: number
  posted_count: number
  place: PlaceReadRow | null
  carcass_state: CarcassState | null
  carcass_place: CarcassPlace | null
  note: string | null
}

export function readDeaths(
  db: Db,
  by: { animalIds?: readonly string[]; id?: string },
): Promise<DeathReadRow[]> {
  return db.query(
    `SELECT ${fact('d')}, d.animal_id, a.accession, d.kind, d.seen_count, d.posted_count, ${placeJson('e')} AS place,
            d.carcass_state, d.carcass_place, d.note, ${struck}
       FROM deaths d JOIN animals a ON a.id = d.animal_id
       LEFT JOIN enclosures e ON e.id = d.enclosure_id
       LEFT JOIN animal_voids v ON v.death_id = d.id
      WHERE ($1::uuid[] IS NULL OR d.animal_id = ANY ($1)) AND ($2::uuid IS NULL OR d.id = $2) ${newestFirst('d')}`,
    [by.animalIds ?? null, by.id ?? null],
  )
}

export interface IdentifierReadRow extends FactRow {
  kind: IdentifierKind
  value: string
  place: string | null
  ended_reason: string | null
  ended_at: Date | null
}

export function readIdentifiers(db: Db, animalId: string): Promise<IdentifierReadRow[]> {
  return db.query(
    `SELECT ${fact('i')}, i.kind, i.value, i.place, x.reason AS ended_reason, x.happened_at AS ended_at
       FROM identifiers i LEFT JOIN identifier_ends x ON x.identifier_id = i.id
      WHERE i.animal_id = $1 ${newestFirst('i')}`,
    [animalId],
  )
}

export interface LockReadRow {
  id: string
  animal_id: string
  kind: 'boundary' | 'all'
  source_kind: string
  source_id: string
  source_label: string
  reason: string
  happened_at: Date
}

const locksInForce = (of: 'animal_id' | 'source_id') => `
  SELECT k.id, k.animal_id, k.kind, k.source_kind, k.source_id, k.source_label, k.reason, k.happened_at
    FROM movement_locks k
   WHERE k.${of} = ANY ($1) AND ${lockStands('k', '$2')}
   ORDER BY k.happened_at, k.id`

/** Locks of some animals in force at an instant. */
export function readLocks(db: Db, animalIds: readonly string[], at: Date): Promise<LockReadRow[]> {
  return db.query(locksInForce('animal_id'), [animalIds, at])
}

/** Locks that some cases or clock events put on, in force at an instant, whosever they are. */
export function readLocksFrom(db: Db, sourceIds: readonly string[], at: Date): Promise<LockReadRow[]> {
  return db.query(locksInForce('source_id'), [sourceIds, at])
}

export interface DiscrepancyReadRow extends FactRow {
  animal_id: string
  accession: string
  common_name: string
  name: string | null
  kind: DiscrepancyKind
  for_role: 'veterinarian' | 'registrar'
  source_kind: string
  source_id: string
  facts: Record<string, string | number>
  outcome: DiscrepancyOutcome | null
  resolution_reason: string
  resolved_at: Date
  resolved_by_name: string | null
  total: number
}

export interface DiscrepanciesFilter {
  id?: string
  animalIds?: readonly string[]
  state?: 'open' | 'all'
  forRole?: string
  offset?: number
  limit?: number
}

export function readDiscrepancies(db: Db, filter: DiscrepanciesFilter): Promise<DiscrepancyReadRow[]> {
  return db.query(
    `SELECT ${fact('q')}, q.animal_id, a.accession, t.common_name, a.name, q.kind, q.for_role, q.source_kind,
            q.source_id, q.facts, z.outcome, z.reason AS resolution_reason, z.recorded_at AS resolved_at,
            (SELECT p.printed_name FROM people p WHERE p.id = z.recorded_by) AS resolved_by_name,
            count(*) OVER ()::int AS total
       FROM discrepancies q JOIN animals a ON a.id = q.animal_id JOIN taxa t ON t.id = a.taxon_id
       LEFT JOIN discrepancy_resolutions z ON z.discrepancy_id = q.id
      WHERE ($1::uuid IS NULL OR q.id = $1) AND ($2::uuid[] IS NULL OR q.animal_id = ANY ($2))
        AND ($3::text IS NULL OR q.for_role = $3) AND ($4::boolean OR z.id IS NULL)
      ORDER BY q.recorded_at DESC, q.id DESC LIMIT $5 OFFSET $6`,
    [
      filter.id ?? null,
      filter.animalIds ?? null,
      filter.forRole ?? null,
      filter.state === 'all' || filter.id !== undefined,
      filter.limit ?? null,
      filter.offset ?? 0,
    ],
  )
}

export async function countOpenDiscrepancies(
  db: Db,
  sourceKind: string,
  sourceIds: readonly string[],
): Promise<number> {
  const [row]: [{ count: number }] = await db.query(
    `SELECT count(*)::int AS count FROM discrepancies q WHERE q.source_kind = $1 AND q.source_id = ANY ($2::uuid[])
        AND NOT EXISTS (SELECT 1 FROM discrepancy_resolutions z WHERE z.discrepancy_id = q.id)`,
    [sourceKind, sourceIds],
  )
  return row.count
}

export interface AnimalTies {
  split_from: string | null
  split_into: string[]
  arrived_at: Date | null
  arrived_known_on: string | null
}

/** Family and history of one animal that its sheet names. */
export async function readAnimalTies(db: Db, animalId: string): Promise<AnimalTies> {
  const [row]: [AnimalTies] = await db.query(
    `SELECT (SELECT f.accession FROM animals f WHERE f.id = a.split_from_id) AS split_from,
            coalesce((SELECT array_agg(c.accession ORDER BY c.accession) FROM animals c
                       WHERE c.split_from_id = a.id), '{}') AS split_into,
            i.arrived_at, ${knownOn('a.id', 'i.arrived_at')} AS arrived_known_on
       FROM animals a
       CROSS JOIN LATERAL (SELECT min(m.happened_at) AS arrived_at FROM live_moves m WHERE m.animal_id = a.id) i
      WHERE a.id = $1`,
    [animalId],
  )
  return row
}

export async function enclosureExists(db: Db, code: string): Promise<boolean> {
  const rows: unknown[] = await db.query(`SELECT 1 FROM enclosures e WHERE e.code = $1`, [code])
  return rows.length > 0
}
