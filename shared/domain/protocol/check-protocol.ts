import { type Result, ok, refuse } from '../result.ts'
import type { ProtocolContent, ProtocolStep } from './protocol-content.ts'

export type ProtocolRefusal =
  'window-reversed' | 'step-key-twice' | 'criterion-without-name' | 'test-without-name' | 'length-too-short'

/**
 * The earliest day on which the protocol's own steps could be finished, when each is done on the first day of its
 * window: treatments with the window in which they hide what the tests look for, and negatives with their distances.
 *
 * @returns day counted from day 0; 0 for a protocol without such steps
 */
export function shortestLengthDays(content: ProtocolContent): number {
  const { policy, steps } = content
  const lastTreatDay = Math.max(-1, ...steps.filter(({ kind }) => kind === 'treat').map(({ day }) => day))
  const afterMasking = lastTreatDay < 0 ? 0 : lastTreatDay + policy.maskingWindowDays
  const ofCriteria = policy.criteria.map((criterion) => {
    if (criterion.kind !== 'negatives') return 0
    const first = firstSampleDay(steps, criterion.testKey)
    const apart = (first ?? 0) + (criterion.count - 1) * criterion.daysApart
    return lastTreatDay < 0 ? apart : Math.max(apart, lastTreatDay + criterion.daysAfterMasking)
  })
  return Math.max(0, afterMasking, ...ofCriteria)
}

function firstSampleDay(steps: readonly ProtocolStep[], testKey: string): number | null {
  const days = steps.filter((step) => step.testKey === testKey).map(({ day }) => day)
  return days.length > 0 ? Math.min(...days) : null
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
