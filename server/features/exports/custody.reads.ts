import type {
  AnimalForm,
  BirthKind,
  IdentifierKind,
  LifeStage,
  Sex,
} from '../../../shared/domain/animals/description.ts'
import type { CountKind } from '../../../shared/domain/ledger/count-entry.ts'
import type { Db } from '../../platform/database/db.ts'

export interface SubjectReadRow {
  id: string
  accession: string
  form: AnimalForm
  name: string | null
  common_name: string
  scientific_name: string
  sex: Sex
  stage: LifeStage
  birth_kind: BirthKind | null
  birth_date: string | null
  birth_approximate: boolean
  place_code: string | null
  place_name: string | null
}

/** The animal or group of a history, as it is described now. */
export async function readSubject(db: Db, accession: string): Promise<SubjectReadRow | null> {
  const [row]: SubjectReadRow[] = await db.query(
    `SELECT a.id, a.accession, a.form, a.name, x.common_name, x.scientific_name, a.sex, a.stage, a.birth_kind,
            a.birth_date, a.birth_approximate, e.code AS place_code, e.name AS place_name
       FROM animals a
       JOIN taxa x ON x.id = a.taxon_id
       LEFT JOIN stays s ON s.animal_id = a.id AND upper_inf(s.during)
       LEFT JOIN enclosures e ON e.id = s.enclosure_id
      WHERE a.accession = $1`,
    [accession],
  )
  return row ?? null
}

/** Times, writer and striking-out of a ledger row, the same columns for each kind of row. */
export interface RecordedReadRow {
  id: string
  happened_at: Date
  happened_on: string
  recorded_at: Date
  recorded_by_name: string | null
  struck_reason: string | null
  struck_at: Date | null
  struck_by_name: string | null
  remark: string | null
}

const recorded = `
  r.id, r.happened_at, r.happened_on::text AS happened_on, r.recorded_at, p.printed_name AS recorded_by_name`
const struck = `v.reason AS struck_reason, v.recorded_at AS struck_at, w.printed_name AS struck_by_name`
const notStruck = `NULL::text AS struck_reason, NULL::timestamptz AS struck_at, NULL::text AS struck_by_name`

export interface CountEntryReadRow extends RecordedReadRow {
  kind: CountKind
  delta: number
  transfer_id: string | null
  other_accession: string | null
}

export function readCountEntries(db: Db, animalId: string): Promise<CountEntryReadRow[]> {
  return db.query(
    `SELECT ${recorded}, ${struck}, r.reason AS remark, r.kind, r.delta, r.transfer_id,
            (SELECT a.accession FROM count_entries o JOIN animals a ON a.id = o.animal_id
              WHERE o.transfer_id = r.transfer_id AND o.animal_id <> r.animal_id LIMIT 1) AS other_accession
       FROM count_entries r
       LEFT JOIN people p ON p.id = r.recorded_by
       LEFT JOIN animal_voids v ON v.count_entry_id = r.id
       LEFT JOIN people w ON w.id = v.recorded_by
      WHERE r.animal_id = $1`,
    [animalId],
  )
}

export interface MoveReadRow extends RecordedReadRow {
  from_enclosure_id: string | null
  to_enclosure_id: string | null
}

export function readMoves(db: Db, animalId: string): Promise<MoveReadRow[]> {
  return db.query(
    `SELECT ${recorded}, ${struck}, coalesce(r.documented_transfer, r.reason) AS remark, r.from_enclosure_id,
            r.to_enclosure_id
       FROM moves r
       LEFT JOIN people p ON p.id = r.recorded_by
       LEFT JOIN animal_voids v ON v.move_id = r.id
       LEFT JOIN people w ON w.id = v.recorded_by
      WHERE r.animal_id = $1`,
    [animalId],
  )
}

export interface StatementReadRow extends RecordedReadRow {
  basis: 'counted' | 'estimated'
  low: number
  high: number
}

export function readStatements(db: Db, animalId: string): Promise<StatementReadRow[]> {
  return db.query(
    `SELECT ${recorded}, ${notStruck}, r.note AS remark, r.basis, r.low, r.high
       FROM count_statements r LEFT JOIN people p ON p.id = r.recorded_by WHERE r.animal_id = $1`,
    [animalId],
  )
}

export interface IdentifierReadRow {
  kind: IdentifierKind
  value: string
  place: string | null
  valid_from: string
  valid_until: string | null
}

export function readIdentifiers(db: Db, animalId: string): Promise<IdentifierReadRow[]> {
  return db.query(
    `SELECT i.kind, i.value, i.place, i.happened_on::text AS valid_from, x.happened_on::text AS valid_until
       FROM identifiers i LEFT JOIN identifier_ends x ON x.identifier_id = i.id
      WHERE i.animal_id = $1 ORDER BY i.happened_at, i.id`,
    [animalId],
  )
}

/** Codes and names of enclosures by id. */
export async function readEnclosureNames(
  db: Db,
  ids: readonly string[],
): Promise<Map<string, { code: string; name: string }>> {
  const rows: { id: string; code: string; name: string }[] = await db.query(
    `SELECT e.id, e.code, e.name FROM enclosures e WHERE e.id = ANY($1::uuid[])`,
    [ids],
  )
  return new Map(rows.map(({ id, code, name }) => [id, { code, name }]))
}
