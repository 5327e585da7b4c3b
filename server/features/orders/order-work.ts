import type { OrderRow } from '../../../shared/contracts/orders.contract.ts'
import type { Db } from '../../platform/database/db.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import type { Signer } from '../../platform/signatures/signer.ts'
import { leaveOut, readBlindness } from './blind-order.ts'
import type { Blindness } from './blind-order.ts'
import { readStandingHolds } from './order-work.reads.ts'
import type { StandingHoldRow } from './order-work.reads.ts'
import { asksForSecond, plannedOf, presentOrderRow, signedContent } from './orders.present.ts'
import { readOrders } from './orders.reads.ts'
import type { OrderReadRow } from './orders.reads.ts'

/** An order that waits for somebody. */
export interface OrderWork {
  order: OrderRow
  /** A draft or a proposal stands, of a new order or of an amended version. */
  stage: 'draft' | 'proposed' | 'none'
  createdAt: string
  createdBy: string
  hold: { reason: string | null; at: string; by: string } | null
  /** End of the window of the last planned dose; null while nothing is signed. */
  lastWindowUntil: string | null
}

interface ShownOrder {
  row: OrderReadRow
  shown: OrderRow
}

/** All orders as they are shown, each made and its signature checked once, and for whom amounts are left out. */
async function readShown(
  db: Db,
  now: string,
  signer: Pick<Signer, 'check'>,
): Promise<{ orders: ShownOrder[]; blindness: Blindness }> {
  const rows = await readOrders(db, {})
  const blindness = await readBlindness(db, rows, now, { areAll: true })
  const orders = rows.map((row) => ({ row, shown: leaveOut(presentOrderRow(row, now, signer), blindness) }))
  return { orders, blindness }
}

/** Signed orders that were not discontinued, each with its plan of doses; none is left of one that is gone with every version. */
function openOrders(shownRows: readonly ShownOrder[]) {
  return shownRows.flatMap(({ row, shown }) => {
    const isOpen = !['draft', 'proposed', 'discontinued'].includes(shown.phase)
    if (!isOpen) return []
    // a text that cannot be read says of no bath that it is over
    const plan = { planned: plannedOf(row), timed: signedContent(row)?.fields.timing !== 'indefinite' }
    return [{ row: shown, plan, secondCalculation: asksForSecond(row) }]
  })
}

export type OpenOrder = ReturnType<typeof openOrders>[number]

/** The plans of the open orders alone. */
export async function readOpenOrders(
  db: Db,
  now: string,
  signer: Pick<Signer, 'check'>,
): Promise<OpenOrder[]> {
  return openOrders((await readShown(db, now, signer)).orders)
}

export interface OrdersAtWork {
  waiting: OrderWork[]
  open: OpenOrder[]
  /** Numbers of all orders, over ones too, whose amounts are left out for somebody. */
  leftOutFor(actor: Actor): Set<string>
}

/**
 * What the worklist asks of orders, in one read: those with something to decide (drafts, proposals, held ones, those
 * whose doses nobody recorded in time), and the plans of the open ones.
 */
export async function readOrderWork(
  db: Db,
  now: string,
  signer: Pick<Signer, 'check'>,
): Promise<OrdersAtWork> {
  const [{ orders, blindness }, holds] = await Promise.all([
    readShown(db, now, signer),
    readStandingHolds(db),
  ])
  return {
    waiting: waitingOrders(orders, holds),
    open: openOrders(orders),
    leftOutFor: (actor) =>
      new Set(orders.filter(({ row }) => blindness.isLeftOutFor(row.id, actor)).map(({ row }) => row.number)),
  }
}

function waitingOrders(orders: readonly ShownOrder[], holds: readonly StandingHoldRow[]): OrderWork[] {
  return orders.flatMap(({ row, shown: order }): OrderWork[] => {
    const waits = row.stage !== 'none' || order.phase === 'held' || order.phase === 'expired'
    if (!waits || order.phase === 'discontinued') return []
    const hold = order.phase === 'held' ? holds.find((one) => one.order_id === row.id) : undefined
    return [
      {
        order,
        stage: row.stage,
        createdAt: row.created_at.toISOString(),
        createdBy: row.created_by_name ?? '',
        hold: hold
          ? { reason: hold.reason, at: hold.happened_at.toISOString(), by: hold.by_name ?? '' }
          : null,
        lastWindowUntil: plannedOf(row).at(-1)?.closesAt ?? null,
      },
    ]
  })
}
