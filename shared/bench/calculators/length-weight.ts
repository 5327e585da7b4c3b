import { coefficientFromUnits, type CoefficientUnits } from '../../domain/growth/coefficient-in-units.ts'
import { conditionFactorFromEnglish, fultonConditionFactor } from '../../domain/growth/condition-factor.ts'
import { growthLimits, isTypicalExponent, isUsualCoefficient } from '../../domain/growth/growth-limits.ts'
import { lengthTypes, type LengthType } from '../../domain/growth/length-type.ts'
import { lengthFromWeight, relativeCondition, weightFromLength } from '../../domain/growth/length-weight.ts'
import { ok, refuse, type Result } from '../../domain/result.ts'
import { convert } from '../../domain/units/convert.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type BenchLine, type Outcome } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'

const byTable = ['weight', 'length', 'relative'] as const
const withLength = ['weight', 'relative', 'fulton'] as const
const withWeight = ['length', 'relative', 'fulton'] as const

/** Units that tables of coefficients are printed in; the exponent is the same in all of them. */
const coefficientUnits = {
  'g-cm': { massUnit: 'g', lengthUnit: 'cm' },
  'g-mm': { massUnit: 'g', lengthUnit: 'mm' },
  'g-m': { massUnit: 'g', lengthUnit: 'm' },
  'kg-cm': { massUnit: 'kg', lengthUnit: 'cm' },
  'kg-m': { massUnit: 'kg', lengthUnit: 'm' },
  'lb-in': { massUnit: 'lb', lengthUnit: 'in' },
} as const satisfies Record<string, CoefficientUnits>

/** Weight by length and back by a species' coefficients, and the condition of an animal. */
export const lengthWeight = defineCalculator({
  id: 'length-weight',
  group: 'body',
  words: defineMessages({
    name: 'Length and weight',
    purpose: 'Weight from a length or back by the coefficients of a species, and how well fed an animal is.',
    search: 'condition factor',
    formula: 'weight = a × length ^ b',
    'input.find': 'What to find',
    'option.find.weight': 'Weight from length',
    'option.find.length': 'Length from weight',
    'option.find.relative': 'Relative condition Kn (Le Cren)',
    'option.find.fulton': 'Condition factor K (Fulton)',
    'option.find.english': 'K from a table in pounds and inches',
    'input.lengthType': 'Kind of length',
    'option.lengthType.total': 'Total, to the end of the tail',
    'option.lengthType.fork': 'Fork, to the fork of the tail',
    'option.lengthType.standard': 'Standard, to the end of the spine',
    'option.lengthType.disc-width': 'Disc width, across a ray',
    'input.length': 'Length',
    'input.lengthError': 'Error of the length',
    'input.weight': 'Weight',
    'input.weightError': 'Error of the weight',
    'input.coefficientUnits': 'Units of the table',
    'option.coefficientUnits.g-cm': 'Grams and centimetres',
    'option.coefficientUnits.g-mm': 'Grams and millimetres',
    'option.coefficientUnits.g-m': 'Grams and metres',
    'option.coefficientUnits.kg-cm': 'Kilograms and centimetres',
    'option.coefficientUnits.kg-m': 'Kilograms and metres',
    'option.coefficientUnits.lb-in': 'Pounds and inches',
    'input.a': 'Coefficient a',
    'help.a': 'As the table prints it. A table that prints its logarithm is turned back first.',
    'input.b': 'Exponent b',
    'input.tableLength': 'Kind of length of the table',
    'option.tableLength.total': 'Total length',
    'option.tableLength.fork': 'Fork length',
    'option.tableLength.standard': 'Standard length',
    'option.tableLength.disc-width': 'Disc width',
    'input.english': 'C in pounds and cubic inches',
    'help.english': 'Tables print it times ten million: 4055 stands for 0.0004055.',
    'result.weight': 'Weight by the table',
    'result.length-total': 'Total length by the table',
    'result.length-fork': 'Fork length by the table',
    'result.length-standard': 'Standard length by the table',
    'result.length-disc-width': 'Disc width by the table',
    'result.kn': 'Relative condition Kn',
    'result.expected': 'Weight by the table',
    'result.k': 'Condition factor K',
    'line.a': 'Coefficient in grams and centimetres',
    'line.weight': 'Weight by the table',
    'line.length': 'Length by the table',
    'line.kn': 'Weighed against the table',
    'line.k': 'Condition factor',
    'refusal.length-type-not-stated':
      'Choose what the length was measured to. Total, fork and standard length of one fish are not the same.',
    'refusal.length-type-differs':
      'The table is of another kind of length. Measure the animal the way the table did, or take a table of this length.',
    'refusal.coefficient-too-large':
      'In these units no animal could have such a coefficient. Check the units of the table, and whether it prints a logarithm.',
    'caution.scales':
      'A weight for an anaesthetic, an injection or any dose to one animal comes from the scales. This one is for logs and the feed of a group.',
    'caution.exponent': (p: { least: string; most: string }) =>
      `Most species have an exponent between ${p.least} and ${p.most} (from memory). Check the table.`,
    'caution.coefficient-unusual': (p: { least: string; most: string }) =>
      `In grams and centimetres a coefficient outside ${p.least} to ${p.most} is doubted here. Check the units of the table.`,
    'caution.one-species':
      'Coefficients and condition belong to one species, one kind of length and often one sex and season. Compare nothing else.',
  }),
  inputs: {
    find: choice(['weight', 'length', 'relative', 'fulton', 'english']),
    lengthType: choice(lengthTypes, { when: { find: withLength }, missing: 'length-type-not-stated' }),
    length: quantity({
      units: ['cm', 'mm', 'm', 'in', 'ft'],
      limits: { above: 0, max: growthLimits.mostLengthCm / 100, plausible: { min: 0.005, max: 12 } },
      when: { find: withLength },
    }),
    lengthError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'length',
      when: { find: withLength },
    }),
    weight: quantity({
      units: ['g', 'kg', 'mg', 'lb', 'oz_av'],
      limits: { above: 0, max: growthLimits.mostWeightG },
      when: { find: withWeight },
    }),
    weightError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'weight',
      when: { find: withWeight },
    }),
    coefficientUnits: choice(Object.keys(coefficientUnits) as (keyof typeof coefficientUnits)[], {
      when: { find: byTable },
    }),
    a: quantity({ units: ['ratio'], limits: { above: 0 }, when: { find: byTable } }),
    b: quantity({
      units: ['ratio'],
      limits: { min: growthLimits.leastB, max: growthLimits.mostB },
      when: { find: byTable },
    }),
    tableLength: choice(lengthTypes, { when: { find: byTable }, missing: 'length-type-not-stated' }),
    english: quantity({
      units: ['ratio'],
      limits: { above: 0, max: 1, plausible: { min: 0.00005, max: 0.005 } },
      when: { find: ['english'] },
    }),
  },
  fields: {
    lengthCm: 'length',
    weightG: 'weight',
    aGPerCmB: 'a',
    coefficientsLengthType: 'tableLength',
    cLbPerIn3: 'english',
  },
  example: {
    find: 'weight',
    lengthType: 'total',
    length: { value: '35', unit: 'cm' },
    lengthError: { value: '2', unit: 'percent' },
    coefficientUnits: 'g-cm',
    a: { value: '0.0124', unit: 'ratio' },
    b: { value: '3.05', unit: 'ratio' },
    tableLength: 'total',
  },
  sources: ['le-cren-1951', 'froese-2006'],
  cautions: [{ code: 'one-species', level: 'note' }],
  plot: { vary: 'length', unit: 'cm', from: 5, to: 100, figure: 'weight' },
  published: [
    'weight_from_length_g',
    'length_from_weight_cm',
    'condition_factor_K',
    'relative_condition_Kn',
    'condition_factor_K_from_english',
  ],
  compute({ find, lengthType, length, weight, english, coefficientUnits: units, a, b, tableLength }) {
    if (find === 'english' && english) return fromEnglish(english)
    if (find === 'fulton' && length && weight) return fulton(length, weight)
    if (!units || !a || !b || !tableLength) return refuse('not-chosen', 'tableLength')
    const table = tableOf(units, a, b)
    if (!table.ok) return table
    const { aGPerCmB, aTerm, lines: working, cautions } = table.value
    const aRests = working.map(({ key }) => key)
    const coefficients = { aGPerCmB, b: b.value }
    if (find === 'length' && weight) {
      const centimetres = lengthFromWeight({ ...coefficients, weightG: weight.value })
      if (!centimetres.ok) return centimetres
      const expression = `(${enteredTerm(weight)} / (${aTerm} g)) ^ (1 / ${enteredTerm(b)}) * 1 cm to cm`
      return ok({
        figures: [{ key: `length-${tableLength}`, value: centimetres.value, unit: 'cm', figures: 3 }],
        working: [...working, line('length', expression, centimetres.value, 'cm', aRests)],
        cautions,
      })
    }
    if (!length || !lengthType) return refuse('blank', 'length', { unit: 'm' })
    const measured = { ...coefficients, ...lengthOf(length, lengthType, tableLength) }
    const expected = weightFromLength(measured)
    if (!expected.ok) return expected
    working.push(
      line(
        'weight',
        `${aTerm} g * ${centimetresTerm(length)} ^ ${enteredTerm(b)} to g`,
        expected.value,
        'g',
        aRests,
      ),
    )
    if (find === 'relative' && weight) {
      const relative = relativeCondition({ ...measured, weightG: weight.value })
      if (!relative.ok) return relative
      const { kn, expectedG } = relative.value
      return ok({
        figures: [
          { key: 'kn', value: kn, unit: 'ratio', figures: 3 },
          { key: 'expected', value: expectedG, unit: 'g', figures: 3 },
        ],
        working: [
          ...working,
          line('kn', `${enteredTerm(weight)} / (${valueTerm(expectedG, 'g')})`, kn, 'ratio', ['weight']),
        ],
        cautions,
      })
    }
    return ok({
      figures: [{ key: 'weight', value: expected.value, unit: 'g', figures: 3 }],
      working,
      cautions: [{ code: 'scales', level: 'warning' }, ...cautions],
    })
  },
})

/** The length as the plain number of centimetres that the coefficients take. */
const centimetresTerm = (length: ParsedQuantity): string => `(${enteredTerm(length)} / (1 cm))`

function lengthOf(length: ParsedQuantity, lengthType: LengthType, coefficientsLengthType: LengthType) {
  const centimetres = convert(length.value, 'm', 'cm')
  return { lengthCm: centimetres.ok ? centimetres.value : NaN, lengthType, coefficientsLengthType }
}

interface Table {
  aGPerCmB: number
  /** a in grams and centimetres, as later lines take it. */
  aTerm: string
  lines: BenchLine[]
  cautions: BenchCaution[]
}

/** The coefficients in grams and centimetres, whatever the table is printed in. */
function tableOf(units: keyof typeof coefficientUnits, a: ParsedQuantity, b: ParsedQuantity): Result<Table> {
  const { massUnit, lengthUnit } = coefficientUnits[units]
  const inCm = coefficientFromUnits({ a: a.value, b: b.value, massUnit, lengthUnit })
  if (!inCm.ok)
    return inCm.refusal.code === 'above-most' && inCm.refusal.field === 'a'
      ? refuse('coefficient-too-large', 'a')
      : inCm
  const { leastUsualA, mostUsualA, leastTypicalB, mostTypicalB } = growthLimits
  const cautions: BenchCaution[] = []
  if (!isTypicalExponent(b.value))
    cautions.push({
      code: 'exponent',
      level: 'warning',
      params: { least: leastTypicalB, most: mostTypicalB },
    })
  if (!isUsualCoefficient(inCm.value))
    cautions.push({
      code: 'coefficient-unusual',
      level: 'warning',
      params: { least: leastUsualA, most: mostUsualA },
    })
  if (units === 'g-cm') return ok({ aGPerCmB: inCm.value, aTerm: enteredTerm(a), lines: [], cautions })
  const [mass, long] = [valueTerm(1, massUnit), valueTerm(1, lengthUnit)]
  const expression = `${enteredTerm(a)} * (${mass} / (1 g)) * (1 cm / (${long})) ^ ${enteredTerm(b)}`
  return ok({
    aGPerCmB: inCm.value,
    aTerm: valueTerm(inCm.value, 'ratio'),
    lines: [line('a', expression, inCm.value, 'ratio')],
    cautions,
  })
}

function fulton(length: ParsedQuantity, weight: ParsedQuantity): Result<Outcome> {
  const { lengthCm } = lengthOf(length, 'total', 'total')
  const k = fultonConditionFactor({ weightG: weight.value, lengthCm })
  if (!k.ok) return k
  const expression = `100 * (${enteredTerm(weight)} / (1 g)) / (${centimetresTerm(length)} ^ 3)`
  return ok({
    figures: [{ key: 'k', value: k.value, unit: 'ratio', figures: 3 }],
    working: [line('k', expression, k.value, 'ratio')],
  })
}

function fromEnglish(english: ParsedQuantity): Result<Outcome> {
  const k = conditionFactorFromEnglish({ cLbPerIn3: english.value })
  if (!k.ok) return k
  const expression = `100 * ${enteredTerm(english)} * (1 lb / (1 g)) / ((1 inch)^3 / (1 cm)^3)`
  return ok({
    figures: [{ key: 'k', value: k.value, unit: 'ratio' }],
    working: [line('k', expression, k.value, 'ratio')],
    sources: ['nist-sp-811'],
  })
}
