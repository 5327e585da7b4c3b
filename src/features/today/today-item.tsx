import { Link } from 'react-router-dom'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { sayTime } from '../../../shared/messages/say-date.ts'
import { sayWork } from '../../../shared/messages/say-today.ts'
import { stateWords, todayWords } from '../../../shared/messages/today.ts'
import { shortDay } from '../../ui/day-words.ts'
import { FlagMark } from '../../ui/flag-mark.tsx'
import { StepPicture } from '../../ui/step-mark.tsx'
import type { StepState } from '../../ui/step-mark.tsx'
import { WholeCodes } from '../../ui/whole-codes.tsx'
import { addressOfWork } from './address-of.ts'
import { TodayActs } from './today-acts.tsx'
import { lateText } from './today-model.ts'

const marks: Record<TodayWork['state'], StepState> = {
  late: 'overdue',
  running: 'due',
  due: 'due',
  waiting: 'due',
  coming: 'to-come',
  done: 'done',
}

/** Work that is done inside quarantine carries its flag; the words beside it name the case. */
const inQuarantine = new Set<TodayWork['kind']>([
  'case-ready',
  'observation',
  'sample',
  'care',
  'case-to-close',
  'outside-case',
])

/** One piece of work: its mark, what and where as the link to it, what helps, and what can be done here. */
export function TodayItem({ item, at, zone }: { item: TodayWork; at: string; zone: string }) {
  const { title, note } = sayWork(item, at, zone)
  return (
    <li className={`today-item is-${item.state}`}>
      <span className="today-mark">
        <StepPicture state={marks[item.state]} />
        <span className="visually-hidden">{stateWords[item.state]}</span>
      </span>
      <div className="today-words">
        <Link to={addressOfWork(item)} className="today-title">
          <WholeCodes>{title}</WholeCodes>
        </Link>
        {note === '' ? null : (
          <span className="today-note">
            {inQuarantine.has(item.kind) ? <FlagMark flag="Q" /> : null}
            {item.kind === 'case-held' ? <FlagMark flag="L" /> : null}
            <WholeCodes>{note}</WholeCodes>
          </span>
        )}
      </div>
      <Figure item={item} at={at} zone={zone} />
      <TodayActs item={item} title={title} />
    </li>
  )
}

/** At the right: how late, the signed amount, or until when. */
function Figure({ item, at, zone }: { item: TodayWork; at: string; zone: string }) {
  const amount = item.params['amount']
  const late = lateText(item, at, zone)
  const until = untilOf(item, zone)
  const hasAmount = item.kind === 'dose' && typeof amount === 'string' && item.state !== 'done'
  if (late === '' && until === '' && !hasAmount) return null
  return (
    <span className="today-figure">
      {late === '' ? null : <b className="today-late">{late}</b>}
      {hasAmount ? (
        <>
          <b className="today-amount" data-quantity="dose">
            {amount}
          </b>
          <small>{todayWords.signedAmount}</small>
        </>
      ) : null}
      {until === '' ? null : <small>{until}</small>}
    </span>
  )
}

function untilOf(item: TodayWork, zone: string): string {
  if (item.state === 'running' && item.dueAt !== null)
    return todayWords.ends({ time: sayTime(item.dueAt, zone) })
  if (item.state === 'coming' && item.dueAt !== null) return sayTime(item.dueAt, zone)
  if (item.state !== 'due') return ''
  if (item.latestAt !== null) return todayWords.by({ when: sayTime(item.latestAt, zone) })
  if (item.latestOn !== null && item.latestOn !== item.dueOn)
    return todayWords.by({ when: shortDay(item.latestOn) })
  return ''
}
