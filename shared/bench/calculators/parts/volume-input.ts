import type { ParsedQuantity } from '../../../domain/units/parse-quantity.ts'
import type { UnitCode } from '../../../domain/units/unit-table.ts'
import { enteredTerm } from '../../../domain/working/entered-term.ts'
import { expressionUnit } from '../../../domain/working/expression-unit.ts'
import type { BenchLine } from '../../definition.ts'
import { quantity } from '../../inputs.ts'

/** What a volume of water is given in. */
export const volumeUnits = [
  'L',
  'm3',
  'gal_us',
  'gal_imp',
  'ft3',
  'in3',
  'acre_ft',
  'mL',
] as const satisfies UnitCode[]

/** The net volume of the water with its error, as every dose asks for it. */
export const volumeInputs = {
  volume: quantity({ units: volumeUnits, limits: { above: 0 }, netVolume: true }),
  volumeError: quantity({
    units: ['percent'],
    limits: { min: 0, max: 90 },
    optional: true,
    errorOf: 'volume',
  }),
} as const

export const volumeWords = {
  'input.volume': 'Net volume of the water',
  'help.volume': 'The water really there: less rock and sand, with sump and pipes.',
  'input.volumeError': 'Error of the volume',
} as const

/** A working whose first line is the volume, with that line as the person entered it: `3785 gal to L`. */
export function withVolumeAsEntered(working: readonly BenchLine[], volume: ParsedQuantity): BenchLine[] {
  const [first, ...rest] = working
  if (first === undefined) return []
  const { unit } = volume.entered
  if (unit === 'L' || expressionUnit(unit) === undefined) return [first, ...rest]
  return [{ ...first, expression: `${enteredTerm(volume)} to L` }, ...rest]
}
