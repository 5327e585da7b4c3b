import type { History, HistoryEvent } from '../../../shared/contracts/exports.contract.ts'
import { historyWords as words, identifierKindNames } from '../../../shared/messages/history.ts'
import { historySheetWords } from '../../../shared/messages/history-sheet.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import {
  sayChange,
  sayCount,
  sayEventDetails,
  sayEventTitle,
  sayPeriod,
  sayPlace,
  sayWhen,
} from '../../../shared/messages/say-history-event.ts'
import { useMe } from '../../lib/me.ts'
import { DataTable } from '../../ui/data-table.tsx'
import { Facts } from '../../ui/facts.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { ListEmpty } from '../../ui/list-states.tsx'
import { PortList } from './port-list.tsx'
import { portsOf } from './ports.ts'

/** How it is held, by whom, since when, how many: the facts above the passage. */
export function HistoryFacts({ history }: { history: History }) {
  const { facility } = useMe()
  const facts: [string, string][] = [
    [words.heldAs, words[history.heldAs]],
    [words.owner, history.owner ?? facility.name],
    [words.since, history.since === null ? words.nothingYet : sayDate(history.since)],
    [words.place, sayPlace(history.place) ?? words.outside],
    [words.count, sayCount(history)],
    [words.period, sayPeriod(history)],
  ]
  return <Facts of={facts} />
}

/** The passage, the ledger with its sum, and the marks. */
export function HistoryView({ history }: { history: History }) {
  const { zone } = useMe().facility
  return (
    <div className="stack gap-6">
      <section className="stack">
        <h2 className="t-head">{historySheetWords.ports}</h2>
        <PortList ports={portsOf(history, zone)} />
      </section>
      <Ledger history={history} zone={zone} />
      <Identifiers history={history} />
    </div>
  )
}

function Ledger({ history, zone }: { history: History; zone: string }) {
  const columns: TableColumn<HistoryEvent>[] = [
    { id: 'when', heading: words.date, cell: (row) => <span className="num">{sayWhen(row, zone)}</span> },
    {
      id: 'what',
      heading: words.event,
      cell: (row) => (
        <>
          <span className={row.voided ? 'struck' : undefined}>{sayEventTitle(row)}</span>
          {row.voided || row.found ? (
            <span className="t-note block">{sayEventDetails(row).join(' ')}</span>
          ) : null}
        </>
      ),
    },
    {
      id: 'change',
      heading: words.change,
      number: true,
      cell: (row) => (row.voided ? words.struckTag : sayChange(row.delta)),
    },
    { id: 'after', heading: words.after, number: true, cell: (row) => row.countAfter },
  ]
  return (
    <section className="stack">
      <h2 className="t-head">{historySheetWords.ledger}</h2>
      <DataTable
        label={historySheetWords.ledger}
        columns={columns}
        rows={history.events}
        rowKey={(row) => row.eventId}
        paging={{ kind: 'local', size: 100 }}
        instead={history.events.length === 0 ? <ListEmpty title={words.noEvents} /> : undefined}
      />
      <p className="balance-line">
        <span>
          {words.opening} {history.opening}, {words.gained.toLowerCase()} {history.gained},{' '}
          {words.lost.toLowerCase()} {history.lost}
        </span>
        <b className="num">{words.balanceSentence(history)}</b>
      </p>
    </section>
  )
}

interface Mark {
  key: string
  kind: string
  value: string
  from: string
  until: string
}

function Identifiers({ history }: { history: History }) {
  const marks: Mark[] = [
    {
      key: 'accession',
      kind: words.accessionNumber,
      value: history.accession,
      from: history.since === null ? '' : sayDate(history.since),
      until: words.inUse,
    },
    ...history.identifiers.map((mark) => ({
      key: `${mark.kind} ${mark.value}`,
      kind: [identifierKindNames[mark.kind], mark.place].filter(Boolean).join(', '),
      value: mark.value,
      from: sayDate(mark.from),
      until: mark.until === null ? words.inUse : sayDate(mark.until),
    })),
  ]
  const columns: TableColumn<Mark>[] = [
    { id: 'kind', heading: words.identifier, cell: (row) => row.kind },
    { id: 'value', heading: words.value, cell: (row) => <b className="num">{row.value}</b> },
    { id: 'from', heading: words.validFrom, cell: (row) => row.from },
    { id: 'until', heading: words.validUntil, cell: (row) => row.until },
  ]
  return (
    <section className="stack">
      <h2 className="t-head">{historySheetWords.identifiers}</h2>
      <DataTable
        label={historySheetWords.identifiers}
        columns={columns}
        rows={marks}
        rowKey={(row) => row.key}
      />
    </section>
  )
}
