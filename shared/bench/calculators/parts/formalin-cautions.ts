import { exceeds } from '../../../domain/cautions/exceeds.ts'
import type { SourceKey } from '../../../domain/sources.ts'
import { convert } from '../../../domain/units/convert.ts'
import type { ParsedQuantity } from '../../../domain/units/parse-quantity.ts'
import type { UnitCode } from '../../../domain/units/unit-table.ts'
import type { BenchCaution } from '../../definition.ts'

/** The highest figure on a label of formalin, µL/L, for eggs. @source cfr-529-1030 */
export const mostOnLabelsUlPerL = 2000

/** The highest figure on a label of formalin for fish, µL/L. @source cfr-529-1030 */
const mostForFishUlPerL = 250

/** Of a liquid whose label was not asked for: the one that its figures are held against. @source formalin-density */
const usualDensityGPerMl = 1.08

/**
 * Formaldehyde in what is sold as formalin, by weight and by volume. Peroxide of 35 % lies below it.
 *
 * @source cfr-529-1030: 37 % by weight; how far labels stray from it: common practice, no source
 */
const ofFormalin = { percent: { low: 36, high: 41 }, mgPerMl: { low: 360, high: 450 } } as const

/** Words for what may be formalin, by its target or by its strength. */
export const formalinWords = {
  'caution.formalin':
    'By its target or its strength this may be formalin. It takes oxygen out of the water, about 1 mg/L for each 5 mg/L of it within 30 to 36 hours, and is more toxic in warm, soft or acid water. With a white precipitate in the bottle do not use it. Aerate, watch the animals, and be ready to flush.',
  'caution.formalin-people':
    'Formalin gives off formaldehyde, which burns eyes, skin and lungs, makes allergic, and can cause cancer. Gloves, goggles and moving air; close the bottle at once. The label and the law of the place come first.',
  'caution.above-fish-labels':
    'More than 250 µL/L of the product. On the label of formalin that is for eggs alone: fish at most 250 for an hour, salmonids above 10 °C at most 170.',
  'caution.above-labels':
    'More than 2,000 µL/L of the product, the highest figure on a label of formalin, which is for eggs. Read the order again, and in which unit it is.',
} as const

interface Bath {
  /** What is in the water, in the canonical unit of its dimension: µL/L, or mg/L. */
  target: { value: number; unit: UnitCode } | undefined
  basis: string
  form?: 'solid' | 'liquid' | undefined
  /** Of the product, or of the stock that drips. */
  strength?: ParsedQuantity | undefined
  strengthOf?: string | undefined
  density?: ParsedQuantity | undefined
}

/** What a bath of formalin asks to be said, and of any liquid that is more than labels of formalin go up to. */
export function formalinCautions(bath: Bath): {
  cautions: readonly BenchCaution[]
  sources: readonly SourceKey[]
} {
  const ulPerL = productUlPerL(bath)
  const isAbove = ulPerL !== null && exceeds(ulPerL, mostOnLabelsUlPerL)
  const mayBe = bath.target?.unit === 'uL/L' || hasStrengthOfFormalin(bath)
  const cautions: BenchCaution[] = []
  if (isAbove) cautions.push({ code: 'above-labels', level: 'warning' })
  else if (mayBe && ulPerL !== null && exceeds(ulPerL, mostForFishUlPerL))
    cautions.push({ code: 'above-fish-labels', level: 'warning' })
  if (mayBe)
    cautions.push({ code: 'formalin', level: 'warning' }, { code: 'formalin-people', level: 'warning' })
  return {
    cautions,
    sources: mayBe
      ? ['cfr-529-1030', 'ufifas-vm77', 'piper-1982', 'cfr-1910-1048']
      : isAbove
        ? ['cfr-529-1030', 'formalin-density']
        : [],
  }
}

/** Whether a liquid has the strength of formalin, as its label may give it. */
function hasStrengthOfFormalin({ form, strength, strengthOf }: Bath): boolean {
  if (form !== 'liquid' || !strength || strengthOf !== 'active') return false
  const byWeight = convert(strength.value, strength.unit, 'percent_w_w')
  const figure = byWeight.ok ? byWeight : convert(strength.value, strength.unit, 'mg/mL')
  if (!figure.ok) return false
  const { low, high } = byWeight.ok ? ofFormalin.percent : ofFormalin.mgPerMl
  return figure.value >= low && figure.value <= high
}

/** Microlitres of a liquid in a litre of the water; null where the target is of another thing. */
function productUlPerL(bath: Bath): number | null {
  const { target, basis, form, strength, density } = bath
  if (!target) return null
  if (target.unit === 'uL/L') return target.value
  if (target.unit !== 'mg/L' || form !== 'liquid') return null
  const gPerMl = density?.value ?? usualDensityGPerMl
  if (basis === 'product') return target.value / gPerMl
  if (!strength || !hasStrengthOfFormalin(bath)) return null
  const byWeight = convert(strength.value, strength.unit, 'percent_w_w')
  if (byWeight.ok) return target.value / gPerMl / (byWeight.value / 100)
  const byVolume = convert(strength.value, strength.unit, 'mg/mL')
  return byVolume.ok ? (target.value / byVolume.value) * 1000 : null
}
