import { ucum } from '@atomic-ehr/ucum'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { convert } from '../../../shared/domain/units/convert.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { unitTable, type UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { unitsOf } from '../../../shared/domain/units/units-of.ts'

/**
 * Every unit by its code in the Unified Code for Units of Measure (UCUM), as laboratories and instruments send them.
 * The factors are those of the UCUM table in the package, which shares nothing with the project's.
 */
const inUcum: Partial<Record<UnitCode, string>> = {
  uL: 'uL',
  mL: 'mL',
  L: 'L',
  m3: 'm3',
  gal_us: '[gal_us]',
  gal_imp: '[gal_br]',
  floz_us: '[foz_us]',
  tsp_us: '[tsp_us]',
  tbsp_us: '[tbs_us]',
  in3: '[cin_i]',
  ft3: '[cft_i]',
  // [acr_us] and [acr_br] are of the survey foot and of the British yard of 1922, 4 and 2 in a million off
  acre_ft: '43560.[cft_i]',

  mm: 'mm',
  cm: 'cm',
  m: 'm',
  in: '[in_i]',
  ft: '[ft_i]',
  m2: 'm2',

  ug: 'ug',
  mg: 'mg',
  g: 'g',
  kg: 'kg',
  t: 't',
  lb: '[lb_av]',
  oz_av: '[oz_av]',

  degC: 'Cel',
  degF: '[degF]',
  K: 'K',
  // a step of a scale without its offset
  delta_degC: 'K',
  delta_degF: '[degR]',

  'ug/L': 'ug/L',
  'mg/L': 'mg/L',
  'g/m3': 'g/m3',
  'g/L': 'g/L',
  'mg/mL': 'mg/mL',
  'g/mL_w_v': 'g/mL',
  percent_w_v: 'g/dL',

  'uL/L': 'uL/L',
  'mL/m3': 'mL/m3',
  'mL/L': 'mL/L',
  percent_v_v: '%',

  percent_w_w: '%',
  'mg/kg_w_w': '[ppm]',
  'g/kg_w_w': '[ppth]',
  'mg/g_w_w': 'mg/g',
  'g/ton_us': 'g/[ston_av]',

  'ug/kg': 'ug/kg',
  'mg/kg': 'mg/kg',

  'g/mL': 'g/mL',
  'kg/L': 'kg/L',
  'kg/m3': 'kg/m3',

  s: 's',
  min: 'min',
  h: 'h',
  d: 'd',
  week: 'wk',

  'mL/min': 'mL/min',
  'L/min': 'L/min',
  'L/h': 'L/h',
  'm3/h': 'm3/h',
  'gal_us/min': '[gal_us]/min',

  per_min: '/min',
  per_h: '/h',
  per_d: '/d',

  'g/kg': '[ppth]',

  'uS/cm': 'uS/cm',
  'mS/cm': 'mS/cm',
  'S/m': 'S/m',

  kPa: 'kPa',
  hPa: 'hPa',
  bar: 'bar',
  atm: 'atm',
  mmHg: 'mm[Hg]',
  inHg: "[in_i'Hg]",
  psi: '[psi]',

  'meq/L': 'meq/L',

  mV: 'mV',
  percent: '%',
  ratio: '1',
  'mg/h': 'mg/h',
  'g/h': 'g/h',
  'mg_min/L': 'mg.min/L',
}

/** What UCUM has no code for, or none that it converts. */
const notInUcum: Partial<Record<UnitCode, string>> = {
  'mg/L_CaCO3':
    'UCUM joins no mass to an amount of substance without a molar mass; see the test against mathjs',
  dKH: 'no degree of hardness has a code; see the test against mathjs',
  'PSS-78': 'practical salinity has no code; nothing converts to it',
  pH: '[pH] is there, of hydrogen ions in mol/L, which the NBS scale is not; nothing converts to it',
  SG: 'a ratio to water has no code of its own; nothing converts to it',
  units: "[arb'U] and its like are units by name only; nothing converts to them",
}

/** Of the value: a few roundings in each of the two, and no wrong digit. */
const relative = 1e-13
/**
 * UCUM rounds the metre of mercury to 133.3220 kPa, where the conventional one is 133.322387415: 2.906 in a million.
 * Between two units that are both of mercury the rounding falls out.
 */
const ofMercury: readonly UnitCode[] = ['mmHg', 'inHg']
const mercuryRounding = 133.322387415 / 133.322

const codes = Object.keys(unitTable) as UnitCode[]
const named = Object.keys(inUcum) as UnitCode[]

function ours(value: number, from: UnitCode, to: UnitCode): number {
  const result = convert(value, from, to)
  if (!result.ok) throw new Error(`${value} ${from} to ${to}: ${result.refusal.code}`)
  return result.value
}

function oracle(value: number, from: UnitCode, to: UnitCode): number {
  const converted = ucum.convert(value, inUcum[from] ?? '', inUcum[to] ?? '')
  const rounded = Number(ofMercury.includes(from)) - Number(ofMercury.includes(to))
  return converted * mercuryRounding ** rounded
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

describe('units against UCUM', () => {
  it('knows of every unit of the table whether UCUM has it', () => {
    const known = [...named, ...Object.keys(notInUcum)]
    expect(codes.filter((code) => !known.includes(code))).toEqual([])
    expect(known.filter((code) => !codes.includes(code as UnitCode))).toEqual([])
    expect(new Set(known).size).toBe(known.length)
  })

  it('leaves out no unit that converts to another, but two of alkalinity', () => {
    const joined = (Object.keys(notInUcum) as UnitCode[]).filter(
      (code) => unitsOf(unitOf(code).dimension).length > 1,
    )
    expect(joined).toEqual(['mg/L_CaCO3', 'dKH'])
  })

  it.each(named.map((code) => [code, inUcum[code] ?? '']))('%s has a code that UCUM reads: %s', (_, code) => {
    expect(ucum.validate(code)).toMatchObject({ valid: true })
  })

  const pairs = named.flatMap((from) =>
    named
      .filter((to) => to !== from && unitOf(to).dimension === unitOf(from).dimension)
      .map((to) => [from, to] as const),
  )

  it.each(pairs)('%s in %s', (from, to) => {
    fc.assert(
      fc.property(anyValueOf(from), (value) => {
        const expected = oracle(value, from, to)
        // the offset of a temperature costs the digits of its hundreds of degrees
        const offset = unitOf(from).dimension === 'temperature' ? 500 : 0
        const away = Math.abs(ours(value, from, to) - expected)
        expect(away).toBeLessThanOrEqual(relative * (Math.abs(expected) + offset))
      }),
      { numRuns: 40 },
    )
  })

  it('differs from UCUM in the column of mercury by its rounding and no more', () => {
    for (const code of ofMercury) {
      const theirs = ucum.convert(1, inUcum[code] ?? '', 'kPa')
      expect(Math.abs(ours(1, code, 'kPa') / theirs - 1)).toBeLessThan(3e-6)
    }
  })

  it('joins no two dimensions that UCUM keeps apart', () => {
    // mass in water and mass in a mass are apart here too, though a litre of water weighs about a kilogram
    for (const [one, other] of [
      ['mg/L', 'mg/kg'],
      ['mg/L', 'uL/L'],
      ['meq/L', 'mg/L'],
      ['L/min', 'per_min'],
      ['mg_min/L', 'mg/L'],
    ] as const) {
      expect(ucum.isConvertible(inUcum[one] ?? '', inUcum[other] ?? '')).toBe(false)
      expect(convert(1, one, other)).toMatchObject({ refusal: { code: 'dimensions-differ' } })
    }
  })
})
