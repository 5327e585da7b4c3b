import fc from 'fast-check'
import { all, create, type MathJsInstance, type Unit } from 'mathjs'
import { describe, expect, it } from 'vitest'
import { convert } from '../../../shared/domain/units/convert.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { unitTable, type UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { unitsOf } from '../../../shared/domain/units/units-of.ts'
import { workingUnit } from '../../../shared/domain/working/expression-unit.ts'

/**
 * Every unit as mathjs would say it, out of the units and constants that mathjs has built in. None of these numbers is
 * taken from the project's table: a fluid ounce is mathjs's own, and a column of mercury is its density × gravity ×
 * height.
 *
 * Conventional mercury has 13,595.1 kg/m³; an acre is a furlong (660 ft) by a chain (66 ft).
 *
 * @source nist-sp-811 · iupac-weights: Ca 40.078, C 12.011, O 15.999
 */
const mercury = '13595.1 kg/m^3 * gravity'
const twoChargesOf = (gramsPerMol: string) => `2 / ((${gramsPerMol}) * g/mol)`

const inMathjs: Partial<Record<UnitCode, string>> = {
  uL: 'uL',
  mL: 'mL',
  L: 'L',
  m3: 'm^3',
  gal_us: 'gallon',
  floz_us: 'fluidounce',
  tsp_us: 'fluidounce / 6',
  tbsp_us: 'fluidounce / 2',
  in3: 'inch^3',
  ft3: 'foot^3',
  acre_ft: '(660 foot) * (66 foot) * foot',

  mm: 'mm',
  cm: 'cm',
  m: 'm',
  in: 'inch',
  ft: 'foot',
  m2: 'm^2',

  ug: 'ug',
  mg: 'mg',
  g: 'g',
  kg: 'kg',
  t: 'tonne',
  lb: 'poundmass',
  oz_av: 'ounce',

  degC: 'degC',
  degF: 'degF',
  K: 'K',
  // a difference is a number of steps of a scale that begins at absolute zero: kelvin, and Rankine for Fahrenheit
  delta_degC: 'K',
  delta_degF: 'degR',

  'ug/L': 'ug/L',
  'mg/L': 'mg/L',
  'g/m3': 'g/m^3',
  'g/L': 'g/L',
  'mg/mL': 'mg/mL',
  'g/mL_w_v': 'g/mL',
  percent_w_v: 'g/dL',

  'uL/L': 'uL/L',
  'mL/m3': 'mL/m^3',
  'mL/L': 'mL/L',
  percent_v_v: 'mL/dL',

  percent_w_w: 'g/hg',
  'mg/kg_w_w': 'mg/kg',
  'g/kg_w_w': 'g/kg',
  'mg/g_w_w': 'mg/g',
  'g/ton_us': 'g/ton',

  'ug/kg': 'ug/kg',
  'mg/kg': 'mg/kg',

  'g/mL': 'g/mL',
  'kg/L': 'kg/L',
  'kg/m3': 'kg/m^3',

  s: 's',
  min: 'minute',
  h: 'hour',
  d: 'day',
  week: 'week',

  'mL/min': 'mL/minute',
  'L/min': 'L/minute',
  'L/h': 'L/hour',
  'm3/h': 'm^3/hour',
  'gal_us/min': 'gallon/minute',

  per_min: '1/minute',
  per_h: '1/hour',
  per_d: '1/day',

  'g/kg': 'g/kg',

  'uS/cm': 'uS/cm',
  'mS/cm': 'mS/cm',
  'S/m': 'S/m',

  kPa: 'kPa',
  hPa: 'hPa',
  bar: 'bar',
  atm: 'atm',
  mmHg: `${mercury} * mm`,
  inHg: `${mercury} * inch`,
  psi: 'lbf/inch^2',

  'meq/L': 'mmol/L',
  'mg/L_CaCO3': `mg/L * ${twoChargesOf('40.078 + 12.011 + 3 * 15.999')}`,
  dKH: `10 mg/L * ${twoChargesOf('40.078 + 15.999')}`,

  mV: 'mV',
  'mg/h': 'mg/hour',
  'g/h': 'g/hour',
  'mg_min/L': 'mg*minute/L',
}

/** What mathjs has no unit for, and why that is no loss, or how it is tested instead. */
const notInMathjs: Partial<Record<UnitCode, string>> = {
  gal_imp: 'mathjs knows the gallon of the United States only; compared below by its definition',
  'PSS-78': 'a scale by a ratio of conductivities; nothing converts to it',
  pH: 'a logarithmic scale; nothing converts to it',
  SG: 'a ratio to water; nothing converts to it',
  percent: 'a plain number in mathjs; nothing converts to it',
  ratio: 'a plain number in mathjs; nothing converts to it',
  units: 'activity of a drug, which each pharmacopoeia defines for each drug; nothing converts to it',
}

/** Of the value: a few roundings in each of the two, and no wrong digit. */
const relative = 1e-14
/** The table writes the pound per square inch with thirteen digits: 6.894757293168 kPa, where 361 more follow. */
const relativeOfPsi = 1e-13

const math = create(all ?? {}, {})
const codes = Object.keys(unitTable) as UnitCode[]
const named = Object.keys(inMathjs) as UnitCode[]

/** How many of `to` are in `count` of `from`, as mathjs has it. Multiplied by a metre, so that ratios have a unit too. */
function ratioOf(count: number, from: string, to: string, by: MathJsInstance = math): number {
  const metres: unknown = by.evaluate(`count * (${from}) / (${to}) * m`, { count })
  return (metres as Unit).toNumber('m')
}

function oracle(value: number, from: UnitCode, to: UnitCode): number {
  const [fromName, toName] = [inMathjs[from] ?? '', inMathjs[to] ?? '']
  if (unitOf(from).dimension === 'temperature') return math.unit(value, fromName).toNumber(toName)
  return ratioOf(value, fromName, toName)
}

function ours(value: number, from: UnitCode, to: UnitCode): number {
  const result = convert(value, from, to)
  if (!result.ok) throw new Error(`${value} ${from} to ${to}: ${result.refusal.code}`)
  return result.value
}

/** A value of any size that a person could type, of either sign; of temperatures, any that exist. */
const anyValueOf = (code: UnitCode): fc.Arbitrary<number> =>
  unitOf(code).dimension === 'temperature'
    ? fc.double({ min: code === 'K' ? 0 : -273, max: 1000, noNaN: true })
    : fc
        .tuple(
          fc.double({ min: 1, max: 10, maxExcluded: true, noNaN: true }),
          fc.integer({ min: -9, max: 9 }),
          fc.constantFrom(1, -1),
        )
        .map(([digits, power, sign]) => sign * digits * 10 ** power)

function close(found: number, expected: number, scale = Math.abs(expected), within = relative): void {
  expect(Math.abs(found - expected)).toBeLessThanOrEqual(within * scale)
}

describe('units against mathjs', () => {
  it('knows of every unit of the table whether mathjs has it', () => {
    const known = [...named, ...Object.keys(notInMathjs)]
    expect(codes.filter((code) => !known.includes(code))).toEqual([])
    expect(known.filter((code) => !codes.includes(code as UnitCode))).toEqual([])
    expect(new Set(known).size).toBe(known.length)
  })

  it('leaves out no unit that converts to another, but the imperial gallon', () => {
    const joined = (Object.keys(notInMathjs) as UnitCode[]).filter(
      (code) => unitsOf(unitOf(code).dimension).length > 1,
    )
    expect(joined).toEqual(['gal_imp'])
  })

  const pairs = named.flatMap((from) =>
    named
      .filter((to) => to !== from && unitOf(to).dimension === unitOf(from).dimension)
      .map((to) => [from, to] as const),
  )

  it.each(pairs)('%s in %s', (from, to) => {
    fc.assert(
      fc.property(anyValueOf(from), (value) => {
        const there = ours(value, from, to)
        // the offset of a temperature costs the digits of its hundreds of degrees
        const offset = unitOf(from).dimension === 'temperature' ? 500 : 0
        const within = from === 'psi' || to === 'psi' ? relativeOfPsi : relative
        close(there, oracle(value, from, to), Math.abs(there) + offset, within)
      }),
      { numRuns: 40 },
    )
  })

  it('has the imperial gallon of 4.54609 litres by definition, 160 ounces of 28.4130625 mL', () => {
    const byDefinition = '160 * 28.4130625 mL'
    for (const to of unitsOf('volume')) {
      if (to === 'gal_imp') continue
      close(ours(37, 'gal_imp', to), ratioOf(37, byDefinition, inMathjs[to] ?? ''))
      close(ours(37, to, 'gal_imp'), ratioOf(37, inMathjs[to] ?? '', byDefinition))
    }
  })
})

describe('names that mathjs shares with the table but means otherwise', () => {
  // These are why the list above builds the unit up and does not take it by its name.
  it.each<[UnitCode, string, number]>([
    ['tsp_us', 'teaspoon', 1.4e-2], // metric, 5 mL
    ['tbsp_us', 'tablespoon', 1.4e-2], // metric, 15 mL
    ['mmHg', 'mmHg', 2.9e-6], // 133.322 Pa
    ['psi', 'psi', 5.9e-11], // 6894.75729276459 Pa
    ['acre_ft', 'acre * foot', 8.4e-7], // 4046.86 m²
  ])('%s is not its %s, to within %d', (code, name, off) => {
    const difference = Math.abs(ratioOf(1, name, inMathjs[code] ?? '') - 1)
    expect(difference).toBeGreaterThan(off * 0.9)
    expect(difference).toBeLessThan(off * 1.1)
  })
})

describe('names of units in working lines', () => {
  // What verifies a working gives these names to mathjs: each must mean the unit of the table and no cousin of it.
  const second = create(all ?? {}, {})
  second.createUnit('impgal', '4.54609 L')
  const spoken = named.filter((code) => workingUnit(code) !== undefined && workingUnit(code) !== '')

  it.each(spoken)('%s', (code) => {
    close(ratioOf(1, workingUnit(code) ?? '', inMathjs[code] ?? '', second), 1)
  })

  it('are those of all but a few', () => {
    expect(spoken.length).toBeGreaterThan(40)
  })
})
