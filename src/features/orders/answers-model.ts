import type { OrderPreview } from '../../../shared/contracts/orders.contract.ts'
import type { SaidCaution } from '../../../shared/contracts/order-primitives.ts'
import { orderFormWords as words } from '../../../shared/messages/order-form.ts'

/** What the signer says to the cautions: warnings read, and stops overridden with a reason. */
export interface Answers {
  /** Keys of warnings that were ticked; one whose words change has to be read again. */
  read: readonly string[]
  /** Reasons by the key of the stop: one whose words change needs a reason of its own. */
  reasons: Readonly<Record<string, string>>
}

export const noAnswers: Answers = { read: [], reasons: {} }

/** A key for a caution among others: a rule may fire more than once, and other words are another caution. */
export const cautionKey = (caution: Pick<SaidCaution, 'ruleId' | 'code' | 'text'>) =>
  `${caution.ruleId} ${caution.code} ${caution.text}`

const shortestReason = 3
const reasonOf = (answers: Answers, caution: SaidCaution) =>
  (answers.reasons[cautionKey(caution)] ?? '').trim()
const hasReason = (answers: Answers, caution: SaidCaution) =>
  reasonOf(answers, caution).length >= shortestReason

/** Stops that nobody answered yet: fixed ones cannot be, others need a reason. */
export function openStops(
  cautions: readonly SaidCaution[],
  answers: Answers,
): { fixed: number; open: number } {
  const stops = cautions.filter((caution) => caution.level === 'stop')
  return {
    fixed: stops.filter((caution) => !caution.overridable).length,
    open: stops.filter((caution) => caution.overridable && !hasReason(answers, caution)).length,
  }
}

/** Warnings that nobody ticked yet. */
export function unreadWarnings(cautions: readonly SaidCaution[], answers: Answers): SaidCaution[] {
  return cautions.filter(
    (caution) => caution.level === 'warning' && !answers.read.includes(cautionKey(caution)),
  )
}

/** The answers as a signature sends them: to the cautions that stand now, each as it was read. */
export function answersToSend(cautions: readonly SaidCaution[], answers: Answers) {
  const named = ({ ruleId, code, text }: SaidCaution) => ({ ruleId, code, text })
  const of = (level: SaidCaution['level']) => cautions.filter((caution) => caution.level === level)
  return {
    read: of('warning')
      .filter((caution) => answers.read.includes(cautionKey(caution)))
      .map(named),
    overrides: of('stop')
      .filter((caution) => hasReason(answers, caution))
      .map((caution) => ({ ...named(caution), reason: reasonOf(answers, caution) })),
  }
}

/** Why an order can't be signed as it stands; undefined when nothing stands in the way. */
export function whyNotSign(given: {
  preview: OrderPreview | undefined
  /** What is shown belongs to what is typed. */
  current: boolean
  answers: Answers
  faults: number
}): string | undefined {
  const { preview, answers } = given
  if (given.faults > 0) return words.faults
  if (!preview || !given.current) return words.waitForJudgement
  if (preview.missing.length > 0) return words.missing({ count: preview.missing.length })
  if (!preview.amount) return words.noAmount
  const stops = openStops(preview.cautions, answers)
  if (stops.fixed > 0) return words.stopsFixed
  if (stops.open > 0) return words.stopsOpen({ count: stops.open })
  const unread = unreadWarnings(preview.cautions, answers).length
  return unread > 0 ? words.warningsUnread({ count: unread }) : undefined
}
