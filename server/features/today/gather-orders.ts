import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { OrderWork } from '../orders/index.ts'
import { waiting, work } from './work.ts'
import type { Moment } from './work.ts'

/** Orders that wait for a veterinarian, and those whose last window closed with doses unaccounted for. */
export function gatherOrders(orders: readonly OrderWork[], moment: Moment): TodayWork[] {
  const mayLift = decide('hold.lift', moment.actor.roles).allowed
  return orders.flatMap(({ order, stage, createdAt, createdBy, hold, lastWindowUntil }): TodayWork[] => {
    const items: TodayWork[] = []
    const params = {
      number: order.number,
      enclosure: order.enclosureCode,
      place: order.enclosureName,
      problem: order.problem,
      ...(order.agent === null ? {} : { agent: order.agent }),
      ...(order.amountText === null ? {} : { amount: order.amountText }),
      ...(order.versionNo === null ? {} : { version: order.versionNo }),
    }
    if (stage !== 'none')
      items.push(
        waiting({
          id: `order-${stage}:${order.number}`,
          kind: stage === 'proposed' ? 'order-proposed' : 'order-draft',
          at: createdAt,
          params: { ...params, by: createdBy },
        }),
      )
    if (order.phase === 'held')
      items.push(
        waiting({
          id: `order-held:${order.number}`,
          kind: 'order-held',
          at: hold?.at ?? null,
          params: { ...params, by: hold?.by ?? '', ...(hold?.reason ? { reason: hold.reason } : {}) },
          acts: mayLift ? ['lift-order'] : [],
        }),
      )
    if (order.phase === 'expired' && lastWindowUntil !== null)
      items.push(
        work({
          id: `order-not-carried-out:${order.number}`,
          kind: 'order-not-carried-out',
          state: 'late',
          latestAt: lastWindowUntil,
          params: { ...params, given: order.dosesGiven, doses: order.doses ?? 0 },
        }),
      )
    return items
  })
}
