import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { getRound } from '../../../shared/contracts/observations.contract.ts'
import type { ReplyOf } from '../../../shared/contracts/contract.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { observationWords as words } from '../../../shared/messages/observation-screens.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { useOutbox } from '../../lib/use-outbox.ts'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { FlagWords } from '../../ui/flag-mark.tsx'
import { ListEmpty, ListFetching, ListUnreadable } from '../../ui/list-states.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { onCallQuery, roundQuery } from './queries.ts'
import { SignalBanner } from './signal-banner.tsx'

type RoundRow = ReplyOf<typeof getRound>['rows'][number]

/** The walk through the enclosures in order of work, quarantine last. Kept on the device for when there is no signal. */
export function Rounds() {
  const { zone } = useMe().facility
  const query = useQuery(roundQuery)
  useQuery(onCallQuery)
  const { waiting } = useOutbox()
  const now = new Date().toISOString()
  const round = query.data
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche
          title={words.round}
          source={
            round
              ? words.roundSource({
                  count: round.value.rows.length,
                  at: sayMoment(round.value.at, zone, now),
                })
              : undefined
          }
        />
        <div className="pane">
          <ButtonLink to={paths.unsent()}>{words.openUnsent}</ButtonLink>
        </div>
      </Area>
      <Area>
        <SignalBanner />
        {round?.old ? (
          <p className="pane t-strong" role="status">
            {words.roundOld({ at: sayMoment(round.at, zone, now) })}
          </p>
        ) : null}
        {isProblem(query.error) ? (
          <div className="pane">
            <ListUnreadable
              why={query.error.says}
              code={query.error.requestId}
              onRetry={() => void query.refetch()}
            />
          </div>
        ) : round === undefined ? (
          <div className="pane">
            <ListFetching what={words.roundWhat} rows={6} />
          </div>
        ) : round.value.rows.length === 0 ? (
          <div className="pane">
            <ListEmpty title={words.roundNone}>{words.roundNoneWhy}</ListEmpty>
          </div>
        ) : (
          roundGroups(round.value.rows).map(({ heading, rows }) => (
            <section key={heading} aria-label={heading}>
              <h2 className="t-head round-heading">{heading}</h2>
              <ul className="round">
                {rows.map((row) => (
                  <li key={row.enclosure}>
                    <RoundLine
                      row={row}
                      zone={zone}
                      now={now}
                      waits={waiting.filter(({ body }) => body['enclosure'] === row.enclosure).length}
                    />
                  </li>
                ))}
              </ul>
            </section>
          ))
        )}
      </Area>
    </Sheet>
  )
}

/** Rows in the order given, under a heading wherever the part of the house or the boundary changes. */
export function roundGroups(rows: readonly RoundRow[]): { heading: string; rows: RoundRow[] }[] {
  const groups: { heading: string; rows: RoundRow[] }[] = []
  for (const row of rows) {
    const heading = row.boundary === null ? row.area : words.quarantineLast({ name: row.boundary })
    const last = groups.at(-1)
    if (last?.heading === heading) last.rows.push(row)
    else groups.push({ heading, rows: [row] })
  }
  return groups
}

function RoundLine({ row, zone, now, waits }: { row: RoundRow; zone: string; now: string; waits: number }) {
  const animals = row.animals.reduce((sum, { count }) => sum + count, 0)
  const names = [...new Set(row.animals.map(({ name }) => name))].slice(0, 3).join(', ')
  const lookedToday =
    row.lastLookAt !== null && facilityDateOf(row.lastLookAt, zone) === facilityDateOf(now, zone)
  return (
    <Link
      className="round-line"
      to={paths.observe(row.enclosure)}
      aria-label={words.observeNamed({ code: row.enclosure })}
    >
      <b className="num">{row.enclosure}</b>
      <span>
        <span className="t-strong">{names || row.name}</span>
        <span className="t-note block">{words.animalsIn({ count: animals })}</span>
        {row.cases.map((one) => (
          <FlagWords key={one.number} flag={one.held ? 'L' : 'Q'}>
            {one.number}
            {one.held
              ? `, ${words.held}`
              : one.dayNumber === null
                ? ''
                : `, ${words.dayOf({ day: one.dayNumber })}`}
          </FlagWords>
        ))}
      </span>
      <span className="round-look">
        {row.lastLookAt === null
          ? words.neverLooked
          : words.lastLook({ at: sayMoment(row.lastLookAt, zone, now), looks: row.looksToday })}
        {!lookedToday && row.lastLookAt !== null ? <b className="block">{words.forgotten}</b> : null}
        {waits > 0 ? <b className="block">{words.waitsHere({ count: waits })}</b> : null}
      </span>
    </Link>
  )
}
