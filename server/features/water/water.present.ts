import type {
  ConnectionNow,
  Isolation,
  LifeSupportNow,
  Range,
  ReadingRow,
  Volume,
  WaterEventRow,
} from '../../../shared/contracts/water-facts.ts'
import type { TouchingConnection } from '../../../shared/domain/connections/connected-water.ts'
import { judgeReading } from '../../../shared/domain/readings/judge-reading.ts'
import type { WaterRange } from '../../../shared/domain/readings/water-range.ts'
import type { RangeReadRow, ReadingReadRow, RecordedReadRow, WaterEventReadRow } from './measurement.reads.ts'
import type { WaterMapRows } from './read-water-map.ts'
import type { IsolationReadRow, VolumeReadRow } from './volumes.reads.ts'
import type { LifeSupportReadRow } from './water-map.reads.ts'

const iso = (at: Date | null) => at?.toISOString() ?? null

const presentRecorded = (row: RecordedReadRow) => ({
  id: row.id,
  happenedAt: row.happened_at.toISOString(),
  happenedOn: row.happened_on,
  recordedAt: row.recorded_at.toISOString(),
  recordedBy: row.recorded_by_name ?? '',
  voided:
    row.void_reason !== null && row.void_at
      ? { reason: row.void_reason, at: row.void_at.toISOString(), by: row.void_by_name ?? '' }
      : null,
})

/** A stored range as the engine takes it. */
export function rangeOf(row: RangeReadRow | undefined): WaterRange | null {
  if (!row) return null
  return {
    unit: row.canonical_unit,
    outerLow: row.outer_low,
    innerLow: row.inner_low,
    innerHigh: row.inner_high,
    outerHigh: row.outer_high,
  }
}

export function presentRange(row: RangeReadRow): Range {
  return {
    id: row.id,
    parameter: row.parameter,
    unit: row.entered_unit,
    entered: {
      outerLow: row.outer_low_entered_value,
      innerLow: row.inner_low_entered_value,
      innerHigh: row.inner_high_entered_value,
      outerHigh: row.outer_high_entered_value,
    },
    canonicalUnit: row.canonical_unit,
    outerLow: row.outer_low,
    innerLow: row.inner_low,
    innerHigh: row.inner_high,
    outerHigh: row.outer_high,
    since: row.happened_at.toISOString(),
    setBy: row.recorded_by_name ?? '',
  }
}

/** A reading with its standing to what is wanted there now, also for old readings: one measure for the whole list. */
export function presentReading(row: ReadingReadRow, ranges: readonly RangeReadRow[]): ReadingRow {
  const reading = { value: row.canonical_value, unit: row.canonical_unit, below: row.below }
  return {
    ...presentRecorded(row),
    waterBodyId: row.water_body_id,
    waterBodyCode: row.water_body_code,
    parameter: row.parameter,
    value: { value: row.entered_value, unit: row.entered_unit },
    below: row.below,
    scale: row.scale,
    canonicalValue: row.canonical_value,
    canonicalUnit: row.canonical_unit,
    instrument: row.instrument,
    note: row.note,
    judgement: judgeReading(reading, rangeOf(ranges.find((range) => range.parameter === row.parameter))),
  }
}

export function presentWaterEvent(row: WaterEventReadRow): WaterEventRow {
  const { amount_entered_value: value, amount_entered_unit: unit } = row
  return {
    ...presentRecorded(row),
    waterBodyId: row.water_body_id,
    waterBodyCode: row.water_body_code,
    kind: row.kind,
    amount: value !== null && unit !== null ? { value, unit } : null,
    amountLitres: row.amount_litres,
    sharePercent: row.share_percent,
    lifeSupportCode: row.life_support_code,
    note: row.note,
  }
}

/** A valve or pump with the state that the engine found for it. */
export function presentConnection(touching: TouchingConnection, rows: WaterMapRows): ConnectionNow[] {
  const row = rows.connections.find((one) => one.id === touching.connectionId)
  const state = rows.states.find((one) => one.connection_id === touching.connectionId)
  if (!row) return []
  return [
    {
      id: row.id,
      code: row.code,
      name: row.name,
      kind: row.kind,
      fromBodyId: row.from_body_id,
      fromCode: row.from_code,
      toBodyId: row.to_body_id,
      toCode: row.to_code,
      state: touching.state,
      since: iso(state?.happened_at ?? null),
      by: state?.recorded_by_name ?? null,
      inside: touching.inside,
      version: row.version,
    },
  ]
}

export function presentLifeSupport(row: LifeSupportReadRow): LifeSupportNow {
  return {
    id: row.id,
    code: row.code,
    name: row.name,
    kind: row.kind,
    waterBodyId: row.water_body_id,
    waterBodyCode: row.water_body_code,
    state: row.is_on === null ? 'unknown' : row.is_on ? 'on' : 'off',
    since: iso(row.since),
    by: row.recorded_by_name,
    version: row.version,
  }
}

export function presentIsolation(row: IsolationReadRow): Isolation {
  return {
    ...presentRecorded(row),
    waterBodyIds: row.water_body_ids,
    codes: row.codes,
    test:
      row.test_at && row.test_method !== null && row.test_passed !== null
        ? {
            method: row.test_method,
            passed: row.test_passed,
            at: row.test_at.toISOString(),
            by: row.test_by_name ?? '',
          }
        : null,
    endedAt: iso(row.ended_at),
    note: row.note,
  }
}

export function presentVolume(row: VolumeReadRow): Volume {
  return {
    ...presentRecorded(row),
    method: row.method,
    grossVolumeLitres: row.gross_volume_litres,
    netVolumeLitres: row.net_volume_litres,
    errorPercent: row.error_percent,
    displacementSubtracted: row.displacement_subtracted,
    sheet: JSON.parse(row.inputs) as Record<string, unknown>,
    working: JSON.parse(row.working) as Volume['working'],
    waterBodyIds: row.water_body_ids,
    codes: row.codes,
    valves: row.valves,
    isolationId: row.isolation_id,
    nextCheckOn: row.next_check_on,
    note: row.note,
    confirmation: row.confirmed_at
      ? {
          at: row.confirmed_at.toISOString(),
          by: row.confirmed_by_name ?? '',
          note: row.confirmation_note,
        }
      : null,
    determinedById: row.recorded_by,
  }
}
