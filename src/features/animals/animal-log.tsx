import { useInfiniteQuery } from '@tanstack/react-query'
import type { LogLine } from '../../../shared/contracts/animals.contract.ts'
import { wallClockOf } from '../../../shared/domain/time/facility-date.ts'
import { animalLogWords } from '../../../shared/messages/animal-log.ts'
import { animalWords as words } from '../../../shared/messages/animal-sheet.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { Button } from '../../ui/button.tsx'
import { LogColumn } from '../../ui/log-column.tsx'
import type { LogEntry } from '../../ui/log-column.tsx'
import { sayLogLine } from './log-model.ts'
import { animalLogQuery } from './queries.ts'

/** Lines as entries of the log column: a heading where a day begins. */
export function logEntries(lines: readonly LogLine[], zone: string, today: string): LogEntry[] {
  let day = ''
  return lines.map((line) => {
    const { date: placed, time } = wallClockOf(line.happenedAt, zone)
    const date = line.knownOn ?? placed
    const heading = date === day ? undefined : date === today ? animalLogWords.today : sayDate(date)
    day = date
    return {
      key: `${line.kind} ${line.id}`,
      ...(heading === undefined ? {} : { day: heading }),
      // no time of day where only the date is known
      time: line.knownOn === null ? time.slice(0, 5) : '',
      instant: line.knownOn ?? line.happenedAt,
      what:
        line.struckReason === null ? (
          sayLogLine(line)
        ) : (
          <>
            <s>{sayLogLine(line)}</s> {animalLogWords.struck({ reason: line.struckReason })}
          </>
        ),
      who: line.recordedBy,
    }
  })
}

/** Everything recorded of one animal, the newest first. */
export function AnimalLog({ accession, zone, today }: { accession: string; zone: string; today: string }) {
  const { data, hasNextPage, fetchNextPage, isFetchingNextPage } = useInfiniteQuery(animalLogQuery(accession))
  const lines = data?.pages.flatMap((page) => page.rows) ?? []
  return (
    <LogColumn
      title={words.record}
      about={accession}
      entries={logEntries(lines, zone, today)}
      head={data && lines.length === 0 ? <p className="t-2 pt-3">{words.noEntries}</p> : undefined}
      foot={
        hasNextPage ? (
          <Button disabled={isFetchingNextPage} onClick={() => void fetchNextPage()}>
            {words.earlier}
          </Button>
        ) : undefined
      }
    />
  )
}
