import type { SaidCaution } from '../../../shared/contracts/order-primitives.ts'
import { groupSaid } from '../../../shared/domain/cautions/group-said.ts'
import { orderFormWords as words } from '../../../shared/messages/order-form.ts'
import { orderViewWords } from '../../../shared/messages/orders-screens.ts'
import { CautionGroupBlock } from '../../ui/caution-block.tsx'
import type { CautionMember } from '../../ui/caution-block.tsx'
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
  const tick = (keys: readonly string[], isRead: boolean) =>
    onAnswers({
      ...answers,
      read: [...answers.read.filter((one) => !keys.includes(one)), ...(isRead ? keys : [])],
    })
  const memberOf = (caution: SaidCaution, isAlone: boolean): CautionMember => {
    const key = cautionKey(caution)
    const isStop = caution.level === 'stop'
    return {
      key,
      ruleId: caution.ruleId,
      level: caution.level,
      title: caution.title,
      source: <CautionSource caution={caution} />,
      cannotOverride: isStop && !caution.overridable,
      override: !isStop ? undefined : !maySign ? (
        <p className="hint">{words.overrideByVet}</p>
      ) : (
        <TextareaField
          label={isAlone ? words.overrideReason : words.overrideReasonOf({ rule: caution.ruleId })}
          hint={words.overrideHint}
          rows={2}
          maxLength={2000}
          value={answers.reasons[key] ?? ''}
          onChange={(event) =>
            onAnswers({ ...answers, reasons: { ...answers.reasons, [key]: event.target.value } })
          }
        />
      ),
      children: `${caution.text}${caution.secondCalculation ? ` ${orderViewWords.secondPerson}` : ''}`,
    }
  }
  /** One tick for the warnings of one cause; each is answered by it as itself. */
  const acknowledge = (warnings: readonly SaidCaution[], isAlone: boolean) => {
    const [first] = warnings
    if (!first || !maySign) return undefined
    const keys = warnings.map(cautionKey)
    const label = isAlone
      ? words.read
      : words.readEach({ rules: warnings.map(({ ruleId }) => ruleId).join(', ') })
    return (
      <Tick
        label={label}
        aria-label={`${label}: ${first.title}`}
        checked={keys.every((key) => answers.read.includes(key))}
        onChange={(event) => tick(keys, event.target.checked)}
      />
    )
  }
  return (
    <section className="stack">
      <h2 className="t-head">
        {words.designHeading} <span className="t-note ml-1">{words.designNote}</span>
      </h2>
      <p className="t-2" role="status">
        {cautionCount(cautions)}
      </p>
      {groupSaid(cautions).map(({ lead, members, acknowledged }) => (
        <CautionGroupBlock
          key={cautionKey(lead)}
          members={members.map((one) => memberOf(one, members.length === 1))}
          acknowledge={acknowledge(acknowledged, members.length === 1)}
        />
      ))}
    </section>
  )
}
