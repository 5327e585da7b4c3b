import * as map from '../../../shared/contracts/water-map.contract.ts'
import * as volumes from '../../../shared/contracts/water-volumes.contract.ts'
import * as water from '../../../shared/contracts/water.contract.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { MeasurementsService } from './measurements.service.ts'
import type { VolumesService } from './volumes.service.ts'
import type { WaterMapService } from './water-map.service.ts'
import { readingsCsv, waterCsv } from './water.csv.ts'
import type { WaterQueries } from './water.queries.ts'

export interface WaterServices {
  measurements: MeasurementsService
  map: WaterMapService
  volumes: VolumesService
}

/** A file of readings ends here: about three years of a fully measured tank. */
const mostReadingsInFile = 20_000

const screenRoutes = (queries: WaterQueries): Route[] => [
  route(water.listWater, async ({ query, context }) => {
    const page = pageOf(query)
    const rows = await queries.list(query)
    return {
      rows: rows.slice(page.offset, page.offset + page.limit),
      total: rows.length,
      nextCursor: nextCursorOf(page, rows.length),
      areas: await queries.areas(),
      may: queries.may(context.actor.roles),
    }
  }),
  route(water.exportWater, async ({ query }) => waterCsv(await queries.list(query))),
  route(water.getWaterOfEnclosure, ({ params, query, context }) =>
    queries.ofEnclosure(params.code, query.asOf, context.actor.roles),
  ),
  route(water.listReadings, async ({ params, query }) => {
    const page = pageOf(query)
    const { rows, total } = await queries.readings(params.code, { ...query, ...page })
    return { rows, total, nextCursor: nextCursorOf(page, total) }
  }),
  route(water.exportReadings, async ({ params, query }) => {
    const { rows } = await queries.readings(params.code, { ...query, offset: 0, limit: mostReadingsInFile })
    return readingsCsv(params.code, rows)
  }),
  route(map.getWaterMap, ({ query }) => queries.map(query.asOf)),
  route(volumes.listVolumes, async ({ params }) => ({ volumes: await queries.volumes(params.code) })),
]

const measurementRoutes = (service: MeasurementsService, queries: WaterQueries): Route[] => [
  route(water.recordReadings, async ({ body, context }) => {
    await service.recordReadings(context, body)
    return { readings: await queries.readingsById(body.readings.map((reading) => reading.id)) }
  }),
  route(water.setRange, async ({ params, body, context }) => {
    await service.setRange(context, params.code, body)
    return { ranges: await queries.ranges(params.code) }
  }),
  route(water.recordWaterEvent, async ({ body, context }) => {
    await service.recordWaterEvent(context, body)
    return queries.waterEvent(body.id)
  }),
  route(water.voidWaterRecord, async ({ params, body, context }) => {
    await service.voidRecord(context, params.kind, params.id, body)
    return { id: params.id, reason: body.reason }
  }),
]

const mapRoutes = (service: WaterMapService, queries: WaterQueries): Route[] => [
  route(map.enterConnection, async ({ body, context }) => {
    await service.enterConnection(context, body)
    return queries.connection(body.id)
  }),
  route(map.correctConnection, async ({ params, body, context }) => {
    await service.correctConnection(context, params.id, body)
    return queries.connection(params.id)
  }),
  route(map.recordConnectionState, async ({ params, body, context }) => {
    await service.recordConnectionState(context, params.id, body)
    return queries.connection(params.id)
  }),
  route(map.enterLifeSupport, async ({ body, context }) => {
    await service.enterLifeSupport(context, body)
    return queries.lifeSupport(body.id)
  }),
  route(map.correctLifeSupport, async ({ params, body, context }) => {
    await service.correctLifeSupport(context, params.id, body)
    return queries.lifeSupport(params.id)
  }),
  route(map.recordLifeSupportState, async ({ params, body, context }) => {
    await service.recordLifeSupportState(context, params.id, body)
    return queries.lifeSupport(params.id)
  }),
  route(map.recordIsolation, async ({ body, context }) => {
    await service.recordIsolation(context, body)
    return queries.isolation(body.id)
  }),
  route(map.recordIsolationTest, async ({ params, body, context }) => {
    await service.recordIsolationTest(context, params.id, body)
    return queries.isolation(params.id)
  }),
  route(map.endIsolation, async ({ params, body, context }) => {
    await service.endIsolation(context, params.id, body)
    return queries.isolation(params.id)
  }),
]

const volumeRoutes = (service: VolumesService, queries: WaterQueries): Route[] => [
  route(volumes.determineVolume, async ({ params, body, context }) => {
    await service.determineVolume(context, params.code, body)
    return queries.volume(body.id)
  }),
  route(volumes.confirmVolume, async ({ params, body, context }) => {
    await service.confirmVolume(context, params.id, body)
    return queries.volume(params.id)
  }),
  route(volumes.voidVolume, async ({ params, body, context }) => {
    await service.voidVolume(context, params.id, body)
    return queries.volume(params.id)
  }),
]

export function waterRoutes(services: WaterServices, queries: WaterQueries): Route[] {
  return [
    ...screenRoutes(queries),
    ...measurementRoutes(services.measurements, queries),
    ...mapRoutes(services.map, queries),
    ...volumeRoutes(services.volumes, queries),
  ]
}
