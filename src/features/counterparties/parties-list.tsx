import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { Counterparty } from '../../../shared/contracts/counterparties.contract.ts'
import { partyWords as words } from '../../../shared/messages/party-sheet.ts'
import { counterpartyKindNames } from '../../../shared/messages/register-kinds.ts'
import { listProps } from '../../lib/list-props.tsx'
import type { ListState } from '../../lib/list-state.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { Button } from '../../ui/button.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { PartyDialog } from './party-dialog.tsx'
import { partiesQuery } from './queries.ts'

/** The other parties, with how many transactions name each. */
export function PartiesList({ list }: { list: ListState }) {
  const { zone } = useMe().facility
  const may = useMay('register.manage')
  const [correcting, setCorrecting] = useState<Counterparty | null>(null)
  const query = useQuery(
    partiesQuery({
      q: list.get('q'),
      sort: list.get('sort') as 'name' | 'transactions' | undefined,
      direction: list.get('direction') as 'asc' | 'desc' | undefined,
      cursor: list.cursor,
    }),
  )
  const columns: TableColumn<Counterparty>[] = [
    {
      id: 'name',
      heading: words.name,
      sort: true,
      cell: (row) => (
        <>
          <b>{row.name}</b>
          <span className="t-note block">
            {[counterpartyKindNames[row.kind], row.registration].filter(Boolean).join(', ')}
          </span>
        </>
      ),
    },
    {
      id: 'reach',
      heading: words.address,
      cell: (row) => [row.address, row.telephone, row.email].filter(Boolean).join(', '),
    },
    {
      id: 'transactions',
      heading: words.transactions,
      number: true,
      sort: true,
      cell: (row) => (
        <Link to={`${paths.register()}?q=${encodeURIComponent(row.name)}`}>{row.transactions}</Link>
      ),
    },
    ...(may.allowed
      ? [
          {
            id: 'correct',
            heading: words.correctShort,
            cell: (row: Counterparty) => (
              <Button
                kind="plain"
                size="small"
                aria-label={words.correct({ name: row.name })}
                onClick={() => setCorrecting(row)}
              >
                {words.correctShort}
              </Button>
            ),
          },
        ]
      : []),
  ]
  return (
    <>
      <DataTable
        label={words.title}
        columns={columns}
        rowKey={(row) => row.id}
        {...listProps({
          query,
          list,
          zone,
          what: words.title,
          empty: { title: words.empty, body: words.emptyBody },
          usualSort: { column: 'name', direction: 'asc' },
        })}
      />
      {correcting ? <PartyDialog party={correcting} onBack={() => setCorrecting(null)} /> : null}
    </>
  )
}
