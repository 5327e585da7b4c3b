import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Result } from '../../../shared/domain/result.ts'
import { acclimationLitres, acclimationSalinity } from '../../../shared/domain/water/flow/drip-acclimation.ts'

const valueOf = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field ?? ''}`)
  return result.value
}
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })

describe('a vessel into which the tank drips', () => {
  it('is as near to the tank as was asked once the litres are in, and keeps its salt', () => {
    fc.assert(
      fc.property(
        between(0.1, 1000),
        between(2, 40),
        between(2, 40),
        between(0.1, 5),
        (litres, start, tank, near) => {
          const vessel = { startLitres: litres, startSalinity: start, tankSalinity: tank }
          const addedLitres = valueOf(acclimationLitres({ ...vessel, nearEnough: near }))
          const reached = valueOf(acclimationSalinity({ ...vessel, addedLitres }))
          if (addedLitres > 0) expect(Math.abs(reached - tank)).toBeCloseTo(near, 8)
          else expect(Math.abs(start - tank)).toBeLessThanOrEqual(near)
          const salt = start * litres + tank * addedLitres
          expect((reached * (litres + addedLitres)) / salt).toBeCloseTo(1, 9)
        },
      ),
    )
  })
  it('is refused or gives a finite figure, whatever is handed over', () => {
    const any = fc.constantFrom(
      ...([
        NaN,
        Infinity,
        -1,
        0,
        1,
        1.025,
        35,
        1e308,
        1e-17,
        1e-320,
        undefined,
        'ten',
      ] as unknown as number[]),
    )
    fc.assert(
      fc.property(any, any, any, any, (a, b, c, d) => {
        const vessel = { startLitres: a, startSalinity: b, tankSalinity: c }
        for (const answer of [
          acclimationLitres({ ...vessel, nearEnough: d }),
          acclimationSalinity({ ...vessel, addedLitres: d }),
        ])
          if (answer.ok) expect(Number.isFinite(answer.value)).toBe(true)
          else expect(answer.refusal.field).toBeTruthy()
      }),
      { numRuns: 2000 },
    )
  })
})
