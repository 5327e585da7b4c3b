import type { WaterListRow, WaterOfEnclosure } from '../../../shared/contracts/water.contract.ts'
import type {
  ConnectionNow,
  Isolation,
  LifeSupportNow,
  Range,
  ReadingRow,
  Volume,
  WaterEventRow,
} from '../../../shared/contracts/water-facts.ts'
import { listConnectedWaters } from '../../../shared/domain/connections/connected-water.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Db } from '../../platform/database/db.ts'
import { Problem } from '../../platform/http/problem.ts'
import { mayWithWater, placeReads, presentEnclosure, presentWaterBody } from '../enclosures/index.ts'
import { readRangesAt, readReadings, readReadingsById, readWaterEvents } from './measurement.reads.ts'
import type { ReadingFilter } from './measurement.reads.ts'
import { readWaterMapAt } from './read-water-map.ts'
import { readIsolations, readVolumes } from './volumes.reads.ts'
import { readEnclosureWater } from './water-at.ts'
import { readLifeSupportAt } from './water-map.reads.ts'
import { listWaterRows } from './water-list.ts'
import type { WaterListFilter } from './water-list.ts'
import * as present from './water.present.ts'

const eventsShown = 20

/** What the screens of the water read. Nothing here writes. */
export function createWaterQueries(parts: { dataSource: Db; clock: Clock }) {
  const db = parts.dataSource
  const now = () => parts.clock.now()

  async function enclosureOf(code: string) {
    const row = await placeReads.readEnclosure(db, { code })
    if (!row) throw new Problem('not-found')
    return row
  }

  /** The bodies whose readings belong to an enclosure's page: its own, and the sumps and loops joined to it now. */
  async function bodiesOfPage(code: string): Promise<{ enclosureId: string; ids: string[] }> {
    const enclosure = await enclosureOf(code)
    const found = await readEnclosureWater(db, enclosure, now())
    const own = enclosure.water_body_id === null ? [] : [enclosure.water_body_id]
    const shared = (found?.bodies ?? []).filter((body) => body.kind !== 'enclosure').map((body) => body.id)
    return { enclosureId: enclosure.id, ids: [...own, ...shared] }
  }

  return {
    list: (filter: WaterListFilter): Promise<WaterListRow[]> => listWaterRows(db, filter, now()),
    areas: (): Promise<string[]> => placeReads.readAreas(db, now()),
    may: (roles: readonly Role[]) => mayWithWater(roles),

    async ofEnclosure(
      code: string,
      asOf: string | undefined,
      roles: readonly Role[],
    ): Promise<WaterOfEnclosure> {
      const at = asOf ? new Date(asOf) : now()
      const enclosure = await enclosureOf(code)
      const found = await readEnclosureWater(db, enclosure, at)
      const base = {
        enclosure: presentEnclosure(enclosure, roles),
        asOf: at.toISOString(),
        may: mayWithWater(roles),
      }
      if (!found)
        return {
          ...base,
          bodies: [],
          enclosures: [],
          connections: [],
          unknownConnectionIds: [],
          lifeSupport: [],
          volume: { volume: null, usable: false, holds: false, basis: null, refusal: null },
          isolations: [],
          ranges: [],
          latest: [],
          events: [],
        }
      const events = await readWaterEvents(db, {
        waterBodyIds: found.water.waterBodyIds,
        at,
        limit: eventsShown,
      })
      const { row, usable, holds, basis, refusal } = found.volume
      return {
        ...base,
        bodies: found.bodies.map(presentWaterBody),
        enclosures: found.enclosures.map(({ id, code: other, name }) => ({ id, code: other, name })),
        connections: found.water.connections.flatMap((one) => present.presentConnection(one, found.map)),
        unknownConnectionIds: found.water.unknownConnectionIds,
        lifeSupport: found.lifeSupport.map(present.presentLifeSupport),
        volume: {
          volume: row ? present.presentVolume(row) : null,
          usable,
          holds,
          basis,
          refusal: refusal?.code ?? null,
        },
        isolations: found.isolations.map(present.presentIsolation),
        ranges: found.ranges.map(present.presentRange),
        latest: found.latest.map((reading) => present.presentReading(reading, found.ranges)),
        events: events.map(present.presentWaterEvent),
      }
    },

    async readings(
      code: string,
      filter: ReadingFilter & { offset: number; limit: number },
    ): Promise<{ rows: ReadingRow[]; total: number }> {
      const { enclosureId, ids } = await bodiesOfPage(code)
      const ranges = await readRangesAt(db, now(), enclosureId)
      const { rows, total } = await readReadings(db, ids, filter)
      return { rows: rows.map((row) => present.presentReading(row, ranges)), total }
    },

    async readingsById(ids: readonly string[]): Promise<ReadingRow[]> {
      const rows = await readReadingsById(db, ids)
      const bodies = await placeReads.readWaterBodies(db, [...new Set(rows.map((row) => row.water_body_id))])
      const enclosureId = bodies[0]?.enclosure_id
      const ranges = enclosureId ? await readRangesAt(db, now(), enclosureId) : []
      return rows.map((row) => present.presentReading(row, ranges))
    },

    async ranges(code: string): Promise<Range[]> {
      const { id } = await enclosureOf(code)
      return (await readRangesAt(db, now(), id)).map(present.presentRange)
    },

    async waterEvent(id: string): Promise<WaterEventRow> {
      const [row] = await readWaterEvents(db, { id })
      if (!row) throw new Problem('not-found')
      return present.presentWaterEvent(row)
    },

    async map(asOf: string | undefined) {
      const at = asOf ? new Date(asOf) : now()
      const rows = await readWaterMapAt(db, at)
      const waters = listConnectedWaters(rows.map, at.toISOString())
      const found = waters.ok ? waters.value : []
      const inUse = new Set(found.flatMap((water) => water.waterBodyIds))
      const connections = new Map(
        found.flatMap((water) => water.connections.map((one) => [one.connectionId, one] as const)),
      )
      return {
        asOf: at.toISOString(),
        bodies: rows.bodies.filter((body) => inUse.has(body.id)).map(presentWaterBody),
        connections: [...connections.values()].flatMap((one) => present.presentConnection(one, rows)),
        waters: found.map((water) => water.waterBodyIds),
      }
    },

    async connection(id: string): Promise<ConnectionNow> {
      const rows = await readWaterMapAt(db, now())
      const waters = listConnectedWaters(rows.map, now().toISOString())
      const inUse = waters.ok ? waters.value.flatMap((water) => water.connections) : []
      // One taken out of use touches no water any more, and is shown as nobody's
      const touching = inUse.find((one) => one.connectionId === id) ?? {
        connectionId: id,
        state: 'unknown' as const,
        inside: false,
      }
      const [found] = present.presentConnection(touching, rows)
      if (!found) throw new Problem('not-found')
      return found
    },

    async lifeSupport(id: string): Promise<LifeSupportNow> {
      const [row] = await readLifeSupportAt(db, now(), { id })
      if (!row) throw new Problem('not-found')
      return present.presentLifeSupport(row)
    },

    async isolation(id: string): Promise<Isolation> {
      const [row] = await readIsolations(db, { id, withVoided: true })
      if (!row) throw new Problem('not-found')
      return present.presentIsolation(row)
    },

    async volumes(code: string): Promise<Volume[]> {
      const { water_body_id: own } = await enclosureOf(code)
      if (own === null) return []
      return (await readVolumes(db, { waterBodyIds: [own], withVoided: true })).map(present.presentVolume)
    },

    async volume(id: string): Promise<Volume> {
      const [row] = await readVolumes(db, { id, withVoided: true })
      if (!row) throw new Problem('not-found')
      return present.presentVolume(row)
    },
  }
}

export type WaterQueries = ReturnType<typeof createWaterQueries>
