import { describe, expect, it } from 'vitest'
import { verifyWorking } from '../../../server/platform/arithmetic/verify-working.ts'
import { computeBathDose, type BathDoseInput } from '../../../shared/domain/dose/compute-bath-dose.ts'
import { computeFlowThroughDose } from '../../../shared/domain/dose/compute-flow-through-dose.ts'
import { computeTopUp } from '../../../shared/domain/dose/compute-top-up.ts'
import { concentrationReached } from '../../../shared/domain/dose/concentration-reached.ts'
import { formatExpression } from '../../../shared/domain/quantities/format-expression.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { formatWorkingValue } from '../../../shared/domain/quantities/format-working-value.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { workingLabels } from '../../../shared/messages/working.ts'
import { copper, formalin, peroxide, praziquantel, q } from '../../builders/baths.ts'

function dosed(input: BathDoseInput) {
  const result = computeBathDose(input)
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
  return result.value
}

const shown = (input: BathDoseInput) =>
  dosed(input).working.map((line) =>
    [workingLabels[line.code](line.params), formatExpression(line.expression), formatWorkingValue(line).text]
      .join(' | ')
      .replaceAll('\u00a0', ' '),
  )

describe('a bath by the active substance', () => {
  it('2 mg/L in 11,400 L is 22.8 g', () => {
    const dose = dosed(praziquantel)
    expect(dose.amount).toBeCloseTo(22.8, 12)
    expect(dose.measured).toEqual(q('22.8', 'g'))
    expect(dose.range?.low).toBeCloseTo(22.344, 9)
    expect(dose.range?.high).toBeCloseTo(23.256, 9)
  })

  it('copper goes through its share in the pentahydrate and the purity of the lot', () => {
    const dose = dosed(copper)
    // 2,217.6 L × 0.05 mg/L = 110.88 mg; ÷ 0.254505 = 435.67 mg; ÷ 0.99 = 0.44007 g (by hand)
    expect(dose.amount).toBeCloseTo(0.440068, 5)
    expect(dose.measured).toEqual(q('0.440', 'g'))
    expect(formatDose(dose.measured?.value ?? '', 'g').text).toBe('0.44\u00a0g')
    expect(shown(copper)).toEqual([
      'Net volume used | 2,217.6 L | 2,217.6 L',
      'Rise needed | 0.05 mg/L − 0.00 mg/L | 0.05 mg/L',
      'Active substance needed | 2,217.6 L × 0.05 mg/L | 110.9 mg',
      'Share of active substance | 63.546 ÷ 249.685 × 100 | 25.45 %',
      'Product | 110.88 mg ÷ (63.546 ÷ 249.685) | 435.7 mg',
      'Product at its purity | 435.7 mg ÷ (99 ÷ 100) | 0.4401 g',
    ])
  })

  it('35 % hydrogen peroxide is 396.1 mg/mL by its density, not 350', () => {
    expect(dosed(peroxide).amount).toBeCloseTo(189.35, 2)
    expect(shown(peroxide).at(-2)).toBe(
      'Strength from % w/w and density | 35 ÷ 100 × 1.1317 g/mL | 396.1 mg/mL',
    )
    const labelled = dosed({
      ...peroxide,
      product: { form: 'liquid', strength: q('396.1', 'mg/mL'), strengthBasis: 'active' },
    })
    expect(labelled.amount).toBeCloseTo(189.35, 2)
    const weak = dosed({
      ...peroxide,
      product: { form: 'liquid', strength: q('3', 'percent_w_v'), strengthBasis: 'active' },
    })
    expect(weak.amount).toBeCloseTo(2500, 9)
  })

  it('a target of the salt takes no share, a target of the base does', () => {
    // chloroquine 319.87 in its diphosphate 515.87
    const share = { activeGPerMol: 319.87, compoundGPerMol: 515.87 }
    const product = {
      form: 'solid',
      strength: q('100', 'percent_w_w'),
      strengthBasis: 'salt',
      share,
    } as const
    const of = (basis: 'salt' | 'base', value: string) =>
      dosed({ target: { concentration: q(value, 'mg/L'), basis }, netLitres: 1000, product }).amount
    expect(of('salt', '10')).toBeCloseTo(10, 9)
    expect(of('base', '6.2')).toBeCloseTo(10, 2)
  })

  it('is one dose whatever unit the target, the strength and the purity are in', () => {
    const grams = dosed(praziquantel).amount
    for (const [value, unit] of [
      ['2000', 'ug/L'],
      ['0.002', 'g/L'],
      ['2', 'g/m3'],
    ] as const)
      expect(
        dosed({ ...praziquantel, target: { concentration: q(value, unit), basis: 'active' } }).amount,
      ).toBeCloseTo(grams, 9)
    const strong = { ...praziquantel.product, strength: q('1000', 'mg/g_w_w') }
    expect(dosed({ ...praziquantel, product: strong }).amount).toBeCloseTo(grams, 9)
  })
})

describe('a bath by the product', () => {
  it('150 µL/L in 320 L is 48 mL', () => {
    const dose = dosed(formalin)
    expect(dose).toMatchObject({ amount: 48, unit: 'mL', measured: q('48', 'mL') })
    expect(dose.range).toBeUndefined()
    expect(shown(formalin)).toEqual([
      'Net volume used | 320 L | 320.0 L',
      'Product | 320 L × 150 µL/L | 48 mL',
    ])
  })

  it('the three readings of “25” in 1,000 L differ, and each is said', () => {
    const product = {
      form: 'liquid',
      strength: q('37', 'percent_w_w'),
      strengthBasis: 'active',
      density: q('1.08', 'g/mL'),
    } as const
    const of = (unit: UnitCode, basis: 'product' | 'active') =>
      dosed({ target: { concentration: q('25', unit), basis }, netLitres: 1000, product }).amount
    expect(of('uL/L', 'product')).toBeCloseTo(25, 9)
    expect(of('mg/L', 'product')).toBeCloseTo(23.148, 3)
    expect(of('mg/L', 'active')).toBeCloseTo(62.56, 2)
  })

  it('mg of a powder per litre takes no purity', () => {
    const dose = dosed({
      target: { concentration: q('167', 'mg/L'), basis: 'product' },
      netLitres: 500,
      product: { form: 'solid' },
    })
    expect(dose).toMatchObject({ amount: 83.5, unit: 'g' })
  })
})

describe('water changes and flow', () => {
  const { netLitres: _, volumeErrorPercent: __, ...bath } = praziquantel

  it('a top-up doses only the water that was replaced', () => {
    const top = computeTopUp({
      ...bath,
      changed: q('300', 'L'),
      netLitres: 1000,
      measure: { division: q('0.01', 'g') },
    })
    expect(top).toMatchObject({ ok: true, value: { unit: 'g', measured: q('0.60', 'g') } })
    expect(computeTopUp({ ...bath, changed: q('1001', 'L'), netLitres: 1000 })).toMatchObject({
      refusal: { code: 'changed-more-than-volume', field: 'changed' },
    })
    expect(computeTopUp({ ...bath, changed: q('0', 'L'), netLitres: 1000 })).toMatchObject({
      refusal: { code: 'not-above-zero', field: 'changed' },
    })
  })

  it('a flow-through bath doses what flows past', async () => {
    const dose = computeFlowThroughDose({
      target: { concentration: q('1667', 'uL/L'), basis: 'product' },
      product: { form: 'liquid' },
      flow: q('5', 'gal_us/min'),
      duration: q('15', 'min'),
    })
    if (!dose.ok) throw new Error(dose.refusal.code)
    expect(dose.value.amount).toBeCloseTo(473.27, 2)
    expect(await verifyWorking(dose.value.working)).toEqual({ ok: true })
  })
})

describe('what an amount makes of the water', () => {
  it.each<[string, Parameters<typeof concentrationReached>[0], number]>([
    [
      '0.44 g of pentahydrate, 99 %, as copper',
      { amount: q('0.44', 'g'), basis: 'free', netLitres: 2217.6, product: copper.product },
      0.04999,
    ],
    [
      '25 mL of formalin in 1,000 L, as formaldehyde',
      {
        amount: q('25', 'mL'),
        basis: 'active',
        netLitres: 1000,
        product: {
          form: 'liquid',
          strength: q('37', 'percent_w_w'),
          strengthBasis: 'active',
          density: q('1.08', 'g/mL'),
        },
      },
      9.99,
    ],
    [
      '25 mL of formalin in 1,000 L, as product',
      {
        amount: q('25', 'mL'),
        basis: 'product',
        netLitres: 1000,
        product: { form: 'liquid', density: q('1.08', 'g/mL') },
      },
      27,
    ],
    [
      '22.8 g of a pure powder in 11,400 L',
      { amount: q('22.8', 'g'), basis: 'active', netLitres: 11400, product: praziquantel.product },
      2,
    ],
  ])('%s', async (_, input, expected) => {
    const reached = concentrationReached(input)
    if (!reached.ok) throw new Error(reached.refusal.code)
    expect(reached.value.mgPerL).toBeCloseTo(expected, 4)
    expect(await verifyWorking(reached.value.working)).toEqual({ ok: true })
  })

  it('is refused as the dose is', () => {
    const sound = { amount: q('1', 'g'), basis: 'free', netLitres: 100, product: copper.product } as const
    const refused = (change: object) => {
      const result = concentrationReached({ ...sound, ...change })
      return result.ok ? 'answered' : result.refusal.code
    }
    expect(refused({ netLitres: 0 })).toBe('not-above-zero')
    expect(refused({ amount: q('1', 'mL') })).toBe('volume-unit-for-solid')
    expect(refused({ amount: q('0', 'g') })).toBe('not-above-zero')
    expect(refused({ product: { ...copper.product, share: undefined } })).toBe('share-missing')
    expect(refused({ product: { ...copper.product, strengthBasis: undefined } })).toBe(
      'strength-basis-missing',
    )
    expect(refused({ product: { ...copper.product, strengthBasis: 'total' } })).toBe(
      'ionic-target-chelated-product',
    )
    expect(refused({ product: { form: 'liquid' }, amount: q('1', 'mL'), basis: 'product' })).toBe(
      'density-missing',
    )
    expect(refused({ product: { form: 'liquid' }, amount: q('1', 'mL'), basis: 'active' })).toBe(
      'strength-missing',
    )
  })
})

describe('every line is borne out by the second evaluation', () => {
  it.each([praziquantel, copper, formalin, peroxide])('bath %#', async (input) => {
    expect(await verifyWorking(dosed(input).working)).toEqual({ ok: true })
  })
})
