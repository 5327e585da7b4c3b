import { useState } from 'react'
import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { attachTransactionDocument } from '../../../shared/contracts/acquisitions.contract.ts'
import type { Transaction } from '../../../shared/contracts/acquisitions.contract.ts'
import { historyWords } from '../../../shared/messages/history.ts'
import {
  permitKindNames,
  permitMarkNames,
  transactionKindNames,
} from '../../../shared/messages/register-kinds.ts'
import { transactionWords as words } from '../../../shared/messages/register-sheet.ts'
import { sayDate, sayInstant } from '../../../shared/messages/say-date.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { Button } from '../../ui/button.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import { Facts } from '../../ui/facts.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { ReasonDialog } from '../../ui/reason-dialog.tsx'
import { Tag } from '../../ui/tag.tsx'
import { Papers } from '../documents/index.ts'
import { useVoidTransaction } from './mutations.ts'
import { transactionsKey } from './queries.ts'

/** Kind, date, party, place and transport of a transaction; what is not known is left out. */
export function TransactionFacts({ transaction: t }: { transaction: Transaction }) {
  const { zone } = useMe().facility
  const { place, transport } = t
  const { latitude, longitude } = place
  const where = [
    place.locality,
    place.on === null ? null : sayDate(place.on),
    place.method,
    latitude === null || longitude === null
      ? null
      : historyWords.coordinates({ latitude, longitude, uncertainty: place.uncertaintyMetres }),
  ].filter(Boolean)
  const travelled = [
    transport.carrier,
    transport.waybill,
    transport.sealedAt === null ? null : sayInstant(transport.sealedAt, zone),
    transport.openedAt === null ? null : sayInstant(transport.openedAt, zone),
    transport.note,
  ].filter(Boolean)
  const facts: [string, ReactNode][] = [
    [words.kind, transactionKindNames[t.kind]],
    [words.way, t.way === 'in' ? words.wayIn : words.wayOut],
    [words.date, t.time === null ? sayDate(t.on) : `${sayDate(t.on)}, ${t.time}`],
    [words.stage, words[t.stage]],
    [words.party, t.counterparty?.name ?? words.none],
    ...(t.reference ? [[words.reference, t.reference] as [string, string]] : []),
    ...(t.loanDueOn ? [[words.loanDueOn, sayDate(t.loanDueOn)] as [string, string]] : []),
    ...(where.length > 0 ? [[words.place, where.join('; ')] as [string, string]] : []),
    ...(travelled.length > 0 ? [[words.transport, travelled.join('; ')] as [string, string]] : []),
    ...(t.note ? [[words.note, t.note] as [string, string]] : []),
  ]
  return <Facts of={facts} />
}

type Line = Transaction['lines'][number]
type Use = Transaction['permitUses'][number]

/** The animals, the permits used for them, and the papers. */
export function TransactionView({ transaction }: { transaction: Transaction }) {
  const mayManage = transaction.may.includes('register.manage')
  return (
    <div className="stack gap-6">
      <section className="stack">
        <h2 className="t-head">{words.animals}</h2>
        <DataTable
          label={words.animals}
          columns={lineColumns()}
          rows={transaction.lines}
          rowKey={(row) => row.id}
        />
      </section>
      <section className="stack">
        <h2 className="t-head">{words.permits}</h2>
        <DataTable
          label={words.permits}
          columns={permitColumns()}
          rows={transaction.permitUses}
          rowKey={(row) => row.id}
          instead={
            transaction.permitUses.length === 0 ? <p className="t-2 py-3">{words.noPermits}</p> : undefined
          }
        />
      </section>
      <section className="stack">
        <h2 className="t-head">{words.papers}</h2>
        <Papers
          papers={transaction.documents}
          mayAttach={transaction.may.includes('document.attach')}
          target={{
            contract: attachTransactionDocument,
            params: { number: transaction.number },
            readAgain: transactionsKey,
          }}
        />
      </section>
      {mayManage && transaction.voided === null ? <VoidTransaction number={transaction.number} /> : null}
    </div>
  )
}

const lineColumns = (): TableColumn<Line>[] => [
  {
    id: 'accession',
    heading: words.accession,
    cell: (row) => <Link to={paths.history(row.accession)}>{row.accession}</Link>,
  },
  {
    id: 'taxon',
    heading: words.taxon,
    cell: (row) => (
      <>
        {row.name ? `${row.name}, ${row.commonName}` : row.commonName}
        <span className="sci block">{row.scientificName}</span>
      </>
    ),
  },
  {
    id: 'count',
    heading: words.count,
    number: true,
    cell: (row) => (
      <>
        {row.count.toLocaleString('en-GB')}
        {row.estimate ? <span className="t-note block">{words.estimate(row.estimate)}</span> : null}
        {row.deadOnArrival ? (
          <span className="t-note block">{words.dead({ count: row.deadOnArrival })}</span>
        ) : null}
      </>
    ),
  },
  {
    id: 'enclosure',
    heading: words.enclosure,
    cell: (row) => (row.enclosure ? `${row.enclosure.code}, ${row.enclosure.name}` : ''),
  },
  { id: 'theirs', heading: words.theirNumber, cell: (row) => row.theirNumber ?? '' },
]

const permitColumns = (): TableColumn<Use>[] => [
  {
    id: 'permit',
    heading: words.permit,
    cell: (row) => (
      <>
        <Link to={paths.permit(row.permit)}>{row.permit}</Link> {row.permitNumber}
        <span className="t-note block">{permitKindNames[row.kind]}</span>
      </>
    ),
  },
  { id: 'authority', heading: words.authority, cell: (row) => row.authority },
  { id: 'quantity', heading: words.quantity, number: true, cell: (row) => row.quantity },
  {
    id: 'remarks',
    heading: words.remarks,
    cell: (row) =>
      row.marks.length === 0 ? (
        <span className="t-note">{words.covered}</span>
      ) : (
        <>
          {row.marks.map((mark) => permitMarkNames[mark]).join(', ')}
          <span className="block">
            {row.explained === null ? (
              <Tag kind="solid">{words.toExplain}</Tag>
            ) : (
              <span className="t-note">{words.explained({ reason: row.explained })}</span>
            )}
          </span>
        </>
      ),
  },
]

function VoidTransaction({ number }: { number: string }) {
  const [key, setKey] = useState<string | null>(null)
  const act = useVoidTransaction(number)
  return (
    <div>
      <Button onClick={() => setKey(newId())}>{words.void}</Button>
      {key !== null ? (
        <ReasonDialog
          question={words.voidQuestion({ number })}
          body={words.voidBody}
          label={words.voidReason}
          act={words.voidAct}
          back={words.voidBack}
          onBack={() => setKey(null)}
          onAct={async (reason) => {
            await act.mutateAsync({ reason, key })
            setKey(null)
          }}
        />
      ) : null}
    </div>
  )
}
