import * as contracts from '../../../shared/contracts/formulary.contract.ts'
import type { DoseLine, Product } from '../../../shared/contracts/formulary.contract.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { FormularyService } from './formulary.service.ts'

export interface FormularyQueries {
  formulary(): Promise<{ lines: DoseLine[]; products: Product[] }>
  product(id: string): Promise<Product>
  productOfLot(lotId: string): Promise<Product>
  doseLine(id: string): Promise<DoseLine>
  /** The lines in force for an agent: proposals are none. */
  doseLinesOf(agent: DoseLine['agent']): Promise<DoseLine[]>
}

export function formularyRoutes(service: FormularyService, queries: FormularyQueries): Route[] {
  return [
    route(contracts.getFormulary, () => queries.formulary()),
    route(contracts.enterProduct, async ({ body, context }) => {
      await service.enterProduct(context, body)
      return queries.product(body.id)
    }),
    route(contracts.withdrawProduct, async ({ params, body, context }) => {
      await service.withdrawProduct(context, params.id, body)
      return queries.product(params.id)
    }),
    route(contracts.receiveLot, async ({ params, body, context }) => {
      await service.receiveLot(context, params.id, body)
      return queries.product(params.id)
    }),
    route(contracts.noteLotEvent, async ({ params, body, context }) => {
      await service.noteLotEvent(context, params.lotId, body)
      return queries.productOfLot(params.lotId)
    }),
    route(contracts.proposeDoseLine, async ({ body, context }) => {
      await service.proposeDoseLine(context, body)
      return queries.doseLine(body.id)
    }),
    route(contracts.confirmDoseLine, async ({ params, body, context }) => {
      await service.confirmDoseLine(context, params.id, body.reason)
      return queries.doseLine(params.id)
    }),
  ]
}
