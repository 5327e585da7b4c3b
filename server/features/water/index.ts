import type { Parts } from '../../platform/parts.ts'
import type { Enclosures } from '../enclosures/index.ts'
import type { FacilityService } from '../facility/index.ts'
import { Reading, WaterEvent, WaterRangeRecord } from './measurement.entity.ts'
import { createMeasurementsService } from './measurements.service.ts'
import * as volume from './volume.entity.ts'
import { createVolumesService } from './volumes.service.ts'
import { createWaterMapService } from './water-map.service.ts'
import * as entity from './water.entity.ts'
import { createWaterQueries } from './water.queries.ts'
import { createWaterQuestions } from './water.questions.ts'
import { waterRoutes } from './water.routes.ts'

export type { ReadingFact, VolumeFact, WaterFacts, WaterQuestions } from './water.questions.ts'
export const waterEntities = [
  entity.ConnectionRecord,
  entity.ConnectionStateRecord,
  entity.LifeSupportUnit,
  entity.LifeSupportState,
  entity.WaterVoid,
  Reading,
  WaterEvent,
  WaterRangeRecord,
  volume.IsolationRecord,
  volume.IsolationBody,
  volume.IsolationTest,
  volume.IsolationEnd,
  volume.VolumeDeterminationRecord,
  volume.VolumeDeterminationBody,
  volume.VolumeDeterminationValve,
  volume.VolumeConfirmation,
]

export function createWater(parts: Parts & { facility: FacilityService; enclosures: Enclosures }) {
  const services = {
    measurements: createMeasurementsService(parts),
    map: createWaterMapService(parts),
    volumes: createVolumesService(parts),
  }
  return {
    services,
    questions: createWaterQuestions(parts),
    routes: waterRoutes(services, createWaterQueries(parts)),
  }
}

export type Water = ReturnType<typeof createWater>
