import type { Order } from '../../../shared/contracts/orders.contract.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { doseKindNames } from '../../../shared/messages/orders.ts'
import { orderViewWords as words } from '../../../shared/messages/orders-screens.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { ButtonLink } from '../../ui/button-link.tsx'
import { StepPicture } from '../../ui/step-mark.tsx'
import type { StepState } from '../../ui/step-mark.tsx'

type CalendarDose = Order['calendar'][number]

/** How a planned dose stands at an instant: the mark, and the words beside it. */
export function doseStanding(
  dose: CalendarDose,
  now: string,
): { mark: StepState; words: 'due' | 'coming' | 'past' | NonNullable<CalendarDose['recorded']> } {
  if (dose.recorded !== null)
    return {
      mark:
        dose.stoppedAt === null && (dose.recorded === 'given' || dose.recorded === 'recorded')
          ? 'done'
          : 'failed',
      words: dose.recorded,
    }
  const at = Date.parse(now)
  if (at < Date.parse(dose.opensAt)) return { mark: 'to-come', words: 'coming' }
  if (at > Date.parse(dose.closesAt)) return { mark: 'overdue', words: 'past' }
  return { mark: 'due', words: 'due' }
}

const standingWords = () => ({
  due: words.dueState,
  coming: words.comingState,
  past: words.pastState,
  given: doseKindNames.given,
  recorded: doseKindNames.recorded,
  withheld: doseKindNames.withheld,
  refused: doseKindNames.refused,
})

/** The planned doses with their windows and what became of them; each leads to its bath sheet. */
export function DoseCalendar({
  order,
  zone,
  now,
  sheets,
}: {
  order: Order
  zone: string
  now: string
  /** Whether the reader may open bath sheets. */
  sheets: boolean
}) {
  const say = (at: string) => sayMoment(at, zone, now)
  return (
    <section className="stack">
      <h2 className="t-head">{words.calendar}</h2>
      {order.calendar.length === 0 ? <p className="t-2">{words.noDoses}</p> : null}
      <ol className="dose-calendar">
        {order.calendar.map((dose) => {
          const standing = doseStanding(dose, now)
          const what = standingWords()[standing.words]
          return (
            <li key={dose.key}>
              <StepPicture state={standing.mark} />
              <span>
                <b>{words.dose({ key: dose.key })}</b> <span className="num">{say(dose.dueAt)}</span>
                {', '}
                {dose.recordedAt === null ? what : words.recordedAt({ what, at: say(dose.recordedAt) })}
                {dose.stoppedAt === null ? null : <b>, {words.stoppedAt({ at: say(dose.stoppedAt) })}</b>}
                {dose.record === 'broken' ? <b> {doseWords.notAsRecorded}</b> : null}
                <small>{words.window({ from: say(dose.opensAt), until: say(dose.closesAt) })}</small>
              </span>
              {sheets ? (
                <ButtonLink
                  size="small"
                  to={`${paths.orderSheet(order.number)}?dose=${dose.key}`}
                  aria-label={words.sheetOf({ key: dose.key })}
                >
                  {words.sheet}
                </ButtonLink>
              ) : null}
            </li>
          )
        })}
      </ol>
    </section>
  )
}
