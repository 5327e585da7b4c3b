import { useState } from 'react'
import { keepPreviousData, useQuery } from '@tanstack/react-query'
import { Search } from 'lucide-react'
import { listAudit } from '../../../shared/contracts/audit.contract.ts'
import type { AuditEntry } from '../../../shared/contracts/audit.contract.ts'
import { auditWords, peopleWords } from '../../../shared/messages/people.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { api } from '../../lib/api-client.ts'
import { useListState } from '../../lib/list-state.ts'
import { useMe } from '../../lib/me.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Button } from '../../ui/button.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { DataTable } from '../../ui/data-table.tsx'
import { ListEmpty, ListFetching, ListUnreadable } from '../../ui/list-states.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { TextField } from '../../ui/text-field.tsx'

const pretty = (value: unknown) => JSON.stringify(value, null, 2)

function Change({ entry }: { entry: AuditEntry }) {
  if (entry.withheld) return <span className="t-2">{auditWords.withheld}</span>
  if (entry.before === null && entry.after === null) return null
  return (
    <details>
      <summary>{auditWords.show}</summary>
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
    { id: 'who', heading: auditWords.who, cell: (row) => row.actorName },
    { id: 'act', heading: auditWords.act, cell: (row) => row.action },
    { id: 'record', heading: auditWords.record, cell: (row) => `${row.subjectKind} ${row.subjectLabel}` },
    { id: 'change', heading: auditWords.change, cell: (row) => <Change entry={row} /> },
  ]
}

/** The audit trail as far as the reader may see it. */
export function AuditTrail() {
  const me = useMe()
  const list = useListState()
  const [typed, setTyped] = useState(list.get('q') ?? '')
  const filter = { q: list.get('q'), cursor: list.cursor }
  const query = useQuery({
    queryKey: ['audit', filter],
    queryFn: ({ signal }) => api(listAudit, { query: filter, signal }),
    placeholderData: keepPreviousData,
  })
  const reply = query.data
  const problem = isProblem(query.error) ? query.error : null
  const { nextCursor } = reply ?? {}
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche place={peopleWords.place} title={auditWords.title} source={auditWords.source} />
        <form
          className="pane stack"
          role="search"
          onSubmit={(event) => {
            event.preventDefault()
            list.set({ q: typed.trim() || undefined })
          }}
        >
          <TextField
            label={auditWords.search}
            type="search"
            value={typed}
            onChange={(event) => setTyped(event.target.value)}
          />
          <Button type="submit" icon={Search}>
            {peopleWords.find}
          </Button>
        </form>
      </Area>
      <Area className="pane">
        <DataTable
          label={auditWords.trail}
          columns={columnsOf(me.facility.zone)}
          rows={reply?.rows ?? []}
          rowKey={(row) => String(row.seq)}
          sort={null}
          onSort={() => undefined}
          old={problem !== null}
          above={
            problem ? (
              <ListUnreadable
                why={problem.says}
                code={problem.requestId}
                onRetry={() => void query.refetch()}
              />
            ) : null
          }
          paging={{
            kind: 'server',
            from: list.from,
            total: reply?.total ?? 0,
            onBefore: list.before,
            onNext: nextCursor && reply ? () => list.next(nextCursor, reply.rows.length) : undefined,
          }}
          instead={
            query.isPending ? (
              <ListFetching what={auditWords.trail} />
            ) : reply?.rows.length === 0 ? (
              <ListEmpty title={auditWords.noneFound}>{auditWords.noneFoundText}</ListEmpty>
            ) : undefined
          }
        />
      </Area>
    </Sheet>
  )
}
