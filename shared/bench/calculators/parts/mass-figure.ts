import { convert } from '../../../domain/units/convert.ts'
import type { Figure } from '../../definition.ts'

const gramsPerKilogram = 1000

/** Something to weigh, written as doses are: in grams, from a kilogram on in kilograms. */
export function massFigure(key: string, grams: number): Figure {
  const kilograms = convert(grams, 'g', 'kg')
  return grams >= gramsPerKilogram && kilograms.ok
    ? { key, value: kilograms.value, unit: 'kg', kind: 'dose' }
    : { key, value: grams, unit: 'g', kind: 'dose' }
}
