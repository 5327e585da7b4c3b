import type { Measure } from '../../domain/dose/bath-product.ts'
import { computeBathDose } from '../../domain/dose/compute-bath-dose.ts'
import { ok } from '../../domain/result.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator } from '../definition.ts'
import { quantity } from '../inputs.ts'
import { measuredFigure } from './parts/measured-figure.ts'
import {
  basisInput,
  basisWords,
  ofSubstance,
  productFields,
  productInputs,
  productOf,
  productWords,
  targetUnits,
} from './parts/product-input.ts'
import { formalinCautions, formalinWords } from './parts/formalin-cautions.ts'
import { volumeInputs, volumeWords, withVolumeAsEntered } from './parts/volume-input.ts'

/** Whatever combination of target, strength and volume a person has: the amount of product for a bath in standing water. */
export const bathDose = defineCalculator({
  id: 'bath-dose',
  group: 'dose',
  weekly: true,
  words: defineMessages({
    name: 'Bath dose',
    purpose: 'How much product to weigh or measure for a target concentration in standing water.',
    search: 'formalin formaldehyde hydrogen peroxide praziquantel ppm',
    formula: 'amount = target × net volume ÷ (strength × share)',
    'input.target': 'Target in the water',
    'help.target': 'Parts per million say too little: choose mg/L or µL/L.',
    'input.basis': 'What the target is of',
    ...basisWords,
    ...volumeWords,
    ...productWords,
    'input.present': 'Concentration there already, by a test',
    'input.division': 'Smallest step of the balance or measure',
    'result.amount': 'Product to add',
    ...formalinWords,
    'caution.volume': 'A wrong volume is a wrong dose: say how the volume was found, and when.',
    'caution.second':
      'Let another person work it out without seeing this figure, from the label and the mark.',
  }),
  inputs: {
    target: quantity({ units: targetUnits, limits: { above: 0 } }),
    basis: basisInput,
    ...volumeInputs,
    ...productInputs,
    present: quantity({
      units: ['mg/L', 'ug/L', 'g/L'],
      limits: { min: 0 },
      optional: true,
      when: { basis: ofSubstance },
    }),
    division: quantity({ units: ['g', 'mg', 'kg', 'mL', 'L', 'uL'], limits: { above: 0 }, optional: true }),
  },
  fields: { ...productFields, reading: 'present' },
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
  published: ['bath_product_volume_mL', 'bath_product_mass', 'bath_product_mass_g'],
  compute(given) {
    const { target, basis, volume, present, division } = given
    const measure: Measure | undefined = division && { division: division.entered }
    const dose = computeBathDose({
      target: { concentration: target.entered, basis },
      netLitres: volume.value,
      product: productOf(given),
      ...(present ? { present: present.entered } : {}),
      ...(measure ? { measure } : {}),
    })
    if (!dose.ok) return dose
    const { amount, unit, measured, working } = dose.value
    return ok({
      figures: [measuredFigure('amount', amount, unit, measured)],
      working: withVolumeAsEntered(working, volume),
      ...formalinCautions(given),
    })
  },
})
