import { describe, expect, it } from 'vitest'
import { measuredVolume } from '../../../shared/bench/calculators/measured-volume.ts'
import type { VolumeSheet } from '../../../shared/domain/water/volume-sheet.ts'
import { computeVolume } from '../../../shared/domain/water/compute-volume.ts'
import { readInputs } from '../../../shared/bench/read-inputs.ts'
import { ask, bodyOf, refusalsOf } from './ask.ts'

const codesOf = async (given: Record<string, string>) =>
  (await ask('measured-volume', given)).cautions.map((one) => `${one.level} ${one.code}`)

/** The sheet that the result is carried with to the volume of a water. */
function sheetOf(given: Record<string, string>): VolumeSheet {
  const [carry] = measuredVolume.carries ?? []
  const { read } = readInputs(measuredVolume, bodyOf(given))
  if (carry?.to !== 'volume' || !carry.sheet) throw new Error('carries no sheet')
  return carry.sheet(read as never)
}

describe('a measured volume', () => {
  const meter = { method: 'meter', startReading: '12.345 m3', endReading: '14.845 m3', error: '2 percent' }
  const salt = { method: 'salt', saltMass: '5 kg', before: '1.2 g/L', after: '3.2 g/L' }
  const dye = { method: 'dye', dyeAmount: '500 mg', before: '0 mg/L', after: '0.2 mg/L' }

  it('by a meter is the difference of its readings, with its error as the range', async () => {
    // 14.845 − 12.345 m³ = 2,500 L; 2 % of it is 50 L, by hand
    const { figures, range } = await ask('measured-volume', meter)
    expect(figures[0]).toMatchObject({ key: 'net', unit: 'L', rounded: '2500' })
    expect(range?.low).toBeCloseTo(2450, 9)
    expect(range?.high).toBeCloseTo(2550, 9)
  })
  it('by a steady flow is flow times time', async () => {
    const flow = { method: 'flow-time', flow: '25 L/min', duration: '1.5 h', error: '5 percent' }
    const { figures, range } = await ask('measured-volume', flow)
    expect(figures[0].value).toBeCloseTo(2250, 9)
    expect(range?.high).toBeCloseTo(2362.5, 9)
  })
  it('by salt is V = m ÷ ΔS', async () => {
    // the identity that the reference names for a salt dilution: 5,000 g ÷ 2 g/L = 2,500 L
    const { figures, range } = await ask('measured-volume', salt)
    expect(figures.map(({ key, value }) => [key, value])).toEqual([
      ['net', expect.closeTo(2500, 9)],
      ['rise', expect.closeTo(2000, 9)],
    ])
    expect(range).toBeNull()
    const moist = await ask('measured-volume', { ...salt, purity: '90 percent_w_w' })
    expect(moist.figures[0].value).toBeCloseTo(2250, 9)
  })
  it('by salt has the errors of both readings and of the mass at the worst', async () => {
    const { range, figures } = await ask('measured-volume', {
      ...salt,
      readingError: '0.1 g/L',
      error: '1 percent',
    })
    expect(range?.low).toBeCloseTo((5000 * 0.99) / 2.2, 9)
    expect(range?.high).toBeCloseTo((5000 * 1.01) / 1.8, 9)
    expect(figures[0].rounded).toBe('2500')
  })
  it('by dye takes the dye itself, or millilitres of its solution', async () => {
    expect((await ask('measured-volume', dye)).figures[0].value).toBeCloseTo(2500, 9)
    const solution = { ...dye, dyeAmount: '25 mL', dyeStrength: '20 g/L' }
    expect((await ask('measured-volume', solution)).figures[0].value).toBeCloseTo(2500, 9)
  })
  it('goes on to the volume of a water with its readings and its error', () => {
    expect(sheetOf(meter)).toMatchObject({
      method: 'metered',
      endReading: { value: '14.845', unit: 'm3' },
      errorPercent: 2,
    })
    const dilution = sheetOf({ ...salt, readingError: '0.1 g/L', purity: '90 percent_w_w' })
    const volume = computeVolume(dilution)
    expect(volume).toMatchObject({ ok: true, value: { method: 'salt-dilution' } })
    if (!volume.ok) return
    expect(volume.value.netLitres).toBeCloseTo(2250, 6)
    // 4,500 g ÷ 1.8 and ÷ 2.2 g/L are 2,500 and 2,045.5 L; the wider side is 250 L, 11.1 %
    expect(volume.value.errorPercent).toBeCloseTo(11.11, 2)
    expect(sheetOf(dye)).toMatchObject({ method: 'stated', errorPercent: 0 })
    expect(sheetOf({ method: 'flow-time', flow: '25 L/min', duration: '90 min' })).toMatchObject({
      method: 'stated',
      volume: { value: '2250', unit: 'L' },
    })
  })
  it('says what each way does not see', async () => {
    expect(await codesOf(meter)).toEqual(expect.arrayContaining(['warning whole-fill', 'note second']))
    expect(await codesOf({ ...meter, error: '' })).toContain('warning error-not-stated')
    expect(await codesOf(meter)).not.toContain('warning error-not-stated')
    expect(await codesOf({ method: 'flow-time', flow: '25 L/min', duration: '90 min' })).toContain(
      'warning flow-falls',
    )
    expect(await codesOf(salt)).toEqual(expect.arrayContaining(['warning mixed', 'warning salt-treats']))
    expect(await codesOf(dye)).toEqual(expect.arrayContaining(['warning mixed', 'warning taken-up']))
    expect(await codesOf({ ...salt, readingError: '0.1 g/L' })).toContain('warning wide')
    expect(await codesOf({ ...salt, readingError: '0.01 g/L' })).not.toContain('warning wide')
  })
  it.each([
    ['a meter that runs backwards', { ...meter, endReading: '12 m3' }, 'endReading meter-runs-backwards'],
    ['no rise', { ...salt, after: '1.2 g/L' }, 'after reading-did-not-rise'],
    [
      'a rise that the readings could have made alone',
      { ...salt, readingError: '1 g/L' },
      'readingError rise-within-error',
    ],
    ['a practical salinity', { ...salt, after: '3.2 PSS-78' }, 'after dimensions-differ'],
    [
      'millilitres of dye without a strength',
      { ...dye, dyeAmount: '25 mL' },
      'dyeStrength dye-strength-missing',
    ],
    ['no flow', { method: 'flow-time', flow: '0 L/min', duration: '1 h' }, 'flow not-above-zero'],
    ['a thimble', { ...salt, saltMass: '1 mg' }, 'saltMass volume-not-of-a-tank'],
    ['a gallon of no country', { ...meter, endReading: '20000 gal' }, 'endReading gallon-not-stated'],
  ])('refuses %s', (_, given, refused) => {
    expect(refusalsOf('measured-volume', given)).toEqual([refused])
  })
})
