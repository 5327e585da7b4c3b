import { containing } from '../../platform/database/like.ts'
import type { WaterEventKind } from '../../../shared/domain/places/water-event-kind.ts'
import { readingParameters } from '../../../shared/domain/readings/parameters.ts'
import type { PhScale, ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import type { Db } from '../../platform/database/db.ts'
import { happenedBy } from '../../platform/database/happened-by.ts'

export interface RecordedReadRow {
  id: string
  happened_at: Date
  happened_on: string
  recorded_at: Date
  recorded_by_name: string | null
  void_reason: string | null
  void_at: Date | null
  void_by_name: string | null
}

/** Columns and joins that every ledger row is shown with; `r` is the row, `column` names it in the voids. */
const recorded = (column: string) => ({
  columns: `r.id, r.happened_at, r.happened_on::text, r.recorded_at, p.printed_name AS recorded_by_name,
    v.reason AS void_reason, v.recorded_at AS void_at, w.printed_name AS void_by_name`,
  joins: `LEFT JOIN people p ON p.id = r.recorded_by
    LEFT JOIN water_voids v ON v.${column} = r.id
    LEFT JOIN people w ON w.id = v.recorded_by`,
})

export interface ReadingReadRow extends RecordedReadRow {
  water_body_id: string
  water_body_code: string
  parameter: ReadingParameter
  entered_value: string
  entered_unit: UnitCode
  below: boolean
  scale: PhScale | null
  canonical_value: number
  canonical_unit: UnitCode
  instrument: string | null
  note: string | null
}

const reading = recorded('reading_id')
const readingColumns = `${reading.columns}, r.water_body_id, b.code AS water_body_code, r.parameter, r.entered_value,
  r.entered_unit, r.below, r.scale, r.canonical_value, r.canonical_unit, r.instrument, r.note`
const readingSource = `readings r JOIN water_bodies b ON b.id = r.water_body_id ${reading.joins}`

/** The newest reading of each parameter in each of these bodies (all bodies when none are named) at an instant. */
export function readLatestReadings(
  db: Db,
  at: Date,
  waterBodyIds?: readonly string[],
): Promise<ReadingReadRow[]> {
  // One step into the index for each pair: sorting all readings of the house grows with every year they are kept
  return db.query(
    `SELECT ${readingColumns}
       FROM water_bodies b
      CROSS JOIN unnest($3::text[]) AS wanted (parameter)
      CROSS JOIN LATERAL (
        SELECT n.* FROM readings n
         WHERE n.water_body_id = b.id AND n.parameter = wanted.parameter AND ${happenedBy('n', '$1')}
           AND NOT EXISTS (SELECT 1 FROM water_voids o WHERE o.reading_id = n.id)
         ORDER BY n.happened_at DESC, n.recorded_at DESC, n.id DESC
         LIMIT 1) r
       ${reading.joins}
      WHERE $2::uuid[] IS NULL OR b.id = ANY($2)
      ORDER BY r.water_body_id, r.parameter`,
    [at, waterBodyIds ?? null, readingParameters],
  )
}

/** Readings of one parameter in a span of time, the newest first. */
export function readParameterSince(
  db: Db,
  waterBodyIds: readonly string[],
  parameter: ReadingParameter,
  from: Date,
  until: Date,
): Promise<ReadingReadRow[]> {
  return db.query(
    `SELECT ${readingColumns} FROM ${readingSource}
      WHERE r.water_body_id = ANY($1) AND r.parameter = $2 AND r.happened_at > $3 AND r.happened_at <= $4
        AND v.id IS NULL
      ORDER BY r.happened_at DESC, r.recorded_at DESC`,
    [[...waterBodyIds], parameter, from, until],
  )
}

export interface ReadingFilter {
  q?: string
  parameter?: ReadingParameter
  from?: string
  until?: string
  voided?: 'with' | 'without'
  direction?: 'asc' | 'desc'
}

const readingConditions = `
  r.water_body_id = ANY($1)
  AND ($2::text IS NULL OR r.parameter = $2)
  AND ($3::timestamptz IS NULL OR r.happened_at >= $3)
  AND ($4::timestamptz IS NULL OR r.happened_at < $4)
  AND ($5 OR v.id IS NULL)
  AND ($6::text IS NULL OR plain_text(r.instrument) LIKE plain_text($6) OR plain_text(r.note) LIKE plain_text($6) OR plain_text(p.printed_name) LIKE plain_text($6) OR plain_text(r.parameter) LIKE plain_text($6))`

const readingValues = (waterBodyIds: readonly string[], filter: ReadingFilter) => [
  waterBodyIds,
  filter.parameter ?? null,
  filter.from ?? null,
  filter.until ?? null,
  filter.voided === 'with',
  containing(filter.q),
]

/** Readings of these bodies, the newest first unless told; one page, or the first `limit` of them. */
export async function readReadings(
  db: Db,
  waterBodyIds: readonly string[],
  filter: ReadingFilter & { offset: number; limit: number },
): Promise<{ rows: ReadingReadRow[]; total: number }> {
  const values = readingValues(waterBodyIds, filter)
  const direction = filter.direction === 'asc' ? 'ASC' : 'DESC'
  const rows: ReadingReadRow[] = await db.query(
    `SELECT ${readingColumns} FROM ${readingSource} WHERE ${readingConditions}
      ORDER BY r.happened_at ${direction}, r.parameter, r.id LIMIT $7 OFFSET $8`,
    [...values, filter.limit, filter.offset],
  )
  const [count]: { n: string }[] = await db.query(
    `SELECT count(*) AS n FROM ${readingSource} WHERE ${readingConditions}`,
    values,
  )
  return { rows, total: Number(count?.n ?? 0) }
}

export function readReadingsById(db: Db, ids: readonly string[]): Promise<ReadingReadRow[]> {
  return db.query(
    `SELECT ${readingColumns} FROM ${readingSource} WHERE r.id = ANY($1::uuid[]) ORDER BY array_position($1::uuid[], r.id)`,
    [ids],
  )
}

export interface RangeReadRow {
  id: string
  enclosure_id: string
  parameter: ReadingParameter
  entered_unit: UnitCode
  outer_low_entered_value: string | null
  inner_low_entered_value: string | null
  inner_high_entered_value: string | null
  outer_high_entered_value: string | null
  canonical_unit: UnitCode
  outer_low: number | null
  inner_low: number | null
  inner_high: number | null
  outer_high: number | null
  happened_at: Date
  recorded_by_name: string | null
}

/** The ranges in force at an instant, of one enclosure or of all. */
export function readRangesAt(db: Db, at: Date, enclosureId?: string): Promise<RangeReadRow[]> {
  return db.query(
    `SELECT n.* FROM (
       SELECT DISTINCT ON (r.enclosure_id, r.parameter) r.id, r.enclosure_id, r.parameter, r.entered_unit,
              r.outer_low_entered_value, r.inner_low_entered_value, r.inner_high_entered_value,
              r.outer_high_entered_value, r.canonical_unit, r.outer_low, r.inner_low, r.inner_high, r.outer_high,
              r.withdrawn, r.happened_at, p.printed_name AS recorded_by_name
         FROM water_ranges r LEFT JOIN people p ON p.id = r.recorded_by
        WHERE ($2::uuid IS NULL OR r.enclosure_id = $2) AND ${happenedBy('r', '$1')}
        ORDER BY r.enclosure_id, r.parameter, r.happened_at DESC, r.position DESC) n
      WHERE NOT n.withdrawn ORDER BY n.parameter`,
    [at, enclosureId ?? null],
  )
}

export interface WaterEventReadRow extends RecordedReadRow {
  water_body_id: string
  water_body_code: string
  kind: WaterEventKind
  amount_entered_value: string | null
  amount_entered_unit: string | null
  amount_litres: number | null
  share_percent: number | null
  life_support_code: string | null
  note: string | null
}

const event = recorded('water_event_id')

/** Water events of these bodies up to an instant, the newest first; or the one with this id. */
export function readWaterEvents(
  db: Db,
  by: { waterBodyIds: readonly string[]; at: Date; limit: number } | { id: string },
): Promise<WaterEventReadRow[]> {
  const one = 'id' in by
  return db.query(
    `SELECT ${event.columns}, r.water_body_id, b.code AS water_body_code, r.kind, r.amount_entered_value,
            r.amount_entered_unit, r.amount_litres, r.share_percent, u.code AS life_support_code, r.note
       FROM water_events r
       JOIN water_bodies b ON b.id = r.water_body_id
       LEFT JOIN life_support_units u ON u.id = r.life_support_unit_id
       ${event.joins}
      WHERE ${one ? 'r.id = $1' : `r.water_body_id = ANY($1) AND ${happenedBy('r', '$2')}`}
      ORDER BY r.happened_at DESC, r.id DESC LIMIT ${one ? '1' : '$3'}`,
    one ? [by.id] : [by.waterBodyIds, by.at, by.limit],
  )
}
