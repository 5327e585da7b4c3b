import type { ReactNode } from 'react'
import { partWords } from '../../shared/messages/parts.ts'
import { StepPicture } from './step-mark.tsx'

export interface Condition {
  key: string
  /** `open` until the step that judges it; `met`; `unmet` only at that step. */
  state: 'open' | 'met' | 'unmet'
  /** What must be true. */
  what: ReactNode
  /** What is known now, and from where. */
  known?: ReactNode
}

const marks = { open: 'to-come', met: 'done', unmet: 'failed' } as const
const words = {
  open: () => partWords.conditionOpen,
  met: () => partWords.conditionMet,
  unmet: () => partWords.conditionUnmet,
}

/** One thing that must be true before an act, judged at the act and never ticked beforehand. */
export function ConditionRow({ condition }: { condition: Condition }) {
  return (
    <li className="condition">
      <StepPicture state={marks[condition.state]} />
      <span>
        {condition.what}
        <span className="visually-hidden">, {words[condition.state]()}</span>
        {condition.known ? <small>{condition.known}</small> : null}
      </span>
    </li>
  )
}

/** "Before each dose", "Before clearance": the list of conditions under its heading. */
export function Conditions({
  heading,
  note,
  conditions,
}: {
  heading: string
  note?: string
  conditions: readonly Condition[]
}) {
  return (
    <section>
      <h2 className="t-head">
        {heading} {note ? <span className="t-note ml-1">{note}</span> : null}
      </h2>
      <ol className="conditions mt-1">
        {conditions.map((condition) => (
          <ConditionRow key={condition.key} condition={condition} />
        ))}
      </ol>
    </section>
  )
}
