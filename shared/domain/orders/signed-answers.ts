/** A caution that was answered at the signature. Orders signed earlier name the rule alone. */
export interface SignedAnswer {
  ruleId: string
  code?: string | undefined
  text?: string | undefined
}

interface Fired {
  ruleId: string
  code: string
  text: string
}

/** Whether an answer is one to this caution: the same rule, the same finding, the same words. */
export function answers(answer: SignedAnswer, caution: Fired): boolean {
  return (
    answer.ruleId === caution.ruleId &&
    (answer.code ?? caution.code) === caution.code &&
    (answer.text ?? caution.text) === caution.text
  )
}

/** The override of a stop among those that were signed; undefined where it has none. */
export function overrideOf<Override extends SignedAnswer>(
  overrides: readonly Override[],
  caution: Fired & { level: string; overridable: boolean },
): Override | undefined {
  if (caution.level !== 'stop' || !caution.overridable) return undefined
  return overrides.find((one) => answers(one, caution))
}

/** Whether a warning is among those that were read. */
export function wasRead(read: readonly (string | SignedAnswer)[], caution: Fired): boolean {
  return read.some((one) => (typeof one === 'string' ? one === caution.ruleId : answers(one, caution)))
}
