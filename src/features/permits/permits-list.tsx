import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { PermitRow } from '../../../shared/contracts/permits.contract.ts'
import { permitWords as words } from '../../../shared/messages/permits-sheet.ts'
import { permitKindNames } from '../../../shared/messages/register-kinds.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { listProps } from '../../lib/list-props.tsx'
import type { ListState } from '../../lib/list-state.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { sayNumber } from '../../lib/say-number.ts'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { Tag } from '../../ui/tag.tsx'
import { PermitState } from './permit-state.tsx'
import { permitsQuery } from './queries.ts'
import type { PermitsAsked } from './queries.ts'
import { UseUp } from './use-up.tsx'

/** What the address asks of the list of permits. */
export function permitsAsked(list: Pick<ListState, 'get' | 'cursor'>): PermitsAsked {
  return {
    q: list.get('q'),
    state: list.get('state') as PermitsAsked['state'],
    kind: list.get('kind') as PermitsAsked['kind'],
    open: list.get('open') === 'yes' ? 'yes' : undefined,
    sort: list.get('sort') as PermitsAsked['sort'],
    direction: list.get('direction') as PermitsAsked['direction'],
    cursor: list.cursor,
  }
}

/** Permits with what is left of them; those that run out first stand first. */
export function PermitsList({ list }: { list: ListState }) {
  const { zone } = useMe().facility
  const query = useQuery(permitsQuery(permitsAsked(list)))
  const columns: TableColumn<PermitRow>[] = [
    {
      id: 'number',
      heading: words.number,
      sort: true,
      cell: (row) => (
        <>
          <Link to={paths.permit(row.number)}>{row.number}</Link>
          {row.openMarks > 0 ? (
            <span className="block">
              <Tag kind="solid">{words.toExplain({ count: row.openMarks })}</Tag>
            </span>
          ) : null}
        </>
      ),
    },
    {
      id: 'authority',
      heading: words.authority,
      sort: true,
      cell: (row) => (
        <>
          {row.authority} <b>{row.permitNumber}</b>
          <span className="t-note block">
            {permitKindNames[row.kind]}
            {row.taxa.length > 0 ? `: ${row.taxa.map((taxon) => taxon.commonName).join(', ')}` : ''}
          </span>
        </>
      ),
    },
    {
      id: 'validUntil',
      heading: words.until,
      sort: true,
      cell: (row) => (
        <>
          <span className="num">{sayDate(row.validUntil)}</span>
          <span className="block">
            <PermitState permit={row} />
          </span>
        </>
      ),
    },
    {
      id: 'used',
      heading: words.used,
      cell: (row) => <UseUp used={row.used} allowed={row.quantityAllowed} />,
    },
    {
      id: 'remaining',
      heading: words.remaining,
      number: true,
      sort: true,
      cell: (row) =>
        row.remaining === null ? (
          <span className="t-note">{words.noNumberStated}</span>
        ) : (
          sayNumber(row.remaining)
        ),
    },
  ]
  return (
    <DataTable
      label={words.title}
      columns={columns}
      rowKey={(row) => row.id}
      density="roomy"
      {...listProps({
        query,
        list,
        zone,
        what: words.title,
        empty: { title: words.empty, body: words.emptyBody },
        usualSort: { column: 'validUntil', direction: 'asc' },
      })}
    />
  )
}
