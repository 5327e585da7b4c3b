import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { findUnsafeWriting } from '../../../shared/domain/quantities/find-unsafe-writing.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { formatDoseRange } from '../../../shared/domain/quantities/format-dose-range.ts'
import { formatReading } from '../../../shared/domain/quantities/format-reading.ts'
import { formatVolume } from '../../../shared/domain/quantities/format-volume.ts'
import { formatVolumeWithError } from '../../../shared/domain/quantities/format-volume-with-error.ts'
import { formatWorkingValue } from '../../../shared/domain/quantities/format-working-value.ts'
import { formatExpression } from '../../../shared/domain/quantities/format-expression.ts'
import { unitTable, type UnitCode } from '../../../shared/domain/units/unit-table.ts'

/** No-break spaces as ~, so that a test shows where they stand. */
const seen = (text: string) => text.replaceAll('\u00a0', '~')
const codes = Object.keys(unitTable) as UnitCode[]

describe('a dose', () => {
  // left column of the ISMP list of error-prone dose designations, and this project's rules for units
  it.each<[string | number, UnitCode, string]>([
    ['1.0', 'mg', '1~mg'],
    ['.5', 'mg', ''],
    ['0.5', 'mg', '0.5~mg'],
    [0.5, 'mg', '0.5~mg'],
    ['0.440', 'g', '0.44~g'],
    ['100000', 'units', '100,000~units'],
    ['1', 'units', '1~unit'],
    ['1000', 'mg', '1,000~mg'],
    ['999', 'mg', '999~mg'],
    ['50', 'ug', '50~micrograms'],
    ['1', 'ug', '1~microgram'],
    ['2', 'mg/L', '2~mg/L'],
    ['250', 'uL/L', '250~µL/L'],
    ['0.15', 'mg/L', '0.15~mg/L'],
    ['10', 'mg/kg', '10~mg/kg'],
    ['0.10', 'mg/L', '0.1~mg/L'],
    ['99', 'percent_w_w', '99~%~w/w'],
    [0.1 + 0.2, 'g', '0.3~g'],
    [22.8, 'g', '22.8~g'],
    [1e-7, 'g', '0.0000001~g'],
    [0, 'g', '0~g'],
    [-0, 'g', '0~g'],
    [1234567.5, 'mg', '1,234,567.5~mg'],
  ])('%j %s is written %s', (value, unit, expected) => {
    if (expected === '') expect(() => formatDose(value, unit)).toThrow(RangeError)
    else expect(seen(formatDose(value, unit).text)).toBe(expected)
  })

  it('is marked as a dose, and hands over its parts', () => {
    expect(formatDose('0.440', 'g')).toEqual({
      kind: 'dose',
      text: '0.44\u00a0g',
      number: '0.44',
      symbol: 'g',
      unit: 'g',
    })
  })

  it('rounds halves up in decimal when places are asked for', () => {
    expect(formatDose(1.005, 'g', 2).number).toBe('1.01')
    expect(formatDose('2.675', 'g', 2).number).toBe('2.68')
    expect(formatDose(0.004, 'g', 2).number).toBe('0')
  })

  it('is a range with its unit once', () => {
    expect(seen(formatDoseRange('0.431', '0.449', 'g', 'to').text)).toBe('0.431~to~0.449~g')
    expect(seen(formatDoseRange('1.0', '2.0', 'mg', 'to').text)).toBe('1~to~2~mg')
  })

  it('never draws what is no number', () => {
    for (const value of [
      NaN,
      Infinity,
      -Infinity,
      '',
      'abc',
      '1e999999',
      '1,5',
      null,
      undefined,
      {},
    ] as string[])
      expect(() => formatDose(value, 'mg')).toThrow(RangeError)
  })

  it('is safe writing for every number and every unit', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-9, max: 1e12, noNaN: true }),
        fc.constantFrom(...codes),
        (value, unit) => {
          const { text } = formatDose(value, unit)
          expect(findUnsafeWriting(text, 'dose')).toEqual([])
          expect(text).not.toContain(' ')
        },
      ),
      { numRuns: 3000 },
    )
  })

  it('means the number it was given, to twelve digits', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-9, max: 1e12, noNaN: true }), (value) => {
        const back = Number(formatDose(value, 'mg').number.replaceAll(',', ''))
        expect(Math.abs(back - value)).toBeLessThanOrEqual(1e-11 * value)
      }),
    )
  })
})

describe('a reading', () => {
  it.each<[string, UnitCode, string]>([
    ['7.0', 'pH', 'pH~7.0'],
    ['5.80', 'mg/L', '5.80~mg/L'],
    ['0.00', 'mg/L', '0.00~mg/L'],
    ['25.6', 'degC', '25.6~°C'],
    ['-1.8', 'degC', '\u22121.8~°C'],
    ['1.0240', 'SG', 'SG~1.0240'],
    ['33.1', 'PSS-78', '33.1~PSS-78'],
    ['12500', 'uS/cm', '12,500~µS/cm'],
    ['128', 'mg/L_CaCO3', '128~mg/L~as~CaCO3'],
  ])('%s %s keeps the digits of its instrument: %s', (value, unit, expected) => {
    const drawn = formatReading({ value, unit })
    expect(seen(drawn.text)).toBe(expected)
    expect(drawn.kind).toBe('reading')
    expect(findUnsafeWriting(drawn.text, 'reading')).toEqual([])
  })

  it.each<[string, UnitCode, UnitCode, string]>([
    ['25.6', 'degC', 'degF', '78.1~°F'],
    ['77', 'degF', 'degC', '25.0~°C'],
    ['5.80', 'mg/L', 'ug/L', '5,800~micrograms/L'],
    ['1.35', 'kg', 'lb', '2.98~lb'],
    ['0.68', 'm', 'cm', '68~cm'],
    ['10.0', 'L', 'gal_us', '2.64~US~gal'],
  ])('%s %s in %s has the places that the step is worth: %s', (value, unit, other, expected) => {
    expect(seen(formatReading({ value, unit }, other).text)).toBe(expected)
  })

  it('cannot be drawn in a unit of another dimension', () => {
    expect(() => formatReading({ value: '1', unit: 'mg/L' }, 'kg')).toThrow(RangeError)
    expect(() => formatReading({ value: 'high', unit: 'mg/L' })).toThrow(RangeError)
  })
})

describe('a volume', () => {
  // 2,217.6 L ± 2 % and 2,220 L from the safe writing rule of the project
  it.each<[number, number, string]>([
    [2217.6, 2, '2,220~L~±~2~%'],
    [2217.6, 4, '2,220~L~±~4~%'],
    [2217.6, 10, '2,200~L~±~10~%'],
    [2217.6, 50, '2,000~L~±~50~%'],
    [11400, 1, '11,400~L~±~1~%'],
    [320, 1, '320~L~±~1~%'],
    [0.5, 3, '0.50~L~±~3~%'],
    [95, 1.25, '95~L~±~1.3~%'],
    [1958.44, 0, '1,958.4~L'],
    [100, 100, '100~L~±~100~%'],
  ])('%d L with %d %% is printed to the first digit of its error: %s', (litres, error, expected) => {
    const drawn = formatVolumeWithError(litres, error)
    expect(seen(drawn.text)).toBe(expected)
    expect(drawn.kind).toBe('volume')
    expect(findUnsafeWriting(drawn.text, 'volume')).toEqual([])
  })

  it('is never off by more than half of the first digit of its error', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 1e8, noNaN: true }),
        fc.double({ min: 0.1, max: 50, noNaN: true }),
        (litres, error) => {
          const drawn = Number(formatVolumeWithError(litres, error).number.replaceAll(',', ''))
          expect(Math.abs(drawn - litres)).toBeLessThanOrEqual(((litres * error) / 100) * 0.500001)
        },
      ),
    )
  })

  it('is drawn in the unit that a person prefers', () => {
    expect(seen(formatVolumeWithError(2217.6, 2, 'gal_us').text)).toBe('590~US~gal~±~2~%')
    expect(seen(formatVolume(1958.4).text)).toBe('1,958.4~L')
    expect(seen(formatVolume(264).text)).toBe('264.0~L')
    expect(seen(formatVolume(-41).text)).toBe('\u221241.0~L')
  })

  it('never draws what is no number', () => {
    for (const value of [NaN, Infinity, '1' as unknown as number]) {
      expect(() => formatVolumeWithError(value, 2)).toThrow(RangeError)
      expect(() => formatVolumeWithError(100, value)).toThrow(RangeError)
      expect(() => formatVolume(value)).toThrow(RangeError)
    }
    expect(() => formatVolumeWithError(100, -1)).toThrow(RangeError)
  })
})

describe('working', () => {
  it.each([
    ['2.40 m * 1.20 m * 0.68 m to L', '2.40~m~× 1.20~m~× 0.68~m'],
    ['pi / 4 * (0.057 m)^2 * 14.2 m to L', '0.7854~× (0.057~m)²~× 14.2~m'],
    ['2217.6 L * 0.05 mg/L to mg', '2,217.6~L~× 0.05~mg/L'],
    ['110.88 mg / (63.546 / 249.685) to mg', '110.88~mg~÷ (63.546~÷ 249.685)'],
    ['2217.6134567 L * 250 uL/L to mL', '2,217.6~L~× 250~µL/L'],
    ['1958.4 L - 41 L + 264 L to L', '1,958.4~L~\u2212 41~L~+ 264~L'],
    ['25000 gal / (400 gal/minute) to minute', '25,000~US gal~÷ 400~US gal/min'],
    ['pi * (0.5 m)^2 * 1e-7 m to L', '3.1416~× (0.5~m)²~× 0.0000001~m'],
    ['80 mg/L * (1 - 30 / 100)^(4)', '80~mg/L~× (1~− 30~÷ 100)^4'],
    ['100 * (1 - 30 / 100)^(25)', '100~× (1~− 30~÷ 100)^25'],
    ['100 * (1 - 30 / 100)^(2)', '100~× (1~− 30~÷ 100)²'],
    ['2^(-30 hour / (12 hour)) * 100', '2^(−30~h~÷ 12~h)~× 100'],
  ])('%s is written %s', (expression, expected) => {
    expect(seen(formatExpression(expression))).toBe(expected)
  })

  it('writes one of something in the singular', () => {
    expect(seen(formatExpression('400 g / (0.1 kg) * 1 day to day'))).toBe('400~g~÷ 0.1~kg~× 1~day')
    expect(seen(formatExpression('21 day * 1.0 ug / 1 ug'))).toBe('21~days~× 1.0~micrograms~÷ 1~microgram')
  })

  it.each([
    ['water-rectangular', 1958.4, 'L', '1,958.4~L', 'volume'],
    ['water-pipe', 36.2352, 'L', '36.2~L', 'volume'],
    ['water-pipe', 0.43518, 'L', '0.4352~L', 'volume'],
    ['net-volume', 2217.6, 'L', '2,217.6~L', 'volume'],
    ['active-needed', 110.88, 'mg', '110.9~mg', 'dose'],
    ['product-mass', 0.435678, 'g', '0.4357~g', 'dose'],
    ['active-share', 25.4505, 'percent', '25.45~%', 'dose'],
    ['product-mass', 22.8, 'g', '22.8~g', 'dose'],
    ['product-mass', 15, 'g', '15~g', 'dose'],
    ['product-mass', 0, 'g', '0~g', 'dose'],
  ] as const)('the answer of %s, %d %s, is drawn %s', (code, value, unit, expected, kind) => {
    const drawn = formatWorkingValue({ code, value, unit })
    expect(seen(drawn.text)).toBe(expected)
    expect(drawn.kind).toBe(kind)
  })
})
