import { chooseVolume } from '../../../shared/domain/connections/choose-volume.ts'
import type { Isolation, VolumeChoiceRefusal } from '../../../shared/domain/connections/choose-volume.ts'
import type { ConnectedWater } from '../../../shared/domain/connections/connected-water.ts'
import type { VolumeDetermination } from '../../../shared/domain/connections/volume-determination.ts'
import type { Refusal } from '../../../shared/domain/result.ts'
import { timeSeenAt } from '../../platform/database/happened-by.ts'
import type { IsolationReadRow, VolumeReadRow } from './volumes.reads.ts'

/** The volume to dose by, or the nearest there is with the reason why it cannot be used. */
export interface VolumeAt {
  row: VolumeReadRow | null
  /** Confirmed, and it holds for this water as the valves stand. */
  usable: boolean
  /** It holds for this water as the valves stand, confirmed or not. */
  holds: boolean
  basis: 'connected-water' | 'isolation' | null
  isolationId: string | null
  refusal: Refusal<VolumeChoiceRefusal> | null
  /** Confirmed for the same water before `row`, in litres. */
  previousLitres: number | null
}

export const determinationOf = (row: VolumeReadRow, at: Date): VolumeDetermination => ({
  determinationId: row.id,
  waterBodyIds: row.water_body_ids,
  connectionStates: row.valves.map((valve) => ({
    connectionId: valve.connectionId,
    state: valve.open ? 'open' : 'shut',
  })),
  netVolumeLitres: row.net_volume_litres,
  errorPercent: row.error_percent,
  method: row.method,
  displacementSubtracted: row.displacement_subtracted,
  determinedAt: timeSeenAt(row, at).toISOString(),
  confirmedAt: row.confirmed_at?.toISOString() ?? null,
})

export const isolationOf = (row: IsolationReadRow, at: Date): Isolation => ({
  isolationId: row.id,
  waterBodyIds: row.water_body_ids,
  isolatedAt: timeSeenAt(row, at).toISOString(),
  isolatedBy: row.recorded_by_name ?? '',
  test:
    row.test_at && row.test_method !== null && row.test_passed !== null
      ? { method: row.test_method, passed: row.test_passed, testedAt: row.test_at.toISOString() }
      : null,
  endedAt: row.ended_at?.toISOString() ?? null,
})

/** Isolations that stand at an instant and part a body from the rest. */
export function standingIsolations(
  rows: readonly IsolationReadRow[],
  waterBodyId: string,
  at: Date,
): IsolationReadRow[] {
  return rows.filter(
    (row) =>
      row.water_body_ids.includes(waterBodyId) &&
      timeSeenAt(row, at) <= at &&
      (row.ended_at === null || row.ended_at > at),
  )
}

/**
 * What was confirmed for exactly the same water before a determination; null when nothing was.
 *
 * @param rows the newest first, without withdrawn ones
 */
export function confirmedBefore(row: VolumeReadRow, rows: readonly VolumeReadRow[]): number | null {
  const bodies = row.water_body_ids.join()
  const before = rows.find(
    (one) =>
      one.id !== row.id &&
      one.confirmed_at !== null &&
      one.happened_at <= row.happened_at &&
      one.water_body_ids.join() === bodies,
  )
  return before?.net_volume_litres ?? null
}

/**
 * The volume that a dose into the water of one body is worked out from, at the instant of `water`.
 *
 * @param rows those that touch this water, without withdrawn ones
 */
export function volumeAt(
  water: ConnectedWater,
  waterBodyId: string,
  rows: readonly VolumeReadRow[],
  isolations: readonly IsolationReadRow[],
): VolumeAt {
  const at = new Date(water.at)
  const isolation = standingIsolations(isolations, waterBodyId, at)[0]
  const choice = chooseVolume(
    water,
    isolation?.water_body_ids ?? [waterBodyId],
    rows.map((row) => determinationOf(row, at)),
    isolations.map((row) => isolationOf(row, at)),
  )
  if (choice.ok) {
    const { determination, basis, isolationId } = choice.value
    const row = rows.find((one) => one.id === determination.determinationId) ?? null
    const previousLitres = row && confirmedBefore(row, rows)
    return { row, usable: true, holds: true, basis, isolationId, refusal: null, previousLitres }
  }
  const named = choice.refusal.params?.['determinationId']
  const covering = rows.filter((one) => timeSeenAt(one, at) <= at && one.water_body_ids.includes(waterBodyId))
  return {
    row: rows.find((one) => one.id === named) ?? covering[0] ?? null,
    usable: false,
    holds: choice.refusal.code === 'determination-not-confirmed',
    basis: isolation ? 'isolation' : null,
    isolationId: isolation?.id ?? null,
    refusal: choice.refusal,
    previousLitres: null,
  }
}
