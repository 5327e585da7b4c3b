import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import { presentCounterparty } from './counterparties.present.ts'
import { readCounterparties, readCounterparty } from './counterparties.reads.ts'
import { counterpartyRoutes } from './counterparties.routes.ts'
import type { CounterpartyQueries } from './counterparties.routes.ts'
import { createCounterpartiesService } from './counterparties.service.ts'
import { CounterpartyRecord } from './counterparty.entity.ts'

export type { CounterpartiesService } from './counterparties.service.ts'
export const counterpartyEntities = [CounterpartyRecord]

export function createCounterparties(parts: Parts) {
  const service = createCounterpartiesService(parts)
  const queries: CounterpartyQueries = {
    async counterparty(id) {
      const row = await readCounterparty(parts.dataSource, id)
      if (!row) throw new Problem('not-found')
      return presentCounterparty(row)
    },
    async counterparties(filter) {
      const { rows, total } = await readCounterparties(parts.dataSource, filter)
      return { rows: rows.map(presentCounterparty), total }
    },
  }
  return { service, routes: counterpartyRoutes(service, queries) }
}
