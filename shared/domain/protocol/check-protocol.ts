import { type Result, ok, refuse } from '../result.ts'
import type { NegativesCriterion } from '../quarantine/clock-policy.ts'
import type { ProtocolContent, ProtocolStep } from './protocol-content.ts'

export type ProtocolRefusal =
  'window-reversed' | 'step-key-twice' | 'criterion-without-name' | 'test-without-name' | 'length-too-short'

/**
 * The shortest length that the protocol's own steps can meet: the last day of every treatment and sample, the end of
 * every masking treatment with the window in which it hides what the tests look for, and the day on which the planned
 * samples meet each criterion. A course counts to its last day, not its first.
 *
 * @returns day counted from day 0; 0 for a protocol without such steps
 * @source project-default: windows and distances are the protocol's own
 */
export function shortestLengthDays(content: ProtocolContent): number {
  const { policy, steps } = content
  const work = steps.filter(({ kind }) => kind === 'treat' || kind === 'sample')
  const masking = steps.filter((step) => step.kind === 'treat' && step.masks !== false)
  const afterMasking = masking.map(
    (step) => lastDay(step) + (step.maskingWindowDays ?? policy.maskingWindowDays),
  )
  const lastMaskDay = masking.length > 0 ? Math.max(...masking.map(lastDay)) : null
  const ofCriteria = policy.criteria.map((criterion) =>
    criterion.kind === 'negatives' ? meetingDay(criterion, steps, lastMaskDay) : 0,
  )
  return Math.max(0, ...work.map(lastDay), ...afterMasking, ...ofCriteria)
}

/** The day on which a step is over, and its agent out of the water. */
function lastDay(step: ProtocolStep): number {
  return step.untilDay + (step.fadingDays ?? 0)
}

/**
 * The day of the first planned sample that can be the last of k, as the clock counts negatives (K15). Where the planned
 * ones are not enough, the day to which they would have to be continued.
 */
function meetingDay(
  { testKey, count, daysApart, daysAfterMasking }: NegativesCriterion,
  steps: readonly ProtocolStep[],
  lastMaskDay: number | null,
): number {
  const notBefore = lastMaskDay === null ? 0 : lastMaskDay + daysAfterMasking
  const days = steps.filter((step) => step.testKey === testKey).map(({ untilDay }) => untilDay)
  const chain: number[] = []
  for (const day of days.sort((a, b) => a - b)) {
    const before = chain.filter((earlier) => day - earlier >= daysApart).length
    if (before + 1 >= count && day >= notBefore) return day
    if (before === chain.length) chain.push(day)
  }
  const missing = Math.max(1, count - chain.length)
  const behind = chain[Math.min(chain.length, count - 1) - 1]
  const spaced = behind === undefined ? (missing - 1) * daysApart : behind + missing * daysApart
  return Math.max(spaced, notBefore)
}

/**
 * Whether a protocol can be kept: windows the right way round, keys of their own, a name for everything that stands in a
 * sentence, and a length that its own steps can meet.
 *
 * @refuses window-reversed | step-key-twice | criterion-without-name | test-without-name | length-too-short (with the
 * days that its steps need)
 */
export function checkProtocol(content: ProtocolContent): Result<ProtocolContent, ProtocolRefusal> {
  const { policy, steps } = content
  for (const [i, step] of steps.entries()) {
    if (step.untilDay < step.day || step.day < 0)
      return refuse('window-reversed', `steps/${String(i)}/untilDay`, { step: step.name })
    if (steps.findIndex(({ key }) => key === step.key) !== i)
      return refuse('step-key-twice', `steps/${String(i)}/key`, { key: step.key })
    if (step.testKey !== undefined && !content.testNames[step.testKey])
      return refuse('test-without-name', 'testNames', { testKey: step.testKey })
  }
  for (const criterion of policy.criteria) {
    if (!content.criterionNames[criterion.criterionId])
      return refuse('criterion-without-name', 'criterionNames', { criterionId: criterion.criterionId })
    if (criterion.kind === 'negatives' && !content.testNames[criterion.testKey])
      return refuse('test-without-name', 'testNames', { testKey: criterion.testKey })
  }
  const neededDays = shortestLengthDays(content)
  if (policy.requiredDays < neededDays)
    return refuse('length-too-short', 'policy/requiredDays', {
      neededDays,
      requiredDays: policy.requiredDays,
    })
  return ok(content)
}
