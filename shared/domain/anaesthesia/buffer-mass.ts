import { ok, refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import type { AnaesthesiaRefusal } from './anaesthesia-refusal.ts'

/**
 * Sodium bicarbonate to buffer tricaine: mass × ratio. Two to one is common; hard and salt water need less. The measured pH
 * decides: 7.0 to 7.5, or that of the animal's own water.
 *
 * @param input.tricaineG        above 0, at most 1,000,000
 * @param input.bicarbonateRatio parts of bicarbonate to one of tricaine, above 0, at most 10
 * @returns g of NaHCO₃
 * @refuses not-finite · not-above-zero, below-least, above-most · unbuffered-stock (bicarbonateRatio) for a ratio of 0
 * @source  tricaine-buffer-practice, from memory · check values tri.03, tri.refuse2
 */
export function bufferMass(input: {
  tricaineG: number
  bicarbonateRatio: number
}): Result<number, AnaesthesiaRefusal> {
  const { tricaineG, bicarbonateRatio } = input
  const refused = checkNumbers([
    [tricaineG, { field: 'tricaineG', unit: 'g', above: 0, max: 1_000_000 }],
    [bicarbonateRatio, { field: 'bicarbonateRatio', unit: 'ratio', min: 0, max: 10 }],
  ])
  if (refused) return refused
  if (bicarbonateRatio === 0) return refuse('unbuffered-stock', 'bicarbonateRatio')
  return ok(tricaineG * bicarbonateRatio)
}
