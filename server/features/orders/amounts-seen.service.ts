import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import type { Db } from '../../platform/database/db.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { Ids } from '../../platform/ids.ts'
import { insertPreviewed, insertSeen, readNotPreviewed } from './amounts-seen.repository.ts'
import { mayBeSecond } from './blind-order.ts'
import type { Learnt } from './blind-order.ts'
import type { OrderSituation } from './order-situation.ts'
import type { OrderQueries } from './orders.queries.ts'
import { readNumbersLike } from './knowers.reads.ts'

export type NoteAmountsSeen = (context: RequestContext, number: string) => Promise<void>
export type NoteAmountsPreviewed = (context: RequestContext, found: OrderSituation) => Promise<void>

/**
 * Remembers that the order itself showed somebody the amount: they are not the blind second person of its doses to come,
 * nor of those of another order for its drug and water.
 */
export function createAmountsSeen(parts: {
  transactions: Transactions
  ids: Ids
  queries: OrderQueries
}): NoteAmountsSeen {
  return async (context, number) => {
    const { personId } = context.actor
    if (personId === null) throw new Problem('not-signed-in')
    const learnt = await parts.queries.amountsToNote(number, context.actor)
    if (learnt.length === 0) return
    await parts.transactions.inTransaction(context, (tx) => noteLearnt(tx, parts.ids, personId, learnt))
  }
}

/** Notes once, and in the audit trail, that a person was shown the amounts of doses to come. */
export async function noteLearnt(
  tx: Tx,
  ids: Ids,
  personId: string,
  learnt: readonly Learnt[],
): Promise<void> {
  for (const { orderId, number, versionId, keys } of learnt) {
    const fresh: string[] = []
    for (const doseKey of keys)
      if (await insertSeen(tx, { id: ids.next(), orderVersionId: versionId, doseKey, personId }))
        fresh.push(doseKey)
    if (fresh.length > 0)
      tx.audit({
        action: 'dose.see-amount',
        subject: { kind: 'order', id: orderId, label: number },
        after: { keys: fresh },
      })
  }
}

/**
 * Whoever works an order out while it is being written is shown what the same drug in the same water comes to: of the
 * orders in force for it, and of one that is signed for it afterwards.
 */
export function createAmountsPreviewed(parts: {
  dataSource: Db
  transactions: Transactions
  ids: Ids
  noteAmountsSeen: NoteAmountsSeen
}): NoteAmountsPreviewed {
  return async (context, { situation, product, judgement }) => {
    const { personId } = context.actor
    if (!product || !judgement?.dose || personId === null || !mayBeSecond(context.actor)) return
    const { agent } = product
    const { enclosures } = situation.water
    const enclosureIds = enclosures.map(({ id }) => id)
    const numbers = await readNumbersLike(parts.dataSource, { enclosureIds, agent })
    for (const number of numbers) await parts.noteAmountsSeen(context, number)
    const on = facilityDateOf(judgement.facts.at, judgement.facts.zone)
    const fresh = await readNotPreviewed(parts.dataSource, { enclosureIds, agent, personId, on })
    if (fresh.length === 0) return
    await parts.transactions.inTransaction(context, async (tx) => {
      for (const { id, code } of enclosures.filter((one) => fresh.includes(one.id)))
        if (await insertPreviewed(tx, { id: parts.ids.next(), enclosureId: id, agent, personId, on }))
          tx.audit({
            action: 'dose.preview-amount',
            subject: { kind: 'enclosure', id, label: code },
            after: { agent },
          })
    })
  }
}
