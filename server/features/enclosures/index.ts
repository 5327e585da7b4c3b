import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import { Enclosure, WaterBodyRecord } from './enclosure.entity.ts'
import { presentEnclosure, presentWaterBody } from './enclosures.present.ts'
import { createEnclosureQuestions } from './enclosures.questions.ts'
import {
  readAreas,
  readEnclosure,
  readEnclosurePage,
  readEnclosures,
  readWaterBodies,
} from './enclosures.reads.ts'
import { enclosureRoutes } from './enclosures.routes.ts'
import type { EnclosureQueries } from './enclosures.routes.ts'
import { createEnclosuresService } from './enclosures.service.ts'

export type { EnclosuresService } from './enclosures.service.ts'
export type { EnclosureBrief, EnclosureQuestions } from './enclosures.questions.ts'
export type { EnclosureFilter, EnclosureReadRow, WaterBodyReadRow } from './enclosures.reads.ts'
export { mayWithWater, presentEnclosure, presentWaterBody } from './enclosures.present.ts'
export const enclosureEntities = [Enclosure, WaterBodyRecord]
/** Rows of places for the screens of the water, which join them with what is measured. */
export const placeReads = { readAreas, readEnclosure, readEnclosures, readWaterBodies }

export function createEnclosures(parts: Parts) {
  const { dataSource, clock } = parts
  const service = createEnclosuresService(parts)
  const queries: EnclosureQueries = {
    async enclosure(by, roles) {
      const row = await readEnclosure(dataSource, by)
      if (!row) throw new Problem('not-found')
      return presentEnclosure(row, roles)
    },
    async page(filter, roles) {
      const { rows, total } = await readEnclosurePage(dataSource, filter, clock.now())
      return { rows: rows.map((row) => presentEnclosure(row, roles)), total }
    },
    async waterBody(id) {
      const [row] = await readWaterBodies(dataSource, [id])
      if (!row) throw new Problem('not-found')
      return presentWaterBody(row)
    },
  }
  return {
    service,
    queries,
    questions: createEnclosureQuestions({ dataSource }),
    routes: enclosureRoutes(service, queries),
  }
}

export type Enclosures = ReturnType<typeof createEnclosures>
