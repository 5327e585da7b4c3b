import fc from 'fast-check'
import { expect } from 'vitest'
import type { Result } from '../../shared/domain/result.ts'

/** The answer of an engine that has to have one. */
export function valueOf<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field ?? ''}`)
  return result.value
}

/** Code and field of a refusal, or that there was none. */
export function refusalOf(result: Result<unknown>): readonly [code: string, field: string | undefined] {
  return result.ok ? ['answered', undefined] : [result.refusal.code, result.refusal.field]
}

export const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })

/** What no caller should hand over, and the ends of what a double holds. */
const nonsense = [
  ...[NaN, Infinity, -Infinity, -1, 0, -0, 1, 100, 1e308, -1e308, 5e-324, 1e-300],
  ...[undefined, null, 'ten', '', {}, [], true, Symbol.iterator, 10n],
] as unknown[]

/**
 * Asks engines with every argument out of nonsense: each answers with finite numbers or refuses with a code and a field, and
 * none throws.
 *
 * @param engines each with the names of its arguments
 */
export function expectTotal(
  engines: readonly (readonly [engine: (input: never) => Result<unknown>, names: readonly string[]])[],
): void {
  for (const [engine, names] of engines) {
    const input = fc.record(Object.fromEntries(names.map((name) => [name, fc.constantFrom(...nonsense)])))
    fc.assert(
      fc.property(input, (given) => {
        const answer = engine(given as never)
        if (!answer.ok) {
          expect(answer.refusal.code).toMatch(/^[a-z-]+$/)
          expect(names).toContain(answer.refusal.field)
          return
        }
        const numbers = [answer.value].flatMap((value) =>
          typeof value === 'object' && value !== null ? (Object.values(value) as unknown[]) : [value],
        )
        for (const value of numbers) if (typeof value === 'number') expect(value).toSatisfy(Number.isFinite)
      }),
      { numRuns: 600 },
    )
  }
}

/** Equal but for the last digits of a double. */
export function expectNear(found: number, expected: number, relative = 1e-12): void {
  expect(Math.abs(found - expected)).toBeLessThanOrEqual(relative * Math.abs(expected))
}
