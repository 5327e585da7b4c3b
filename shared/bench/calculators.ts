import { bathDose } from './calculators/bath-dose.ts'
import type { AnyCalculator } from './definition.ts'

/** Every calculator of the bench, in the order in which the bench shows them. A new one is a file and a line here. */
export const calculators: readonly AnyCalculator[] = [bathDose]

const byId = new Map(calculators.map((each) => [each.id, each]))

/** The calculator at an address; undefined for an address that has none. */
export function calculatorAt(id: string): AnyCalculator | undefined {
  return byId.get(id)
}
