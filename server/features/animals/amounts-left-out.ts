import type { Discrepancy } from '../../../shared/contracts/animals.contract.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import type { Actor } from '../../platform/http/request-context.ts'

/** Of some orders, by number, those whose amount is left out for somebody who may still calculate it blind. */
export type BlindAmong = (numbers: readonly string[], actor: Actor) => Promise<Set<string>>

/** Figures of discrepancies that are amounts of a dose. */
export const amountFacts: readonly string[] = ['given', 'signed', 'workedOut']

const orderOf = ({ facts }: Discrepancy): string | null =>
  'order' in facts && amountFacts.some((name) => name in facts) ? String(facts['order']) : null

const withoutAmounts = (facts: Discrepancy['facts']): Discrepancy['facts'] =>
  Object.fromEntries(
    Object.entries(facts).map(([name, value]) => [
      name,
      amountFacts.includes(name) ? doseWords.amountLeftOutHere : value,
    ]),
  )

/**
 * Discrepancies of doses name amounts, and orders know for whom they are left out. Orders are made after animals, so
 * they say here how they are asked.
 */
export function createAmountsLeftOut() {
  let blindAmong: BlindAmong | null = null
  return {
    askOf(answer: BlindAmong): void {
      blindAmong = answer
    },
    async from(discrepancies: readonly Discrepancy[], actor: Actor): Promise<Discrepancy[]> {
      const numbers = [...new Set(discrepancies.flatMap((one) => orderOf(one) ?? []))]
      const blind = numbers.length > 0 ? await blindAmong?.(numbers, actor) : undefined
      return discrepancies.map((one) =>
        blind?.has(orderOf(one) ?? '') ? { ...one, facts: withoutAmounts(one.facts) } : one,
      )
    },
  }
}

export type AmountsLeftOut = ReturnType<typeof createAmountsLeftOut>
