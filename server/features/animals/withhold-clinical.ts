import type {
  Animal,
  CountLine,
  Death,
  Discrepancy,
  LogLine,
  WeightEntry,
} from '../../../shared/contracts/animals.contract.ts'
import { isDeathKind } from '../../../shared/domain/ledger/count-entry.ts'
import { clinicalWords } from '../../../shared/messages/quarantine-records.ts'

const { withheld } = clinicalWords
export const hide = (words: string | null): string | null => (words ? withheld : words)

/** A death without what was written of it. That it happened, where, and what became of the body is no clinical word. */
export function withholdFromDeath(death: Death): Death {
  return {
    ...death,
    note: hide(death.note),
    struck: death.struck && { ...death.struck, reason: withheld },
  }
}

/** A weight without what was written of it. */
export function withholdFromWeight(weight: WeightEntry): WeightEntry {
  return {
    ...weight,
    confirmedReason: hide(weight.confirmedReason),
    struck: weight.struck && { ...weight.struck, reason: withheld },
  }
}

/** A line of the count ledger; one that goes with a struck-out death repeats the reason. */
export function withholdFromCountLine(line: CountLine): CountLine {
  return {
    ...line,
    struck: line.struck && isDeathKind(line.kind) ? { ...line.struck, reason: withheld } : line.struck,
  }
}

/**
 * What does not fit is for everybody to see; how a veterinarian or registrar explained it is not. What is told of a dose
 * stands in an order, which is read by fewer people than the ledgers.
 */
export function withholdFromDiscrepancy(one: Discrepancy): Discrepancy {
  const isOfDose = one.kind.startsWith('dose')
  return {
    ...one,
    facts: isOfDose ? Object.fromEntries(Object.keys(one.facts).map((key) => [key, withheld])) : one.facts,
    resolution: one.resolution && { ...one.resolution, reason: withheld },
  }
}

export const withholdFromAnimal = (animal: Animal): Animal => ({
  ...animal,
  discrepancies: animal.discrepancies.map(withholdFromDiscrepancy),
})

/** Kinds of lines of the log with words that belong to the chart, and which words these are. */
const clinicalFacts: Readonly<Record<string, readonly string[]>> = {
  death: ['note'],
  statement: ['note'],
  weight: ['confirmedReason'],
  'discrepancy-resolved': ['reason'],
}

export function withholdFromLogLine(line: LogLine): LogLine {
  const hidden = clinicalFacts[line.kind]
  if (!hidden) return line
  const kept = Object.entries(line.facts).map(([key, value]) => [
    key,
    hidden.includes(key) && value !== null && value !== '' ? withheld : value,
  ])
  return { ...line, facts: Object.fromEntries(kept), struckReason: hide(line.struckReason) }
}
