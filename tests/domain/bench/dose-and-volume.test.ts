import { describe, expect, it } from 'vitest'
import { convert } from '../../../shared/domain/units/convert.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { unitTable, type UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { evaluate } from '../../../shared/bench/evaluate.ts'
import { unitConversion } from '../../../shared/bench/calculators/unit-conversion.ts'
import { verifyWorking } from '../../../server/platform/arithmetic/verify-working.ts'
import { ask, refusalsOf } from './ask.ts'

const peroxide = {
  target: '75 mg/L',
  basis: 'active',
  volume: '1000 L',
  form: 'liquid',
  strength: '35 percent_w_w',
  strengthOf: 'active',
}

describe('the bath dose', () => {
  it('takes hydrogen peroxide by weight with its density', async () => {
    // 21 CFR 529.1150(a): 396.1 mg/mL of a 35 % w/w solution; 75 mg/L × 1,000 L ÷ 396.1 mg/mL = 189.35 mL (computed)
    const answer = await ask('bath-dose', { ...peroxide, density: '1.1317 g/mL' })
    expect(answer.figures[0].value).toBeCloseTo(189.35, 1)
  })

  it('reads formalin in three ways that differ by 2.7 times', async () => {
    // 25 mL, 23.1 mL and 62.6 mL for 1,000 L: the table of three readings of "25 ppm" (computed; 37 % w/w, 1.08 g/mL)
    const common = { volume: '1000 L', form: 'liquid' }
    const byVolume = await ask('bath-dose', { ...common, target: '25 uL/L', basis: 'product' })
    const byMass = await ask('bath-dose', {
      ...common,
      target: '25 mg/L',
      basis: 'product',
      density: '1.08 g/mL',
    })
    const active = { basis: 'active', strength: '37 percent_w_w', strengthOf: 'active', density: '1.08 g/mL' }
    const formaldehyde = await ask('bath-dose', { ...common, target: '25 mg/L', ...active })
    const shown = [byVolume, byMass, formaldehyde].map(({ figures }) => Number(figures[0].value.toFixed(1)))
    expect(shown).toEqual([25, 23.1, 62.6])
  })

  it('carries both errors to the result as the widest range', async () => {
    const errors = { volumeError: '5 percent', strengthTolerance: '2 percent', density: '1.1317 g/mL' }
    const { range, figures } = await ask('bath-dose', { ...peroxide, ...errors })
    const value = figures[0].value
    expect(range?.low).toBeCloseTo((value * 0.95) / 1.02, 6)
    expect(range?.high).toBeCloseTo((value * 1.05) / 0.98, 6)
    expect(figures[0]).toMatchObject({ significantFigures: 2, rounded: '190' })
  })

  it.each([
    ['a bare ppm', { target: '25 ppm' }, 'target bare-ppm'],
    ['a gallon of no country', { volume: '1000 gal' }, 'volume gallon-not-stated'],
    ['a bare percentage', { strength: '35 %' }, 'strength percent-not-stated'],
    ['35 % by weight without a density', {}, 'density density-missing'],
    [
      'more than the product holds',
      { density: '1.13 g/mL', strength: '120 percent_w_w' },
      'strength strength-above-all',
    ],
    ['more water than there is', { volume: '1000000000 L', density: '1.1 g/mL' }, 'volume above-most'],
    [
      'a test at the target',
      { present: '75 mg/L', density: '1.1 g/mL' },
      'present reading-at-or-above-target',
    ],
  ])('refuses %s', (_, given, refused) => {
    expect(refusalsOf('bath-dose', { ...peroxide, ...given })).toEqual([refused])
  })
})

describe('copper sulfate', () => {
  const given = { product: 'pentahydrate', targetOf: 'copper', target: '0.2 mg/L', volume: '11400 L' }
  it('gives the grams for 0.2 mg/L in 11,400 L', async () => {
    // 2,280 mg Cu ÷ 0.2545 (63.546/249.685, IUPAC abridged weights; computed) = 8.958 g
    const answer = await ask('copper-sulfate', { ...given, division: '0.1 g' })
    expect(answer.figures[0].value).toBeCloseTo(8.9585, 3)
    expect(answer.figures[0].rounded).toBe('9.0')
  })
  it('tops up from a reading', async () => {
    // check value cu.02: 0.8924 g ± 0.001 for 1,000 US gallons from 0.14 to 0.2 mg/L (computed)
    const more = { measured: '0.14 mg/L', volume: '1000 gal_us' }
    const answer = await ask('copper-sulfate', { ...given, ...more })
    expect(Math.abs(answer.figures[0].value - 0.8924)).toBeLessThanOrEqual(0.001)
    expect(answer.working[0]?.expression).toBe('1000 gal to L')
  })
  it.each([
    [
      'an ionic target for a chelated product',
      { product: 'chelated' },
      'product ionic-target-chelated-product',
    ],
    ['a target of unstated basis', { targetOf: '' }, 'targetOf copper-basis-not-stated'],
    ['a reading above the target', { measured: '0.25 mg/L' }, 'measured reading-at-or-above-target'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('copper-sulfate', { ...given, ...change })).toEqual([refused])
  })
})

describe('the volume of a tank', () => {
  // check values geom.*: closed forms that agree with numerical integration (computed)
  it.each([
    [{ shape: 'rectangular', length: '120 cm', width: '50 cm', depth: '45 cm' }, 270],
    [{ shape: 'cylindrical', diameter: '7.5 m', depth: '2 m' }, 88_357.293],
    [{ shape: 'half-cylindrical', diameter: '100 cm', depth: '60 cm' }, 235.619],
    [{ shape: 'cone-bottom', diameter: '1 m', coneHeight: '0.3 m', depth: '1.3 m' }, 863.938],
    [
      { shape: 'bow-front', length: '100 cm', sideWidth: '40 cm', centreWidth: '50 cm', depth: '50 cm' },
      233.598,
    ],
    [{ shape: 'elliptical', longAxis: '150 cm', shortAxis: '90 cm', depth: '70 cm' }, 742.201],
    [{ shape: 'polygon', sides: '8 ratio', measured: 'side', side: '30 cm', depth: '50 cm' }, 217.279],
    [{ shape: 'truncated-cone', topDiameter: '1.2 m', bottomDiameter: '0.8 m', depth: '0.8 m' }, 636.696],
    [{ shape: 'spherical-cap', radius: '0.5 m', depth: '0.3 m' }, 113.097],
    [{ shape: 'horizontal-cylinder', diameter: '1.45 m', length: '10 m', depth: '1.25 m' }, 15_138],
  ])('of %o', async (given, litres) => {
    const { figures, cautions } = await ask('tank-volume', given)
    expect(Math.abs(figures[0].value - litres)).toBeLessThanOrEqual(litres > 10_000 ? 0.5 : 0.001)
    expect(cautions[0]?.code).toBe('displacement-not-measured')
  })
  it('adds sump and pipes and takes off what is displaced', async () => {
    // check value geom.23: 299.4 L (computed)
    const tank = { shape: 'rectangular', length: '120 cm', width: '50 cm', depth: '45 cm' }
    const system = { displaced: '12 percent', sump: '60 L', bore: '50 mm', pipeLength: '0.916732 m' }
    const { figures } = await ask('tank-volume', { ...tank, ...system })
    expect(Math.abs(figures[0].value - 299.4)).toBeLessThanOrEqual(0.001)
  })
  it.each([
    [
      { shape: 'horizontal-cylinder', diameter: '1 m', length: '2 m', depth: '1.2 m' },
      'depth deeper-than-shape',
    ],
    [
      { shape: 'horizontal-cylinder', diameter: '1 m', length: '-2 m', depth: '0.5 m' },
      'length not-above-zero',
    ],
    [
      { shape: 'cylindrical', diameter: '1 m', depth: '1 m', displaced: '105 percent' },
      'displaced above-most',
    ],
    [{ shape: 'cylindrical', diameter: '1 m', depth: '1 m', bore: '50 mm' }, 'pipeLength blank'],
  ])('refuses %o', (given, refused) => {
    expect(refusalsOf('tank-volume', given)).toEqual([refused])
  })
})

describe('unit conversion', () => {
  const codes = (Object.keys(unitTable) as UnitCode[]).filter(
    (code) => unitOf(code).dimension !== 'pureNumber',
  )
  it('converts between all units of a kind, borne out by mathjs', async () => {
    for (const from of codes)
      for (const to of codes.filter((code) => unitOf(code).dimension === unitOf(from).dimension)) {
        const evaluation = evaluate(unitConversion, { from: quantityOf(7.25, from), to })
        if (!evaluation.ok) throw new Error(`${from} ${to} ${JSON.stringify(evaluation.refusals)}`)
        const expected = convert(7.25, from, to)
        expect(evaluation.answer.figures[0].value).toBe(expected.ok ? expected.value : NaN)
        const verified = await verifyWorking(evaluation.answer.working)
        if (!verified.ok) throw new Error(`${from} ${to} ${JSON.stringify(verified.disagreements)}`)
      }
  })
  it('refuses to join two kinds', () => {
    expect(refusalsOf('unit-conversion', { from: '1 mg/L', to: 'kg' })).toEqual(['to dimensions-differ'])
    expect(refusalsOf('unit-conversion', { from: '1 ppm', to: 'mg/L' })).toEqual(['from bare-ppm'])
    expect(refusalsOf('unit-conversion', { from: '-5 L', to: 'mL' })).toEqual(['from below-least'])
    expect(refusalsOf('unit-conversion', { from: '-500 degF', to: 'degC' })).toEqual([
      'from below-absolute-zero',
    ])
  })
})
