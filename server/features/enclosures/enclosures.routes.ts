import * as contracts from '../../../shared/contracts/enclosures.contract.ts'
import type { Enclosure, WaterBody } from '../../../shared/contracts/enclosures.contract.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { EnclosureFilter } from './enclosures.reads.ts'
import type { EnclosuresService } from './enclosures.service.ts'

export interface EnclosureQueries {
  enclosure(by: { code: string } | { id: string }, roles: readonly Role[]): Promise<Enclosure>
  page(
    filter: EnclosureFilter & {
      sort?: 'code' | 'name' | 'area'
      direction?: 'asc' | 'desc'
      offset: number
      limit: number
    },
    roles: readonly Role[],
  ): Promise<{ rows: Enclosure[]; total: number }>
  waterBody(id: string): Promise<WaterBody>
}

export function enclosureRoutes(service: EnclosuresService, queries: EnclosureQueries): Route[] {
  return [
    route(contracts.listEnclosures, async ({ query, context }) => {
      const page = pageOf(query)
      const { rows, total } = await queries.page({ ...query, ...page }, context.actor.roles)
      return { rows, total, nextCursor: nextCursorOf(page, total) }
    }),
    route(contracts.getEnclosure, ({ params, context }) => queries.enclosure(params, context.actor.roles)),
    route(contracts.enterEnclosure, async ({ body, context }) => {
      await service.enterEnclosure(context, body)
      return queries.enclosure({ id: body.id }, context.actor.roles)
    }),
    route(contracts.correctEnclosure, async ({ params, body, context }) => {
      await service.correctEnclosure(context, params.code, body)
      return queries.enclosure(params, context.actor.roles)
    }),
    route(contracts.enterWaterBody, async ({ body, context }) => {
      await service.enterWaterBody(context, body)
      return queries.waterBody(body.id)
    }),
    route(contracts.correctWaterBody, async ({ params, body, context }) => {
      await service.correctWaterBody(context, params.id, body)
      return queries.waterBody(params.id)
    }),
  ]
}
