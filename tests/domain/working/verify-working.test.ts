import { describe, expect, it } from 'vitest'
import { verifyWorking } from '../../../server/platform/arithmetic/verify-working.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import { unitTable, type UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { canonicalUnit } from '../../../shared/domain/units/unit-table.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { expressionUnit } from '../../../shared/domain/working/expression-unit.ts'
import { valueTerm } from '../../../shared/domain/working/value-term.ts'
import type { WorkingLine } from '../../../shared/domain/working/working-line.ts'

const line = (
  expression: string,
  value: number,
  unit: UnitCode,
  more: Partial<WorkingLine> = {},
): WorkingLine => ({
  key: 'amount',
  code: 'product-mass',
  params: {},
  expression,
  value,
  unit,
  rests: [],
  ...more,
})

async function why(...lines: WorkingLine[]): Promise<string[]> {
  const verified = await verifyWorking(lines)
  return verified.ok ? [] : verified.disagreements.map((each) => each.why)
}

describe('the second evaluation', () => {
  it('bears out a right line, whatever units it is in', async () => {
    expect(await why(line('2 mg/L * 11400 L to g', 22.8, 'g'))).toEqual([])
    expect(await why(line('100 impgal to L', 454.609, 'L'))).toEqual([])
    expect(await why(line('63.546 / 249.685 * 100', 25.450467589162344, 'percent'))).toEqual([])
    expect(await why(line('250 uL/L * 500 L to mL', 125, 'mL'))).toEqual([])
  })

  it('finds a line whose value is off by a millionth, a factor of ten, or a unit', async () => {
    expect(await why(line('2 mg/L * 11400 L to g', 22.8 * (1 + 1e-6), 'g'))).toEqual(['different'])
    expect(await why(line('2 mg/L * 11400 L to g', 228, 'g'))).toEqual(['different'])
    expect(await why(line('2 mg/L * 11400 L to g', 22.8, 'mg'))).toEqual(['different'])
    expect(await why(line('2 mg/L * 11400 L to g', -22.8, 'g'))).toEqual(['different'])
    expect(await why(line('2 mg/L * 11400 L to g', NaN, 'g'))).toEqual(['different'])
  })

  it('says what it found', async () => {
    expect(await verifyWorking([line('2 mg/L * 11400 L to g', 23, 'g')])).toEqual({
      ok: false,
      disagreements: [
        {
          key: 'amount',
          expression: '2 mg/L * 11400 L to g',
          stated: 23,
          found: expect.closeTo(22.8),
          why: 'different',
        },
      ],
    })
  })

  it('finds a line whose units do not make its unit', async () => {
    expect(await why(line('2 mg/L * 11400 g to g', 22.8, 'g'))).toEqual(['not-evaluable'])
    expect(await why(line('2 mg/L * 11400 L', 22.8, 'percent'))).toEqual(['not-evaluable'])
    expect(await why(line('22.8', 22.8, 'g'))).toEqual(['not-evaluable'])
    expect(await why(line('', 0, 'g'))).toEqual(['form-not-allowed'])
  })

  it.each([
    'import("fs")',
    'evaluate("1 g")',
    'a = 3',
    'f(x) = x',
    '[1, 2]',
    '"22.8 g"',
    '3!',
    '5 > 3',
    'true ? 1 g : 2 g',
    'e * 1 g',
    'i * 1 g',
    '1 furlong to g',
    'random() * 1 g',
    'sin(1) * 1 g',
    'sqrt.constructor("return 1")()',
    '{a: 1}',
    '5 % 3 * 1 g',
  ])('does not evaluate %s', async (expression) => {
    expect(['form-not-allowed', 'not-evaluable']).toContain((await why(line(expression, 1, 'g')))[0])
  })

  it('finds a line that does not take the value it says it rests on', async () => {
    const volume = line('2 m * 1 m * 0.5 m to L', 1000, 'L', { key: 'net', code: 'net-volume' })
    const dose = (expression: string, value: number) => line(expression, value, 'g', { rests: ['net'] })
    expect(await why(volume, dose('2 mg/L * 1000 L to g', 2))).toEqual([])
    expect(await why(volume, dose('2 mg/L * 11000 L to g', 22))).toEqual(['does-not-rest-on-earlier-line'])
    expect(await why(volume, dose('2 mg/L * 900 L to g', 1.8))).toEqual(['does-not-rest-on-earlier-line'])
    expect(await why(dose('2 mg/L * 1000 L to g', 2), volume)).toContain('does-not-rest-on-earlier-line')
    expect(await why(volume, { ...volume })).toEqual(['key-not-unique'])
  })

  // mathjs has its own table of units, so this is a second opinion on ours
  it.each((Object.keys(unitTable) as UnitCode[]).filter((code) => expressionUnit(code)))(
    'knows %s with the same factor',
    async (code) => {
      const canonical = canonicalUnit[unitOf(code).dimension]
      const ours = convert(7, code, canonical)
      if (!ours.ok) throw new Error(ours.refusal.code)
      const dimensionless = unitOf(code).dimension === 'volumeConcentration'
      const perBodyMass = unitOf(code).dimension === 'bodyDose'
      const expression = dimensionless
        ? `${valueTerm(7, code)} * 1 L to uL`
        : perBodyMass
          ? valueTerm(7, code)
          : `${valueTerm(7, code)} to ${expressionUnit(canonical)}`
      expect(await verifyWorking([line(expression, ours.value, dimensionless ? 'uL' : canonical)])).toEqual({
        ok: true,
      })
    },
  )
})
