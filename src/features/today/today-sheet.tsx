import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Footprints } from 'lucide-react'
import { sayOffset, sayTime } from '../../../shared/messages/say-date.ts'
import { laneOwners, todayWords } from '../../../shared/messages/today.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { usePreference, useSetPreference } from '../../lib/preferences.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { todayQuery } from '../../lib/today-query.ts'
import type { TodayReply } from '../../lib/today-query.ts'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { longDay } from '../../ui/day-words.ts'
import { ListFetching, ListUnreadable } from '../../ui/list-states.tsx'
import { SegmentedChoice } from '../../ui/segmented-choice.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { useMedia } from '../../ui/use-media.ts'
import { HandoverNotes } from './handover-notes.tsx'
import { TodayBands } from './today-bands.tsx'
import { TodayDone } from './today-done.tsx'
import { TodayLog } from './today-log.tsx'
import { UrgentCalls } from './urgent-calls.tsx'
import { lanesSeenBy, viewToday } from './today-model.ts'
import type { TodayView } from './today-model.ts'

/** What is late, due, waiting and coming for the roles of the person, in lanes by the hour; done from here. */
export function TodaySheet() {
  const me = useMe()
  const query = useQuery(todayQuery)
  const preferred = usePreference('todayLane')
  const { zone } = me.facility
  const reply = query.data
  const narrow = useMedia('(max-width: 1200px)')
  // the log is of the tanks, and for whoever works there
  const atTheTanks = lanesSeenBy(me.roles).includes('watch')
  const view = reply && viewToday(reply.items, { at: reply.at, zone, roles: me.roles, preferred })

  return (
    <Sheet recipe={atTheTanks ? 'list-log' : 'plain'} className="today">
      <Area>
        <div className="sheet-head today-head">
          <Cartouche
            place={me.facility.name}
            title={todayWords.title}
            source={
              reply ? (
                <>
                  {todayWords.source({ day: longDay(reply.on), offset: sayOffset(reply.at, zone) })}
                  <br />
                  {todayWords.asOf({ time: sayTime(reply.at, zone) })}
                </>
              ) : undefined
            }
          />
          {view ? <TodayTop view={view} /> : <div className="sheet-tools" />}
        </div>
        {query.isError ? (
          <ListUnreadable
            title={todayWords.unreadable}
            why={isProblem(query.error) ? query.error.says : ''}
            oldFrom={reply ? sayTime(reply.at, zone) : null}
            code={isProblem(query.error) ? query.error.requestId : undefined}
            onRetry={() => void query.refetch()}
          />
        ) : null}
        {!reply && query.isPending ? <ListFetching what={todayWords.what} rows={6} /> : null}
        {reply && view ? (
          <>
            <UrgentCalls calls={view.urgent} at={reply.at} zone={zone} />
            {narrow ? <UnreadHandover reply={reply} zone={zone} /> : null}
            <TodayBands view={view} at={reply.at} zone={zone} />
            <TodayDone items={view.done} at={reply.at} zone={zone} />
          </>
        ) : null}
      </Area>
      {atTheTanks ? <ShipsLog reply={reply} zone={zone} /> : null}
    </Sheet>
  )
}

/** Where the log is a drawer, a note that this person has not read stands before the work. */
function UnreadHandover({ reply, zone }: { reply: TodayReply; zone: string }) {
  const unread = reply.handover.filter((note) => !note.mine && !note.readByMe)
  if (unread.length === 0) return null
  return (
    <div className="today-handover">
      <HandoverNotes notes={unread} at={reply.at} zone={zone} />
    </div>
  )
}

function ShipsLog({ reply, zone }: { reply: TodayReply | undefined; zone: string }) {
  return (
    <TodayLog
      lines={reply?.log ?? []}
      handover={reply?.handover ?? []}
      at={reply?.at ?? new Date().toISOString()}
      zone={zone}
    />
  )
}

/** How much waits, and the lane that comes first. */
function TodayTop({ view }: { view: TodayView }) {
  const setPreference = useSetPreference()
  const [announced, setAnnounced] = useState('')
  return (
    <div className="sheet-tools today-top">
      <p className="today-sum" role="status">
        <b>{view.waits === 0 ? todayWords.noneWait : todayWords.waits({ count: view.waits })}</b>
        {view.waitsLate > 0
          ? `, ${todayWords.ofThemLate({ count: view.waitsLate, all: view.waitsLate === view.waits })}`
          : ''}
        {'. '}
        {view.othersLate > 0
          ? todayWords.othersLate({ count: view.othersLate, more: view.waitsLate > 0 })
          : ''}
        <span className="visually-hidden">{announced}</span>
      </p>
      <div className="row row-wrap">
        {view.lanes.length > 1 && view.chosen !== null ? (
          <SegmentedChoice
            label={todayWords.chooseLane}
            value={view.chosen}
            segments={[...view.lanes].sort().map((lane) => ({ value: lane, label: laneOwners[lane] }))}
            onChange={(lane) => {
              setPreference.mutate({ name: 'todayLane', value: lane })
              setAnnounced(laneOwners[lane])
            }}
          />
        ) : null}
        {view.lanes.includes('watch') ? (
          <ButtonLink to={paths.rounds()} icon={Footprints}>
            {todayWords.rounds}
          </ButtonLink>
        ) : null}
      </div>
    </div>
  )
}
