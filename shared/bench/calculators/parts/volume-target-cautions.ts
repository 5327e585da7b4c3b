import { exceeds } from '../../../domain/cautions/exceeds.ts'
import type { SourceKey } from '../../../domain/sources.ts'
import type { UnitCode } from '../../../domain/units/unit-table.ts'
import type { BenchCaution } from '../../definition.ts'

/** The highest figure on a label of formalin, µL/L, for eggs. @source cfr-529-1030 */
export const mostOnLabelsUlPerL = 2000

/** Words for a target by volume, whose usual product is formalin. */
export const volumeTargetWords = {
  'caution.formalin':
    'A target by volume is usually one of formalin. It takes oxygen out of the water, about 1 mg/L for each 5 mg/L of it within 30 to 36 hours, and is more toxic in warm, soft or acid water. With a white precipitate in the bottle do not use it. Aerate, watch the animals, and be ready to flush.',
  'caution.above-labels':
    'More than 2,000 µL/L, the highest figure on a label of formalin, which is for eggs. Read the order again, and in which unit it is.',
} as const

/**
 * What a target by volume asks to be said; nothing of a target by weight.
 *
 * @param target in the canonical unit of its dimension: µL/L, or mg/L
 */
export function volumeTargetCautions(target: { value: number; unit: UnitCode } | undefined): {
  cautions: readonly BenchCaution[]
  sources: readonly SourceKey[]
} {
  if (target?.unit !== 'uL/L') return { cautions: [], sources: [] }
  const formalin: BenchCaution = { code: 'formalin', level: 'warning' }
  return {
    cautions: exceeds(target.value, mostOnLabelsUlPerL)
      ? [{ code: 'above-labels', level: 'warning' }, formalin]
      : [formalin],
    sources: ['cfr-529-1030', 'ufifas-vm77', 'piper-1982'],
  }
}
