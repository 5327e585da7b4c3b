import { containing } from '../../platform/database/like.ts'
import type { WaterBodyKind } from '../../../shared/domain/connections/water-map.ts'
import type { EnclosureKind } from '../../../shared/domain/places/enclosure-kind.ts'
import type { Db } from '../../platform/database/db.ts'

export interface EnclosureReadRow {
  id: string
  code: string
  name: string
  kind: EnclosureKind
  area: string
  boundary: string | null
  air_space: string | null
  treatment_vessel: boolean
  fill_mark: string | null
  fill_mark_entered_value: string | null
  fill_mark_entered_unit: string | null
  fill_mark_litres: number | null
  description: string | null
  in_use_from: Date
  in_use_until: Date | null
  version: number
  water_body_id: string | null
}

const columns = `
  e.id, e.code, e.name, e.kind, e.area, e.boundary, e.air_space, e.treatment_vessel, e.fill_mark,
  e.fill_mark_entered_value, e.fill_mark_entered_unit, e.fill_mark_litres, e.description, e.in_use_from,
  e.in_use_until, e.version, b.id AS water_body_id`
const source = `enclosures e LEFT JOIN water_bodies b ON b.enclosure_id = e.id`

export async function readEnclosure(
  db: Db,
  by: { code: string } | { id: string },
): Promise<EnclosureReadRow | null> {
  const [column, value] = 'code' in by ? ['code', by.code] : ['id', by.id]
  const [row]: EnclosureReadRow[] = await db.query(
    `SELECT ${columns} FROM ${source} WHERE e.${column} = $1`,
    [value],
  )
  return row ?? null
}

export interface EnclosureFilter {
  q?: string
  kind?: string
  area?: string
  boundary?: string
  treatmentVessel?: 'yes' | 'no'
}

/** People look for QT-10 after QT-9: runs of digits sort by their number. */
const byCode = [`regexp_replace(e.code, '\\d+', '', 'g')`, 'length(e.code)', 'e.code']
const orders = { code: byCode, name: ['lower(e.name)'], area: ['lower(e.area)', ...byCode] } as const

const conditions = `
  ($1::text IS NULL OR plain_text(e.code) LIKE plain_text($1) OR plain_text(e.name) LIKE plain_text($1) OR plain_text(e.area) LIKE plain_text($1))
  AND ($2::text IS NULL OR e.kind = $2)
  AND ($3::text IS NULL OR e.area = $3)
  AND ($4::text IS NULL OR e.boundary = $4)
  AND ($5::boolean IS NULL OR e.treatment_vessel = $5)
  AND e.in_use_from <= $6 AND (e.in_use_until IS NULL OR e.in_use_until > $6)`

const valuesOf = (filter: EnclosureFilter, at: Date) => [
  containing(filter.q),
  filter.kind ?? null,
  filter.area ?? null,
  filter.boundary ?? null,
  filter.treatmentVessel === undefined ? null : filter.treatmentVessel === 'yes',
  at,
]

/** Every enclosure in use at an instant that fits the filter, by code. */
export function readEnclosures(db: Db, filter: EnclosureFilter, at: Date): Promise<EnclosureReadRow[]> {
  return db.query(
    `SELECT ${columns} FROM ${source} WHERE ${conditions} ORDER BY ${byCode.join(', ')}`,
    valuesOf(filter, at),
  )
}

/** One page of the same. */
export async function readEnclosurePage(
  db: Db,
  filter: EnclosureFilter & {
    sort?: keyof typeof orders
    direction?: 'asc' | 'desc'
    offset: number
    limit: number
  },
  at: Date,
): Promise<{ rows: EnclosureReadRow[]; total: number }> {
  const values = valuesOf(filter, at)
  const direction = filter.direction === 'desc' ? 'DESC' : 'ASC'
  const order = orders[filter.sort ?? 'code'].map((part) => `${part} ${direction}`).join(', ')
  const rows: EnclosureReadRow[] = await db.query(
    `SELECT ${columns} FROM ${source} WHERE ${conditions} ORDER BY ${order}, e.id LIMIT $7 OFFSET $8`,
    [...values, filter.limit, filter.offset],
  )
  const [count]: { n: string }[] = await db.query(
    `SELECT count(*) AS n FROM enclosures e WHERE ${conditions}`,
    values,
  )
  return { rows, total: Number(count?.n ?? 0) }
}

export interface WaterBodyReadRow {
  id: string
  code: string
  name: string
  kind: WaterBodyKind
  enclosure_id: string | null
  in_use_from: Date
  in_use_until: Date | null
  version: number
}

/** All bodies of water, or those with these ids; also those no longer in use. */
export function readWaterBodies(db: Db, ids?: readonly string[]): Promise<WaterBodyReadRow[]> {
  return db.query(
    `SELECT b.id, b.code, b.name, b.kind, b.enclosure_id, b.in_use_from, b.in_use_until, b.version
       FROM water_bodies b WHERE $1::uuid[] IS NULL OR b.id = ANY($1) ORDER BY b.code`,
    [ids ?? null],
  )
}

/** Parts of the house that have enclosures in use, for filters. */
export async function readAreas(db: Db, at: Date): Promise<string[]> {
  const rows: { area: string }[] = await db.query(
    `SELECT DISTINCT e.area FROM enclosures e
      WHERE e.in_use_from <= $1 AND (e.in_use_until IS NULL OR e.in_use_until > $1) ORDER BY e.area`,
    [at],
  )
  return rows.map((row) => row.area)
}
