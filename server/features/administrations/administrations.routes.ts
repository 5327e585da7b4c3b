import * as contracts from '../../../shared/contracts/doses.contract.ts'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import type { QueryOf, ReplyOf } from '../../../shared/contracts/contract.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { SheetPrinter } from './print-sheet.ts'
import type { AdministrationsService } from './administrations.service.ts'

export interface AdministrationsQueries {
  /** @param lotId the lot in the hand, where somebody chose one */
  sheet(
    number: string,
    key: string,
    blind: boolean,
    context: RequestContext,
    lotId?: string,
  ): Promise<BathSheet>
  sheetOfDose(doseId: string, context: RequestContext): Promise<BathSheet>
  due(query: QueryOf<typeof contracts.listDueDoses>): Promise<ReplyOf<typeof contracts.listDueDoses>['rows']>
}

export function administrationRoutes(
  service: AdministrationsService,
  queries: AdministrationsQueries,
  print: SheetPrinter,
): Route[] {
  return [
    route(contracts.listDueDoses, async ({ query }) => ({ rows: await queries.due(query) })),
    route(contracts.getBathSheet, ({ params, query, context }) =>
      queries.sheet(params.number, params.key, query.blind === 'yes', context, query.lot),
    ),
    route(contracts.printBathSheet, async ({ params, context }) => ({
      contentType: 'application/pdf',
      fileName: `${params.number}-dose-${params.key}.pdf`,
      body: await print(context, params.number, params.key),
    })),
    route(contracts.calculateFirst, async ({ params, body, context }) => {
      await service.calculateFirst(context, params.number, params.key, body)
      return queries.sheet(params.number, params.key, false, context)
    }),
    route(contracts.calculateSecond, async ({ params, body, context }) => {
      await service.calculateSecond(context, params.number, params.key, body)
      return queries.sheet(params.number, params.key, true, context)
    }),
    route(contracts.overrideDoseStop, async ({ params, body, context }) => {
      await service.overrideDoseStop(context, params.number, params.key, body)
      // whoever signs it may still be the second person
      return queries.sheet(params.number, params.key, true, context)
    }),
    route(contracts.giveDose, async ({ params, body, context }) => {
      await service.giveDose(context, params.number, params.key, body)
      return queries.sheet(params.number, params.key, false, context)
    }),
    route(contracts.recordDose, async ({ params, body, context }) => {
      await service.recordDose(context, params.number, params.key, body)
      // with its amounts: whoever put in ten times as much is told so at once; where nothing went in there is none to tell
      return queries.sheet(params.number, params.key, body.kind !== 'recorded', context)
    }),
    route(contracts.strikeDoseRecord, async ({ params, body, context }) => {
      const doseId = await service.strikeDoseRecord(context, params, body)
      return queries.sheetOfDose(doseId, context)
    }),
    route(contracts.stopBath, async ({ params, body, context }) => {
      await service.stopBath(context, params.doseId, body)
      return queries.sheetOfDose(params.doseId, context)
    }),
  ]
}
