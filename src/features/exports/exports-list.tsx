import type { ReactNode } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { ExportRow } from '../../../shared/contracts/exports.contract.ts'
import { formatFingerprint } from '../../../shared/domain/documents/format-fingerprint.ts'
import { historySheetWords as words } from '../../../shared/messages/history-sheet.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import type { ListState } from '../../lib/list-state.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { sayBytes } from '../../lib/say-bytes.ts'
import { listProps } from '../../lib/list-props.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { exportAddress, exportsQuery } from './queries.ts'

const short = (sha256: string) => {
  const written = formatFingerprint(sha256)
  return written.ok ? written.value : sha256
}

/** Every file that left the register, the newest first. */
export function ExportsList({ list, above }: { list: ListState; above?: ReactNode }) {
  const { zone } = useMe().facility
  const sort = list.get('sort') as 'exported' | 'accession' | undefined
  const query = useQuery(
    exportsQuery({
      q: list.get('q'),
      sort,
      direction: list.get('direction') as 'asc' | 'desc' | undefined,
      cursor: list.cursor,
    }),
  )
  const columns: TableColumn<ExportRow>[] = [
    {
      id: 'file',
      heading: words.file,
      cell: (row) => (
        <a href={exportAddress(row.id)} download={row.fileName}>
          {row.fileName}
        </a>
      ),
    },
    {
      id: 'accession',
      heading: words.animal,
      narrow: 'head',
      sort: true,
      cell: (row) => <Link to={paths.history(row.accession)}>{row.accession}</Link>,
    },
    { id: 'purpose', heading: words.purpose, cell: (row) => row.reason ?? '' },
    { id: 'by', heading: words.by, cell: (row) => row.exportedBy },
    { id: 'exported', heading: words.at, sort: true, cell: (row) => sayInstant(row.exportedAt, zone) },
    { id: 'size', heading: words.size, number: true, cell: (row) => sayBytes(row.bytes) },
    { id: 'hash', heading: words.hash, cell: (row) => <span className="num">{short(row.sha256)}</span> },
  ]
  return (
    <>
      {above}
      <DataTable
        label={words.exportsTitle}
        columns={columns}
        rowKey={(row) => row.id}
        {...listProps({
          query,
          list,
          zone,
          what: words.exportsTitle,
          empty: { title: words.empty, body: words.emptyBody },
          usualSort: { column: 'exported', direction: 'desc' },
        })}
      />
    </>
  )
}
