import * as contracts from '../../../shared/contracts/taxa.contract.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { AnimalQueries } from './animals.queries.ts'
import type { AnimalsService } from './animals.service.ts'

export function taxaRoutes(service: AnimalsService, queries: AnimalQueries): Route[] {
  return [
    route(contracts.listTaxa, async ({ query }) => {
      const page = pageOf(query)
      const { rows, total } = await queries.taxa({ ...query, ...page })
      return { rows, total, nextCursor: nextCursorOf(page, total) }
    }),
    route(contracts.getTaxon, ({ params }) => queries.taxon(params.id)),
    route(contracts.enterTaxon, async ({ body, context }) => {
      await service.enterTaxon(context, body)
      return queries.taxon(body.id)
    }),
    route(contracts.correctTaxon, async ({ params, body, context }) => {
      await service.correctTaxon(context, params.id, body)
      return queries.taxon(params.id)
    }),
    route(contracts.enterWeightBand, async ({ params, body, context }) => {
      await service.enterWeightBand(context, params.id, body)
      return queries.taxon(params.id)
    }),
    route(contracts.setSensitivity, async ({ params, body, context }) => {
      await service.setSensitivity(context, params.id, body)
      return queries.taxon(params.id)
    }),
  ]
}
