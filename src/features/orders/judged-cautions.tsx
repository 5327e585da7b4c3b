import type { SaidCaution } from '../../../shared/contracts/order-primitives.ts'
import { orderFormWords as words } from '../../../shared/messages/order-form.ts'
import { orderViewWords } from '../../../shared/messages/orders-screens.ts'
import { CautionBlock, sortCautions } from '../../ui/caution-block.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import { cautionKey } from './answers-model.ts'
import type { Answers } from './answers-model.ts'
import { CautionSource } from './signed-cautions.tsx'

/** How many of each level there are, in words. */
export function cautionCount(cautions: readonly SaidCaution[]): string {
  const of = (level: SaidCaution['level']) => cautions.filter((caution) => caution.level === level).length
  return words.countCautions({ stops: of('stop'), warnings: of('warning'), notes: of('note') })
}

/**
 * Cautions judged while the order is written. A veterinarian ticks each warning as read and gives each stop that takes
 * one a reason of its own; for others they are there to be read.
 */
export function JudgedCautions({
  cautions,
  answers,
  onAnswers,
  maySign,
}: {
  cautions: readonly SaidCaution[]
  answers: Answers
  onAnswers: (next: Answers) => void
  maySign: boolean
}) {
  const sorted = sortCautions(cautions)
  return (
    <section className="stack">
      <h2 className="t-head">
        {words.designHeading} <span className="t-note ml-1">{words.designNote}</span>
      </h2>
      <p className="t-2" role="status">
        {cautionCount(cautions)}
      </p>
      {sorted.map((caution) => {
        const key = cautionKey(caution)
        const isStop = caution.level === 'stop'
        return (
          <CautionBlock
            key={key}
            level={caution.level}
            title={caution.title}
            source={<CautionSource caution={caution} />}
            cannotOverride={isStop && !caution.overridable}
            override={
              isStop ? (
                !maySign ? (
                  <p className="hint">{words.overrideByVet}</p>
                ) : (
                  <TextareaField
                    label={words.overrideReason}
                    hint={words.overrideHint}
                    rows={2}
                    maxLength={2000}
                    value={answers.reasons[key] ?? ''}
                    onChange={(event) =>
                      onAnswers({
                        ...answers,
                        reasons: { ...answers.reasons, [key]: event.target.value },
                      })
                    }
                  />
                )
              ) : caution.level === 'warning' && maySign ? (
                <Tick
                  label={words.read}
                  aria-label={`${words.read}: ${caution.title}`}
                  checked={answers.read.includes(key)}
                  onChange={(event) =>
                    onAnswers({
                      ...answers,
                      read: event.target.checked
                        ? [...answers.read, key]
                        : answers.read.filter((one) => one !== key),
                    })
                  }
                />
              ) : undefined
            }
          >
            {caution.text}
            {caution.secondCalculation ? ` ${orderViewWords.secondPerson}` : ''}
          </CautionBlock>
        )
      })}
    </section>
  )
}
