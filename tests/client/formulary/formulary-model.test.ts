import { describe, expect, it } from 'vitest'
import type { DoseLine, Product } from '../../../shared/contracts/formulary.contract.ts'
import { defaultDoseLines } from '../../../shared/domain/formulary/default-dose-lines.ts'
import { sources } from '../../../shared/domain/sources.ts'
import { rangeOfLine, useOfLine } from '../../../src/features/formulary/dose-line-text.ts'
import { matchingLines, matchingProducts } from '../../../src/features/formulary/formulary-model.ts'

const lines: DoseLine[] = defaultDoseLines.map((line) => ({
  ...line,
  citation: sources[line.source].citation,
  state: 'default',
  confirmedBy: null,
  confirmedAt: null,
}))
const plain = (text: string) => text.replaceAll('\u00a0', ' ')

describe('a dose line in words', () => {
  it('says a range with its unit once, an upper limit as one, and never a trailing zero', () => {
    expect(plain(rangeOfLine({ low: 2, high: 10, unit: 'mg/L' }))).toBe('2 to 10 mg/L')
    expect(plain(rangeOfLine({ low: null, high: 250, unit: 'uL/L' }))).toBe('up to 250 µL/L')
    expect(plain(rangeOfLine({ low: 0.5, high: 0.5, unit: 'mg/L' }))).toBe('0.5 mg/L')
    for (const line of lines) expect(rangeOfLine(line), line.id).not.toMatch(/\d\.\d*0\b|(^|\s)\.\d/)
  })

  it('has words for every use of the project’s lines', () => {
    for (const line of lines) expect(useOfLine(line), line.id).not.toBe(line.use)
  })
})

describe('the formulary searched', () => {
  it('finds lines by every typed word, in drug, use or source', () => {
    const found = matchingLines(lines, { q: 'FORMALIN bath' })
    expect(found.length).toBeGreaterThan(0)
    expect(found.every((line) => line.agent === 'formalin')).toBe(true)
    expect(matchingLines(lines, { q: '529.1030' }).length).toBeGreaterThan(0)
    expect(matchingLines(lines, { q: 'nothing like this' })).toEqual([])
    expect(matchingLines(lines, {})).toHaveLength(lines.length)
  })

  it('filters by drug and by standing', () => {
    expect(matchingLines(lines, { agent: 'praziquantel' }).length).toBeGreaterThan(0)
    expect(matchingLines(lines, { agent: 'praziquantel', state: 'confirmed' })).toEqual([])
  })

  it('finds products by name and by lot', () => {
    const product = {
      agent: 'praziquantel',
      productName: 'Powder of the treatment room',
      lots: [{ lotNumber: 'PZ-0317' }],
    } as Product
    expect(matchingProducts([product], { q: 'pz-03' })).toEqual([product])
    expect(matchingProducts([product], { q: 'treatment room' })).toEqual([product])
    expect(matchingProducts([product], { agent: 'formalin' })).toEqual([])
  })
})
