import type { AnsweredCaution } from '../../../shared/contracts/orders.contract.ts'
import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import { scheduleOf } from '../../../shared/domain/licences/controlled-agents.ts'
import { orderProblemWords, orderWords, relationshipWords } from '../../../shared/messages/orders.ts'
import { verifyWorking } from '../../platform/arithmetic/verify-working.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { timeByNow } from '../../platform/http/check-time.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { Ids } from '../../platform/ids.ts'
import type { FacilityService } from '../facility/index.ts'
import type { SigningService } from '../signing/index.ts'
import { checkAnswers } from './check-answers.ts'
import { scheduleOfDraft } from './draft-schedule.ts'
import { keptBench, saidBench } from './order-bench.ts'
import type { AskBench } from './order-bench.ts'
import { contentOf } from './order-content.ts'
import type { Override } from './order-content.ts'
import type { OrderEventRow, OrderHead } from './order.entity.ts'
import {
  missingFields,
  missingProblem,
  noWaterProblem,
  readSituation,
  refuseUnfit,
} from './order-situation.ts'
import type { SituationParts } from './order-situation.ts'
import type { CourseReporter } from './report-course.ts'
import * as repository from './orders.repository.ts'
import { saidCautions } from './say-order.ts'
import { targetMgPerL } from './target-mg-per-l.ts'

export interface OrdersParts extends SituationParts {
  transactions: Transactions
  clock: Clock
  ids: Ids
  facility: FacilityService
  signing: SigningService
  enclosureName(id: string): Promise<string>
  /** Whether there is such an enclosure and it has water now. */
  hasWater(enclosureId: string): Promise<boolean>
  course: CourseReporter
  askBench: AskBench
}

export interface SignRequest {
  licenceId?: string | undefined
  password: string
  expectedVersion: number
  read: AnsweredCaution[]
  overrides: Override[]
  relationship?: boolean | undefined
}

const subject = (order: Pick<OrderHead, 'id' | 'number'>) => ({
  kind: 'order',
  id: order.id,
  label: order.number,
})
const asJson = (fields: BathOrderFields) => JSON.parse(JSON.stringify(fields)) as Json

/** Held, if the newest of holds and lifts is a hold; ended, once discontinued. */
export function standingOf(events: readonly Pick<OrderEventRow, 'kind'>[]): {
  held: boolean
  ended: boolean
} {
  const holds = events.filter((event) => event.kind !== 'discontinued')
  return { held: holds.at(-1)?.kind === 'held', ended: events.some((event) => event.kind === 'discontinued') }
}

export function createOrdersService(parts: OrdersParts) {
  /** A technician's draft is a proposal, which a veterinarian takes up. */
  const stageFor = (context: RequestContext) =>
    context.actor.roles.includes('veterinarian') ? ('draft' as const) : ('proposed' as const)

  async function lock(tx: Tx, number: string): Promise<OrderHead> {
    const order = await repository.lockOrder(tx, number)
    if (!order) throw new Problem('not-found')
    return order
  }

  /** A technician proposes: what a veterinarian writes is not written over. */
  function refuseTheirDraft(context: RequestContext, order: OrderHead): void {
    if (order.stage === 'draft' && stageFor(context) === 'proposed')
      throw new Problem('may-not', { detail: orderProblemWords.veterinariansDraft })
  }

  async function refuseEnded(tx: Tx, order: OrderHead): Promise<void> {
    if (standingOf(await repository.eventsOf(tx, order.id)).ended)
      throw new Problem('order-ended', { detail: 'Write a new order.' })
  }

  async function noteEvent(
    tx: Tx,
    order: OrderHead,
    kind: OrderEventRow['kind'],
    given: { id: string; happenedAt: Date; reason: string | null },
  ): Promise<void> {
    const { created } = await repository.insertEvent(tx, {
      ...given,
      orderId: order.id,
      kind,
      happenedOn: await parts.facility.dateOf(given.happenedAt, tx),
      recordedAt: tx.at,
      recordedBy: tx.actor.personId,
    })
    if (created)
      tx.audit({
        action: `order.${kind}`,
        subject: subject(order),
        after: { reason: given.reason },
        clinical: true,
      })
  }

  return {
    async draftOrder(
      context: RequestContext,
      id: string,
      fields: BathOrderFields,
    ): Promise<{ number: string }> {
      if (!(await parts.hasWater(fields.enclosureId))) throw noWaterProblem()
      await refuseUnfit(parts, fields, parts.clock.now())
      await saidBench(parts.askBench, fields, null)
      return parts.transactions.inTransaction(context, async (tx) => {
        const earlier = await repository.findOrderById(tx, id)
        if (earlier) {
          if (earlier.draftText !== JSON.stringify(fields)) throw new Problem('id-already-used')
          return { number: earlier.number }
        }
        const number = await parts.facility.nextNumber(tx, 'order')
        const row: OrderHead = {
          id,
          number,
          enclosureId: fields.enclosureId,
          stage: stageFor(context),
          draftText: JSON.stringify(fields),
          createdAt: tx.at,
          createdBy: tx.actor.personId,
          changedAt: tx.at,
          changedBy: tx.actor.personId,
          version: 1,
        }
        await repository.insertOrder(tx, row)
        tx.audit({ action: 'order.draft', subject: subject(row), after: asJson(fields), clinical: true })
        return { number }
      })
    },

    /** Saves a draft again; on a signed order it begins an amended version, while the signed one stays in force. */
    async reviseDraft(
      context: RequestContext,
      number: string,
      expectedVersion: number,
      written: BathOrderFields,
    ) {
      await refuseUnfit(parts, written, parts.clock.now())
      await saidBench(parts.askBench, written, null)
      await parts.transactions.inTransaction(context, async (tx) => {
        const order = await lock(tx, number)
        await refuseEnded(tx, order)
        refuseTheirDraft(context, order)
        // whoever was not shown what the bench said has nothing to send back, and takes nothing away
        const fields =
          written.bench === undefined ? { ...written, ...(await keptBench(tx.manager, number)) } : written
        await repository.saveOrder(
          tx,
          { id: order.id, version: expectedVersion },
          {
            enclosureId: fields.enclosureId,
            stage: stageFor(context),
            draftText: JSON.stringify(fields),
            changedAt: tx.at,
            changedBy: tx.actor.personId,
          },
        )
        tx.audit({
          action: 'order.revise-draft',
          subject: subject(order),
          before: order.draftText === null ? null : (JSON.parse(order.draftText) as Json),
          after: asJson(fields),
          clinical: true,
        })
      })
    },

    /**
     * Signs a draft: recomputed from stored facts in this transaction, every working line evaluated a second way, every
     * caution judged anew; then frozen. A client's figure is never used.
     */
    async signOrder(
      context: RequestContext,
      number: string,
      request: SignRequest,
    ): Promise<{ versionNo: number }> {
      const controlledSchedule = await scheduleOfDraft(parts, number)
      const signatory = await parts.signing.confirmSignatory(
        context,
        'order.sign',
        request.password,
        parts.clock.now(),
        { licenceId: request.licenceId, controlledSchedule },
      )
      return parts.transactions.inTransaction(context, async (tx) => {
        const order = await lock(tx, number)
        await refuseEnded(tx, order)
        if (order.draftText === null) throw new Problem('nothing-to-sign')
        if (order.version !== request.expectedVersion)
          throw new Problem('stale-version', {
            detail: 'Nothing was signed. Read what changed, then sign again.',
            extra: { current_version: order.version },
          })
        const fields = JSON.parse(order.draftText) as BathOrderFields
        const missing = missingFields(fields)
        if (missing.length > 0) throw missingProblem(missing)
        await refuseUnfit(parts, fields, parts.clock.now())
        const found = await readSituation(parts, fields, tx.at, { db: tx.manager, exceptOrderId: order.id })
        if (found.changed.length > 0) throw new Problem('not-as-entered', { detail: found.changed.join(' ') })
        const bench = await saidBench(parts.askBench, fields, found.judgement?.dose ?? null)
        checkAnswers(saidCautions(found), request)
        const { judgement, product, situation } = found
        // the drug was exchanged between the look at the registration and now
        if (product && scheduleOf(product.agent) !== controlledSchedule) throw new Problem('stale-version')
        const isExtralabel = fields.use === 'extralabel'
        if (isExtralabel && request.relationship !== true)
          throw refusedInput('/relationship', relationshipWords.needed, 'relationship-not-stated')
        const volume = situation.water.volume
        if (product && fields.lotId !== null && !product.lots.some(({ id }) => id === fields.lotId))
          throw refusedInput('/fields/lotId', orderWords.lotOfOther, 'lot-of-other-product')
        if (!judgement?.dose || !judgement.dose.measured || !product || !volume || fields.startsAt === null)
          throw new Problem('order-incomplete', { detail: 'The amount cannot be worked out yet.' })
        const verified = await verifyWorking(judgement.dose.working)
        if (!verified.ok)
          throw new Problem('working-disagrees', {
            extra: { lines: verified.disagreements.map((one) => one.key) },
          })
        const versionNo = ((await repository.newestVersion(tx, order.id))?.versionNo ?? 0) + 1
        const treated = situation.animals.filter((animal) => fields.animalIds.includes(animal.animalId))
        if (treated.length !== new Set(fields.animalIds).size)
          throw new Problem('order-incomplete', {
            detail: 'Some of the animals named are no longer in this water. Choose the animals again.',
          })
        const content = contentOf({
          number,
          versionNo,
          enclosureName: await parts.enclosureName(fields.enclosureId),
          fields,
          found: { ...found, product },
          dose: judgement.dose,
          volume,
          bench,
          overrides: request.overrides,
          read: request.read,
          relationship: isExtralabel ? relationshipWords.statement : null,
        })
        const sealed = await parts.signing.seal(tx, {
          signatory,
          subject: subject(order),
          meaning: orderWords.meaningAuthor,
          content: JSON.parse(JSON.stringify(content)) as Json,
        })
        const versionId = parts.ids.next()
        await repository.insertVersion(
          tx,
          {
            id: versionId,
            orderId: order.id,
            versionNo,
            signedTextId: sealed.id,
            agent: product.agent,
            productId: product.id,
            lotId: fields.lotId,
            enclosureId: fields.enclosureId,
            determinationId: volume.id,
            netVolumeLitres: volume.netVolumeLitres,
            allowedDriftPercent: fields.allowedVolumeDriftPercent,
            amountEnteredValue: judgement.dose.measured.value,
            amountEnteredUnit: judgement.dose.measured.unit,
            targetMgPerL: targetMgPerL(fields),
            doses: fields.doses,
            intervalHours: fields.intervalHours,
            contactMinutes: fields.timing === 'timed' ? fields.contactMinutes : null,
            startsAt: new Date(fields.startsAt),
            signedAt: tx.at,
            signedBy: signatory.personId,
          },
          treated.map(({ animalId, taxonId }) => ({ animalId, taxonId })),
        )
        const declared = treated.filter((animal) =>
          fields.stated.experienceWith.includes(animal.scientificName),
        )
        await repository.insertExperience(
          tx,
          [...new Set(declared.map((animal) => animal.taxonId))].map((taxonId) => ({
            id: parts.ids.next(),
            agent: product.agent,
            taxonId,
            orderVersionId: versionId,
            declaredAt: tx.at,
            declaredBy: signatory.personId,
          })),
        )
        await repository.saveOrder(
          tx,
          { id: order.id, version: order.version },
          { stage: 'none', draftText: null, changedAt: tx.at, changedBy: signatory.personId },
        )
        tx.audit({
          action: versionNo === 1 ? 'order.sign' : 'order.amend',
          subject: subject(order),
          after: { versionNo, hash: sealed.hash, overrides: request.overrides.map((one) => ({ ...one })) },
          clinical: true,
        })
        return { versionNo }
      })
    },

    /**
     * Holds an order at once. Never refused for its state, nor for a device's clock that goes ahead: whoever saw something
     * may stop, and then it was stopped by now.
     */
    async holdOrder(
      context: RequestContext,
      number: string,
      given: { id: string; happenedAt: string; reason?: string },
    ): Promise<void> {
      const happenedAt = timeByNow(given.happenedAt, parts.clock.now())
      await parts.transactions.inTransaction(context, async (tx) => {
        const order = await lock(tx, number)
        await noteEvent(tx, order, 'held', { id: given.id, happenedAt, reason: given.reason ?? null })
      })
    },

    async liftHold(context: RequestContext, number: string, reason: string): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const order = await lock(tx, number)
        if (!standingOf(await repository.eventsOf(tx, order.id)).held) throw new Problem('not-held')
        await noteEvent(tx, order, 'hold-lifted', { id: parts.ids.next(), happenedAt: tx.at, reason })
      })
    },

    async discontinueOrder(context: RequestContext, number: string, reason: string): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const order = await lock(tx, number)
        await refuseEnded(tx, order)
        await noteEvent(tx, order, 'discontinued', { id: parts.ids.next(), happenedAt: tx.at, reason })
        await parts.course.settle(tx, order.id)
      })
    },
  }
}

export type OrdersService = ReturnType<typeof createOrdersService>
