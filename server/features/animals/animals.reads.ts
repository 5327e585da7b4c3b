import type { AnimalForm, BirthKind, LifeStage, Sex } from '../../../shared/domain/animals/description.ts'
import type { QuarantineKindName, TaxonGroup } from '../../../shared/domain/taxa/taxon-group.ts'
import type { Db } from '../../platform/database/db.ts'
import { happenedBy } from '../../platform/database/happened-by.ts'
import { containing } from '../../platform/database/like.ts'
import { knownOn } from './known-on.ts'
import { lockStands } from './lock-stands.ts'

/** An animal or group as it stood at an instant. */
export interface AnimalReadRow {
  id: string
  accession: string
  form: AnimalForm
  name: string | null
  sex: Sex
  stage: LifeStage
  birth_kind: BirthKind | null
  birth_date: string | null
  birth_approximate: boolean
  split_from_id: string | null
  version: number
  taxon_id: string
  scientific_name: string
  common_name: string
  taxon_group: TaxonGroup
  quarantine_kind: QuarantineKindName
  enclosure_id: string | null
  enclosure_code: string
  enclosure_name: string
  enclosure_area: string
  enclosure_boundary: string | null
  since: Date | null
  since_known_on: string | null
  ledger: number
  statement_basis: 'counted' | 'estimated' | null
  statement_low: number
  statement_high: number
  moved_since: number
  weight_id: string | null
  weight_kg: number | null
  weight_value: string
  weight_unit: string
  weight_animals: number
  weight_basis: 'measured' | 'estimated'
  weight_at: Date
  weight_on: string
  lock: 'none' | 'boundary' | 'all'
  open_discrepancies: number
  total: number
}

export interface AnimalsFilter {
  at: Date
  ids?: readonly string[]
  accession?: string
  enclosureIds?: readonly string[]
  q?: string
  group?: string
  kind?: string
  form?: string
  taxonId?: string
  place?: string
  area?: string
  state?: 'here' | 'gone' | 'all'
  sort?: keyof typeof sortColumns
  direction?: 'asc' | 'desc'
  offset?: number
  limit?: number
}

const sortColumns = {
  accession: 'r.accession',
  name: 'lower(r.common_name), lower(r.name)',
  taxon: 'lower(r.scientific_name)',
  place: 'r.enclosure_code',
  count: 'r.ledger',
  weight: 'r.weight_kg',
  arrived: 'r.since',
} as const

/**
 * Everything about an animal at the instant $1, in one row: description, place, count, weight, locks. It stands where its
 * last move that had happened by then put it, also when that was written down on a device whose clock is fast.
 */
const asOf = `
  SELECT a.id, a.accession, a.form, a.split_from_id, a.version,
         CASE WHEN d.id IS NULL THEN a.name ELSE d.name END AS name,
         coalesce(d.sex, a.sex) AS sex, coalesce(d.stage, a.stage) AS stage,
         CASE WHEN d.id IS NULL THEN a.birth_kind ELSE d.birth_kind END AS birth_kind,
         CASE WHEN d.id IS NULL THEN a.birth_date ELSE d.birth_date END AS birth_date,
         coalesce(d.birth_approximate, a.birth_approximate) AS birth_approximate,
         t.id AS taxon_id, t.scientific_name, t.common_name, t.taxon_group, t.quarantine_kind,
         e.id AS enclosure_id, e.code AS enclosure_code, e.name AS enclosure_name, e.area AS enclosure_area,
         e.boundary AS enclosure_boundary, lower(s.during) AS since,
         coalesce(c.ledger, 0)::int AS ledger,
         n.basis AS statement_basis, n.low AS statement_low, n.high AS statement_high,
         coalesce(c.moved_since, 0)::int AS moved_since,
         w.id AS weight_id, w.weight_kg, w.entered_value AS weight_value, w.entered_unit AS weight_unit,
         w.animals_weighed AS weight_animals, w.basis AS weight_basis, w.happened_at AS weight_at,
         w.happened_on::text AS weight_on,
         (SELECT count(*)::int FROM discrepancies q
           WHERE q.animal_id = a.id AND q.recorded_at <= $1
             AND NOT EXISTS (SELECT 1 FROM discrepancy_resolutions z
                              WHERE z.discrepancy_id = q.id AND z.recorded_at <= $1)) AS open_discrepancies
    FROM animals a
    LEFT JOIN LATERAL (SELECT d.* FROM animal_descriptions d WHERE d.animal_id = a.id AND ${happenedBy('d', '$1')}
                        ORDER BY d.happened_at DESC, d.position DESC LIMIT 1) d ON true
    JOIN taxa t ON t.id = coalesce(d.taxon_id, a.taxon_id)
    CROSS JOIN LATERAL (SELECT greatest($1::timestamptz, max(m.happened_at)) AS at FROM live_moves m
                         WHERE m.animal_id = a.id AND m.happened_at > $1 AND ${happenedBy('m', '$1')}) p
    LEFT JOIN stays s ON s.animal_id = a.id AND s.during @> p.at
    LEFT JOIN enclosures e ON e.id = s.enclosure_id
    LEFT JOIN LATERAL (SELECT n.* FROM count_statements n WHERE n.animal_id = a.id AND ${happenedBy('n', '$1')}
                        ORDER BY n.happened_at DESC, n.recorded_at DESC, n.id DESC LIMIT 1) n ON true
    LEFT JOIN LATERAL (SELECT sum(x.delta) AS ledger,
                              sum(x.delta) FILTER (WHERE x.happened_at > n.happened_at) AS moved_since
                         FROM live_count_entries x WHERE x.animal_id = a.id AND ${happenedBy('x', '$1')}) c ON true
    LEFT JOIN LATERAL (SELECT w.* FROM live_weights w WHERE w.animal_id = a.id AND ${happenedBy('w', '$1')}
                        ORDER BY w.happened_at DESC, w.recorded_at DESC, w.id DESC LIMIT 1) w ON true`

/**
 * What keeps an animal where it is: of two kinds the stronger, `all`, which sorts first. Asked only of the rows that are
 * shown, since every lift is held against the record behind it.
 */
const lockOf = `coalesce((
  SELECT min(k.kind) FROM movement_locks k WHERE k.animal_id = r.id AND ${lockStands('k', '$1')}), 'none')`

/** Animals and groups at an instant, by whatever filter; `total` of each row counts all that fit. */
export async function readAnimals(db: Db, filter: AnimalsFilter): Promise<AnimalReadRow[]> {
  const values: unknown[] = [filter.at]
  const put = (value: unknown) => `$${String(values.push(value))}`
  const before: string[] = []
  const after: string[] = []
  if (filter.ids) before.push(`a.id = ANY (${put(filter.ids)}::uuid[])`)
  if (filter.accession !== undefined) before.push(`a.accession = ${put(filter.accession)}`)
  if (filter.form) before.push(`a.form = ${put(filter.form)}`)
  if (filter.enclosureIds) before.push(`s.enclosure_id = ANY (${put(filter.enclosureIds)}::uuid[])`)
  if (filter.taxonId) before.push(`t.id = ${put(filter.taxonId)}`)
  if (filter.group) before.push(`t.taxon_group = ${put(filter.group)}`)
  if (filter.kind) before.push(`t.quarantine_kind = ${put(filter.kind)}`)
  if (filter.place) before.push(`e.code = ${put(filter.place)}`)
  if (filter.area) before.push(`e.area = ${put(filter.area)}`)
  if (filter.state === 'here') before.push('s.enclosure_id IS NOT NULL')
  if (filter.state === 'gone') before.push('s.enclosure_id IS NULL')
  for (const word of (filter.q ?? '').split(/\s+/).filter(Boolean)) {
    const like = put(containing(word))
    const key = word.toUpperCase().replace(/[^0-9A-Z]/g, '')
    const byMark = key
      ? `OR EXISTS (SELECT 1 FROM identifiers i WHERE i.animal_id = r.id AND i.value_key LIKE ${put(`%${key}%`)})`
      : ''
    after.push(`(plain_text(r.accession) LIKE plain_text(${like}) OR plain_text(r.name) LIKE plain_text(${like}) OR plain_text(r.common_name) LIKE plain_text(${like})
      OR plain_text(r.scientific_name) LIKE plain_text(${like}) OR plain_text(r.enclosure_code) LIKE plain_text(${like}) OR plain_text(r.enclosure_name) LIKE plain_text(${like})
      OR plain_text(r.enclosure_area) LIKE plain_text(${like}) ${byMark})`)
  }
  const direction = filter.direction === 'desc' ? 'DESC' : 'ASC'
  const order = sortColumns[filter.sort ?? 'accession']
    .split(', ')
    .map((column) => `${column} ${direction} NULLS LAST`)
  return db.query(
    `SELECT r.*, ${lockOf} AS lock, ${knownOn('r.id', 'r.since')} AS since_known_on,
            count(*) OVER ()::int AS total
       FROM (${asOf} ${before.length > 0 ? `WHERE ${before.join(' AND ')}` : ''}) r
      ${after.length > 0 ? `WHERE ${after.join(' AND ')}` : ''}
      ORDER BY ${order.join(', ')}, r.accession
      LIMIT ${put(filter.limit ?? null)} OFFSET ${put(filter.offset ?? 0)}`,
    values,
  )
}
