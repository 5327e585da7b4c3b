import type { OrderRow } from '../../../shared/contracts/orders.contract.ts'
import type { Db } from '../../platform/database/db.ts'
import { readStandingHolds } from './order-work.reads.ts'
import { presentOrderRow } from './orders.present.ts'
import { readOrders } from './orders.reads.ts'

/** An order that waits for somebody. */
export interface OrderWork {
  order: OrderRow
  /** A draft or a proposal stands, of a new order or of an amended version. */
  stage: 'draft' | 'proposed' | 'none'
  createdAt: string
  createdBy: string
  hold: { reason: string | null; at: string; by: string } | null
}

/** Orders with something to decide: drafts, proposals, held ones, and those whose doses nobody recorded in time. */
export async function readOrderWork(db: Db, now: string): Promise<OrderWork[]> {
  const [rows, holds] = await Promise.all([readOrders(db, {}), readStandingHolds(db)])
  return rows.flatMap((row): OrderWork[] => {
    const order = presentOrderRow(row, now)
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
      },
    ]
  })
}
