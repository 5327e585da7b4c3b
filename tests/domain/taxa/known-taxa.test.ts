import { describe, expect, it } from 'vitest'
import { knownTaxa } from '../../../shared/domain/taxa/known-taxa.ts'
import { judgeWeight } from '../../../shared/domain/animals/judge-weight.ts'
import { convert } from '../../../shared/domain/units/convert.ts'

const inKg = (value: string, unit: 'g' | 'kg') => {
  const kg = convert(Number(value), unit, 'kg')
  if (!kg.ok) throw new Error(kg.refusal.code)
  return kg.value
}

describe('the starting list of taxa', () => {
  it('names each taxon once, in its own words', () => {
    for (const name of ['scientificName', 'commonName'] as const) {
      const names = knownTaxa.map((taxon) => taxon[name].toLowerCase())
      expect(new Set(names).size).toBe(names.length)
    }
    expect(knownTaxa.length).toBeGreaterThanOrEqual(42)
  })

  it('bounds weights the right way round, and believes the single adult weights that were read', () => {
    for (const { scientificName, weight, source } of knownTaxa) {
      if (!weight) continue
      const band = { lowKg: inKg(weight.low, weight.unit), highKg: inKg(weight.high, weight.unit) }
      expect(band.lowKg, scientificName).toBeGreaterThan(0)
      expect(band.highKg, scientificName).toBeGreaterThan(band.lowKg)
      const read = /: ([\d.]+) kg$/.exec(source)?.[1]
      // near its own maximum a fish may lie just outside; nobody would be refused a dose for it
      if (read) {
        const judged = judgeWeight(Number(read), band, Number(read))
        expect(judged.ok && judged.value.verdict, scientificName).not.toBe('needs-confirmation')
      }
    }
  })

  it('claims no more than memory for its ranges', () => {
    expect(new Set(knownTaxa.map((taxon) => taxon.mark))).toEqual(new Set(['M']))
  })
})
