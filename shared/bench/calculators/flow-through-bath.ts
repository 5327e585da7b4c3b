import { computeFlowThroughDose } from '../../domain/dose/compute-flow-through-dose.ts'
import { ok, refuse, type Result } from '../../domain/result.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { unitOf } from '../../domain/units/unit-of.ts'
import type { UnitCode } from '../../domain/units/unit-table.ts'
import { dripConcentration } from '../../domain/water/flow/drip-rate.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type Outcome } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { dripAnswer } from './parts/drip-answer.ts'
import { measuredFigure } from './parts/measured-figure.ts'
import {
  basisInput,
  basisWords,
  productFields,
  productInputsToFind,
  productOf,
  productWords,
  targetUnits,
} from './parts/product-input.ts'
import { formalinCautions, formalinWords } from './parts/formalin-cautions.ts'
import { volumeUnits, volumeWords } from './parts/volume-input.ts'

const flowUnits = ['L/min', 'L/h', 'm3/h', 'mL/min', 'gal_us/min'] as const
const byDrip = ['rate', 'concentration'] as const
const perThousand = 1000

/** A bath through which water flows: the drip of a stock, what primes the tank, or the product for the whole time. */
export const flowThroughBath = defineCalculator({
  id: 'flow-through-bath',
  group: 'dose',
  words: defineMessages({
    name: 'Bath with flow',
    purpose:
      'The drip of a stock into flowing water for a target, with what primes the tank and what the whole time takes.',
    search: 'formalin formaldehyde',
    formula: 'drip = flow × target ÷ (stock − target); priming = target × volume ÷ stock',
    'input.find': 'What to find',
    'option.find.rate': 'How fast the stock has to drip',
    'option.find.concentration': 'What a running pump makes',
    'option.find.product': 'The product for the whole time',
    'input.flow': 'Flow of water',
    'help.flow': 'Measured with a bucket and a watch, not read from the label of the pump.',
    'input.flowError': 'Error of the flow',
    'input.target': 'Target in the water',
    'help.target': 'Parts per million say too little: choose mg/L or µL/L.',
    'input.basis': 'What target and stock are of',
    ...basisWords,
    'input.stockStrength': 'Strength of the stock',
    'help.stockStrength': 'Of the same as the target. Undiluted product is 100 % v/v, for a target in µL/L.',
    'input.stockTolerance': 'Tolerance of the stock',
    'input.drip': 'Drip of the pump',
    ...volumeWords,
    'help.volume': 'Of the tank that the water flows through, for the priming.',
    'input.duration': 'Time that it runs',
    ...productWords,
    'input.division': 'Smallest step of the balance or measure',
    'result.drip': 'Drip of the stock',
    'result.concentration': 'Concentration that it makes',
    'result.prime': 'Stock to prime the tank with',
    'result.reach': 'Time to 95 % of the target without priming',
    'result.stock-used': 'Stock for the whole time',
    'result.drug-used': 'Of that, the substance or product itself',
    'result.amount': 'Product for the whole time, without priming',
    'line.drip': 'Drip of the stock',
    'line.concentration': 'Concentration that it makes',
    'line.prime': 'Stock to prime the tank with',
    'line.reach': 'Time to 95 % without priming',
    'line.stock-used': 'Stock for the whole time',
    'line.drug-used': 'The substance or product in it',
    'column.turnovers': 'Turnovers',
    'column.minutes': 'Time',
    'column.unprimed': 'Without priming',
    'refusal.stock-of-other-kind':
      'Give target and stock both by weight, or both by volume. Undiluted product is 100 % v/v and its target is in µL/L.',
    ...formalinWords,
    'caution.no-flow':
      'If the water stops and the pump goes on, the tank gets the stock neat. Let the pump stop with the water, or stay beside it.',
    'caution.not-primed':
      'Not primed, the tank has 63 % of the target after one turnover and 95 % after three. Type its volume for the priming, or count the time from when it is reached.',
    'caution.prime-whole':
      'Spread the priming stock over the whole tank with the animals away from where it goes in, and start the pump at once.',
    'caution.plug-flow':
      'A raceway does not mix like a tank: the target passes along it and may not be reached at its end. Test at the outlet.',
    'caution.leaves':
      'All of it leaves with the water. Know where that goes, and what the discharge permit says.',
  }),
  inputs: {
    find: choice(['rate', 'concentration', 'product']),
    flow: quantity({ units: flowUnits, limits: { above: 0, max: 100_000_000 } }),
    flowError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'flow',
    }),
    target: quantity({ units: targetUnits, limits: { above: 0 }, when: { find: ['rate', 'product'] } }),
    basis: basisInput,
    stockStrength: quantity({
      units: ['mg/mL', 'g/L', 'percent_w_v', 'percent_v_v', 'mL/L', 'g/mL_w_v'],
      limits: { above: 0, max: 1_000_000 },
      when: { find: byDrip },
    }),
    stockTolerance: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'stockStrength',
      when: { find: byDrip },
    }),
    drip: quantity({
      units: ['mL/min', 'L/h', 'L/min'],
      limits: { above: 0 },
      when: { find: ['concentration'] },
    }),
    volume: quantity({
      units: volumeUnits,
      limits: { above: 0 },
      optional: true,
      netVolume: true,
      when: { find: ['rate'] },
    }),
    duration: quantity({
      units: ['min', 'h', 'd'],
      limits: { above: 0, max: 100_000_000 },
      optional: true,
      when: { find: ['rate', 'product'] },
    }),
    ...productInputsToFind(['product']),
    division: quantity({
      units: ['g', 'mg', 'kg', 'mL', 'L', 'uL'],
      limits: { above: 0 },
      optional: true,
      when: { find: ['product'] },
    }),
  },
  fields: {
    ...productFields,
    inflowLPerMin: 'flow',
    flowLPerMin: 'flow',
    targetMgPerL: 'target',
    stockMgPerMl: 'stockStrength',
    volumeLitres: 'volume',
    dripMlPerMin: 'drip',
    minutes: 'duration',
    primingMl: 'volume',
    netVolume: 'duration',
  },
  example: {
    find: 'rate',
    flow: { value: '20', unit: 'L/min' },
    target: { value: '25', unit: 'mg/L' },
    basis: 'active',
    stockStrength: { value: '100', unit: 'mg/mL' },
    volume: { value: '2000', unit: 'L' },
    duration: { value: '60', unit: 'min' },
  },
  sources: ['stirred-tank'],
  cautions: [
    { code: 'no-flow', level: 'warning' },
    { code: 'plug-flow', level: 'note' },
    { code: 'leaves', level: 'note' },
  ],
  plot: { across: 'minutes', up: 'unprimed' },
  published: ['drip_rate_mL_per_min', 'priming_dose_mL', 'flow_through_product_total_mL'],
  compute(given) {
    const { find, flow, target, basis, stockStrength, drip, volume, duration, division } = given
    if (find === 'product') {
      if (!duration) return refuse('blank', 'duration', { unit: 'min' })
      if (!target) return refuse('blank', 'target', { unit: 'mg/L' })
      const dose = computeFlowThroughDose({
        target: { concentration: target.entered, basis },
        product: productOf(given),
        flow: flow.entered,
        duration: duration.entered,
        ...(division ? { measure: { division: division.entered } } : {}),
      })
      if (!dose.ok) return dose
      const { amount, unit, measured, working } = dose.value
      return ok({
        figures: [measuredFigure('amount', amount, unit, measured)],
        working,
        ...formalinCautions({ ...given, form: given.form ?? 'liquid' }),
      })
    }
    if (!stockStrength) return refuse('blank', 'stockStrength', { unit: 'mg/mL' })
    const kind = stockKind(stockStrength, basis)
    if (!kind.ok) return kind
    if (find === 'concentration')
      return drip
        ? made(flow, drip, { strength: stockStrength, basis }, kind.value)
        : refuse('blank', 'drip', { unit: 'mL/min' })
    if (!target) return refuse('blank', 'target', { unit: 'mg/L' })
    if (target.unit !== stockStrength.unit) return refuse('stock-of-other-kind', 'stockStrength')
    return dripAnswer({ flow, target, basis, stock: stockStrength, volume, duration, unit: kind.value })
  },
})

/** Whether a stock is by weight or by volume; by volume it can only be of the product. */
function stockKind(stock: ParsedQuantity, basis: string): Result<'mg/L' | 'uL/L'> {
  const byVolume = unitOf(stock.entered.unit).dimension === 'volumeConcentration'
  if (byVolume && basis !== 'product') return refuse('basis-not-of-unit', 'basis')
  return ok(byVolume ? 'uL/L' : 'mg/L')
}

function made(
  flow: ParsedQuantity,
  drip: ParsedQuantity,
  { strength: stock, basis }: { strength: ParsedQuantity; basis: string },
  unit: Extract<UnitCode, 'mg/L' | 'uL/L'>,
): Result<Outcome> {
  const concentration = dripConcentration({
    inflowLPerMin: flow.value,
    dripMlPerMin: drip.value * perThousand,
    // a litre of undiluted product in a litre is a million microlitres, as a kilogram is a million milligrams
    stockMgPerMl: stock.value / perThousand,
  })
  if (!concentration.ok) return concentration
  const [water, dripped, strength] = [enteredTerm(flow), enteredTerm(drip), enteredTerm(stock)]
  const to = unit === 'mg/L' ? ' to mg/L' : ''
  const expression = `${strength} * (${dripped}) / (${water} + ${dripped})${to}`
  return ok({
    figures: [{ key: 'concentration', value: concentration.value, unit, kind: 'dose' }],
    working: [line('concentration', expression, concentration.value, unit)],
    ...formalinCautions({
      target: { value: concentration.value, unit },
      basis,
      form: 'liquid',
      strength: stock,
      strengthOf: basis,
    }),
  })
}
