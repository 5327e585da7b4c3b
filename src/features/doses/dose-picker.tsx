import { Link } from 'react-router-dom'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { StepPicture } from '../../ui/step-mark.tsx'
import type { StepState } from '../../ui/step-mark.tsx'

type Dose = BathSheet['calendar'][number]

const marks: Record<Dose['state'], StepState> = {
  coming: 'to-come',
  due: 'due',
  late: 'overdue',
  running: 'due',
  given: 'done',
  withheld: 'failed',
  refused: 'failed',
  'not-given': 'failed',
}

const stateWords = (state: Dose['state']) =>
  state === 'due' ? words.dueState : state === 'given' ? words.givenState : words[state]

/** A longer course is folded away: the sheet at the tank is about one dose. */
const mostShown = 6

/** Every planned dose of the order with its state; each leads to its sheet. */
export function DosePicker({ sheet, zone }: { sheet: BathSheet; zone: string }) {
  const { calendar } = sheet
  if (calendar.length < 2) return null
  const endsAt = (key: string) => sheet.running.find((bath) => bath.key === key)?.endsAt
  const say = (dose: Dose) => {
    const end = dose.state === 'running' ? endsAt(dose.key) : undefined
    // whoever looks for a bath that runs asks when it ends, not when it was planned
    return end === undefined || end === null
      ? words.doseLine({
          key: dose.key,
          at: sayMoment(dose.dueAt, zone, sheet.now),
          state: stateWords(dose.state),
        })
      : words.doseRuns({ key: dose.key, end: sayMoment(end, zone, sheet.now) })
  }
  const list = (
    <ol>
      {calendar.map((dose) => (
        <li key={dose.key}>
          <Link
            to={`${paths.orderSheet(sheet.number)}?dose=${dose.key}`}
            aria-current={dose.key === sheet.key ? 'true' : undefined}
          >
            <StepPicture state={marks[dose.state]} />
            <span>{say(dose)}</span>
          </Link>
        </li>
      ))}
    </ol>
  )
  return (
    <nav aria-label={words.doses} className="dose-picker">
      {calendar.length <= mostShown ? (
        list
      ) : (
        <details>
          <summary>{words.allDoses({ count: calendar.length })}</summary>
          {list}
        </details>
      )}
    </nav>
  )
}
