import type { CautionFacts } from './caution-facts.ts'
import type { CautionSettings } from './caution-rule.ts'
import { type Caution, evaluateCautions } from './evaluate-cautions.ts'

/**
 * What would have fired at a dose that was given: kept as exceptions for a vet to review. Nothing here refuses
 * anything; what has happened can always be recorded.
 *
 * @param facts of the instant at which the dose was given, not of its entry
 */
export function listExceptions(facts: CautionFacts, settings: CautionSettings = {}): Caution[] {
  return evaluateCautions({ facts, stage: 'start', settings }).cautions.filter(
    ({ level }) => level !== 'note',
  )
}
