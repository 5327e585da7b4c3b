import fc from 'fast-check'
import { beforeAll, describe, expect, it } from 'vitest'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { workOutArithmetic } from '../../../src/lib/arithmetic.ts'
import { quantityTools } from '../../../src/lib/quantity-tools.ts'

// the module takes a second to load, and much longer on a busy machine
beforeAll(async () => {
  await import('mathjs')
}, 60_000)

async function worked(typed: string, unit: UnitCode, gallon?: 'us' | 'imperial'): Promise<string> {
  const answer = await workOutArithmetic(typed, unit, gallon ? { gallon } : {})
  return answer.ok ? answer.value.text : answer.refusal.code
}

describe('arithmetic in a number field', () => {
  it.each<[string, UnitCode, string]>([
    ['2.4 * 1.2', 'm', '2.88'],
    ['2,4 × 1,2', 'm', '2.88'],
    ['2.4 x 1.2', 'm', '2.88'],
    ['0.1 + 0.2', 'g', '0.3'],
    ['(120 + 80) / 4', 'L', '50'],
    ['-5 + 2', 'L', '-3'],
    ['7 − 2', 'L', '5'],
    ['12 L + 500 mL', 'L', '12.5'],
    ['38 gal(US) + 12 L', 'L', '155.845647792'],
    ['38 US gal + 12 L', 'L', '155.845647792'],
    ['10 imperial gal', 'L', '45.4609'],
    ['2 ft + 6 in', 'm', '0.762'],
    ['2.4 m * 1.2 m * 0.68 m', 'L', '1958.4'],
    ['120 cm * 50 cm * 45 cm', 'gal_us', '71.3264541367'],
    ['2 mg/L * 11400 L', 'g', '22.8'],
    ['5 mg / 2 L', 'mg/L', '2.5'],
    ['250 µL/L + 0.1 mL/L', 'uL/L', '350'],
    ['250 µL/L * 500 L', 'mL', '125'],
    ['3 kg + 250 g', 'g', '3250'],
    ['1 lb', 'g', '453.59237'],
    ['50 % + 2 %', 'percent', '52'],
    ['90 min + 1 h', 'h', '2.5'],
    ['7.1 + 0.2', 'pH', '7.3'],
    ['2(3 + 4)', 'L', '14'],
  ])('%s in a field of %s is %s', async (typed, unit, text) => {
    expect(await worked(typed, unit)).toBe(text)
  })

  it('takes a bare gallon only where the facility says which', async () => {
    expect(await worked('38 gal + 12 L', 'L')).toBe('gallon-not-stated')
    expect(await worked('38 gal + 12 L', 'L', 'us')).toBe('155.845647792')
    expect(await worked('38 gal + 12 L', 'L', 'imperial')).toBe('184.75142')
  })

  it.each<[string, UnitCode, string]>([
    ['25 ppm * 4', 'mg/L', 'bare-ppm'],
    ['2 cc + 1 mL', 'mL', 'write-millilitres'],
    ['38 L + 12', 'L', 'arithmetic-units-do-not-fit'],
    ['2 L + 3 g', 'L', 'arithmetic-units-do-not-fit'],
    ['2 m * 3 m', 'L', 'arithmetic-units-do-not-fit'],
    ['5 m / 2 m', 'm', 'arithmetic-units-do-not-fit'],
    ['2 kg', 'pH', 'arithmetic-units-do-not-fit'],
    ['20 °C + 5 °C', 'degC', 'arithmetic-with-temperatures'],
    ['33 psu + 1', 'PSS-78', 'arithmetic-unit-not-usable'],
    ['5 % * 20 L', 'L', 'percent-not-stated'],
    ['1 / 0', 'L', 'not-finite'],
    ['0 / 0', 'L', 'not-finite'],
    ['1,250 * 2', 'L', 'thousands-or-decimal'],
    ['1.2.3 * 2', 'L', 'two-separators'],
    ['2 *', 'L', 'arithmetic-not-readable'],
    ['(2 + 3', 'L', 'arithmetic-not-readable'],
    ['2 ^ 3', 'L', 'arithmetic-not-readable'],
    ['a = 3', 'L', 'unknown-unit'],
    ['import("fs")', 'L', 'unknown-unit'],
    ['evaluate("1")', 'L', 'unknown-unit'],
    ['[1, 2]', 'L', 'arithmetic-not-readable'],
    ['"2"', 'L', 'arithmetic-not-readable'],
    ['2; 3', 'L', 'arithmetic-not-readable'],
    ['{a: 1}', 'L', 'arithmetic-not-readable'],
    ['pi * 2', 'L', 'unknown-unit'],
    ['e + 1', 'L', 'unknown-unit'],
    ['5!', 'L', 'arithmetic-not-readable'],
    ['1e3 * 2', 'L', 'unknown-unit'],
    ['   ', 'L', 'blank'],
    ['1+'.repeat(150), 'L', 'too-long'],
  ])('%s in a field of %s is refused as %s', async (typed, unit, code) => {
    expect(await worked(typed, unit)).toBe(code)
  })

  it('adds and multiplies like numbers do', async () => {
    const hundredths = fc.integer({ min: 1, max: 1_000_000 })
    await fc.assert(
      fc.asyncProperty(hundredths, hundredths, async (a, b) => {
        const [first, second] = [(a / 100).toFixed(2), (b / 100).toFixed(2)]
        expect(Number(await worked(`${first} L + ${second} L`, 'L'))).toBeCloseTo((a + b) / 100, 6)
        expect(Number(await worked(`${first} * ${second}`, 'L')) / ((a * b) / 10_000)).toBeCloseTo(1, 9)
      }),
      { numRuns: 100 },
    )
  })

  it('never answers with anything but a finite number, whatever is typed', async () => {
    const characters = fc.constantFrom(...'0123456789.,+-*/()^!% LmgkxE=;[]{}"\'\\µ°'.split(''))
    await fc.assert(
      fc.asyncProperty(fc.string({ unit: characters, maxLength: 20 }), async (typed) => {
        const answer = await workOutArithmetic(typed, 'L', { gallon: 'us' })
        if (answer.ok) expect(Number.isFinite(answer.value.value)).toBe(true)
        else expect(answer.refusal.code).toMatch(/^[a-z-]+$/)
      }),
      { numRuns: 500 },
    )
  })
})

describe('the tools of number fields', () => {
  it('say their refusals in words', async () => {
    const tools = quantityTools()
    expect(await tools.evaluate('2 L + 3 g', 'L')).toEqual({
      ok: false,
      says: 'The units do not fit together, or do not give L. Give a unit to each number of a sum, or to none.',
    })
    expect(await tools.evaluate('2 * 3', 'furlong')).toEqual({ ok: false })
    expect(await quantityTools('us').evaluate('38 gal + 12 L', 'L')).toEqual({
      ok: true,
      value: '155.845647792',
    })
  })

  it('convert digits by the table of units', () => {
    const tools = quantityTools()
    expect(tools.convert('0.68', 'm', 'cm')).toEqual({ ok: true, value: '68' })
    expect(tools.convert('1', 'gal_us', 'L')).toEqual({ ok: true, value: '3.785411784' })
    expect(tools.convert('1', 'mg/L', 'kg')).toMatchObject({ ok: false, says: expect.stringMatching(/list/) })
    expect(tools.convert('1', 'mg/L', 'nothing')).toEqual({ ok: false })
  })
})
