import { describe, expect, it } from 'vitest'
import { computeBathDose, type BathDoseInput } from '../../../shared/domain/dose/compute-bath-dose.ts'
import { copper, formalin, peroxide, praziquantel, q } from '../../builders/baths.ts'

describe('bad input to a bath', () => {
  const with_ = (base: BathDoseInput, change: object) => ({ ...base, ...change }) as BathDoseInput
  const target = (value: unknown, unit: unknown, basis: unknown = 'active') =>
    ({ target: { concentration: { value, unit }, basis } }) as object
  const product = (base: BathDoseInput, change: object) => ({ product: { ...base.product, ...change } })

  it.each<[string, BathDoseInput, string, string | undefined]>([
    ['no water', with_(praziquantel, { netLitres: 0 }), 'not-above-zero', 'netVolume'],
    ['negative water', with_(praziquantel, { netLitres: -1 }), 'not-above-zero', 'netVolume'],
    ['NaN water', with_(praziquantel, { netLitres: NaN }), 'not-finite', 'netVolume'],
    ['endless water', with_(praziquantel, { netLitres: Infinity }), 'not-finite', 'netVolume'],
    ['water as text', with_(praziquantel, { netLitres: '11400' }), 'not-finite', 'netVolume'],
    ['an ocean', with_(praziquantel, { netLitres: 1e12 }), 'above-most', 'netVolume'],
    ['no target', with_(praziquantel, target('0', 'mg/L')), 'not-above-zero', 'target'],
    ['negative target', with_(praziquantel, target('-2', 'mg/L')), 'not-above-zero', 'target'],
    ['absurd target', with_(praziquantel, target('2', 'mg/mL_')), 'unknown-unit', 'target'],
    ['grams for milligrams', with_(praziquantel, target('200', 'g/L')), 'above-most', 'target'],
    ['bare ppm', with_(formalin, target('25', 'ppm', 'product')), 'bare-ppm', 'target'],
    ['no basis', with_(praziquantel, target('2', 'mg/L', null)), 'basis-missing', 'basis'],
    ['a made-up basis', with_(praziquantel, target('2', 'mg/L', 'pure')), 'basis-missing', 'basis'],
    ['no basis by volume', with_(formalin, target('150', 'uL/L', null)), 'basis-missing', 'basis'],
    ['µL/L of the active', with_(formalin, target('150', 'uL/L', 'active')), 'basis-not-of-unit', 'basis'],
    ['µL/L of a powder', with_(formalin, { product: { form: 'solid' } }), 'volume-unit-for-solid', 'target'],
    [
      'no strength',
      with_(praziquantel, product(praziquantel, { strength: undefined })),
      'strength-missing',
      'strength',
    ],
    [
      'strength 0',
      with_(praziquantel, product(praziquantel, { strength: q('0', 'percent_w_w') })),
      'not-above-zero',
      'purity',
    ],
    [
      'strength above all of it',
      with_(praziquantel, product(praziquantel, { strength: q('120', 'percent_w_w') })),
      'strength-above-all',
      'purity',
    ],
    [
      'strength 100.1 % of a liquid',
      with_(peroxide, product(peroxide, { strength: q('100.1', 'percent_w_w') })),
      'strength-above-all',
      'strength',
    ],
    [
      'more in a millilitre than it weighs',
      with_(peroxide, product(peroxide, { strength: q('1200', 'mg/mL') })),
      'strength-above-all',
      'strength',
    ],
    [
      'more in a millilitre than anything weighs',
      with_(peroxide, { product: { form: 'liquid', strength: q('2100', 'mg/mL'), strengthBasis: 'active' } }),
      'strength-above-all',
      'strength',
    ],
    [
      'a bare percentage',
      with_(peroxide, product(peroxide, { strength: { value: '35', unit: '%' } })),
      'percent-not-stated',
      'strength',
    ],
    [
      '35 % w/w without density',
      with_(peroxide, product(peroxide, { density: undefined })),
      'density-missing',
      'density',
    ],
    [
      'density of lead',
      with_(peroxide, product(peroxide, { density: q('11.3', 'g/mL') })),
      'above-most',
      'density',
    ],
    ['density 0', with_(peroxide, product(peroxide, { density: q('0', 'g/mL') })), 'below-least', 'density'],
    [
      'a powder by mg/mL',
      with_(praziquantel, product(praziquantel, { strength: q('10', 'mg/mL') })),
      'strength-unit-not-usable',
      'strength',
    ],
    [
      'strength of what?',
      with_(copper, product(copper, { strengthBasis: undefined })),
      'strength-basis-missing',
      'strengthBasis',
    ],
    [
      'copper without its share',
      with_(copper, product(copper, { share: undefined })),
      'share-missing',
      'share',
    ],
    [
      'a share above one',
      with_(copper, product(copper, { share: { activeGPerMol: 250, compoundGPerMol: 63 } })),
      'share-outside-range',
      'share',
    ],
    [
      'a share of nothing',
      with_(copper, product(copper, { share: { activeGPerMol: 0, compoundGPerMol: 63 } })),
      'share-outside-range',
      'share',
    ],
    [
      'a share that is none',
      with_(copper, product(copper, { share: { activeGPerMol: NaN, compoundGPerMol: Infinity } })),
      'share-outside-range',
      'share',
    ],
    [
      'the ionic target with a chelated product',
      with_(copper, product(copper, { strengthBasis: 'total' })),
      'ionic-target-chelated-product',
      'basis',
    ],
    [
      'a reading at the target',
      with_(copper, { present: q('0.05', 'mg/L') }),
      'reading-at-or-above-target',
      'reading',
    ],
    [
      'a reading above it',
      with_(copper, { present: q('0.3', 'mg/L') }),
      'reading-at-or-above-target',
      'reading',
    ],
    ['a negative reading', with_(copper, { present: q('-0.1', 'mg/L') }), 'below-least', 'reading'],
    [
      'a reading of formalin',
      with_(formalin, { present: q('1', 'uL/L') }),
      'reading-not-comparable',
      'reading',
    ],
    [
      'a target above the strength',
      with_(peroxide, {
        ...target('50', 'g/L'),
        product: { form: 'liquid', strength: q('3', 'percent_w_v'), strengthBasis: 'active' },
      }),
      'target-above-strength',
      'target',
    ],
    ['an error of 120 %', with_(praziquantel, { volumeErrorPercent: 120 }), 'error-outside-range', 'error'],
    ['an error NaN', with_(praziquantel, { volumeErrorPercent: NaN }), 'error-outside-range', 'error'],
    [
      'a balance for a liquid',
      with_(formalin, { measure: { division: q('0.1', 'g') } }),
      'division-of-other-kind',
      'division',
    ],
    [
      'a balance without steps',
      with_(praziquantel, { measure: { division: q('0', 'g') } }),
      'division-not-positive',
      'division',
    ],
    [
      'too little to weigh',
      with_(copper, { measure: { division: q('0.1', 'g') } }),
      'too-little-to-measure',
      'division',
    ],
  ])('%s is refused by name', (_, input, code, field) => {
    const result = computeBathDose(input)
    expect(result.ok ? result.value : result.refusal).toMatchObject({ code, field })
  })

  it('a target at the strength of the product cannot be reached, one just below it can', () => {
    const of = (value: string) =>
      computeBathDose({
        target: { concentration: q(value, 'g/L'), basis: 'active' },
        netLitres: 10,
        product: { form: 'liquid', strength: q('3', 'percent_w_v'), strengthBasis: 'active' },
      })
    expect(of('30')).toMatchObject({ ok: false, refusal: { code: 'target-above-strength' } })
    expect(of('29.999')).toMatchObject({ ok: true })
  })

  it('ten divisions are enough, nine are not', () => {
    const of = (division: string) =>
      computeBathDose({ ...praziquantel, netLitres: 500, measure: { division: q(division, 'g') } })
    expect(of('0.1')).toMatchObject({ ok: true, value: { measured: q('1.0', 'g') } })
    expect(of('0.11')).toMatchObject({ ok: false, refusal: { params: { least: 1.1, unit: 'g' } } })
  })
})
