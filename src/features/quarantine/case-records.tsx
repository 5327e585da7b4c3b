import { Link } from 'react-router-dom'
import type { CaseDetail, CaseMember } from '../../../shared/contracts/quarantine.contract.ts'
import { extensionKindWords, lockCauseWords } from '../../../shared/messages/quarantine.ts'
import {
  caseEventWords,
  caseWords as words,
  deathFindingWords,
} from '../../../shared/messages/quarantine-case.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { Button } from '../../ui/button.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { OrderSignature } from '../orders/index.ts'
import { animalsText } from './passage-of-case.ts'

interface RecordsProps {
  of: CaseDetail
  zone: string
}

/** Locks and holds that stand, each with who put it on and the way to lift it. */
export function LockList({
  of: detail,
  zone,
  onLift,
}: RecordsProps & { onLift: ((lock: CaseDetail['locks'][number]) => void) | undefined }) {
  if (detail.locks.length === 0) return null
  return (
    <section aria-labelledby="case-locks">
      <h2 id="case-locks" className="t-head">
        {words.locks}
      </h2>
      {detail.locks.map((lock) => (
        <p key={lock.eventId} className="case-line">
          <span>
            {words.lockLine({
              cause: lockCauseWords[lock.cause],
              at: sayMoment(lock.since, zone, detail.asOf),
              by:
                lock.fromCase !== null
                  ? words.lockFrom({ number: lock.fromCase })
                  : lock.by === null
                    ? ''
                    : words.lockBy({ by: lock.by }),
            })}
            {lock.reason ? <span className="t-2 block">{lock.reason}</span> : null}
          </span>
          {onLift && lock.fromCase === null ? (
            <Button size="small" onClick={() => onLift(lock)}>
              {words.lift}
            </Button>
          ) : null}
        </p>
      ))}
    </section>
  )
}

const batchColumns = (zone: string, now: string): TableColumn<CaseMember>[] => [
  {
    id: 'accession',
    heading: words.accession,
    cell: (row) => (
      <Link to={paths.animal(row.accession)} className="num">
        {row.accession}
      </Link>
    ),
  },
  {
    id: 'animal',
    heading: words.animal,
    narrow: 'head',
    cell: (row) => (
      <>
        {row.name}
        <span className="sci block">{row.scientificName}</span>
        {row.fromSplit ? <span className="t-note block">{words.fromSplit}</span> : null}
      </>
    ),
  },
  {
    id: 'count',
    heading: words.count,
    narrow: 'short',
    cell: (row) => (row.animals.high === 0 ? words.gone : animalsText(row.animals)),
  },
  {
    id: 'place',
    heading: words.place,
    narrow: 'short',
    cell: (row) =>
      row.enclosure === null ? (
        <span className="t-2">{row.animals.high === 0 ? words.gone : words.elsewhere}</span>
      ) : (
        <Link to={paths.enclosure(row.enclosure)}>{row.enclosure}</Link>
      ),
  },
  { id: 'in', heading: words.cameIn, cell: (row) => sayMoment(row.joinedAt, zone, now) },
]

/** Animals and groups of the batch, those that died included. */
export function BatchTable({ of: detail, zone }: RecordsProps) {
  return (
    <section aria-labelledby="case-batch">
      <h2 id="case-batch" className="t-head">
        {words.batch}
      </h2>
      <DataTable
        label={words.batch}
        columns={batchColumns(zone, detail.asOf)}
        rows={detail.batch}
        rowKey={(row) => row.id}
        paging={{ kind: 'local', size: 20 }}
      />
    </section>
  )
}

/** Deaths of the batch with their signed causes. */
export function DeathList({
  of: detail,
  onSign,
}: Pick<RecordsProps, 'of'> & { onSign: ((death: CaseDetail['deaths'][number]) => void) | undefined }) {
  if (detail.deaths.length === 0) return null
  return (
    <section aria-labelledby="case-deaths">
      <h2 id="case-deaths" className="t-head">
        {words.deaths}
      </h2>
      {detail.deaths.map((death) => (
        <div key={death.eventId} className="case-line">
          <span>
            {words.deathLine({
              on: sayDate(death.on),
              count: words.bodies({ count: death.count }),
              whose: death.accession ?? words.whoseUnknown,
            })}
            <span className="t-2 block">
              {deathFindingWords[death.finding]}
              {death.cause ? `: ${death.cause}` : ''}
            </span>
          </span>
          {death.signature ? (
            <OrderSignature signature={death.signature} />
          ) : onSign ? (
            <Button size="small" onClick={() => onSign(death)}>
              {words.signCause}
            </Button>
          ) : null}
        </div>
      ))}
    </section>
  )
}

/** Reasons to wait longer, those that no longer count as well. */
export function ExtensionList({ of: detail }: Pick<RecordsProps, 'of'>) {
  if (detail.extensions.length === 0) return null
  return (
    <section aria-labelledby="case-extensions">
      <h2 id="case-extensions" className="t-head">
        {words.extensions}
      </h2>
      {detail.extensions.map((one) => {
        const line = words.extensionLine({
          kind: extensionKindWords[one.kind],
          from: sayDate(one.fromOn),
          until: one.untilOn === null ? words.untilEnded : words.until({ on: sayDate(one.untilOn) }),
        })
        return (
          <p key={`${one.eventId} ${one.kind}`} className="case-line">
            {one.state === 'standing' ? (
              <span>{line}</span>
            ) : (
              <span>
                <s>{line}</s> {one.state === 'ended' ? words.ended : words.withdrawn}
              </span>
            )}
          </p>
        )
      })}
    </section>
  )
}

type EventRow = CaseDetail['events'][number]

const eventColumns = (zone: string, now: string): TableColumn<EventRow>[] => [
  { id: 'at', heading: words.eventAt, cell: (row) => sayMoment(row.at, zone, now) },
  {
    id: 'event',
    heading: words.event,
    cell: (row) => {
      const name = caseEventWords[row.kind] ?? row.kind
      return (
        <>
          {row.voidedReason === null ? name : <s>{name}</s>}
          {row.reason ? <span className="t-2 block">{row.reason}</span> : null}
          {row.voidedReason === null ? null : (
            <span className="t-note block">{words.voided({ reason: row.voidedReason })}</span>
          )}
        </>
      )
    },
  },
  { id: 'by', heading: words.enteredBy, cell: (row) => row.recordedBy },
]

/** Events entered for the case, the newest first. */
export function EventTable({ of: detail, zone }: RecordsProps) {
  return (
    <section aria-labelledby="case-events">
      <h2 id="case-events" className="t-head">
        {words.events}
      </h2>
      {detail.events.length === 0 ? (
        <p className="t-2">{words.noEvents}</p>
      ) : (
        <DataTable
          label={words.events}
          columns={eventColumns(zone, detail.asOf)}
          rows={detail.events}
          rowKey={(row) => row.id}
          paging={{ kind: 'local', size: 10 }}
        />
      )}
    </section>
  )
}
