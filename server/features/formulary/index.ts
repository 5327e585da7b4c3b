import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import type { FacilityService } from '../facility/index.ts'
import type { People } from '../people/index.ts'
import { DoseLineConfirmation, DoseLineRow, LotEventRow, LotRow, ProductRow } from './formulary.entity.ts'
import { presentDoseLine, presentProduct } from './formulary.present.ts'
import { readDoseLine, readDoseLines, readProductIdOfLot, readProducts } from './formulary.reads.ts'
import { formularyRoutes } from './formulary.routes.ts'
import type { FormularyQueries } from './formulary.routes.ts'
import { createFormularyService } from './formulary.service.ts'

export type { FormularyService } from './formulary.service.ts'
export const formularyEntities = [ProductRow, LotRow, LotEventRow, DoseLineRow, DoseLineConfirmation]

export function createFormulary(parts: Parts & { facility: FacilityService; people: People }) {
  const { dataSource, facility, clock } = parts
  const service = createFormularyService({
    ...parts,
    validLicence: (personId, at) => parts.people.questions.validLicence(personId, at),
    refuseWhileLocked: parts.people.ownPassword.refuseWhileLocked,
  })
  const today = () => facility.dateOf(clock.now())
  const queries: FormularyQueries = {
    async formulary() {
      const on = await today()
      const [lines, products] = await Promise.all([readDoseLines(dataSource), readProducts(dataSource)])
      return { lines: lines.map(presentDoseLine), products: products.map((row) => presentProduct(row, on)) }
    },
    async product(id) {
      const [row] = await readProducts(dataSource, id)
      if (!row) throw new Problem('not-found')
      return presentProduct(row, await today())
    },
    async productOfLot(lotId) {
      const id = await readProductIdOfLot(dataSource, lotId)
      if (id === null) throw new Problem('not-found')
      return queries.product(id)
    },
    async doseLinesOf(agent) {
      const rows = (await readDoseLines(dataSource)).filter((row) => row.agent === agent)
      return rows.map(presentDoseLine).filter((line) => line.state !== 'proposed')
    },
    async doseLine(id) {
      const row = await readDoseLine(dataSource, id)
      if (!row) throw new Problem('not-found')
      return presentDoseLine(row)
    },
  }
  return { service, queries, routes: formularyRoutes(service, queries) }
}

export type Formulary = ReturnType<typeof createFormulary>
