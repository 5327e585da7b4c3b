import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/doses.contract.ts'
import { judgeMark } from '../../../shared/domain/dose/judge-mark.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { verifyWorking } from '../../platform/arithmetic/verify-working.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { noteLearnt } from '../orders/index.ts'
import type { Learnt } from '../orders/index.ts'
import * as repository from './administrations.repository.ts'
import { compareCalculations, comparedWith } from './compare-calculations.ts'
import { lockAndRead, personOf, refuseBroken, refuseGiver, subjectOf, versionOf } from './dose-context.ts'
import type { AdministrationsParts } from './dose-context.ts'
import { goneOf } from './dose-situation.ts'
import type { DoseSituation } from './dose-situation.ts'
import { amountEntered, strengthEntered } from './entered-amounts.ts'
import { refuseOtherLot } from './lot-of-order.ts'
import { firstOf, refuseSecond, secondRefusal } from './second-person.ts'

const allowedDrift = ({ content }: DoseSituation) => content.fields.allowedVolumeDriftPercent

/** The two calculations of one dose: the first for the lot in the hand, the second by another person, blind. */
export function createCalculations(parts: AdministrationsParts) {
  return {
    /** Remembers that somebody was shown the amount of doses before their two calculations agreed. */
    noteSeen: (context: RequestContext, learnt: readonly Learnt[]): Promise<void> =>
      parts.transactions.inTransaction(context, (tx) => noteLearnt(tx, parts.ids, personOf(tx), learnt)),

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
        refuseBroken(situation)
        await refuseOtherLot(tx, situation, given.lotId)
        const gone = goneOf(situation)
        if (gone.all)
          throw new Problem('dose-not-possible', {
            detail: doseWords.allGone({ animals: gone.names.join('; ') }),
          })
        const measured = situation.judgement?.dose?.measured
        if (!measured || !situation.judgement?.dose)
          throw new Problem('dose-not-possible', {
            detail: situation.changed.join(' ') || doseWords.noAmount,
          })
        const verified = await verifyWorking(situation.judgement.dose.working)
        if (!verified.ok) throw new Problem('working-disagrees')
        const volume = situation.judgement.facts.volume.determination
        const { created } = await repository.insertCalculation(tx, {
          id: given.id,
          orderVersionId: versionOf(situation),
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
        refuseBroken(situation)
        const calculations = await parts.calculations(situation, tx)
        // sent again: the answer is the one of the first time
        if (calculations.all.some((one) => one.id === given.id && one.part === 'second')) return
        const { enclosureRead, markRead, lotRead, nobodyReached = false } = given
        refuseSecond(calculations, context.actor, {
          nobodyReached,
          at: tx.at,
          zone: situation.block.zone,
        })
        const first = firstOf(calculations)
        if (!first) throw secondRefusal('no-first')
        if (judgeMark(markRead, situation.marks, allowedDrift(situation)) === 'unreadable')
          throw refusedInput('/markRead', doseWords.markUnreadable, 'mark-unreadable')
        const { differs, agreement } = compareCalculations(comparedWith(situation, first), {
          enclosureRead,
          markRead,
          lotRead,
          strength,
          amount,
        })
        const agrees = differs.length === 0
        const { created } = await repository.insertCalculation(tx, {
          id: given.id,
          orderVersionId: versionOf(situation),
          doseKey: key,
          part: 'second',
          enclosureRead,
          markRead,
          lotRead,
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
              enclosureRead,
              markRead,
              lotRead,
              differs,
              alone: first.recorded_by === tx.actor.personId,
            },
            clinical: true,
          })
      })
    },
  }
}
