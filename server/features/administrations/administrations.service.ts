import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/doses.contract.ts'
import { listExceptions } from '../../../shared/domain/cautions/list-exceptions.ts'
import { decide, rolesThatMay } from '../../../shared/domain/permissions/decide.ts'
import { parseQuantity } from '../../../shared/domain/units/parse-quantity.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { findUnit } from '../../../shared/domain/units/find-unit.ts'
import { permissionWords } from '../../../shared/messages/permissions.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import { verifyWorking } from '../../platform/arithmetic/verify-working.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { timeByNow, timeNotAhead } from '../../platform/http/check-time.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { FacilityService } from '../facility/index.ts'
import type { CalculationReadRow } from './administrations.reads.ts'
import * as repository from './administrations.repository.ts'
import { compareCalculations } from './compare-calculations.ts'
import { readDoseSituation } from './dose-situation.ts'
import type { DoseSituation, DoseSituationParts } from './dose-situation.ts'
import { divisionOf, isAmountNow, obstacles } from './judge-dose.ts'
import { saidForSheet } from './present-sheet.ts'

export interface AdministrationsParts extends DoseSituationParts {
  transactions: Transactions
  clock: Clock
  facility: FacilityService
  calculations(versionId: string, key: string, tx: Tx): Promise<CalculationReadRow[]>
}

interface Exception {
  ruleId: string
  code: string
  level: 'stop' | 'warning' | 'note'
  title: string
  text: string
  resolve: string[]
}

const subject = (situation: DoseSituation) => ({
  kind: 'order',
  id: situation.row.id,
  label: situation.row.number,
})

/** An amount as entered, checked for its shape only: above zero, a mass or a volume. */
function amountEntered(entered: { value: string; unit: string }, pointer: string): Quantity {
  const unit = findUnit(entered.unit, {})
  const dimension = unit.ok && unitOf(unit.value).dimension === 'volume' ? 'volume' : 'mass'
  const parsed = parseQuantity(entered, { dimension, above: 0, field: 'amount' })
  if (parsed.ok) return parsed.value.entered
  const detail = sayNumberRefusal(parsed.refusal)
  throw new Problem('bad-input', { detail, errors: [{ pointer, detail, code: parsed.refusal.code }] })
}

/** A strength as read from a container: a share of the mass, or a mass in a volume. */
function strengthEntered(entered: { value: string; unit: string }, pointer: string): Quantity {
  const unit = findUnit(entered.unit, {})
  const dimension =
    unit.ok && unitOf(unit.value).dimension === 'massConcentration' ? 'massConcentration' : 'massFraction'
  const parsed = parseQuantity(entered, { dimension, above: 0, field: 'strengthRead' })
  if (parsed.ok) return parsed.value.entered
  const detail = sayNumberRefusal(parsed.refusal)
  throw new Problem('bad-input', { detail, errors: [{ pointer, detail, code: parsed.refusal.code }] })
}

/** A bath is given by a veterinarian or technician; what an order opens to keepers is feed and topical. */
function refuseGiver(context: RequestContext): void {
  if (!decide('dose.give', context.actor.roles, {}).allowed)
    throw new Problem('may-not', {
      detail: permissionWords.whoMay({
        roles: rolesThatMay('dose.give').filter((role) => decide('dose.give', [role], {}).allowed),
      }),
    })
}

export function createAdministrationsService(parts: AdministrationsParts) {
  async function lockAndRead(tx: Tx, number: string, key: string, at: Date, lotId?: string | null) {
    if ((await repository.lockOrderHead(tx, number)) === null) throw new Problem('not-found')
    return readDoseSituation(parts, number, key, at, {
      db: tx.manager,
      ...(lotId === undefined ? {} : { lotId }),
    })
  }

  /** Facts that rules on what is about to happen would have refused; kept with the record, for the veterinarian. */
  function exceptionsOf(situation: DoseSituation, happenedAt: Date): Exception[] {
    const { judgement, block, row } = situation
    const zone = judgement?.facts.zone ?? 'UTC'
    const found: Exception[] = judgement
      ? listExceptions(judgement.facts).map((caution) => saidForSheet(caution, zone))
      : []
    const mark = (code: string, title: string, text: string) =>
      found.push({ ruleId: 'record', code, level: 'warning', title, text, resolve: [] })
    if (happenedAt < new Date(block.signedAt))
      mark('signed-after', doseWords.signedAfter, doseWords.signedAfterText)
    if (row.phase === 'held') mark('while-held', doseWords.whileHeld, doseWords.whileHeldText)
    if (block.state !== 'intact') mark('not-intact', doseWords.notIntact, doseWords.notIntact)
    return found
  }

  async function writeDose(
    tx: Tx,
    situation: DoseSituation,
    given: {
      id: string
      kind: 'given' | 'recorded' | 'withheld' | 'refused'
      happenedAt: Date
      amount: Quantity | null
      lotId: string | null
      note: string | null
      secondCalculationId: string | null
    },
  ): Promise<void> {
    const happened = given.kind === 'given' || given.kind === 'recorded'
    const target = situation.judgement?.facts.order.target
    const inMgPerL =
      happened && target?.state === 'known' && target.value.unit === 'mg/L' ? target.value.value : null
    const exceptions = happened && given.kind === 'recorded' ? exceptionsOf(situation, given.happenedAt) : []
    const { created } = await repository.insertDose(tx, {
      id: given.id,
      orderVersionId: situation.versionId,
      doseKey: situation.planned.key,
      kind: given.kind,
      lotId: given.lotId,
      amountEnteredValue: given.amount?.value ?? null,
      amountEnteredUnit: given.amount?.unit ?? null,
      givenMgPerL: inMgPerL,
      secondCalculationId: given.secondCalculationId,
      note: given.note,
      factsText: situation.judgement ? JSON.stringify(situation.judgement.facts) : null,
      exceptionsText: JSON.stringify(exceptions),
      happenedAt: given.happenedAt,
      happenedOn: await parts.facility.dateOf(given.happenedAt, tx),
      recordedAt: tx.at,
      recordedBy: personOf(tx),
    })
    if (!created) return
    tx.audit({
      action: `dose.${given.kind}`,
      subject: subject(situation),
      after: {
        key: situation.planned.key,
        amount: given.amount && { ...given.amount },
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
  }

  return {
    /** Works the amount out for the water as it is now and the lot in the hand. */
    async calculateFirst(
      context: RequestContext,
      number: string,
      key: string,
      given: BodyOf<typeof contracts.calculateFirst>,
    ): Promise<void> {
      refuseGiver(context)
      await parts.transactions.inTransaction(context, async (tx) => {
        const situation = await lockAndRead(tx, number, key, tx.at, given.lotId)
        const measured = situation.judgement?.dose?.measured
        if (!measured || !situation.judgement?.dose)
          throw new Problem('dose-not-possible', { detail: doseWords.noAmount })
        const verified = await verifyWorking(situation.judgement.dose.working)
        if (!verified.ok) throw new Problem('working-disagrees')
        const volume = situation.judgement.facts.volume.determination
        const { created } = await repository.insertCalculation(tx, {
          id: given.id,
          orderVersionId: situation.versionId,
          doseKey: key,
          part: 'first',
          enclosureRead: null,
          markRead: null,
          lotRead: null,
          lotId: given.lotId,
          strengthEnteredValue: null,
          strengthEnteredUnit: null,
          amountEnteredValue: measured.value,
          amountEnteredUnit: measured.unit,
          netVolumeLitres: volume.state === 'known' ? volume.value.netVolumeLitres : null,
          agrees: null,
          differencePercent: null,
          recordedAt: tx.at,
          recordedBy: personOf(tx),
        })
        if (created)
          tx.audit({
            action: 'dose.calculate-first',
            subject: subject(situation),
            after: { key, amount: { ...measured }, lotId: given.lotId },
            clinical: true,
          })
      })
    },

    /** Stores a blind second calculation and says whether it agrees; a disagreement is kept as well. */
    async calculateSecond(
      context: RequestContext,
      number: string,
      key: string,
      given: BodyOf<typeof contracts.calculateSecond>,
    ): Promise<void> {
      const amount = amountEntered(given.amount, '/amount')
      const strength = strengthEntered(given.strengthRead, '/strengthRead')
      await parts.transactions.inTransaction(context, async (tx) => {
        const situation = await lockAndRead(tx, number, key, tx.at)
        const first = (await parts.calculations(situation.versionId, key, tx)).find(
          (one) => one.part === 'first',
        )
        if (!first)
          throw new Problem('first-calculation-missing', { detail: 'Ask the first person to calculate.' })
        if (first.recorded_by === personOf(tx))
          throw new Problem('another-person-needed', {
            detail: 'The second calculation is another person’s.',
          })
        const firstAmount = {
          value: first.amount_entered_value,
          unit: first.amount_entered_unit as Quantity['unit'],
        }
        const { differs, agreement } = compareCalculations(
          {
            enclosureCode: situation.content.enclosure.code,
            lotNumber: first.lot_number ?? '',
            strength: situation.product && (situation.product.strength as Quantity),
            amount: firstAmount,
            division: divisionOf(situation.content),
          },
          { enclosureRead: given.enclosureRead, lotRead: given.lotRead, strength, amount },
        )
        const agrees = differs.length === 0
        const { created } = await repository.insertCalculation(tx, {
          id: given.id,
          orderVersionId: situation.versionId,
          doseKey: key,
          part: 'second',
          enclosureRead: given.enclosureRead,
          markRead: given.markRead,
          lotRead: given.lotRead,
          lotId: first.lot_id,
          strengthEnteredValue: strength.value,
          strengthEnteredUnit: strength.unit,
          amountEnteredValue: amount.value,
          amountEnteredUnit: amount.unit,
          netVolumeLitres: null,
          agrees,
          differencePercent: agreement?.differencePercent ?? null,
          recordedAt: tx.at,
          recordedBy: personOf(tx),
        })
        if (created)
          tx.audit({
            action: 'dose.calculate-second',
            subject: subject(situation),
            after: {
              key,
              agrees,
              amount: { ...amount },
              enclosureRead: given.enclosureRead,
              lotRead: given.lotRead,
              differs,
            },
            clinical: true,
          })
      })
    },

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
        const situation = await lockAndRead(tx, number, key, tx.at, given.lotId)
        if (situation.block.state !== 'intact')
          throw new Problem('broken-record', { detail: doseWords.notIntact })
        const calculations = await parts.calculations(situation.versionId, key, tx)
        const why = obstacles(situation, calculations)
        const measured = situation.judgement?.dose?.measured
        if (measured && !isAmountNow(situation, amount))
          why.push(doseWords.amountDiffers({ amount: `${measured.value} ${unitOf(measured.unit).symbol}` }))
        const first = calculations.find((one) => one.part === 'first')
        if (first && first.lot_id !== given.lotId) why.push(doseWords.secondOutdated)
        if (why.length > 0) throw new Problem('dose-not-possible', { detail: why.join(' '), extra: { why } })
        await writeDose(tx, situation, {
          id: given.id,
          kind: 'given',
          happenedAt: tx.at,
          amount,
          lotId: given.lotId,
          note: given.note ?? null,
          secondCalculationId: calculations.find((one) => one.part === 'second')?.id ?? null,
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
      if (given.kind === 'recorded' && given.amount === null)
        throw new Problem('bad-input', {
          detail: 'Type how much was given.',
          errors: [{ pointer: '/amount', detail: 'Type how much was given.' }],
        })
      const amount = given.amount === null ? null : amountEntered(given.amount, '/amount')
      await parts.transactions.inTransaction(context, async (tx) => {
        const situation = await lockAndRead(tx, number, key, happenedAt, given.lotId)
        await writeDose(tx, situation, {
          id: given.id,
          kind: given.kind,
          happenedAt,
          amount,
          lotId: given.lotId,
          note: given.note ?? null,
          secondCalculationId: null,
        })
      })
    },

    /** Ends a bath. Never gated: whoever stands at the tank may stop it. */
    async stopBath(
      context: RequestContext,
      doseId: string,
      given: BodyOf<typeof contracts.stopBath>,
    ): Promise<void> {
      const happenedAt = timeByNow(given.happenedAt, parts.clock.now())
      await parts.transactions.inTransaction(context, async (tx) => {
        const dose = await repository.findDose(tx, doseId)
        const orderId = dose && (await repository.lockOrderOfVersion(tx, dose.orderVersionId))
        if (!dose || !orderId) throw new Problem('not-found')
        const { created } = await repository.insertStop(tx, {
          id: given.id,
          doseId,
          cause: given.cause,
          seen: given.seen ?? null,
          rescue: given.rescue ?? null,
          happenedAt,
          happenedOn: await parts.facility.dateOf(happenedAt, tx),
          recordedAt: tx.at,
          recordedBy: personOf(tx),
        })
        if (created)
          tx.audit({
            action: 'bath.stop',
            subject: { kind: 'dose', id: doseId, label: dose.doseKey },
            after: { cause: given.cause, seen: given.seen, rescue: given.rescue },
            clinical: true,
          })
        await parts.orders.course.settle(tx, orderId)
      })
    },
  }
}

function personOf(tx: Tx): string {
  if (tx.actor.personId === null) throw new Problem('not-signed-in')
  return tx.actor.personId
}

export type AdministrationsService = ReturnType<typeof createAdministrationsService>
