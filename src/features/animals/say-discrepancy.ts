import type { Discrepancy } from '../../../shared/contracts/animals.contract.ts'
import { discrepancySentences } from '../../../shared/messages/animal-log.ts'

/** What does not fit, in a sentence with its figures. */
export function sayDiscrepancy(discrepancy: Pick<Discrepancy, 'kind' | 'facts'>): string {
  return discrepancySentences[discrepancy.kind]({ said: (key) => String(discrepancy.facts[key] ?? '') })
}
