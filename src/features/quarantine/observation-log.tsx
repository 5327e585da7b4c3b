import { useState } from 'react'
import type { ReactNode } from 'react'
import { useInfiniteQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { Observation } from '../../../shared/contracts/observations.contract.ts'
import { daysBetween, wallClockOf } from '../../../shared/domain/time/facility-date.ts'
import { noticeStateWords } from '../../../shared/messages/notices.ts'
import { sayObservation } from '../../../shared/messages/observations.ts'
import { caseForms, observationForms } from '../../../shared/messages/quarantine-forms.ts'
import { quarantineWords as words } from '../../../shared/messages/quarantine-screens.ts'
import { sayTime } from '../../../shared/messages/say-date.ts'
import { useFacilityNow } from '../../lib/facility-time.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { Button } from '../../ui/button.tsx'
import { longDay } from '../../ui/day-words.ts'
import { LogColumn } from '../../ui/log-column.tsx'
import type { LogEntry } from '../../ui/log-column.tsx'
import { ReasonDialog } from '../../ui/reason-dialog.tsx'
import { Tag } from '../../ui/tag.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { BodiesDialog } from './bodies-dialog.tsx'
import { useReviewObservation, useStrikeObservation } from './mutations.ts'
import { observationsQuery } from './queries.ts'

/** What was seen, the newest first: of one case, or of all with their numbers. A veterinarian notes here that they read it. */
export function ObservationLog({
  number,
  day0On = null,
  foot,
}: {
  number?: string
  /** Day 0 of the case, for its day numbers. */
  day0On?: string | null
  foot?: ReactNode
}) {
  const { zone } = useMe().facility
  const { date: today } = useFacilityNow(zone)
  const { data, hasNextPage, fetchNextPage, isFetchingNextPage } = useInfiniteQuery(observationsQuery(number))
  // an observation that came in between moves the others down: one may stand on two pages
  const rows = [
    ...new Map((data?.pages ?? []).flatMap((page) => page.rows.map((row) => [row.id, row]))).values(),
  ]
  const total = data?.pages.at(-1)?.total ?? 0
  let day = ''
  const entries = rows.map((row): LogEntry => {
    const { date, time } = wallClockOf(row.happenedAt, zone)
    const name = date === today ? words.today : longDay(date)
    const heading =
      day0On !== null && date >= day0On
        ? words.dayOfCase({ date: name, day: daysBetween(day0On, date) })
        : name
    const entry: LogEntry = {
      key: row.id,
      ...(date === day ? {} : { day: heading }),
      time: time.slice(0, 5),
      instant: row.happenedAt,
      what: <ObservationWords row={row} numbered={number === undefined} zone={zone} />,
      who: row.recordedBy,
      act: <Strike row={row} zone={zone} />,
    }
    day = date
    return entry
  })
  return (
    <LogColumn
      title={words.log}
      about={number ?? words.logAllCases}
      entries={entries}
      head={data && rows.length === 0 ? <p className="t-2 pt-3">{words.logNone}</p> : undefined}
      count={total}
      more={
        hasNextPage ? (
          <>
            <p className="t-note">{words.observationsShown({ shown: rows.length, total })}</p>
            <Button disabled={isFetchingNextPage} onClick={() => void fetchNextPage()}>
              {words.observationsOlder}
            </Button>
          </>
        ) : undefined
      }
      foot={foot}
    />
  )
}

function ObservationWords({ row, numbered, zone }: { row: Observation; numbered: boolean; zone: string }) {
  const now = new Date().toISOString()
  const may = useMay('chart.write')
  const mayName = useMay('discrepancy.resolve')
  const [naming, setNaming] = useState(false)
  const review = useReviewObservation()
  const said = `${sayObservation(row).join('. ')}.`
  return (
    <>
      {numbered ? (
        <>
          {row.cases.map((one) => (
            <Link key={one} to={paths.quarantineCase(one)} className="t-strong">
              {one}
            </Link>
          ))}
          {row.cases.length === 0 ? <b className="t-strong">{row.enclosure}</b> : null}{' '}
        </>
      ) : null}
      {row.voidedReason === null ? (
        said
      ) : (
        <>
          <s>{said}</s> {words.struck({ reason: row.voidedReason })}
        </>
      )}
      {row.deathsStanding.length > 0 ? (
        <span className="t-note block">
          {words.deathsStand({ count: row.deathsStanding.reduce((sum, { count }) => sum + count, 0) })}
          {row.deathsStanding.map(({ accession }, i) => (
            <Link
              key={`${accession} ${String(i)}`}
              className="inline-block min-h-6 ps-1"
              to={paths.animal(accession)}
            >
              {accession}
            </Link>
          ))}
        </span>
      ) : null}
      {row.origin === 'outbox' ? (
        <span className="t-note block">
          {row.timeDoubtful ? words.clockDoubtful : words.keptFirst({ at: sayTime(row.recordedAt, zone) })}
        </span>
      ) : null}
      {row.notice ? (
        <span className="block pt-1">
          <Tag kind="solid">{words.urgent}</Tag>{' '}
          <Link className="inline-block min-h-6" to={paths.urgentCall(row.notice.id)}>
            {noticeStateWords[row.notice.state]}
          </Link>
        </span>
      ) : null}
      {row.bodiesToName > 0 ? (
        <span className="block pt-1">
          <Tag>{observationForms.bodiesWaiting({ count: row.bodiesToName })}</Tag>
          {mayName.allowed ? (
            <Button size="small" className="mt-1 block" onClick={() => setNaming(true)}>
              {observationForms.nameBodies}
              <span className="visually-hidden"> {row.enclosure}</span>
            </Button>
          ) : null}
        </span>
      ) : null}
      {row.bodies ? (
        <span className="t-note block">
          {row.bodies.named > 0
            ? observationForms.bodiesNamed({ count: row.bodies.named, by: row.bodies.by })
            : observationForms.bodiesExplained({ by: row.bodies.by })}
          {row.bodies.reason === null ? null : words.readWith({ words: row.bodies.reason })}
        </span>
      ) : null}
      {naming ? <BodiesDialog observation={row} onBack={() => setNaming(false)} /> : null}
      {row.forVeterinarian ? (
        <span className="block pt-1">
          <Tag>{words.forVeterinarian}</Tag>
        </span>
      ) : null}
      {row.reviewed ? (
        <span className="t-note block">
          {words.readBy({ name: row.reviewed.by, at: sayMoment(row.reviewed.at, zone, now) })}
          {row.reviewed.words ? words.readWith({ words: row.reviewed.words }) : null}
        </span>
      ) : row.forVeterinarian && row.voidedReason === null && may.allowed ? (
        <Button
          size="small"
          className="mt-1"
          disabled={review.isPending}
          onClick={() => review.mutate(row.id)}
        >
          {words.haveRead}
        </Button>
      ) : null}
    </>
  )
}

/** Whoever wrote it, or a veterinarian, strikes it out: quietly, at the end of its line. */
function Strike({ row, zone }: { row: Observation; zone: string }) {
  const me = useMe()
  const may = useMay('chart.write')
  const [asked, setAsked] = useState(false)
  if (row.voidedReason !== null || (row.recordedById !== me.id && !may.allowed)) return null
  return (
    <>
      <button type="button" className="log-act" onClick={() => setAsked(true)}>
        {observationForms.strikeOut}
        <span className="visually-hidden"> {sayMoment(row.happenedAt, zone, new Date().toISOString())}</span>
      </button>
      {asked ? <StrikeQuestion row={row} onBack={() => setAsked(false)} /> : null}
    </>
  )
}

/** Says beforehand what of the observation stays. */
function StrikeQuestion({ row, onBack }: { row: Observation; onBack: () => void }) {
  const strike = useStrikeObservation(row.id)
  const say = useToast()
  const [key] = useState(newId)
  return (
    <ReasonDialog
      question={observationForms.strikeQuestion({ enclosure: row.enclosure })}
      body={`${sayObservation(row).join('. ')}. ${observationForms.strikeHint}`}
      label={caseForms.reason}
      act={observationForms.strikeOut}
      back={observationForms.strikeBack}
      onBack={onBack}
      onAct={async (reason) => {
        await strike.mutateAsync({ reason, key })
        onBack()
        say({ words: observationForms.observationStruck })
      }}
    />
  )
}
