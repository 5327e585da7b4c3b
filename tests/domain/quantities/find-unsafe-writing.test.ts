import { describe, expect, it } from 'vitest'
import { findUnsafeWriting, type Writing } from '../../../shared/domain/quantities/find-unsafe-writing.ts'

const found = (text: string, writing: Writing) => findUnsafeWriting(text, writing).map((each) => each.code)

describe('the right column of the writing rules', () => {
  it.each<[string, Writing, string]>([
    ['1.0\u00a0mg', 'dose', 'trailing-zero'],
    ['0.440\u00a0g', 'dose', 'trailing-zero'],
    ['0.10 to 0.20', 'dose', 'trailing-zero'],
    ['.5\u00a0mg', 'dose', 'naked-point'],
    ['give .5 mg', 'prose', 'naked-point'],
    ['100000\u00a0units', 'dose', 'ungrouped-thousands'],
    ['fill to 11400 L now', 'prose', 'ungrouped-thousands'],
    ['10mg/kg', 'dose', 'no-space-before-unit'],
    ['give 10mg/kg once', 'prose', 'no-space-before-unit'],
    ['10 mg', 'dose', 'breaking-space-before-unit'],
    ['-41.0\u00a0L', 'volume', 'hyphen-for-minus'],
    ['25 ppm', 'prose', 'bare-ppm'],
    ['25ppm', 'dose', 'bare-ppm'],
    ['50\u00a0µg', 'dose', 'microgram-sign'],
    ['50 μg/L', 'prose', 'microgram-sign'],
    ['50 ug', 'prose', 'microgram-sign'],
    ['100 U', 'prose', 'unit-letter'],
    ['100,000 IU', 'prose', 'unit-letter'],
    ['5 cc', 'prose', 'cubic-centimetre'],
    ['once QD', 'prose', 'latin-frequency'],
    ['QOD', 'prose', 'latin-frequency'],
    ['q.d.', 'prose', 'latin-frequency'],
    ['SQ', 'prose', 'route-letters'],
    ['<5\u00a0mg', 'dose', 'comparison-sign'],
    ['if oxygen > 5 mg/L', 'prose', 'comparison-sign'],
    ['2\u00a0mg\u00a0+\u00a01\u00a0mg', 'dose', 'joining-sign'],
    ['11/12/26', 'prose', 'slashed-date'],
    ['CuSO4 0.44 g', 'prose', 'drug-abbreviation'],
    ['MS-222', 'prose', 'drug-abbreviation'],
    ['NaN mg', 'prose', 'not-a-number'],
    ['undefined', 'prose', 'not-a-number'],
  ])('%j as %s is %s', (text, writing, code) => {
    expect(found(text, writing)).toContain(code)
  })
})

describe('the left column of the writing rules', () => {
  it.each<[string, Writing]>([
    ['1\u00a0mg', 'dose'],
    ['0.5\u00a0mg', 'dose'],
    ['100,000\u00a0units', 'dose'],
    ['100\u00a0mg', 'dose'],
    ['10.05\u00a0mg', 'dose'],
    ['pH\u00a07.0', 'reading'],
    ['5.80\u00a0mg/L', 'reading'],
    ['250\u00a0µL/L', 'dose'],
    ['0.431\u00a0to\u00a00.449\u00a0g', 'dose'],
    ['2,220\u00a0L\u00a0±\u00a02\u00a0%', 'volume'],
    ['pH 7.0, 5.80 mg/L at 14:20 on 12 Nov 2026', 'prose'],
    ['250 µL/L (microlitres of product per litre), daily, under the skin', 'prose'],
    ['10 mg/kg × 1.35 kg = 13.5 mg = 0.59 mL of 22.7 mg/mL', 'prose'],
    ['Order TO-0734, case Q-118, version 2, e-mail dr@example.test', 'prose'],
    ['Orders / TO-0734, page 1 of 1. Copper at most 0.15 mg/L', 'prose'],
    ['Signed 14 May 2026, 14:24:07, UTC−4', 'prose'],
    ['QT-3 and its sump, tank 2.40 m × 1.20 m × 0.68 m', 'prose'],
  ])('%j as %s is safe', (text, writing) => {
    expect(findUnsafeWriting(text, writing)).toEqual([])
  })

  it('says where each form stands', () => {
    expect(findUnsafeWriting('give .5 mg or 5 cc', 'prose')).toEqual([
      { code: 'naked-point', found: '.5', at: 5 },
      { code: 'cubic-centimetre', found: '5 cc', at: 14 },
    ])
  })
})
