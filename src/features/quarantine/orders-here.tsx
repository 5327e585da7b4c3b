import { useQueries } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { agentNames } from '../../../shared/messages/formulary.ts'
import { caseWords as words } from '../../../shared/messages/quarantine-case.ts'
import { useMay } from '../../lib/may.ts'
import { paths } from '../../lib/paths.ts'
import { DoseText, ordersQuery, PhaseTag } from '../orders/index.ts'

/** Orders of the water that the batch is in; nothing where there are none, or for who may not read orders. */
export function OrdersHere({ enclosures }: { enclosures: readonly string[] }) {
  const may = useMay('order.read')
  const replies = useQueries({
    queries: enclosures.map((enclosureCode) => ({
      ...ordersQuery({ enclosureCode, phase: 'open', limit: 20 }),
      enabled: may.allowed,
    })),
  })
  const orders = replies.flatMap(({ data }) => data?.rows ?? [])
  if (orders.length === 0) return null
  return (
    <section aria-labelledby="case-orders">
      <h2 id="case-orders" className="t-head">
        {words.orders}
      </h2>
      {orders.map((order) => (
        <p key={order.id} className="case-line">
          <span>
            <Link to={paths.order(order.number)} className="t-strong num inline-block min-h-6">
              {order.number}
            </Link>{' '}
            {order.agent === null ? order.problem : agentNames[order.agent]}
            {order.targetText === null ? null : (
              <>
                {', '}
                <DoseText text={order.targetText} />
              </>
            )}
            , {order.enclosureCode}
          </span>
          <PhaseTag order={order} />
        </p>
      ))}
    </section>
  )
}
