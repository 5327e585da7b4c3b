import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/doses.contract.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { verifyWorking } from '../../platform/arithmetic/verify-working.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import * as repository from './administrations.repository.ts'
import { compareCalculations } from './compare-calculations.ts'
import { lockAndRead, personOf, refuseGiver, subjectOf } from './dose-context.ts'
import type { AdministrationsParts } from './dose-context.ts'
import { goneOf } from './dose-situation.ts'
import { amountEntered, strengthEntered } from './entered-amounts.ts'
import { divisionOf } from './judge-dose.ts'

/** The two calculations of one dose: the first for the lot in the hand, the second by another person, blind. */
export function createCalculations(parts: AdministrationsParts) {
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
        const situation = await lockAndRead(parts, tx, { number, key, at: tx.at, lotId: given.lotId })
        const gone = goneOf(situation)
        if (gone.all)
          throw new Problem('dose-not-possible', {
            detail: doseWords.allGone({ animals: gone.names.join('; ') }),
          })
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
            subject: subjectOf(situation),
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
        const situation = await lockAndRead(parts, tx, { number, key, at: tx.at })
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
            subject: subjectOf(situation),
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
  }
}
