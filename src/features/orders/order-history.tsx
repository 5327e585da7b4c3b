import { Link } from 'react-router-dom'
import type { Order } from '../../../shared/contracts/orders.contract.ts'
import { orderViewWords as words } from '../../../shared/messages/orders-screens.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { paths } from '../../lib/paths.ts'

/** Every signed version; the one in force first. */
export function OrderVersions({ order, shown, zone }: { order: Order; shown: number; zone: string }) {
  if (order.versions.length < 2) return null
  return (
    <section className="stack">
      <h2 className="t-head">{words.versions}</h2>
      <ul className="stack">
        {order.versions.map(({ versionNo, signature, superseded }) => {
          const line = words.versionLine({
            n: versionNo,
            name: signature.printedName,
            at: sayInstant(signature.signedAt, zone),
          })
          return (
            <li key={versionNo}>
              {versionNo === shown ? (
                <b aria-current="true">{line}</b>
              ) : (
                <Link to={`${paths.order(order.number)}?version=${String(versionNo)}`}>{line}</Link>
              )}{' '}
              <span className="t-2">{superseded ? words.isSuperseded : words.inForce}</span>
            </li>
          )
        })}
      </ul>
    </section>
  )
}

interface Line {
  at: string
  what: string
  who: string
}

/** What happened to an order, the newest first. */
export function orderLines(order: Pick<Order, 'events' | 'versions' | 'createdAt' | 'createdBy'>): Line[] {
  const because = (reason: string | null) => ({ reason: reason === null ? '' : words.because({ reason }) })
  const said = {
    held: words.logHeld,
    'hold-lifted': words.logLifted,
    discontinued: words.logDiscontinued,
  }
  const lines: Line[] = [
    ...order.events.map((event) => ({
      at: event.happenedAt,
      what: said[event.kind](because(event.reason)),
      who: event.by,
    })),
    ...order.versions.map(({ versionNo, signature }) => ({
      at: signature.signedAt,
      what: words.logSigned({ n: versionNo }),
      who: signature.printedName,
    })),
    { at: order.createdAt, what: words.logWritten, who: order.createdBy },
  ]
  return lines.sort((a, b) => Date.parse(b.at) - Date.parse(a.at))
}

export function OrderHistory({ order, zone }: { order: Order; zone: string }) {
  return (
    <section className="stack">
      <h2 className="t-head">{words.log}</h2>
      <ul className="stack">
        {orderLines(order).map((line) => (
          <li key={`${line.at} ${line.what}`} className="text-[13px]">
            <span className="num">{sayInstant(line.at, zone)}</span> {line.what}
            <span className="t-note block">{line.who}</span>
          </li>
        ))}
      </ul>
    </section>
  )
}
