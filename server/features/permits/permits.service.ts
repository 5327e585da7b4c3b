import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type { enterPermit } from '../../../shared/contracts/permits.contract.ts'
import { judgeLineCover } from '../../../shared/domain/register/judge-line-cover.ts'
import { judgePermitUse } from '../../../shared/domain/register/judge-permit-use.ts'
import type { PermitMark } from '../../../shared/domain/register/judge-permit-use.ts'
import { permitSentences } from '../../../shared/messages/permit-sentences.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { Ids } from '../../platform/ids.ts'
import type { CounterpartiesService } from '../counterparties/index.ts'
import type { FacilityService } from '../facility/index.ts'
import * as repository from './permits.repository.ts'

export interface PermitsParts {
  transactions: Transactions
  ids: Ids
  facility: FacilityService
  counterparties: CounterpartiesService
}

/** Animals to be taken under a permit, as an acquisition or disposition names them. */
export interface UseGiven {
  id: string
  permitId: string
  transactionId: string
  lineId: string
  quantity: number
  /** Animals of the line: alive, and dead in the boxes. */
  animals: { alive: number; dead: number }
  taxonId: string
  /** First and last day on which it may have happened. */
  first: string
  last: string
  /** `now`: about to happen, refused when the permit does not cover it. `already`: kept and marked. */
  stage: 'now' | 'already'
  /** Where the use stands in the form, for what is said about it. */
  pointer: string
}

const subject = (permit: { id: string; number: string; permitNumber: string; authority: string }) => ({
  kind: 'permit',
  id: permit.id,
  label: `${permit.number}, ${permit.authority} ${permit.permitNumber}`,
})

export function createPermitsService(parts: PermitsParts) {
  return {
    async enterPermit(context: RequestContext, given: BodyOf<typeof enterPermit>): Promise<string> {
      if (given.validUntil < given.validFrom)
        throw new Problem('period-reversed', {
          errors: [{ pointer: '/validUntil', detail: permitSentences.lastDayFirst }],
        })
      return parts.transactions.inTransaction(context, async (tx) => {
        const { id, taxonIds, ...rest } = given
        const wanted = [...new Set(taxonIds)].sort()
        // Two people with the same paper in hand: the second is told, not the database
        await repository.lockPermit(tx, `${given.authority} ${given.permitNumber}`.toLowerCase())
        const earlier = await repository.findPermit(tx, id)
        if (earlier && JSON.stringify(await repository.taxaOf(tx, id)) !== JSON.stringify(wanted))
          throw new Problem('id-already-used')
        if (given.counterpartyId && !(await parts.counterparties.exists(tx, given.counterpartyId)))
          throw new Problem('not-found', {
            errors: [{ pointer: '/counterpartyId', detail: permitSentences.noSuchParty }],
          })
        if ((await repository.countTaxa(tx, wanted)) !== wanted.length)
          throw new Problem('not-found', {
            errors: [{ pointer: '/taxonIds', detail: permitSentences.noSuchTaxon }],
          })
        const standing = await repository.findStanding(tx, given.authority, given.permitNumber)
        if (standing !== null && standing !== id)
          throw new Problem('number-already-used', {
            errors: [{ pointer: '/permitNumber', detail: permitSentences.numberTaken }],
          })
        const row = {
          id,
          number: earlier?.number ?? (await parts.facility.nextNumber(tx, 'permit')),
          permitNumber: rest.permitNumber,
          authority: rest.authority,
          kind: rest.kind,
          validFrom: rest.validFrom,
          validUntil: rest.validUntil,
          quantityAllowed: rest.quantityAllowed ?? null,
          counterpartyId: rest.counterpartyId ?? null,
          purposeCode: rest.purposeCode ?? null,
          conditions: rest.conditions ?? null,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        }
        const { created } = await repository.insertPermit(tx, row)
        if (created) {
          await repository.insertPermitTaxa(tx, id, wanted)
          tx.audit({ action: 'permit.enter', subject: subject(row), after: { ...rest, taxonIds: wanted } })
        }
        return row.number
      })
    },

    async voidPermit(context: RequestContext, number: string, reason: string): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const permit = await repository.findPermitByNumber(tx, number)
        if (!permit) throw new Problem('not-found')
        await repository.lockPermit(tx, permit.id)
        if (await repository.isVoided(tx, permit.id)) throw new Problem('already-voided')
        await repository.insertPermitVoid(tx, {
          id: parts.ids.next(),
          permitId: permit.id,
          reason,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        tx.audit({ action: 'permit.void', subject: subject(permit), after: { reason } })
      })
    },

    /**
     * Takes animals under permits, inside the transaction that moves them. Permits are locked in one order, so that
     * two shipments cannot both take the last animal, and cannot wait for each other.
     *
     * @returns the marks of each use, by its id; with stage `now` none, since it refuses
     */
    async useUp(tx: Tx, uses: readonly UseGiven[]): Promise<Map<string, PermitMark[]>> {
      const marks = new Map<string, PermitMark[]>()
      const kinds = await repository.kindsOf(
        tx,
        uses.map((use) => use.permitId),
      )
      const refused: { pointer: string; detail: string; code: string }[] = []
      for (const permitId of [...new Set(uses.map((use) => use.permitId))].sort()) {
        await repository.lockPermit(tx, permitId)
        const permit = await repository.findPermit(tx, permitId)
        const own = uses.filter((use) => use.permitId === permitId)
        if (!permit)
          throw new Problem('not-found', {
            errors: own.map(({ pointer }) => ({ pointer, detail: permitSentences.noSuchPermit })),
          })
        const terms = {
          validFrom: permit.validFrom,
          validUntil: permit.validUntil,
          quantityAllowed: permit.quantityAllowed,
          taxonIds: await repository.taxaOf(tx, permitId),
          voided: await repository.isVoided(tx, permitId),
        }
        for (const use of own) {
          const judged = judgePermitUse(terms, await repository.usedSoFar(tx, permitId), use)
          if (!judged.ok) throw new Problem('bad-input', { errors: [{ pointer: use.pointer, detail: '' }] })
          const { value } = judged
          const ofKind = uses.filter(
            (other) => other.lineId === use.lineId && kinds.get(other.permitId) === permit.kind,
          )
          const cover = judgeLineCover(
            use.animals,
            ofKind.map((other) => other.quantity),
          )
          const found = cover === null ? value.marks : [...value.marks, cover]
          marks.set(use.id, found)
          if (use.stage === 'now')
            refused.push(
              ...found.map((mark) => ({
                pointer: use.pointer,
                code: mark,
                detail: permitSentences[mark]({
                  permit: permit.number,
                  validFrom: permit.validFrom,
                  validUntil: permit.validUntil,
                  remaining: value.remainingBefore ?? 0,
                  wanted: use.quantity,
                  alive: use.animals.alive,
                }),
              })),
            )
          await repository.insertUse(tx, {
            id: use.id,
            permitId,
            transactionId: use.transactionId,
            lineId: use.lineId,
            quantity: use.quantity,
            excess: value.excess,
            marks: found,
            recordedAt: tx.at,
            recordedBy: tx.actor.personId,
          })
        }
      }
      if (refused.length > 0)
        throw new Problem('permit-does-not-cover', {
          detail: `${refused.map((one) => one.detail).join(' ')} ${permitSentences.ifItHappened}`,
          errors: refused,
        })
      return marks
    },

    async explainUse(context: RequestContext, number: string, useId: string, reason: string): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const permit = await repository.findPermitByNumber(tx, number)
        const use = await repository.findUse(tx, useId)
        if (!permit || use?.permitId !== permit.id || use.marks.length === 0) throw new Problem('not-found')
        await repository.lockPermit(tx, permit.id)
        if (await repository.isExplained(tx, useId)) throw new Problem('already-explained')
        await repository.insertExplanation(tx, {
          id: parts.ids.next(),
          permitUseId: useId,
          reason,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        tx.audit({
          action: 'permit.explain-use',
          subject: subject(permit),
          before: { marks: use.marks, excess: use.excess },
          after: { reason },
        })
      })
    },
  }
}

export type PermitsService = ReturnType<typeof createPermitsService>
