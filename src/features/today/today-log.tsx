import { Link } from 'react-router-dom'
import type { HandoverNote } from '../../../shared/contracts/handover.contract.ts'
import type { TodayLogLine } from '../../../shared/contracts/today.contract.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { sayTime } from '../../../shared/messages/say-date.ts'
import { sayLogLine } from '../../../shared/messages/say-today.ts'
import { todayWords } from '../../../shared/messages/today.ts'
import { paths } from '../../lib/paths.ts'
import { longDay } from '../../ui/day-words.ts'
import { HandoverNotes } from './handover-notes.tsx'
import { WriteHandover } from './write-handover.tsx'
import { LogColumn } from '../../ui/log-column.tsx'
import type { LogEntry } from '../../ui/log-column.tsx'

/** What people at the tanks wrote in the last 24 hours, the newest first. */
export function TodayLog({
  lines,
  handover,
  at,
  zone,
}: {
  lines: readonly TodayLogLine[]
  handover: readonly HandoverNote[]
  at: string
  zone: string
}) {
  return (
    <LogColumn
      title={todayWords.log}
      about={todayWords.logHours}
      entries={entriesOf(lines, at, zone)}
      head={
        <>
          <HandoverNotes notes={handover} at={at} zone={zone} />
          {lines.length === 0 ? <p className="t-2 py-3">{todayWords.logEmpty}</p> : null}
        </>
      }
      foot={<WriteHandover />}
    />
  )
}

function entriesOf(lines: readonly TodayLogLine[], at: string, zone: string): LogEntry[] {
  let day = facilityDateOf(at, zone)
  return lines.map((line) => {
    const on = facilityDateOf(line.at, zone)
    const isNewDay = on !== day
    day = on
    const enclosure = String(line.params['enclosure'] ?? '')
    return {
      key: line.id,
      ...(isNewDay ? { day: longDay(on) } : {}),
      time: sayTime(line.at, zone),
      instant: line.at,
      what: (
        <>
          <Link className="t-strong" to={paths.enclosure(enclosure)}>
            {enclosure}
          </Link>{' '}
          {sayLogLine(line, at, zone)}
        </>
      ),
      who: line.by,
    }
  })
}
