import { keepPreviousData, useQuery } from '@tanstack/react-query'
import { listAudit } from '../../../shared/contracts/audit.contract.ts'
import type { AuditEntry } from '../../../shared/contracts/audit.contract.ts'
import { auditWords, peopleWords } from '../../../shared/messages/people.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { api } from '../../lib/api-client.ts'
import { listProps } from '../../lib/list-props.tsx'
import { useListState } from '../../lib/list-state.ts'
import { useMe } from '../../lib/me.ts'
import { SearchField } from '../../lib/search-field.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { DataTable } from '../../ui/data-table.tsx'
import { ListSheet } from '../../ui/list-sheet.tsx'

const pretty = (value: unknown) => JSON.stringify(value, null, 2)

function Change({ entry }: { entry: AuditEntry }) {
  if (entry.withheld) return <span className="t-2">{auditWords.withheld}</span>
  if (entry.before === null && entry.after === null) return null
  return (
    <details>
      <summary>{auditWords.show}</summary>
      {entry.amountLeftOut ? <p className="t-note">{auditWords.amountLeftOut}</p> : null}
      {(['before', 'after'] as const).map((side) =>
        entry[side] === null || entry[side] === undefined ? null : (
          <div key={side}>
            <p className="t-note">{auditWords[side]}</p>
            <pre className="whitespace-pre-wrap break-words text-[12px]">{pretty(entry[side])}</pre>
          </div>
        ),
      )}
      <p className="t-note break-all">{auditWords.hash({ seq: entry.seq, hash: entry.hash })}</p>
    </details>
  )
}

function columnsOf(zone: string): TableColumn<AuditEntry>[] {
  return [
    { id: 'at', heading: auditWords.at, cell: (row) => sayInstant(row.at, zone) },
    { id: 'who', heading: auditWords.who, narrow: 'head', cell: (row) => row.actorName },
    { id: 'act', heading: auditWords.act, cell: (row) => row.action },
    { id: 'record', heading: auditWords.record, cell: (row) => `${row.subjectKind} ${row.subjectLabel}` },
    { id: 'change', heading: auditWords.change, cell: (row) => <Change entry={row} /> },
  ]
}

/** The audit trail as far as the reader may see it. */
export function AuditTrail() {
  const me = useMe()
  const list = useListState()
  const filter = { q: list.get('q'), cursor: list.cursor }
  const query = useQuery({
    queryKey: ['audit', filter],
    queryFn: ({ signal }) => api(listAudit, { query: filter, signal }),
    placeholderData: keepPreviousData,
  })
  return (
    <ListSheet
      place={peopleWords.place}
      title={auditWords.title}
      source={auditWords.source}
      search={<SearchField label={auditWords.search} list={list} />}
    >
      <DataTable
        label={auditWords.trail}
        columns={columnsOf(me.facility.zone)}
        rowKey={(row) => String(row.seq)}
        {...listProps({
          query,
          list,
          zone: me.facility.zone,
          what: auditWords.trail,
          empty: { title: auditWords.noneFound },
          usualSort: null,
        })}
      />
    </ListSheet>
  )
}
