import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { OrderRow } from '../../../shared/contracts/orders.contract.ts'
import { agentNames } from '../../../shared/messages/formulary.ts'
import { orderListWords as words } from '../../../shared/messages/orders-screens.ts'
import { listProps } from '../../lib/list-props.tsx'
import type { ListState } from '../../lib/list-state.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { DoseText } from './dose-text.tsx'
import { PhaseTag } from './phase-tag.tsx'
import { ordersQuery } from './queries.ts'
import type { OrdersAsked } from './queries.ts'

/** What the address asks of the list of orders. */
export function ordersAsked(list: Pick<ListState, 'get' | 'cursor'>): OrdersAsked {
  return {
    q: list.get('q'),
    phase: list.get('phase') as OrdersAsked['phase'],
    enclosureCode: list.get('enclosure'),
    sort: list.get('sort') as OrdersAsked['sort'],
    direction: list.get('direction') as OrdersAsked['direction'],
    cursor: list.cursor,
  }
}

/** Treatment orders. */
export function OrdersList({ list }: { list: ListState }) {
  const { zone } = useMe().facility
  const query = useQuery(ordersQuery(ordersAsked(list)))
  const now = new Date().toISOString()
  return (
    <DataTable
      label={words.title}
      columns={columnsOf((at) => sayMoment(at, zone, now), now)}
      rowKey={(row) => row.id}
      density="roomy"
      {...listProps({
        query,
        list,
        zone,
        what: words.title,
        empty: { title: words.empty, body: words.emptyBody },
        usualSort: { column: 'number', direction: 'desc' },
      })}
    />
  )
}

/** Why a row has no amount. */
function noAmountText({ versionNo, record }: OrderRow): string {
  if (record === 'broken') return words.amountBroken
  return versionNo === null ? words.noAmount : words.amountWithheld
}

function columnsOf(say: (at: string) => string, now: string): TableColumn<OrderRow>[] {
  return [
    {
      id: 'number',
      heading: words.number,
      sort: true,
      cell: (row) => (
        <>
          <Link to={paths.order(row.number)} className="t-strong num">
            {row.number}
          </Link>
          {row.versionNo !== null && row.versionNo > 1 ? (
            <span className="t-note block">{words.version({ n: row.versionNo })}</span>
          ) : null}
        </>
      ),
    },
    {
      id: 'phase',
      heading: words.phase,
      narrow: 'head',
      cell: (row) => (
        <>
          <PhaseTag order={row} />
          {row.record === 'broken' ? (
            <span className="text-magenta t-strong block">{words.recordBroken}</span>
          ) : null}
        </>
      ),
    },
    {
      id: 'enclosure',
      heading: words.enclosure,
      sort: true,
      cell: (row) => (
        <>
          <Link to={paths.enclosure(row.enclosureCode)} className="num">
            {row.enclosureCode}
          </Link>
          <span className="t-note block">{row.enclosureName}</span>
        </>
      ),
    },
    {
      id: 'drug',
      heading: words.drug,
      cell: (row) => (
        <>
          {row.agent === null ? <span className="t-2">{words.noDrug}</span> : agentNames[row.agent]}
          <span className="t-note block">{row.problem}</span>
        </>
      ),
    },
    {
      id: 'amount',
      heading: words.amount,
      cell: (row) =>
        row.amountText === null ? (
          <span className="t-2">{noAmountText(row)}</span>
        ) : (
          <>
            <DoseText text={row.amountText} size="strong" />
            {row.targetText === null ? null : (
              <span className="t-note block">
                <DoseText text={row.targetText} />
              </span>
            )}
          </>
        ),
    },
    {
      id: 'startsAt',
      heading: words.start,
      sort: true,
      cell: (row) =>
        row.startsAt === null ? (
          <span className="t-2">{words.noStart}</span>
        ) : (
          <span className="num">{say(row.startsAt)}</span>
        ),
    },
    {
      id: 'doses',
      heading: words.doses,
      cell: (row) =>
        row.doses === null ? null : (
          <>
            <span className="num">{words.dosesOf({ given: row.dosesGiven, doses: row.doses })}</span>
            {row.nextDueAt === null ? null : (
              <span className="t-note block">
                {row.nextDueAt < now
                  ? words.since({ at: say(row.nextDueAt) })
                  : words.next({ at: say(row.nextDueAt) })}
              </span>
            )}
          </>
        ),
    },
    {
      id: 'signedAt',
      heading: words.signed,
      sort: true,
      cell: (row) =>
        row.signedAt === null ? (
          <span className="t-2">{words.notSigned}</span>
        ) : (
          words.signedBy({ name: row.signedBy ?? '', at: say(row.signedAt) })
        ),
    },
  ]
}
