import { findConnectedWater } from '../../../shared/domain/connections/connected-water.ts'
import type { ConnectedWater } from '../../../shared/domain/connections/connected-water.ts'
import type { Db } from '../../platform/database/db.ts'
import { placeReads } from '../enclosures/index.ts'
import type { EnclosureReadRow, WaterBodyReadRow } from '../enclosures/index.ts'
import { readLatestReadings, readRangesAt } from './measurement.reads.ts'
import type { RangeReadRow, ReadingReadRow } from './measurement.reads.ts'
import { readWaterMapAt } from './read-water-map.ts'
import type { WaterMapRows } from './read-water-map.ts'
import { standingIsolations, volumeAt } from './volume-now.ts'
import type { VolumeAt } from './volume-now.ts'
import { readIsolations, readVolumes } from './volumes.reads.ts'
import type { IsolationReadRow } from './volumes.reads.ts'
import { readLifeSupportAt } from './water-map.reads.ts'
import type { LifeSupportReadRow } from './water-map.reads.ts'

/** The water of an enclosure at an instant, with everything known of it then. */
export interface EnclosureWater {
  at: Date
  enclosure: EnclosureReadRow
  water: ConnectedWater
  map: WaterMapRows
  bodies: WaterBodyReadRow[]
  enclosures: EnclosureReadRow[]
  volume: VolumeAt
  isolations: IsolationReadRow[]
  lifeSupport: LifeSupportReadRow[]
  ranges: RangeReadRow[]
  /** One a parameter: its own water's where that was ever measured, else the newest elsewhere in the same water. */
  latest: ReadingReadRow[]
}

/**
 * One reading a parameter out of the newest of each body. The enclosure's own water comes first, even when a sump was
 * measured later: the animals are in this water, and an old figure shows as old.
 */
export function pickLatest(rows: readonly ReadingReadRow[], ownBodyId: string): ReadingReadRow[] {
  const best = new Map<string, ReadingReadRow>()
  for (const row of rows) {
    const held = best.get(row.parameter)
    const isOwn = row.water_body_id === ownBodyId
    const heldIsOwn = held?.water_body_id === ownBodyId
    if (!held || (isOwn && !heldIsOwn) || (!heldIsOwn && row.happened_at > held.happened_at))
      best.set(row.parameter, row)
  }
  return [...best.values()]
}

/** Which bodies an enclosure shares its water with at an instant, with the map of then; null when it had no water. */
export async function readConnectedWater(
  db: Db,
  enclosure: Pick<EnclosureReadRow, 'water_body_id'>,
  at: Date,
): Promise<{ map: WaterMapRows; water: ConnectedWater; ownBodyId: string } | null> {
  const ownBodyId = enclosure.water_body_id
  if (ownBodyId === null) return null
  const map = await readWaterMapAt(db, at)
  const found = findConnectedWater(map.map, ownBodyId, at.toISOString())
  return found.ok ? { map, water: found.value, ownBodyId } : null
}

/**
 * Reads the water of an enclosure at an instant; null when the enclosure had none then (a land area, or an instant
 * before it was taken into use).
 */
export async function readEnclosureWater(
  db: Db,
  enclosure: EnclosureReadRow,
  at: Date,
): Promise<EnclosureWater | null> {
  const found = await readConnectedWater(db, enclosure, at)
  if (!found) return null
  const { map, water, ownBodyId } = found
  const here = new Set(water.waterBodyIds)
  const ids = water.waterBodyIds
  const isolations = await readIsolations(db, { waterBodyIds: ids })
  const all = await placeReads.readEnclosures(db, {}, at)
  return {
    at,
    enclosure,
    water,
    map,
    bodies: map.bodies.filter((body) => here.has(body.id)),
    enclosures: all.filter((one) => water.enclosureIds.includes(one.id)),
    volume: volumeAt(
      water,
      ownBodyId,
      await readVolumes(db, { waterBodyIds: ids, withVoided: false }),
      isolations,
    ),
    isolations: standingIsolations(isolations, ownBodyId, at),
    lifeSupport: await readLifeSupportAt(db, at, { waterBodyIds: ids }),
    ranges: await readRangesAt(db, at, enclosure.id),
    latest: pickLatest(await readLatestReadings(db, at, ids), ownBodyId),
  }
}
