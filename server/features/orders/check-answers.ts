import type { AnsweredCaution } from '../../../shared/contracts/orders.contract.ts'
import type { SaidCaution } from '../../../shared/contracts/order-primitives.ts'
import { answers, overrideOf, wasRead } from '../../../shared/domain/orders/signed-answers.ts'
import { orderProblemWords } from '../../../shared/messages/orders.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Override } from './order-content.ts'

const named = ({ ruleId, code }: { ruleId: string; code: string }) => ({ ruleId, code })

/**
 * Refuses a signature whose answers do not fit the cautions: every stop needs its own signed reason, and some take none;
 * every warning has to have been read; and an answer to a caution that does not stand, or stands in other words by now,
 * would be a signature under something nobody saw.
 *
 * @param cautions as they are judged at the signature
 */
export function checkAnswers(
  cautions: readonly SaidCaution[],
  request: { read: readonly AnsweredCaution[]; overrides: readonly Override[] },
): void {
  const belongs = (level: SaidCaution['level']) => (answer: AnsweredCaution) =>
    cautions.some((caution) => caution.level === level && answers(answer, caution))
  const strays = [
    ...request.overrides.filter((one) => !belongs('stop')(one)),
    ...request.read.filter((one) => !belongs('warning')(one)),
  ]
  if (strays.length > 0)
    throw new Problem('caution-not-fired', {
      detail: orderProblemWords.cautionsChanged,
      extra: { answers: strays.map(named) },
    })
  const open = cautions.filter(
    (caution) => caution.level === 'stop' && !overrideOf(request.overrides, caution),
  )
  if (open.length > 0)
    throw new Problem('caution-stops', {
      detail: 'Remove the cause, or override with a reason where that is possible.',
      extra: {
        cautions: open.map(({ ruleId, code, overridable }) => ({ ruleId, code, overridable })),
      },
    })
  const unread = cautions.filter((caution) => caution.level === 'warning' && !wasRead(request.read, caution))
  if (unread.length > 0)
    throw new Problem('cautions-unread', {
      detail: 'Read each warning, then sign.',
      extra: { cautions: unread.map(named) },
    })
}
