import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/doses.contract.ts'
import { isBeforeStart } from '../../../shared/domain/dose/is-before-start.ts'
import { wentIn } from '../../../shared/domain/orders/dose-states.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { timeByNow, timeNotAhead } from '../../platform/http/check-time.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { FactTimes } from '../facility/index.ts'
import { readOrderNumberOfDose } from './administrations.reads.ts'
import * as repository from './administrations.repository.ts'
import { createCalculations } from './calculations.service.ts'
import {
  lockAndRead,
  personOf,
  refuseBroken,
  refuseGiver,
  refuseLongBefore,
  subjectOf,
} from './dose-context.ts'
import type { AdministrationsParts } from './dose-context.ts'
import { createOverrides } from './override.service.ts'
import { createStrikes } from './strike.service.ts'
import { tellClocksAnew } from './tell-clocks.ts'
import type { DoseRow } from './dose.entity.ts'
import { goneOf, readDoseSituation } from './dose-situation.ts'
import type { DoseSituation } from './dose-situation.ts'
import { amountEntered } from './entered-amounts.ts'
import { readLotNamed, refuseOtherLot } from './lot-of-order.ts'
import type { LotNamed } from './lot-of-order.ts'
import { isAmountNow, needsSecond, obstacles } from './judge-dose.ts'
import { calculationsBy, firstOf, secondOf, secondStands } from './second-person.ts'
import { concentrationGiven, exceptionsOf, judgeAmount, marksOfCalculations, textOf } from './judge-record.ts'
import type { Exception } from './judge-record.ts'

interface DoseToWrite {
  id: string
  kind: 'given' | 'recorded' | 'withheld' | 'refused'
  happenedAt: Date
  amount: Quantity | null
  lotId: string | null
  note: string | null
  secondCalculationId: string | null
  /** What is known to deviate before it is judged as a fact. */
  marks: Exception[]
}

/** Whose record what happened to the dose belongs in: the animals that were in its water, or all that it was for where none was. */
function affectedOf(treated: DoseSituation['treated']): DoseSituation['treated'] {
  const here = treated.filter(({ isHere }) => isHere !== false)
  return here.length > 0 ? here : treated
}

export function createAdministrationsService(parts: AdministrationsParts) {
  async function writeDose(tx: Tx, situation: DoseSituation, given: DoseToWrite): Promise<void> {
    const happened = wentIn(given)
    const isFact = given.kind === 'recorded'
    const lot = given.lotId === null ? null : await readLotNamed(tx, situation, given.lotId)
    const exceptions = [...given.marks, ...(isFact ? exceptionsOf(situation, { ...given, lot }) : [])]
    const times = {
      happenedAt: given.happenedAt,
      happenedOn: await parts.facility.dateOf(given.happenedAt, tx),
      recordedAt: tx.at,
      recordedBy: personOf(tx),
    }
    const { created } = await repository.insertDose(tx, {
      id: given.id,
      orderId: situation.row.id,
      orderVersionId: situation.versionId,
      doseKey: situation.planned.key,
      kind: given.kind,
      lotId: given.lotId,
      amountEnteredValue: given.amount?.value ?? null,
      amountEnteredUnit: given.amount?.unit ?? null,
      givenMgPerL: happened && given.amount ? concentrationGiven(situation, given.amount) : null,
      secondCalculationId: given.secondCalculationId,
      note: given.note,
      factsText: situation.judgement ? JSON.stringify(situation.judgement.facts) : null,
      exceptionsText: JSON.stringify(exceptions),
      ...times,
    })
    if (!created) return
    tx.audit({
      action: `dose.${given.kind}`,
      subject: subjectOf(situation),
      after: {
        key: situation.planned.key,
        amount: given.amount && { ...given.amount },
        overrides: situation.overrides.map(({ id }) => id),
        happenedAt: given.happenedAt.toISOString(),
        exceptions: exceptions.map((exception) => exception.code),
      },
      clinical: true,
    })
    if (happened)
      await parts.orders.course.doseWentIn(tx, {
        orderId: situation.row.id,
        enclosureIds: situation.enclosureIds,
        at: given.happenedAt,
      })
    await parts.orders.course.settle(tx, situation.row.id)
    if (isFact) await openDiscrepancies(tx, situation, { ...given, lot }, times)
  }

  /** What does not fit the order is explained by a veterinarian, and locks the next dose and clearance until then. */
  async function openDiscrepancies(
    tx: Tx,
    situation: DoseSituation,
    given: DoseToWrite & { lot: LotNamed | null },
    times: FactTimes,
  ): Promise<void> {
    const { treated, content, planned } = situation
    const facts = { dose: given.id, order: content.number, key: planned.key }
    const open = (
      kind: 'dose-amount-differs' | 'dosed-in-absence' | 'dose-of-other-product' | 'dose-under-broken-order',
      animals: readonly { animalId: string }[],
      more: Record<string, string>,
    ) =>
      parts.animals.service.openForDose(tx, {
        kind,
        animalIds: animals.map(({ animalId }) => animalId),
        doseId: given.id,
        facts: { ...facts, ...more },
        times,
      })
    const affected = affectedOf(treated)
    if (given.lot && !given.lot.isOrdered) {
      const { lotNumber, productName } = given.lot
      await open('dose-of-other-product', affected, { lot: lotNumber, product: productName })
    }
    if (situation.block.state === 'broken')
      await open('dose-under-broken-order', affected, { given: given.amount ? textOf(given.amount) : '' })
    const amount = situation.readable && given.amount && judgeAmount(situation, given.amount)
    if (amount && !amount.fits) {
      const { given: what, signed, workedOut } = amount
      await open('dose-amount-differs', affected, { given: what, signed, workedOut })
    }
    if (goneOf(situation).all) await open('dosed-in-absence', treated, { enclosure: content.enclosure.code })
  }

  /** An end before its dose ends nothing: a veterinarian finds out when the animals were in the bath. */
  async function openEarlyEnd(
    tx: Tx,
    dose: DoseRow,
    order: { number: string },
    times: FactTimes,
  ): Promise<void> {
    const { id: doseId, doseKey: key, happenedAt: at } = dose
    if (await repository.findVoid(tx, { doseId })) return
    const { treated } = await readDoseSituation(parts, order.number, key, at, { db: tx.manager })
    await parts.animals.service.openForDose(tx, {
      kind: 'end-before-dose',
      animalIds: affectedOf(treated).map(({ animalId }) => animalId),
      doseId,
      facts: { dose: doseId, order: order.number, key },
      times,
    })
  }

  return {
    ...createCalculations(parts),
    ...createStrikes(parts),
    ...createOverrides(parts),

    /** Gives a dose: everything is judged again in this transaction, and anything in the way refuses it. */
    async giveDose(
      context: RequestContext,
      number: string,
      key: string,
      given: BodyOf<typeof contracts.giveDose>,
    ): Promise<void> {
      refuseGiver(context)
      const amount = amountEntered(given.amount, '/amount')
      await parts.transactions.inTransaction(context, async (tx) => {
        const earlier = await repository.findDose(tx, given.id)
        if (earlier?.doseKey === key && earlier.kind === 'given') return
        const situation = await lockAndRead(parts, tx, { number, key, at: tx.at, lotId: given.lotId })
        refuseBroken(situation)
        await refuseOtherLot(tx, situation, given.lotId)
        const calculations = await parts.calculations(situation, tx)
        // before the second calculation the answer is the same for every amount and names none: it is not to be found by trying
        const isOpen = !needsSecond(situation) || secondStands(calculations)
        const why = obstacles(situation, calculations, { hide: !isOpen })
        const measured = situation.judgement?.dose?.measured
        if (measured && isOpen && !isAmountNow(situation, amount))
          why.push(doseWords.amountDiffers({ amount: `${measured.value} ${unitOf(measured.unit).symbol}` }))
        if (why.length > 0) throw new Problem('dose-not-possible', { detail: why.join(' '), extra: { why } })
        await writeDose(tx, situation, {
          id: given.id,
          kind: 'given',
          happenedAt: tx.at,
          amount,
          lotId: given.lotId,
          note: given.note ?? null,
          secondCalculationId: secondOf(calculations)?.id ?? null,
          marks: marksOfCalculations(calculations),
        })
      })
    },

    /** Records what happened. Refused only for its shape and for a time that has not come yet. */
    async recordDose(
      context: RequestContext,
      number: string,
      key: string,
      given: BodyOf<typeof contracts.recordDose>,
    ): Promise<void> {
      const happenedAt = timeNotAhead(given.happenedAt, parts.clock.now())
      const amount = given.amount === null ? null : amountEntered(given.amount, '/amount')
      await parts.transactions.inTransaction(context, async (tx) => {
        const situation = await lockAndRead(parts, tx, {
          number,
          key,
          at: happenedAt,
          lotId: given.lotId,
        })
        refuseLongBefore(situation, happenedAt)
        const calculations = calculationsBy(await parts.calculations(situation, tx), happenedAt)
        const rested =
          wentIn(given) && secondStands(calculations) && firstOf(calculations)?.lot_id === given.lotId
        await writeDose(tx, situation, {
          id: given.id,
          kind: given.kind,
          happenedAt,
          amount,
          lotId: given.lotId,
          note: given.note ?? null,
          secondCalculationId: rested ? (secondOf(calculations)?.id ?? null) : null,
          marks: rested ? marksOfCalculations(calculations) : [],
        })
      })
    },

    /** Ends a bath. Never gated: whoever stands at the tank may stop it. A time before the dose is kept, and ends nothing. */
    async stopBath(
      context: RequestContext,
      doseId: string,
      given: BodyOf<typeof contracts.stopBath>,
    ): Promise<void> {
      const happenedAt = timeByNow(given.happenedAt, parts.clock.now())
      await parts.transactions.inTransaction(context, async (tx) => {
        const dose = await repository.findDose(tx, doseId)
        const orderId = dose && (await repository.lockOrderOfDose(tx, dose.id))
        if (!dose || !orderId) throw new Problem('not-found')
        const isFirst = !(await repository.hasEnded(tx, doseId))
        const times = {
          happenedAt,
          happenedOn: await parts.facility.dateOf(happenedAt, tx),
          recordedAt: tx.at,
          recordedBy: personOf(tx),
        }
        const { created } = await repository.insertStop(tx, {
          id: given.id,
          doseId,
          cause: given.cause,
          seen: given.seen ?? null,
          rescue: given.rescue ?? null,
          ...times,
        })
        const isEarly = isBeforeStart(happenedAt.toISOString(), dose.happenedAt.toISOString())
        if (created)
          tx.audit({
            action: 'bath.stop',
            subject: { kind: 'dose', id: doseId, label: dose.doseKey },
            after: { cause: given.cause, seen: given.seen, rescue: given.rescue },
            clinical: true,
          })
        const named = created && (await readOrderNumberOfDose(tx.manager, doseId))
        if (named && isEarly) await openEarlyEnd(tx, dose, named, times)
        else if (named && !isFirst)
          await tellClocksAnew(parts, tx, { id: orderId, number: named.number }, doseWords.anotherEnd)
        else await parts.orders.course.settle(tx, orderId)
      })
    },
  }
}

export type AdministrationsService = ReturnType<typeof createAdministrationsService>
