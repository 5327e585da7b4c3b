import { useEffect, useRef, useState } from 'react'
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { Phone, WifiOff } from 'lucide-react'
import { Link } from 'react-router-dom'
import { noteSeen } from '../../../shared/contracts/notices.contract.ts'
import type { Notice } from '../../../shared/contracts/notices.contract.ts'
import { observationWords as words } from '../../../shared/messages/observation-screens.ts'
import { sayObservation } from '../../../shared/messages/observations.ts'
import { api } from '../../lib/api-client.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { enterAndSend } from '../../lib/enter-and-send.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { useOutbox } from '../../lib/use-outbox.ts'
import { Button } from '../../ui/button.tsx'
import { Icon } from '../../ui/icon.tsx'
import { entries } from './entries.ts'
import type { ObservationBody } from './observation-draft.ts'
import { noticeQuery, onCallQuery, roundQuery } from './queries.ts'
import { TelephonedQuestion } from './telephoned-question.tsx'
import { urgentFate } from './urgent-fate.ts'
import type { UrgentFate } from './urgent-fate.ts'

const titles: Record<UrgentFate, () => string> = {
  sending: () => words.sending,
  'not-sent': () => words.notSent,
  sent: () => words.sent,
  seen: () => words.seen,
}

const buzzMs = 200

/** An urgent call and its own fate. Until it is sent, or somebody was telephoned, it says what to do instead. */
export function UrgentSheet({ id }: { id: string }) {
  const me = useMe()
  const { zone } = me.facility
  const maySee = useMay('notice.see').allowed
  const client = useQueryClient()
  const { waiting, refused, downSince } = useOutbox()
  const own = [...waiting, ...refused]
  const local = own.find((item) => item.kind === 'observation' && item.body['noticeId'] === id)
  const phoned = own.filter((item) => item.kind === 'telephoned' && item.params['id'] === id)
  const { data: notice, error } = useQuery({ ...noticeQuery(id), enabled: local === undefined })
  const { data: onCall } = useQuery(onCallQuery)
  const { data: round } = useQuery(roundQuery)
  const seen = useMutation({
    mutationFn: () => api(noteSeen, { params: { id }, body: { id: newId() } }),
    onSettled: () => client.invalidateQueries({ queryKey: ['quarantine'] }),
  })
  const [asking, setAsking] = useState(false)
  const [held, setHeld] = useState<string | null>(null)
  const now = useNow()
  const entry = local?.body as ObservationBody | undefined
  const raisedAt = entry?.happenedAt ?? notice?.raisedAt
  const ageMs = raisedAt === undefined ? 0 : now - new Date(raisedAt).getTime()
  const fate = urgentFate({ local, notice, down: downSince !== null || isNoAnswer(error), ageMs })
  const first = useFirstLine(fate)
  const say = (at: string) => sayMoment(at, zone, new Date(now).toISOString())

  if (isProblem(error, 'not-found') && !local) {
    return (
      <main id="chart" tabIndex={-1} className="urgent-sheet">
        <h1>{words.noSuchCall}</h1>
        <Link to={paths.rounds()}>{words.back}</Link>
      </main>
    )
  }

  const place = local?.label ?? placeOf(notice)
  const caseNumber =
    notice?.caseNumber ??
    round?.value.rows.find((row) => row.enclosure === entry?.enclosure)?.cases[0]?.number ??
    null
  const enclosure = entry?.enclosure ?? notice?.enclosure
  const seenWords = entry ? `${sayObservation(entry).join('. ')}.` : (notice?.words ?? '')

  return (
    <main
      id="chart"
      tabIndex={-1}
      className="urgent-sheet"
      role={fate === 'not-sent' ? 'alertdialog' : undefined}
      aria-labelledby="urgent-fate"
    >
      <p className="urgent-about">
        {raisedAt === undefined
          ? words.callTitle
          : words.callBy({ place, by: entry ? words.you : (notice?.raisedBy ?? ''), at: say(raisedAt) })}
      </p>
      <h1 id="urgent-fate" ref={first} tabIndex={-1} aria-live="assertive">
        {titles[fate]()}
      </h1>
      {fate === 'not-sent' ? <p className="urgent-do">{words.ringsNobody}</p> : null}
      {fate === 'sent' ? <p className="urgent-do">{words.sentBody}</p> : null}
      {fate === 'sending' ? <p>{words.sendingBody}</p> : null}
      {fate === 'seen' || fate === 'sending' ? null : (
        <OnCallList people={onCall?.value.people ?? []} from={onCall ? say(onCall.value.asOf) : null} />
      )}
      <blockquote>{seenWords}</blockquote>
      <div className="urgent-facts">
        {notice?.seen.map((act) => (
          <p key={act.at}>{words.seenBy({ name: act.by, at: say(act.at) })}</p>
        ))}
        {notice && notice.sentTo.length > 0 ? (
          <p>{words.sentTo({ names: notice.sentTo.map(({ name }) => name).join(', ') })}</p>
        ) : null}
        {notice?.failed.map(({ name, error: why }) => (
          <p key={name}>{words.failedTo({ name, error: why })}</p>
        ))}
        {[
          ...(notice?.telephoned ?? []),
          ...phoned.map((item) => ({
            by: words.you,
            at: item.madeAt,
            whom: (item.body['whom'] as string | undefined) ?? null,
          })),
        ].map((act) => (
          <p key={act.at}>
            {words.telephonedBy({
              name: act.by,
              whom: act.whom ? words.telephonedTo({ name: act.whom }) : '',
              at: say(act.at),
            })}
          </p>
        ))}
        {held === null ? null : <p>{held}</p>}
        {local?.refusal ? <p>{words.notTaken({ says: local.refusal.says })}</p> : null}
        {downSince !== null && fate === 'not-sent' ? (
          <p className="urgent-signal">
            <Icon of={WifiOff} size={20} />
            <span>
              {words.noSignal({ at: say(downSince) })} {words.trying}
            </span>
          </p>
        ) : null}
      </div>
      <div className="urgent-acts">
        {fate === 'seen' ? null : (
          <Button kind="primary" size="touch" block onClick={() => setAsking(true)}>
            {words.haveTelephoned}
          </Button>
        )}
        {notice && fate !== 'seen' && maySee && notice.raisedById !== me.id ? (
          <Button size="touch" block disabled={seen.isPending} onClick={() => seen.mutate()}>
            {words.haveSeen}
          </Button>
        ) : null}
        <div className="urgent-two">
          {caseNumber === null || held !== null ? null : (
            <Button
              kind="hold"
              size="touch"
              onClick={() =>
                void enterAndSend(client, entries.hold(me.id, caseNumber, undefined)).then((became) =>
                  setHeld(
                    became === 'sent'
                      ? words.holdDone({ number: caseNumber })
                      : words.holdKept({ number: caseNumber }),
                  ),
                )
              }
            >
              {words.holdTheCase}
            </Button>
          )}
          <Link
            className="btn btn-touch"
            to={enclosure === undefined ? paths.rounds() : paths.observe(enclosure)}
          >
            {words.backToEntry}
          </Link>
        </div>
      </div>
      {asking ? (
        <TelephonedQuestion
          names={(onCall?.value.people ?? []).map(({ name }) => name)}
          onBack={() => setAsking(false)}
          onRecord={(whom) => {
            setAsking(false)
            void enterAndSend(client, entries.telephoned(me.id, place, id, whom))
          }}
        />
      ) : null}
    </main>
  )
}

const isNoAnswer = (error: unknown) => isProblem(error) && error.noAnswer

const placeOf = (notice: Notice | undefined) =>
  notice ? [notice.enclosure, notice.caseNumber].filter(Boolean).join(', ') : ''

function OnCallList({
  people,
  from,
}: {
  people: readonly { name: string; phone: string | null }[]
  from: string | null
}) {
  if (people.length === 0) return <p className="urgent-do">{words.nobodyOnCall}</p>
  return (
    <>
      <ul className="urgent-phones">
        {people.map(({ name, phone }) => (
          <li key={name}>
            {phone === null ? (
              <p>
                <span>{name}</span>
                <b>{words.noPhone}</b>
              </p>
            ) : (
              <a href={`tel:${phone.replace(/[^\d+]/g, '')}`}>
                <Icon of={Phone} size={26} />
                <span>{name}</span>
                <b>{phone}</b>
              </a>
            )}
          </li>
        ))}
      </ul>
      {from === null ? null : <p className="urgent-note">{words.listFrom({ at: from })}</p>}
    </>
  )
}

/** The time, to the second, while the sheet is open. */
function useNow(): number {
  const [now, setNow] = useState(() => Date.now())
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), 1000)
    return () => clearInterval(timer)
  }, [])
  return now
}

/** Focus on the first line when the fate changes, and one vibration when the call was not sent. No sound. */
function useFirstLine(fate: UrgentFate) {
  const line = useRef<HTMLHeadingElement>(null)
  useEffect(() => {
    line.current?.focus()
    if (fate === 'not-sent') navigator.vibrate?.(buzzMs)
  }, [fate])
  return line
}
