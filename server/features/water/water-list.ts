import type { WaterListRow } from '../../../shared/contracts/water.contract.ts'
import { listConnectedWaters } from '../../../shared/domain/connections/connected-water.ts'
import type { ConnectedWater } from '../../../shared/domain/connections/connected-water.ts'
import type { Db } from '../../platform/database/db.ts'
import { placeReads } from '../enclosures/index.ts'
import type { EnclosureReadRow } from '../enclosures/index.ts'
import { readLatestReadings, readRangesAt } from './measurement.reads.ts'
import type { RangeReadRow, ReadingReadRow } from './measurement.reads.ts'
import { readWaterMapAt } from './read-water-map.ts'
import { volumeAt } from './volume-now.ts'
import type { VolumeAt } from './volume-now.ts'
import { readIsolations, readVolumes } from './volumes.reads.ts'
import { pickLatest } from './water-at.ts'
import { readLifeSupportAt } from './water-map.reads.ts'
import { presentReading } from './water.present.ts'

export interface WaterListFilter {
  q?: string
  area?: string
  kind?: string
  state?: 'outside' | 'volume-not-usable' | 'life-support-off' | 'treatment-vessel'
  sort?: 'code' | 'name' | 'area' | 'volume' | 'lastReading'
  direction?: 'asc' | 'desc'
}

function volumeState(
  water: ConnectedWater | undefined,
  volume: VolumeAt | null,
): WaterListRow['volumeState'] {
  if (!water || !volume) return 'no-water'
  if (volume.usable) return 'usable'
  if (!volume.row) return 'none'
  return volume.holds ? 'to-confirm' : 'does-not-hold'
}

/** Reads the water of the whole house once, and makes one row an enclosure. */
async function readRows(db: Db, filter: WaterListFilter, at: Date): Promise<WaterListRow[]> {
  const enclosures = await placeReads.readEnclosures(
    db,
    {
      ...(filter.q ? { q: filter.q } : {}),
      ...(filter.area ? { area: filter.area } : {}),
      ...(filter.kind ? { kind: filter.kind } : {}),
      ...(filter.state === 'treatment-vessel' ? { treatmentVessel: 'yes' as const } : {}),
    },
    at,
  )
  const rows = await readWaterMapAt(db, at)
  const waters = listConnectedWaters(rows.map, at.toISOString())
  const byBody = new Map<string, ConnectedWater>()
  if (waters.ok) for (const one of waters.value) for (const id of one.waterBodyIds) byBody.set(id, one)
  const codeOf = new Map(rows.bodies.map((body) => [body.id, body.code]))
  const volumes = await readVolumes(db, { withVoided: false })
  const isolations = await readIsolations(db, {})
  const latest = await readLatestReadings(db, at)
  const ranges = await readRangesAt(db, at)
  const off = (await readLifeSupportAt(db, at)).filter((unit) => unit.is_on === false)

  return enclosures.map((enclosure): WaterListRow => {
    const ownBodyId = enclosure.water_body_id
    const water = ownBodyId === null ? undefined : byBody.get(ownBodyId)
    const ids = water?.waterBodyIds ?? []
    const touches = (row: { water_body_ids: string[] }) => row.water_body_ids.some((id) => ids.includes(id))
    const volume =
      water && ownBodyId !== null
        ? volumeAt(water, ownBodyId, volumes.filter(touches), isolations.filter(touches))
        : null
    const here = latest.filter((row) => ids.includes(row.water_body_id))
    return {
      ...describe(enclosure),
      connectedCodes: ids.filter((id) => id !== ownBodyId).map((id) => codeOf.get(id) ?? ''),
      netVolumeLitres: volume?.row?.net_volume_litres ?? null,
      errorPercent: volume?.row?.error_percent ?? null,
      volumeState: volumeState(water, volume),
      lastReadingAt: newest(here)?.toISOString() ?? null,
      outside:
        ownBodyId === null
          ? []
          : outsideOf(
              pickLatest(here, ownBodyId),
              ranges.filter((one) => one.enclosure_id === enclosure.id),
            ),
      lifeSupportOff: off.filter((unit) => ids.includes(unit.water_body_id)).map((unit) => unit.code),
    }
  })
}

const describe = ({ id, code, name, kind, area, boundary, treatment_vessel }: EnclosureReadRow) => ({
  id,
  code,
  name,
  kind,
  area,
  boundary,
  treatmentVessel: treatment_vessel,
})

const newest = (rows: readonly ReadingReadRow[]) =>
  rows.reduce<Date | null>((last, row) => (last && last > row.happened_at ? last : row.happened_at), null)

function outsideOf(
  latest: readonly ReadingReadRow[],
  ranges: readonly RangeReadRow[],
): WaterListRow['outside'] {
  return latest
    .map((row) => presentReading(row, ranges))
    .filter((row) => row.judgement.level === 'inner' || row.judgement.level === 'outer')
    .map(({ parameter, value, below, judgement, happenedAt }) => ({
      parameter,
      value,
      below,
      judgement,
      at: happenedAt,
    }))
}

const inState = (row: WaterListRow, state: WaterListFilter['state']): boolean => {
  if (state === 'outside') return row.outside.length > 0
  if (state === 'life-support-off') return row.lifeSupportOff.length > 0
  if (state === 'volume-not-usable') return row.volumeState !== 'usable' && row.volumeState !== 'no-water'
  return true
}

const sortKeys: Record<
  'name' | 'area' | 'volume' | 'lastReading',
  (row: WaterListRow) => string | number | null
> = {
  name: (row) => row.name.toLowerCase(),
  area: (row) => row.area.toLowerCase(),
  volume: (row) => row.netVolumeLitres,
  lastReading: (row) => row.lastReadingAt,
}

/** The list as shown: filtered and in its order. Rows without a figure stand at the end either way. */
export async function listWaterRows(db: Db, filter: WaterListFilter, at: Date): Promise<WaterListRow[]> {
  const rows = (await readRows(db, filter, at)).filter((row) => inState(row, filter.state))
  const sign = filter.direction === 'desc' ? -1 : 1
  // They come by code already, and a stable sort keeps that order among equals
  if (filter.sort === undefined || filter.sort === 'code') return sign === 1 ? rows : rows.reverse()
  const keyOf = sortKeys[filter.sort]
  return rows.sort((a, b) => {
    const [x, y] = [keyOf(a), keyOf(b)]
    if (x === null || y === null) return Number(x === null) - Number(y === null)
    return x === y ? 0 : (x < y ? -1 : 1) * sign
  })
}
