import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { TransactionRow } from '../../../shared/contracts/acquisitions.contract.ts'
import { transactionKindNames } from '../../../shared/messages/register-kinds.ts'
import { registerWords as words } from '../../../shared/messages/register-sheet.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { listProps } from '../../lib/list-props.tsx'
import type { ListState } from '../../lib/list-state.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { Tag } from '../../ui/tag.tsx'
import { transactionsAsked, transactionsQuery } from './queries.ts'

const columns = (): TableColumn<TransactionRow>[] => [
  {
    id: 'number',
    heading: words.number,
    sort: true,
    cell: (row) => (
      <>
        <Link to={paths.transaction(row.number)} className={row.voided ? 'struck' : undefined}>
          {row.number}
        </Link>
        {row.voided ? (
          <span className="block">
            <Tag>{words.voidedTag}</Tag>
          </span>
        ) : null}
      </>
    ),
  },
  {
    id: 'date',
    heading: words.date,
    narrow: 'head',
    sort: true,
    cell: (row) => <span className="num">{sayDate(row.on)}</span>,
  },
  {
    id: 'kind',
    heading: words.kind,
    cell: (row) => (
      <>
        {transactionKindNames[row.kind]}
        <span className="t-note block">{row.way === 'in' ? words.in : words.out}</span>
      </>
    ),
  },
  {
    id: 'counterparty',
    heading: words.party,
    sort: true,
    cell: (row) => (
      <>
        {row.counterparty ?? <span className="t-note">{words.noParty}</span>}
        {row.reference ? <span className="t-note block">{row.reference}</span> : null}
      </>
    ),
  },
  {
    id: 'animals',
    heading: words.animals,
    cell: (row) => (
      <>
        {row.animals.map((animal) => (
          <span key={animal.accession} className="block min-h-6">
            <Link to={paths.history(animal.accession)}>{animal.accession}</Link> {animal.commonName},{' '}
            {animal.count.toLocaleString('en-GB')}
          </span>
        ))}
        {row.lines > row.animals.length ? (
          <span className="t-note">{words.andMore({ more: row.lines - row.animals.length })}</span>
        ) : null}
      </>
    ),
  },
  {
    id: 'count',
    heading: words.count,
    number: true,
    sort: true,
    cell: (row) => row.count.toLocaleString('en-GB'),
  },
  {
    id: 'papers',
    heading: words.papers,
    cell: (row) => (
      <>
        <span className="t-note">{words.papersCount(row)}</span>
        {row.openMarks > 0 ? (
          <span className="block">
            <Tag kind="solid">{words.toExplain({ count: row.openMarks })}</Tag>
          </span>
        ) : null}
      </>
    ),
  },
]

/** Transactions in and out, the newest first. */
export function TransactionsList({ list }: { list: ListState }) {
  const { zone } = useMe().facility
  const query = useQuery(transactionsQuery(transactionsAsked(list)))
  return (
    <DataTable
      label={words.transactions}
      columns={columns()}
      rowKey={(row) => row.id}
      {...listProps({
        query,
        list,
        zone,
        what: words.transactions,
        empty: { title: words.empty, body: words.emptyBody },
        usualSort: { column: 'date', direction: 'desc' },
      })}
    />
  )
}
