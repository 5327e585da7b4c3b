import type { CaseStepView } from '../../../shared/contracts/quarantine-primitives.ts'
import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import { caseWords as words } from '../../../shared/messages/quarantine-case.ts'
import { quarantineWords } from '../../../shared/messages/quarantine-screens.ts'
import { Button } from '../../ui/button.tsx'
import { classNames } from '../../ui/class-names.ts'
import { shortDay } from '../../ui/day-words.ts'
import { stateWords } from '../../ui/passage/passage-words.ts'
import { StepPicture } from '../../ui/step-mark.tsx'

/** The steps of the protocol with their windows: the table that says what the drawing shows, and where each is recorded. */
export function CaseSteps({
  of: detail,
  today,
  mayRecord,
  onRecord,
}: {
  of: CaseDetail
  today: string
  mayRecord: boolean
  onRecord: (step: CaseStepView) => void
}) {
  const running = detail.legs.find((leg) => leg.endedOn === null)
  const earlier = detail.legs.filter((leg) => leg.endedOn !== null && leg.steps.length > 0)
  return (
    <section aria-labelledby="case-steps">
      <h2 id="case-steps" className="t-head">
        {words.steps}
      </h2>
      {running ? (
        <StepTable
          label={words.steps}
          steps={running.steps}
          today={today}
          onRecord={mayRecord ? onRecord : undefined}
        />
      ) : (
        <p className="t-2 pt-2">{words.stepsNotDated}</p>
      )}
      {earlier.map((leg) => {
        const label = words.earlierSteps({ on: shortDay(leg.day0On), days: leg.daysRun ?? 0 })
        return (
          <details key={leg.day0On} className="pt-3">
            <summary className="min-h-6">{label}</summary>
            <StepTable label={label} steps={leg.steps} today={today} />
          </details>
        )
      })}
    </section>
  )
}

function StepTable({
  label,
  steps,
  today,
  onRecord,
}: {
  label: string
  steps: readonly CaseStepView[]
  today: string
  onRecord?: ((step: CaseStepView) => void) | undefined
}) {
  return (
    <div className="table-scroll">
      <table role="table" className="data-table" aria-label={label}>
        <thead role="rowgroup">
          <tr role="row">
            <th role="columnheader" scope="col">
              <span className="visually-hidden">{words.stepState}</span>
            </th>
            <th role="columnheader" scope="col" className="is-number">
              {words.stepDay}
            </th>
            <th role="columnheader" scope="col">
              {words.stepDate}
            </th>
            <th role="columnheader" scope="col">
              {words.step}
            </th>
            <th role="columnheader" scope="col">
              {words.stepResult}
            </th>
            {onRecord ? (
              <th role="columnheader" scope="col">
                <span className="visually-hidden">{words.stepAct}</span>
              </th>
            ) : null}
          </tr>
        </thead>
        <tbody role="rowgroup">
          {steps.map((step) => (
            <tr
              key={step.key}
              role="row"
              className={classNames(
                step.state === 'due' && 'is-selected',
                step.state === 'overdue' && 'is-late',
              )}
            >
              <td role="cell" className="is-head w-9">
                <StepPicture state={step.state} />
                <span className="visually-hidden">{stateWords(step.state)}</span>
              </td>
              <td role="cell" className="is-number is-short" data-label={words.stepDay}>
                {step.day === step.untilDay
                  ? step.day
                  : words.dayWindow({ from: step.day, until: step.untilDay })}
              </td>
              <td role="cell" className="num is-short" data-label={words.stepDate}>
                {windowText(step, today)}
              </td>
              <td role="cell" className={classNames('is-head', step.state === 'due' && 't-strong')}>
                <span>{step.name}</span>
                {step.state === 'overdue' ? (
                  <span className="late-words">{quarantineWords.lateDays({ days: step.lateDays })}</span>
                ) : null}
              </td>
              <td role="cell" className="t-2" data-label={words.stepResult}>
                {resultText(step)}
              </td>
              {onRecord ? (
                <td role="cell" data-label="">
                  {recordable(step) ? (
                    <Button
                      size="small"
                      kind={step.state === 'to-come' ? 'edge' : 'primary'}
                      aria-label={words.recordNamed({ step: step.name })}
                      onClick={() => onRecord(step)}
                    >
                      {words.recordStep}
                    </Button>
                  ) : null}
                </td>
              ) : null}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}

/** Steps that somebody records by hand: not the daily look, which observations keep, and not the decision, which is signed. */
export function recordable(step: CaseStepView): boolean {
  return step.daily === null && step.kind !== 'decide' && step.state !== 'done'
}

function windowText(step: CaseStepView, today: string): string {
  const say = (on: string) => (on === today ? words.today : shortDay(on))
  return step.on === step.untilOn
    ? say(step.on)
    : words.window({ from: say(step.on), until: say(step.untilOn) })
}

function resultText(step: CaseStepView): string {
  if (step.daily) {
    const { doneDays, passedDays, missedOn } = step.daily
    if (passedDays === 0) return ''
    const missed = missedOn.slice(-3).map(shortDay).join(', ')
    return [
      words.dailyDone({ done: doneDays, passed: passedDays }),
      missed ? words.dailyMissed({ on: missed }) : '',
    ]
      .filter(Boolean)
      .join('; ')
  }
  if (step.doneOn === null) return step.note ?? ''
  const on = shortDay(step.doneOn)
  const done = step.doneBy === null ? words.doneOn({ on }) : words.doneBy({ on, by: step.doneBy })
  return step.note ? `${done}: ${step.note}` : done
}
