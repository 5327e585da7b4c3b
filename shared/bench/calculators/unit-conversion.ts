import { ok, refuse } from '../../domain/result.ts'
import { convert } from '../../domain/units/convert.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { unitOf } from '../../domain/units/unit-of.ts'
import { unitTable, type UnitCode } from '../../domain/units/unit-table.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { expressionUnit } from '../../domain/working/expression-unit.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchLine } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'

const codes = (Object.keys(unitTable) as UnitCode[]).filter((code) => unitOf(code).dimension !== 'pureNumber')

/** A quantity in another unit of its dimension. No conversion joins two dimensions or two bases. */
export const unitConversion = defineCalculator({
  id: 'unit-conversion',
  group: 'units',
  weekly: true,
  words: defineMessages({
    name: 'Unit conversion',
    purpose: 'A quantity in another unit of the same kind, by exact definitions.',
    search: 'ppm gallons fahrenheit celsius pounds inches hardness alkalinity',
    formula: 'both units by their exact factors to the unit of their kind',
    'input.from': 'Quantity',
    'help.from': 'Choose US or imperial gallons; parts per million are no unit.',
    'input.to': 'Unit wanted',
    'result.converted': 'Converted',
    'line.canonical': 'In the unit that this program computes in',
    'line.converted': 'Converted',
    'refusal.dimensions-differ':
      'These two units measure different things, and no factor joins them. A concentration, for example, needs a volume before it is a mass.',
    'caution.temperature': 'A difference of temperatures is converted without the offset.',
    'caution.basis':
      'The unit changes, what it is of does not: mg/L of copper is not mg/L of copper sulfate.',
  }),
  inputs: {
    from: quantity({ units: codes, toConvert: true }),
    to: choice(codes, { unitsOf: 'from', missing: 'not-chosen' }),
  },
  fields: { value: 'from' },
  example: { from: { value: '100', unit: 'gal_us' }, to: 'L' },
  sources: ['nist-sp-811', 'iupac-weights'],
  published: ['unit_conversion'],
  compute({ from, to }) {
    const { unit } = from.entered
    if (from.value < 0 && unitOf(unit).dimension !== 'temperature')
      return refuse('below-least', 'from', { limit: '0', unit })
    const answer = convert(Number(from.entered.value), from.entered.unit, to)
    if (!answer.ok)
      return answer.refusal.code === 'dimensions-differ' ? refuse('dimensions-differ', 'to') : answer
    const { dimension } = unitOf(to)
    const caution = dimension === 'temperatureDifference' ? 'temperature' : 'basis'
    const concentration = dimension === 'massConcentration' || dimension === 'volumeConcentration'
    return ok({
      figures: [{ key: 'converted', value: answer.value, unit: to, figures: 10, kind: 'dose' }],
      working: workingOf(from, to, answer.value),
      ...(caution === 'temperature' || concentration
        ? { cautions: [{ code: caution, level: 'note' as const }] }
        : {}),
    })
  },
})

/** By mathjs's own factors where it knows both units, otherwise with the factors of the table written out. */
function workingOf(from: ParsedQuantity, to: UnitCode, value: number): BenchLine[] {
  const [named, wanted] = [expressionUnit(from.entered.unit), expressionUnit(to)]
  const oneCode = from.entered.unit === to
  const { dimension } = unitOf(to)
  // volume by volume and mass by mass have no dimension left for mathjs to convert
  const cancels = dimension === 'volumeConcentration' || dimension === 'bodyDose'
  if (named && wanted && !cancels && !oneCode)
    return [line('converted', `${enteredTerm(from)} to ${wanted}`, value, to)]
  const source = unitOf(from.entered.unit)
  const target = unitOf(to)
  const shifted =
    source.offset === 0 ? from.entered.value : `(${from.entered.value} + (${String(source.offset)}))`
  const plain = `${shifted} * ${String(source.numerator)} / ${String(source.denominator)}`
  const back = `${valueTerm(from.value, 'ratio')} * ${String(target.denominator)} / ${String(target.numerator)}`
  return [
    line('canonical', plain, from.value, 'ratio'),
    line('converted', `${back} - (${String(target.offset)})`, value, 'ratio', ['canonical']),
  ]
}
