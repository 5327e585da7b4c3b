import { useId } from 'react'
import type { ReactNode } from 'react'
import { laneNames, todayWords } from '../../../shared/messages/today.ts'
import { sayTime } from '../../../shared/messages/say-date.ts'
import { sayWork } from '../../../shared/messages/say-today.ts'
import { classNames } from '../../ui/class-names.ts'
import { longDay } from '../../ui/day-words.ts'
import { ListEmpty } from '../../ui/list-states.tsx'
import { TodayItem } from './today-item.tsx'
import type { TodayView } from './today-model.ts'

interface Drawn {
  view: TodayView
  at: string
  zone: string
}

/** The lanes side by side, in bands of time: overdue, now, the hours to come, the days after. */
export function TodayBands({ view, at, zone }: Drawn) {
  const { lanes } = view
  if (view.empty)
    return (
      <div className="pane">
        <ListEmpty title={todayWords.empty}>{todayWords.emptyBody}</ListEmpty>
      </div>
    )
  const nothingNow = view.bands.every(
    (band) => band.kind !== 'late' && (band.kind !== 'now' || band.count === 0),
  )
  return (
    <div className={`today-bands today-lanes-${String(lanes.length)}`}>
      <div className="today-lane-heads" aria-hidden="true">
        <span />
        {lanes.map((lane) => (
          <p key={lane} className="t-head">
            {laneNames[lane]}
          </p>
        ))}
      </div>
      {view.bands.map((band) => (
        <Band key={band.key} band={band} at={at} zone={zone}>
          {band.kind === 'now' && band.count === 0 ? (
            <p className="today-nothing t-2">
              {nothingNow ? nextWords(view, at, zone) : todayWords.nothingNow}
            </p>
          ) : null}
        </Band>
      ))}
    </div>
  )
}

/** When the first thing comes, for whoever has nothing to do now. */
function nextWords(view: TodayView, at: string, zone: string): string {
  const band = view.bands.find((one) => one.kind === 'hour' || one.kind === 'day')
  const first = band?.cells.flatMap(({ items }) => items)[0]
  if (!band || !first) return todayWords.nothingNow
  const when =
    first.dueAt !== null && band.kind === 'hour' ? sayTime(first.dueAt, zone) : longDay(band.on ?? '')
  return todayWords.emptyUntil({ when, what: sayWork(first, at, zone).title })
}

function Band({
  band,
  at,
  zone,
  children,
}: {
  band: TodayView['bands'][number]
  at: string
  zone: string
  children: ReactNode
}) {
  const id = useId()
  return (
    <section className={classNames('today-band', `today-band-${band.kind}`)} aria-labelledby={id}>
      <div className="today-hour">
        <h2 id={id}>{headOf(band, at, zone)}</h2>
        {band.kind === 'now' ? <span>{todayWords.now}</span> : null}
        {band.kind === 'late' ? <span>{band.count}</span> : null}
      </div>
      {children}
      {band.count === 0
        ? null
        : band.cells.map(({ lane, items }) => (
            <div key={lane} className={classNames('today-cell', items.length === 0 && 'is-empty')}>
              {items.length === 0 ? null : (
                <>
                  <p className="today-cell-lane t-label" aria-hidden="true">
                    {laneNames[lane]}
                  </p>
                  <ol aria-label={laneNames[lane]}>
                    {items.map((item) => (
                      <TodayItem key={item.id} item={item} at={at} zone={zone} />
                    ))}
                  </ol>
                </>
              )}
            </div>
          ))}
    </section>
  )
}

function headOf(band: TodayView['bands'][number], at: string, zone: string): string {
  if (band.kind === 'late') return todayWords.late
  if (band.kind === 'now') return sayTime(at, zone)
  return band.kind === 'hour' ? band.key : longDay(band.key)
}
