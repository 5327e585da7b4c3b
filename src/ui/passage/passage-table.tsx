import { Link } from 'react-router-dom'
import { passageWords } from '../../../shared/messages/passage.ts'
import { classNames } from '../class-names.ts'
import { StepPicture } from '../step-mark.tsx'
import { daysBetween } from '../../../shared/domain/time/facility-date.ts'
import { shortDay } from '../day-words.ts'
import { stateWords } from './passage-words.ts'
import type { PassageFix, PassageView } from './passage-view.ts'

/** The steps of the running leg as a table: the same as the drawing, for everybody. */
export function PassageTable({ view }: { view: PassageView }) {
  const leg = view.legs[view.legs.length - 1]
  if (!leg) return null
  const steps = [...leg.fixes].sort((a, b) => daysBetween(b.on, a.on))
  return (
    <div className="table-scroll">
      <table
        className="data-table is-close"
        aria-label={passageWords.stepsTable({ name: `${view.number} ${view.name}` })}
      >
        <thead>
          <tr>
            <th scope="col">
              <span className="visually-hidden">{passageWords.state}</span>
            </th>
            <th scope="col" className="is-number">
              {passageWords.day}
            </th>
            <th scope="col">{passageWords.date}</th>
            <th scope="col">{passageWords.step}</th>
            <th scope="col">{passageWords.result}</th>
          </tr>
        </thead>
        <tbody>
          {steps.map((step) => (
            <StepRow key={step.id} step={step} day={daysBetween(leg.from, step.on)} today={view.today} />
          ))}
        </tbody>
      </table>
    </div>
  )
}

function StepRow({ step, day, today }: { step: PassageFix; day: number; today: string }) {
  return (
    <tr className={classNames(step.state === 'due' && 'is-selected', step.state === 'overdue' && 'is-late')}>
      <td className="w-9">
        <StepPicture state={step.state} />
        <span className="visually-hidden">{stateWords(step.state)}</span>
      </td>
      <td className="is-number">{day}</td>
      <td className="num">{step.on === today ? passageWords.today : shortDay(step.on)}</td>
      <td className={step.state === 'due' ? 't-strong' : undefined}>
        {step.to === undefined ? step.name : <Link to={step.to}>{step.name}</Link>}
        {step.late ? <span className="late-words">{step.late}</span> : null}
      </td>
      <td className="t-2">{step.result}</td>
    </tr>
  )
}
