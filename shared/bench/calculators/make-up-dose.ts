import type { BathDose } from '../../domain/dose/bath-dose.ts'
import { computeBathDose } from '../../domain/dose/compute-bath-dose.ts'
import { computeMakeUpAfterChange, computeMakeUpAfterLoss } from '../../domain/dose/compute-make-up.ts'
import { computeTopUp } from '../../domain/dose/compute-top-up.ts'
import { ok, refuse, type Result } from '../../domain/result.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { measuredFigure } from './parts/measured-figure.ts'
import {
  basisInput,
  basisWords,
  productFields,
  productInputs,
  productOf,
  productWords,
  targetUnits,
} from './parts/product-input.ts'
import { formalinCautions, formalinWords } from './parts/formalin-cautions.ts'
import { volumeInputs, volumeUnits, volumeWords, withVolumeAsEntered } from './parts/volume-input.ts'

const tested = ['mg/L', 'ug/L', 'g/L'] as const

/** The product to put back so that a bath is at its target again: after a water change, by a test, or by an expected loss. */
export const makeUpDose = defineCalculator({
  id: 'make-up-dose',
  group: 'dose',
  words: defineMessages({
    name: 'Make-up dose',
    purpose:
      'How much product brings a bath back to its target: for the water that was changed, by a test, or for a loss that is expected.',
    search: 'top-up formalin ppm',
    formula: 'amount = (target − what is left) × net volume ÷ strength; of a change, target × water changed',
    'input.after': 'What is made up for',
    'option.after.change': 'Water that was changed',
    'option.after.test': 'What a test shows to be missing',
    'option.after.half-life': 'A loss that is expected, not measured',
    'input.target': 'Target in the water',
    'help.target': 'Parts per million say too little: choose mg/L or µL/L.',
    'input.basis': 'What the target is of',
    ...basisWords,
    ...volumeWords,
    'input.changed': 'Water taken out and replaced',
    'help.changed': 'Only what was replaced by water without the drug. What evaporated took no drug with it.',
    'input.changedError': 'Error of the water replaced',
    'input.before': 'Concentration before the change, by a test',
    'help.before': 'Left open, the bath is taken to have been at its target.',
    'input.measured': 'Concentration now, by a test',
    'help.measured': 'On the same basis as the target.',
    'input.halfLife': 'Half-life in this water',
    'input.elapsed': 'Time since the bath was at its target',
    ...productWords,
    'input.division': 'Smallest step of the balance or measure',
    'result.amount': 'Product to add',
    'caution.taken-at-target':
      'The bath is taken to have been at its target before the change: what was lost otherwise is not in this. Where a test exists, test after the change and make up by the test.',
    'caution.not-measured':
      'Nothing was measured. Warm, lit or filtered water can lose a drug much faster than cold, dark water, or not at all: where a test exists, test first. Made up for a loss that did not happen, the bath is too strong.',
    ...formalinWords,
    'caution.order': 'Whether a bath is made up at all, and how often, is for the order to say.',
    'caution.volume': 'A wrong volume is a wrong dose: say how the volume was found, and when.',
  }),
  inputs: {
    after: choice(['change', 'test', 'half-life']),
    target: quantity({ units: targetUnits, limits: { above: 0 } }),
    basis: basisInput,
    ...volumeInputs,
    changed: quantity({ units: volumeUnits, limits: { above: 0 }, when: { after: ['change'] } }),
    changedError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'changed',
      when: { after: ['change'] },
    }),
    before: quantity({ units: tested, limits: { min: 0 }, optional: true, when: { after: ['change'] } }),
    measured: quantity({ units: tested, limits: { min: 0 }, when: { after: ['test'] } }),
    halfLife: quantity({
      units: ['h', 'd', 'min'],
      limits: { above: 0, max: 60_000_000 },
      when: { after: ['half-life'] },
    }),
    elapsed: quantity({
      units: ['h', 'd', 'min'],
      limits: { above: 0, max: 60_000_000 },
      when: { after: ['half-life'] },
    }),
    ...productInputs,
    division: quantity({ units: ['g', 'mg', 'kg', 'mL', 'L', 'uL'], limits: { above: 0 }, optional: true }),
  },
  fields: { ...productFields, reading: 'measured' },
  example: {
    after: 'change',
    target: { value: '2', unit: 'mg/L' },
    basis: 'active',
    volume: { value: '1000', unit: 'L' },
    changed: { value: '300', unit: 'L' },
    before: { value: '1.6', unit: 'mg/L' },
    form: 'solid',
    strength: { value: '98', unit: 'percent_w_w' },
    strengthOf: 'active',
    division: { value: '0.01', unit: 'g' },
  },
  sources: ['stirred-tank', 'srac-410'],
  cautions: [
    { code: 'order', level: 'note' },
    { code: 'volume', level: 'note' },
  ],
  carries: [{ to: 'order', target: 'target', basis: 'basis', division: 'division' }],
  published: ['topup_dose_mg'],
  compute(given) {
    const { target, basis, volume, division } = given
    const dose = doseFor(given, {
      target: { concentration: target.entered, basis },
      netLitres: volume.value,
      product: productOf(given),
      ...(division ? { measure: { division: division.entered } } : {}),
    })
    if (!dose.ok) return dose
    const { amount, unit, measured, working } = dose.value
    // of a change alone the first line is the water that was changed, not the volume of the bath
    const first = given.after === 'change' && !given.before ? (given.changed ?? volume) : volume
    const byVolume = formalinCautions(given)
    return ok({
      figures: [measuredFigure('amount', amount, unit, measured)],
      working: withVolumeAsEntered(working, first),
      cautions: [...unmeasured(given), ...byVolume.cautions],
      sources: byVolume.sources,
    })
  },
})

interface Loss {
  after: 'change' | 'test' | 'half-life'
  changed: ParsedQuantity | undefined
  before: ParsedQuantity | undefined
  measured: ParsedQuantity | undefined
  halfLife: ParsedQuantity | undefined
  elapsed: ParsedQuantity | undefined
}

function doseFor(loss: Loss, bath: Parameters<typeof computeBathDose>[0]): Result<BathDose> {
  const { after, changed, before, measured, halfLife, elapsed } = loss
  if (after === 'change') {
    if (!changed) return refuse('blank', 'changed')
    return before
      ? computeMakeUpAfterChange({ ...bath, changed: changed.entered, before: before.entered })
      : computeTopUp({ ...bath, changed: changed.entered })
  }
  if (after === 'test')
    return measured ? computeBathDose({ ...bath, present: measured.entered }) : refuse('blank', 'measured')
  return halfLife && elapsed
    ? computeMakeUpAfterLoss({ ...bath, halfLife: halfLife.entered, elapsed: elapsed.entered })
    : refuse('blank', 'halfLife')
}

function unmeasured({ after, before }: Loss): BenchCaution[] {
  if (after === 'half-life') return [{ code: 'not-measured', level: 'warning' }]
  return after === 'change' && !before ? [{ code: 'taken-at-target', level: 'warning' }] : []
}
