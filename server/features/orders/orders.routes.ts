import * as contracts from '../../../shared/contracts/orders.contract.ts'
import { previewWeightOrder } from '../../../shared/contracts/weight-orders.contract.ts'
import { csvReply } from '../../platform/http/csv-reply.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import type { NoteAmountsPreviewed, NoteAmountsSeen } from './amounts-seen.service.ts'
import { ordersCsvColumns } from './orders-csv.ts'
import { readSituation, refuseUnfit } from './order-situation.ts'
import type { LabelPrinter } from './print-label.ts'
import type { OrderQueries } from './orders.queries.ts'
import type { OrdersService } from './orders.service.ts'
import { saidBench } from './order-bench.ts'
import type { AskBench } from './order-bench.ts'
import { presentPreview } from './preview-order.ts'
import { presentWeightPreview } from './preview-weight-order.ts'
import { readWeightSituation, refuseUnfitByWeight } from './weight-situation.ts'
import type { WeightSituationParts } from './weight-situation.ts'

export interface OrderRouteParts {
  service: OrdersService
  queries: OrderQueries
  situation: WeightSituationParts
  askBench: AskBench
  now(): Date
  noteAmountsSeen: NoteAmountsSeen
  noteAmountsPreviewed: NoteAmountsPreviewed
  /** The PDF of the label of the version in force, and a note that it was printed. */
  printLabel: LabelPrinter
  /** The PDF of a signed version, and a note that it was printed. */
  print(number: string, version: number | undefined, actor: Actor, requestId: string): Promise<Uint8Array>
}

export function orderRoutes(parts: OrderRouteParts): Route[] {
  const {
    service,
    queries,
    situation,
    askBench,
    now,
    noteAmountsSeen,
    noteAmountsPreviewed,
    print,
    printLabel,
  } = parts
  return [
    route(contracts.listOrders, ({ query }) => queries.list(query)),
    route(contracts.listOrdersCsv, async ({ query }) =>
      csvReply('orders.csv', ordersCsvColumns, await queries.find(query)),
    ),
    route(contracts.getOrder, async ({ params, query, context }) => {
      if (query.amounts === 'yes') await noteAmountsSeen(context, params.number)
      return queries.order(params.number, context.actor)
    }),
    route(contracts.previewOrder, async ({ body, query, context }) => {
      await refuseUnfit(situation, body, now())
      // an order that is amended is not another order beside itself
      const exceptOrderId = query.order === undefined ? null : await queries.idOf(query.order)
      const found = await readSituation(situation, body, now(), { exceptOrderId })
      await noteAmountsPreviewed(context, found)
      const dose = found.judgement?.dose ?? null
      const asked =
        body.bench === undefined && query.order !== undefined
          ? await queries.benchForPreview(query.order, context.actor, { body, isWorkedOut: dose !== null })
          : body
      return presentPreview(body, found, await saidBench(askBench, asked, dose))
    }),
    route(previewWeightOrder, async ({ body }) => {
      await refuseUnfitByWeight(situation, body, now())
      return presentWeightPreview(body, await readWeightSituation(situation, body, now()))
    }),
    route(contracts.draftOrder, async ({ body, context }) => {
      const { number } = await service.draftOrder(context, body.id, body.fields)
      return queries.order(number, context.actor)
    }),
    route(contracts.reviseDraft, async ({ params, body, context }) => {
      await service.reviseDraft(context, params.number, body.expectedVersion, body.fields)
      return queries.order(params.number, context.actor)
    }),
    route(contracts.signOrder, async ({ params, body, context }) => {
      await service.signOrder(context, params.number, body)
      return queries.order(params.number, context.actor)
    }),
    route(contracts.holdOrder, async ({ params, body, context }) => {
      await service.holdOrder(context, params.number, body)
      return queries.order(params.number, context.actor)
    }),
    route(contracts.liftOrderHold, async ({ params, body, context }) => {
      await service.liftHold(context, params.number, body.reason)
      return queries.order(params.number, context.actor)
    }),
    route(contracts.discontinueOrder, async ({ params, body, context }) => {
      await service.discontinueOrder(context, params.number, body.reason)
      return queries.order(params.number, context.actor)
    }),
    route(contracts.printOrderLabel, async ({ params, context }) => ({
      contentType: 'application/pdf',
      fileName: `${params.number}-label.pdf`,
      body: await printLabel(context, params.number),
    })),
    route(contracts.printOrder, async ({ params, query, context }) => ({
      contentType: 'application/pdf',
      fileName: `${params.number}.pdf`,
      body: await print(params.number, query.version, context.actor, context.requestId),
    })),
  ]
}
