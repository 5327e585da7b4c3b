import type { BodyOf, ParamsOf } from '../../../shared/contracts/contract.ts'
import type { strikeDoseRecord } from '../../../shared/contracts/doses.contract.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { checkMayStrike } from '../animals/index.ts'
import { readOrderNumberOfDose } from './administrations.reads.ts'
import * as repository from './administrations.repository.ts'
import { personOf } from './dose-context.ts'
import type { AdministrationsParts } from './dose-context.ts'
import type { DoseRow } from './dose.entity.ts'
import { tellClocksAnew } from './tell-clocks.ts'

/** Striking out what was recorded by mistake: the record stays with its reason, and nothing rests on it any more. */
export function createStrikes(parts: AdministrationsParts) {
  async function locked(tx: Tx, doseId: string): Promise<{ dose: DoseRow; orderId: string; number: string }> {
    const dose = await repository.findDose(tx, doseId)
    const orderId = dose && (await repository.lockOrderOfDose(tx, dose.id))
    const named = orderId && (await readOrderNumberOfDose(tx.manager, doseId))
    if (!dose || !orderId || !named) throw new Problem('not-found')
    return { dose, orderId, number: named.number }
  }

  return {
    /** @returns the dose whose record it was */
    async strikeDoseRecord(
      context: RequestContext,
      { kind, id }: ParamsOf<typeof strikeDoseRecord>,
      { reason }: BodyOf<typeof strikeDoseRecord>,
    ): Promise<string> {
      return parts.transactions.inTransaction(context, async (tx) => {
        const stop = kind === 'stop' ? await repository.findStop(tx, id) : null
        if (kind === 'stop' && !stop) throw new Problem('not-found')
        const { dose, orderId, number } = await locked(tx, kind === 'dose' ? id : (stop?.doseId ?? id))
        const row = stop ?? dose
        if (await repository.findVoid(tx, stop ? { stopId: id } : { doseId: id }))
          throw new Problem('already-void')
        await checkMayStrike(parts, tx, 'dose.strike', row)
        await repository.insertVoid(tx, {
          id: parts.ids.next(),
          doseId: stop ? null : id,
          stopId: stop ? id : null,
          reason,
          recordedAt: tx.at,
          recordedBy: personOf(tx),
        })
        tx.audit({
          action: stop ? 'bath.strike-stop' : 'dose.strike',
          subject: { kind: 'order', id: orderId, label: number },
          before: {
            key: dose.doseKey,
            kind: stop ? stop.cause : dose.kind,
            happenedAt: row.happenedAt.toISOString(),
            ...(stop || dose.amountEnteredValue === null
              ? {}
              : { amount: { value: dose.amountEnteredValue, unit: dose.amountEnteredUnit } }),
          },
          after: { reason },
          clinical: true,
        })
        const { settleForDose } = parts.animals.service
        if (!stop) await settleForDose(tx, id, reason)
        else if (!(await repository.hasEarlyEnd(tx, dose.id)))
          await settleForDose(tx, dose.id, reason, 'end-before-dose')
        await tellClocksAnew(parts, tx, { id: orderId, number }, reason)
        return dose.id
      })
    },
  }
}
