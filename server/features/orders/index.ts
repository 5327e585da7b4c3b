import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import type { CautionStage } from '../../../shared/domain/cautions/caution-rule.ts'
import type { Db } from '../../platform/database/db.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import type { PdfPool } from '../../platform/pdf/pdf-pool.ts'
import type { Animals } from '../animals/index.ts'
import type { Cautions } from '../cautions/index.ts'
import type { Documents } from '../documents/index.ts'
import { placeReads } from '../enclosures/index.ts'
import type { FacilityService } from '../facility/index.ts'
import type { Formulary } from '../formulary/index.ts'
import { readSamplesTaken } from '../quarantine/index.ts'
import type { TreatmentsService } from '../quarantine/index.ts'
import type { SigningService } from '../signing/index.ts'
import type { Water } from '../water/index.ts'
import { createAmountsPreviewed, createAmountsSeen } from './amounts-seen.service.ts'
import { createBathFactsReader } from './bath-facts.ts'
import {
  AgentExperience,
  OrderEventRow,
  OrderHead,
  OrderVersion,
  OrderVersionAnimal,
} from './order.entity.ts'
import type { AskBench } from './order-bench.ts'
import { readOrderWork } from './order-work.ts'
import { readSituation } from './order-situation.ts'
import { createCourseReporter } from './report-course.ts'
import type { FacilityDate } from '../../../shared/domain/time/instant.ts'
import { readWithdrawalHold } from './withdrawal-holds.ts'
import { AdverseEventReviewRow, AdverseEventRow } from './adverse-event.entity.ts'
import { createAdverseEvents } from './adverse-events.ts'
import { createOrderQueries } from './orders.queries.ts'
import { orderRoutes } from './orders.routes.ts'
import { createOrdersService } from './orders.service.ts'
import { createOrderPrinter, orderPrintKind } from './print-order.ts'
import { createLabelPrinter, labelPrintKind } from './print-label.ts'
import { answerForOrderPrints } from './print-state.ts'

export { readKnown } from './knowers.reads.ts'
export { noteLearnt } from './amounts-seen.service.ts'
export type { Learnt } from './blind-order.ts'
export { verifyOrders } from './verify-orders.ts'
export { saidCautions } from './say-order.ts'
export type { OrdersService } from './orders.service.ts'
export type { OrderQueries } from './orders.queries.ts'
export type { AskBench } from './order-bench.ts'
export { orderNotice } from './order-document.ts'
export { saidAmount, sayTreated } from './say-order.ts'
export { sayRounding } from './say-rounding.ts'
export { saidAnimal } from './preview-order.ts'
export type { SignedOrder } from './order-content.ts'
export type { OpenOrder, OrderWork, OrdersAtWork } from './order-work.ts'
export { readOpenAdverseEvents } from './adverse-events.ts'
export type { EventReadRow } from './orders.reads.ts'
export type { BathFactsReader } from './bath-facts.ts'
export const orderEntities = [
  OrderHead,
  OrderVersion,
  OrderVersionAnimal,
  OrderEventRow,
  AgentExperience,
  AdverseEventRow,
  AdverseEventReviewRow,
]

export interface OrdersOutside extends Parts {
  facility: FacilityService
  signing: SigningService
  formulary: Formulary
  cautions: Cautions
  water: Water
  animals: Animals
  documents: Documents
  pdf: PdfPool
  /** Where people reach this installation, for codes on paper. */
  publicUrl: string
  treatments: TreatmentsService
  /** Asks a calculator of the bench. */
  askBench: AskBench
}

export function createOrders(parts: OrdersOutside) {
  const { dataSource, clock, facility, signing, formulary, documents } = parts
  const now = () => clock.now()
  const facts = createBathFactsReader({
    dataSource,
    water: parts.water.questions,
    animals: parts.animals.questions,
    samplesTaken: readSamplesTaken,
    zone: () => facility.zone(),
  })
  const situation = {
    dataSource,
    facts,
    settingsAt: parts.cautions.settingsAt,
    product: (id: string) => formulary.queries.product(id),
    doseLine: (id: string) => formulary.queries.doseLine(id),
    doseLinesOf: (agent: AgentCode) => formulary.queries.doseLinesOf(agent),
  }
  const course = createCourseReporter(parts)
  const service = createOrdersService({
    ...parts,
    course,
    ...situation,
    hasWater: (enclosureId) => parts.water.questions.hasWaterAt(enclosureId, now()),
    enclosureName: async (id) => (await placeReads.readEnclosure(dataSource, { id }))?.name ?? '',
  })
  const queries = createOrderQueries({ dataSource, signing, now, askBench: parts.askBench })
  const noteAmountsSeen = createAmountsSeen({ ...parts, queries })
  const noteAmountsPreviewed = createAmountsPreviewed({ ...parts, noteAmountsSeen })
  const print = createOrderPrinter({ ...parts, documents: documents.service, queries, noteAmountsSeen })
  const printLabel = createLabelPrinter({ ...parts, documents: documents.service, queries })
  const answerForPrint = answerForOrderPrints(queries)
  documents.prints.answerFor(orderPrintKind, answerForPrint)
  documents.prints.answerFor(labelPrintKind, answerForPrint)
  parts.animals.amounts.askOf(queries.blindAmong)
  /** Judges an order's fields by the facts of an instant; null where its water cannot be read any more. */
  const judge = (
    fields: BathOrderFields,
    at: Date,
    options: { db?: Db; exceptOrderId?: string | null; stage?: CautionStage },
  ) =>
    readSituation(situation, fields, at, options).catch((error: unknown) => {
      if (error instanceof Problem && error.code === 'not-found') return null
      throw error
    })
  return {
    service,
    queries,
    judge,
    print,
    course,
    /** Orders with something to decide, and the plans of the open ones, for the worklist. */
    work: () => readOrderWork(dataSource, now().toISOString(), signing.signer),
    answerForPrint,
    /** Whether an animal still waits after a dose before it may be eaten or set free. */
    withdrawalHold: (asked: { animalId: string; on: FacilityDate; at: Date }, db: Db) =>
      readWithdrawalHold(
        {
          animals: parts.animals.questions,
          settingsAt: parts.cautions.settingsAt,
          zone: () => facility.zone(),
        },
        asked,
        db,
      ),
    routes: [
      ...createAdverseEvents(parts).routes,
      ...orderRoutes({
        service,
        queries,
        situation: { ...situation, animals: parts.animals.questions },
        askBench: parts.askBench,
        now,
        noteAmountsSeen,
        noteAmountsPreviewed,
        print,
        printLabel,
      }),
    ],
  }
}

export type Orders = ReturnType<typeof createOrders>
