import type { Order } from '../../../shared/contracts/orders.contract.ts'
import { wentIn } from '../../../shared/domain/orders/dose-states.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { doseKindNames } from '../../../shared/messages/orders.ts'
import { orderViewWords as words } from '../../../shared/messages/orders-screens.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { ButtonLink } from '../../ui/button-link.tsx'
import { StepPicture } from '../../ui/step-mark.tsx'
import type { StepState } from '../../ui/step-mark.tsx'

type CalendarDose = Order['calendar'][number]
type CalendarRecord = CalendarDose['records'][number]

const isAsItShouldBe = ({ stoppedAt, broke, record }: CalendarRecord) =>
  stoppedAt === null && broke.length === 0 && record === 'intact'

/** How a planned dose stands at an instant: the mark, and the words beside it. */
export function doseStanding(
  dose: CalendarDose,
  now: string,
): { mark: StepState; words: 'due' | 'coming' | 'past' | CalendarRecord['kind'] } {
  const { records } = dose
  if (dose.recorded !== null)
    return {
      // one that was withheld at first and given later is done
      mark: records.filter(wentIn).length === 1 && records.every(isAsItShouldBe) ? 'done' : 'failed',
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
  ...doseKindNames,
})

/** One record of a dose: what, when, by whom, and what it breaks. */
function Recorded({ record, say }: { record: CalendarRecord; say: (at: string) => string }) {
  const { kind, happenedAt, by, stoppedAt, broke, warnings } = record
  return (
    <span className="block">
      {words.recordedAt({ what: doseKindNames[kind], at: say(happenedAt), by })}
      {stoppedAt === null ? null : (
        <b className="block text-magenta">{words.stoppedAt({ at: say(stoppedAt) })}</b>
      )}
      {record.record === 'broken' ? <b className="block text-magenta">{doseWords.notAsRecorded}</b> : null}
      {broke.map((title) => (
        <b key={title} className="block text-magenta">
          {title}
        </b>
      ))}
      {warnings > 0 ? (
        <span className="t-note block">{words.warningsBesides({ count: warnings })}</span>
      ) : null}
    </span>
  )
}

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
                {dose.records.length === 0 ? `, ${what}` : null}{' '}
                {dose.records.length > 1 ? (
                  <b className="text-magenta">{words.severalRecords({ count: dose.records.length })}</b>
                ) : null}
                {dose.records.map((record) => (
                  <Recorded key={`${record.happenedAt} ${record.kind}`} record={record} say={say} />
                ))}
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
