import type { BathProduct, Measure } from '../../domain/dose/bath-product.ts'
import { computeBathDose } from '../../domain/dose/compute-bath-dose.ts'
import { ok } from '../../domain/result.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { measuredFigure } from './parts/measured-figure.ts'
import { volumeUnits, withVolumeAsEntered } from './parts/volume-input.ts'

const ofSubstance = ['active', 'salt', 'base', 'free', 'total'] as const

/** Whatever combination of target, strength and volume a person has: the amount of product for a bath in standing water. */
export const bathDose = defineCalculator({
  id: 'bath-dose',
  group: 'dose',
  weekly: true,
  words: defineMessages({
    name: 'Bath dose',
    purpose: 'How much product to weigh or measure for a target concentration in standing water.',
    formula: 'amount = target × net volume ÷ (strength × share)',
    'input.target': 'Target in the water',
    'help.target': 'Parts per million say too little: choose mg/L or µL/L.',
    'input.basis': 'What the target is of',
    'option.basis.product': 'The product as it stands on the shelf',
    'option.basis.active': 'The active substance',
    'option.basis.salt': 'The salt or hydrate',
    'option.basis.base': 'The base',
    'option.basis.free': 'The free ion',
    'option.basis.total': 'The total of a metal',
    'input.volume': 'Net volume of the water',
    'help.volume': 'The water really there: less rock and sand, with sump and pipes.',
    'input.volumeError': 'Error of the volume',
    'input.form': 'Form of the product',
    'option.form.solid': 'Powder or crystals',
    'option.form.liquid': 'Liquid',
    'input.strength': 'Strength on the label',
    'help.strength': 'A percentage by weight of a liquid needs its density.',
    'input.strengthTolerance': 'Tolerance of the strength',
    'input.strengthOf': 'What the strength is of',
    'option.strengthOf.active': 'The active substance',
    'option.strengthOf.salt': 'The salt or hydrate',
    'option.strengthOf.base': 'The base',
    'option.strengthOf.total': 'The total of a metal',
    'input.share': 'Share of the target substance in what the label names',
    'help.share':
      'Only where the target is of one thing and the label of another: copper in its sulfate 25.45 %.',
    'input.density': 'Density of the product',
    'input.present': 'Already in the water, by a test',
    'input.division': 'Smallest step of the balance or measure',
    'result.amount': 'Product to add',
    'caution.volume': 'A wrong volume is a wrong dose: say how the volume was found, and when.',
    'caution.second':
      'Let another person work it out without seeing this figure, from the label and the mark.',
  }),
  inputs: {
    target: quantity({
      units: ['mg/L', 'uL/L', 'g/L', 'ug/L', 'mL/L', 'mL/m3', 'g/m3', 'percent_v_v'],
      limits: { above: 0 },
    }),
    basis: choice(['product', ...ofSubstance], { missing: 'basis-missing' }),
    volume: quantity({ units: volumeUnits, limits: { above: 0 }, netVolume: true }),
    volumeError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'volume',
    }),
    form: choice(['solid', 'liquid']),
    strength: quantity({
      units: ['percent_w_w', 'mg/mL', 'percent_w_v', 'g/L', 'g/mL_w_v'],
      limits: { above: 0 },
      when: { basis: ofSubstance },
    }),
    strengthTolerance: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'strength',
      when: { basis: ofSubstance },
    }),
    strengthOf: choice(['active', 'salt', 'base', 'total'], {
      when: { basis: ofSubstance },
      missing: 'strength-basis-missing',
    }),
    share: quantity({
      units: ['percent'],
      limits: { above: 0, max: 100 },
      optional: true,
      when: { basis: ofSubstance },
    }),
    density: quantity({
      units: ['g/mL', 'kg/L', 'kg/m3'],
      limits: { min: 0.5, max: 3, plausible: { min: 0.7, max: 2 } },
      optional: true,
      when: { form: ['liquid'] },
    }),
    present: quantity({
      units: ['mg/L', 'ug/L', 'g/L'],
      limits: { min: 0 },
      optional: true,
      when: { basis: ofSubstance },
    }),
    division: quantity({ units: ['g', 'mg', 'kg', 'mL', 'L', 'uL'], limits: { above: 0 }, optional: true }),
  },
  fields: { purity: 'strength', netVolume: 'volume', reading: 'present', strengthBasis: 'strengthOf' },
  example: {
    target: { value: '75', unit: 'mg/L' },
    basis: 'active',
    volume: { value: '1000', unit: 'L' },
    volumeError: { value: '5', unit: 'percent' },
    form: 'liquid',
    strength: { value: '35', unit: 'percent_w_w' },
    strengthOf: 'active',
    density: { value: '1.1317', unit: 'g/mL' },
    division: { value: '1', unit: 'mL' },
  },
  sources: ['srac-410', 'piper-1982', 'nist-sp-811'],
  cautions: [
    { code: 'volume', level: 'note' },
    { code: 'second', level: 'note' },
  ],
  carries: [{ to: 'order', target: 'target', basis: 'basis', division: 'division' }],
  published: ['bath_product_volume_mL', 'bath_product_mass', 'bath_product_mass_g', 'topup_dose_mg'],
  compute(given) {
    const { target, basis, volume, form, strength, strengthOf, share, density, present, division } = given
    const product: BathProduct = {
      form,
      ...(strength ? { strength: strength.entered } : {}),
      ...(strengthOf ? { strengthBasis: strengthOf } : {}),
      ...(share ? { share: { activeGPerMol: share.value, compoundGPerMol: 100 } } : {}),
      ...(density ? { density: density.entered } : {}),
    }
    const measure: Measure | undefined = division && { division: division.entered }
    const dose = computeBathDose({
      target: { concentration: target.entered, basis },
      netLitres: volume.value,
      product,
      ...(present ? { present: present.entered } : {}),
      ...(measure ? { measure } : {}),
    })
    if (!dose.ok) return dose
    const { amount, unit, measured, working } = dose.value
    return ok({
      figures: [measuredFigure('amount', amount, unit, measured)],
      working: withVolumeAsEntered(working, volume),
    })
  },
})
