import { stockVolumeInBath, stockVolumeOnTop } from '../../domain/anaesthesia/stock-volume.ts'
import { checkDrift } from '../../domain/dose/check-drift.ts'
import { computeStock } from '../../domain/dose/compute-stock.ts'
import { doseLimits } from '../../domain/dose/dose-limits.ts'
import { measureAmount } from '../../domain/dose/measure-amount.ts'
import { ok, refuse, type Result } from '../../domain/result.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type Outcome } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { formalinCautions, formalinWords } from './parts/formalin-cautions.ts'
import { measuredFigure } from './parts/measured-figure.ts'
import {
  basisInput,
  basisWords,
  productFields,
  productInputsToFind,
  productOf,
  productWords,
} from './parts/product-input.ts'
import { volumeUnits, volumeWords, withVolumeAsEntered } from './parts/volume-input.ts'

const gramsPerLitre = 1000
const mlPerLitre = 1000

/** A stock solution: what goes into it, and how much of it goes into a bath. */
export const stockSolution = defineCalculator({
  id: 'stock-solution',
  group: 'dose',
  words: defineMessages({
    name: 'Stock solution',
    purpose: 'What goes into a stock solution of a strength, or how much of a stock makes a bath.',
    search: 'formalin formaldehyde',
    formula: 'product = strength of the stock × its volume ÷ strength of the product',
    'input.find': 'What to find',
    'option.find.make': 'The product for a stock',
    'option.find.use': 'The stock for a bath',
    'input.stockStrength': 'Strength of the stock',
    'input.basis': 'What its strength is of',
    'help.basis': 'For a bath, what its target is of too.',
    ...basisWords,
    'input.stockVolume': 'Volume of the finished stock',
    'input.target': 'Target in the bath',
    ...volumeWords,
    'input.way': 'How the bath is made up',
    'option.way.filled-up': 'Filled up to its volume after the stock is in',
    'option.way.on-top': 'Stock poured into water that is there',
    ...productWords,
    'input.division': 'Smallest step of the balance or measure',
    'result.amount': 'Product for the stock',
    'result.stock': 'Stock for the bath',
    'line.stock': 'Stock for the bath',
    'refusal.target-not-below-stock':
      'The target is not below the strength of the stock: no amount of it makes such a bath. Check both figures and their units.',
    ...formalinWords,
    'caution.dissolves':
      'Check that this much dissolves in this water at this temperature. What lies on the bottom is not in the dose.',
    'caution.label':
      'Label the stock with the name, the strength and of what, the date, when it goes off and who made it. Use no stock without a date.',
    'caution.fill-up': 'Put the product in first, then fill up to the volume: the product takes up room.',
    'caution.own-volume':
      'The volume of the bath has the stock in it. Poured into water that is there already, the bath comes out weaker: choose that way then.',
    'caution.raises-level': (p: { percent: string }) =>
      `The stock is more than ${p.percent} % of the water. Take as much water out first, or make a stronger stock.`,
    'caution.second':
      'Let another person work it out without seeing this figure, from the label and the mark.',
  }),
  inputs: {
    find: choice(['make', 'use']),
    stockStrength: quantity({
      units: ['g/L', 'mg/mL', 'percent_w_v', 'mg/L', 'g/mL_w_v'],
      limits: { above: 0, max: doseLimits.mostStockPerL },
    }),
    basis: basisInput,
    stockVolume: quantity({
      units: ['mL', 'L', 'gal_us', 'gal_imp'],
      limits: { above: 0 },
      when: { find: ['make'] },
    }),
    target: quantity({
      units: ['mg/L', 'g/L', 'ug/L', 'g/m3'],
      limits: { above: 0 },
      when: { find: ['use'] },
    }),
    volume: quantity({
      units: volumeUnits,
      limits: { above: 0 },
      netVolume: true,
      when: { find: ['use'] },
    }),
    volumeError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'volume',
      when: { find: ['use'] },
    }),
    way: choice(['on-top', 'filled-up'], { when: { find: ['use'] } }),
    ...productInputsToFind(['make']),
    division: quantity({ units: ['g', 'mg', 'kg', 'mL', 'L', 'uL'], limits: { above: 0 }, optional: true }),
  },
  fields: {
    ...productFields,
    targetMgPerL: 'target',
    bathLitres: 'volume',
    waterLitres: 'volume',
    stockGPerL: 'stockStrength',
  },
  example: {
    find: 'make',
    stockStrength: { value: '10', unit: 'g/L' },
    basis: 'active',
    stockVolume: { value: '500', unit: 'mL' },
    form: 'solid',
    strength: { value: '98', unit: 'percent_w_w' },
    strengthOf: 'active',
    division: { value: '0.01', unit: 'g' },
  },
  sources: ['stirred-tank', 'srac-410'],
  cautions: [
    { code: 'label', level: 'warning' },
    { code: 'second', level: 'note' },
  ],
  published: ['stock_volume_mL_simple', 'stock_volume_mL_exact'],
  compute(given) {
    const { find, stockStrength, basis, stockVolume, target, volume, way, division } = given
    if (find === 'use') {
      if (!target || !volume || !way) return refuse('blank', 'target')
      return stockInBath({ stockStrength, basis, target, volume, way, division })
    }
    if (!stockVolume) return refuse('blank', 'stockVolume')
    const stock = computeStock({
      target: { concentration: stockStrength.entered, basis },
      stockLitres: stockVolume.value,
      product: productOf(given),
      ...(division ? { measure: { division: division.entered } } : {}),
    })
    if (!stock.ok) {
      // what the engine calls the target is here the strength of the stock
      const { refusal } = stock
      return refusal.field === 'target'
        ? { ok: false, refusal: { ...refusal, field: 'stockStrength' } }
        : stock
    }
    const { amount, unit, measured, working } = stock.value
    // what is measured here is the neat product; what it makes in a bath is another question
    const neat = formalinCautions({ ...given, target: undefined, form: given.form ?? 'liquid' })
    return ok({
      figures: [measuredFigure('amount', amount, unit, measured)],
      working: withVolumeAsEntered(working, stockVolume),
      cautions: [
        { code: 'dissolves', level: 'warning' },
        { code: 'fill-up', level: 'note' },
        ...neat.cautions,
      ],
      sources: neat.sources,
    })
  },
})

interface Bath {
  stockStrength: ParsedQuantity
  /** What stock and target are of. */
  basis: string
  target: ParsedQuantity
  volume: ParsedQuantity
  way: 'on-top' | 'filled-up'
  division: ParsedQuantity | undefined
}

function stockInBath({ stockStrength, basis, target, volume, way, division }: Bath): Result<Outcome> {
  const stockGPerL = stockStrength.value / gramsPerLitre
  const asked = { targetMgPerL: target.value, stockGPerL }
  const onTop = way === 'on-top'
  const millilitres = onTop
    ? stockVolumeOnTop({ ...asked, waterLitres: volume.value })
    : stockVolumeInBath({ ...asked, bathLitres: volume.value })
  if (!millilitres.ok) return millilitres
  const measured = measureAmount(
    millilitres.value,
    'mL',
    division ? { division: division.entered } : undefined,
  )
  if (!measured.ok) return measured
  const [strength, wanted, water] = [enteredTerm(stockStrength), enteredTerm(target), enteredTerm(volume)]
  const divisor = onTop ? `(${strength} - ${wanted})` : `(${strength})`
  const level = checkDrift(
    volume.value,
    volume.value + millilitres.value / mlPerLitre,
    doseLimits.volumeDriftPercent,
  )
  const much = onTop && level.ok && !level.value.within
  const stock = { form: 'liquid', strength: stockStrength, strengthOf: basis } as const
  const asFormalin = formalinCautions({ target, basis: 'active', ...stock })
  const cautions: BenchCaution[] = [
    ...asFormalin.cautions,
    ...(much
      ? [
          {
            code: 'raises-level',
            level: 'warning',
            params: { percent: doseLimits.volumeDriftPercent },
          } as const,
        ]
      : []),
    ...(onTop ? [] : [{ code: 'own-volume', level: 'note' } as const]),
  ]
  return ok({
    figures: [measuredFigure('stock', millilitres.value, 'mL', measured.value)],
    working: [line('stock', `${wanted} * ${water} / ${divisor} to mL`, millilitres.value, 'mL')],
    cautions,
    sources: asFormalin.sources,
  })
}
