import * as contracts from '../../../shared/contracts/counterparties.contract.ts'
import type { Counterparty } from '../../../shared/contracts/counterparties.contract.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { CounterpartyFilter } from './counterparties.reads.ts'
import type { CounterpartiesService } from './counterparties.service.ts'

export interface CounterpartyQueries {
  counterparty(id: string): Promise<Counterparty>
  counterparties(filter: CounterpartyFilter): Promise<{ rows: Counterparty[]; total: number }>
}

export function counterpartyRoutes(service: CounterpartiesService, queries: CounterpartyQueries): Route[] {
  return [
    route(contracts.listCounterparties, async ({ query }) => {
      const page = pageOf(query)
      const { rows, total } = await queries.counterparties({ ...query, ...page })
      return { rows, total, nextCursor: nextCursorOf(page, total) }
    }),
    route(contracts.enterCounterparty, async ({ body, context }) => {
      await service.enterCounterparty(context, body)
      return queries.counterparty(body.id)
    }),
    route(contracts.correctCounterparty, async ({ params, body, context }) => {
      await service.correctCounterparty(context, params.id, body)
      return queries.counterparty(params.id)
    }),
  ]
}
