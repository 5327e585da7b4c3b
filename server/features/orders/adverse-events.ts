import * as contracts from '../../../shared/contracts/adverse-events.contract.ts'
import type { AdverseEvent } from '../../../shared/contracts/adverse-events.contract.ts'
import type { OpenAdverseEvent } from '../../../shared/domain/cautions/caution-facts.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Db } from '../../platform/database/db.ts'
import { insertOnce } from '../../platform/database/rows.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { timeByNow } from '../../platform/http/check-time.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { FacilityService } from '../facility/index.ts'
import { AdverseEventReviewRow, AdverseEventRow } from './adverse-event.entity.ts'
import type { OrderHead } from './order.entity.ts'
import * as repository from './orders.repository.ts'

interface ReadRow {
  id: string
  dose_key: string | null
  seen: string
  affected_count: number | null
  happened_at: Date
  recorded_at: Date
  recorded_by_name: string
  finding: string | null
  reviewed_at: Date | null
  reviewed_by_name: string | null
}

const readEvents = (db: Db, number: string): Promise<ReadRow[]> =>
  db.query(
    `SELECT e.id, e.dose_key, e.seen, e.affected_count, e.happened_at, e.recorded_at,
            p.printed_name AS recorded_by_name, r.finding, r.recorded_at AS reviewed_at,
            v.printed_name AS reviewed_by_name
       FROM adverse_events e JOIN orders o ON o.id = e.order_id JOIN people p ON p.id = e.recorded_by
       LEFT JOIN adverse_event_reviews r ON r.event_id = e.id LEFT JOIN people v ON v.id = r.recorded_by
      WHERE o.number = $1 ORDER BY e.happened_at DESC, e.recorded_at DESC, e.id DESC`,
    [number],
  )

/** Adverse events of an order, seen by an instant, that no veterinarian had reviewed by then; the earliest first. */
export async function readOpenAdverseEvents(db: Db, orderId: string, at: Date): Promise<OpenAdverseEvent[]> {
  const rows: { seen: string; happened_at: Date }[] = await db.query(
    `SELECT e.seen, e.happened_at FROM adverse_events e
      WHERE e.order_id = $1 AND e.happened_at <= $2
        AND NOT EXISTS (SELECT 1 FROM adverse_event_reviews r WHERE r.event_id = e.id AND r.recorded_at <= $2)
      ORDER BY e.happened_at, e.id`,
    [orderId, at],
  )
  return rows.map((row) => ({ seen: row.seen, at: row.happened_at.toISOString() }))
}

const present = (row: ReadRow): AdverseEvent => ({
  id: row.id,
  doseKey: row.dose_key,
  seen: row.seen,
  affectedCount: row.affected_count,
  happenedAt: row.happened_at.toISOString(),
  recordedAt: row.recorded_at.toISOString(),
  recordedBy: row.recorded_by_name,
  review:
    row.finding !== null && row.reviewed_at
      ? { finding: row.finding, at: row.reviewed_at.toISOString(), by: row.reviewed_by_name ?? '' }
      : null,
})

/** What went wrong under orders: recorded by whoever saw it, reviewed by a veterinarian. */
export function createAdverseEvents(parts: {
  dataSource: Db
  transactions: Transactions
  facility: FacilityService
  clock: Clock
}) {
  async function lock(tx: Tx, number: string): Promise<OrderHead> {
    const order = await repository.lockOrder(tx, number)
    if (!order) throw new Problem('not-found')
    return order
  }
  const subject = ({ id, number }: OrderHead) => ({ kind: 'order', id, label: number })
  const list = async (number: string) => {
    const rows = await readEvents(parts.dataSource, number)
    if (
      rows.length === 0 &&
      !(await parts.dataSource.query(`SELECT 1 FROM orders WHERE number = $1`, [number])).length
    )
      throw new Problem('not-found')
    return { rows: rows.map(present) }
  }

  /** Whatever the state of the order, and for a device's clock that goes ahead: then it was seen by now. */
  async function record(
    context: RequestContext,
    number: string,
    given: {
      id: string
      doseKey: string | null
      seen: string
      affectedCount: number | null
      happenedAt: string
    },
  ): Promise<void> {
    const happenedAt = timeByNow(given.happenedAt, parts.clock.now())
    await parts.transactions.inTransaction(context, async (tx) => {
      const order = await lock(tx, number)
      const { id, doseKey, seen, affectedCount } = given
      const { created } = await insertOnce(
        tx,
        AdverseEventRow,
        {
          id,
          orderId: order.id,
          doseKey,
          seen,
          affectedCount,
          happenedAt,
          happenedOn: await parts.facility.dateOf(happenedAt, tx),
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        },
        ['orderId', 'doseKey', 'seen', 'affectedCount'],
      )
      if (created)
        tx.audit({
          action: 'order.record-adverse-event',
          subject: subject(order),
          after: { doseKey, seen, affectedCount, happenedAt: happenedAt.toISOString() },
          clinical: true,
        })
    })
  }

  async function review(
    context: RequestContext,
    number: string,
    eventId: string,
    given: { id: string; finding: string },
  ): Promise<void> {
    await parts.transactions.inTransaction(context, async (tx) => {
      const order = await lock(tx, number)
      const event = await tx.manager.findOneBy(AdverseEventRow, { id: eventId })
      if (event?.orderId !== order.id) throw new Problem('not-found')
      const earlier = await tx.manager.findOneBy(AdverseEventReviewRow, { eventId })
      if (earlier && earlier.id !== given.id) throw new Problem('already-resolved')
      const { created } = await insertOnce(
        tx,
        AdverseEventReviewRow,
        { ...given, eventId, recordedAt: tx.at, recordedBy: tx.actor.personId },
        ['eventId', 'finding'],
      )
      if (created)
        tx.audit({
          action: 'order.review-adverse-event',
          subject: subject(order),
          before: { seen: event.seen },
          after: { finding: given.finding },
          clinical: true,
        })
    })
  }

  const routes: Route[] = [
    route(contracts.listAdverseEvents, ({ params }) => list(params.number)),
    route(contracts.recordAdverseEvent, async ({ params, body, context }) => {
      await record(context, params.number, body)
      return list(params.number)
    }),
    route(contracts.reviewAdverseEvent, async ({ params, body, context }) => {
      await review(context, params.number, params.eventId, body)
      return list(params.number)
    }),
  ]
  return { routes }
}
