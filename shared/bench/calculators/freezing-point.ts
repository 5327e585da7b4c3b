import { ok } from '../../domain/result.ts'
import {
  freezingMargin,
  freezingPoint as freezingOf,
  freezingPoint68,
} from '../../domain/seawater/freezing-point.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution } from '../definition.ts'
import { quantity } from '../inputs.ts'
import { line } from '../line.ts'

/** Nearer than this to freezing a chiller has no reserve, °C. @source project-default */
const leastReserveC = 1
const digits = 3
const marginDigits = 2

/** The temperature at which sea water freezes, and how far a cold system is from it. */
export const freezingPoint = defineCalculator({
  id: 'freezing-point',
  group: 'water',
  words: defineMessages({
    name: 'Freezing point of sea water',
    purpose: 'When sea water freezes, and how far the coldest spot of a chilled system is from it.',
    formula: 'freezing point = (−0.0575 + 0.001710523 × salinity^0.5 − 0.0002154996 × salinity) × salinity',
    'input.salinity': 'Salinity',
    'help.salinity': 'From 4 to 40. Fresh water freezes at 0 °C.',
    'input.coldest': 'Coldest spot that the water touches',
    'help.coldest': 'The surface of the chiller, not the water that leaves it.',
    'result.freezing': 'Freezing point',
    'result.margin': 'Coldest spot above it',
    'line.freezing-68': 'Freezing point on the scale of 1968',
    'line.freezing': 'Freezing point',
    'line.margin': 'Coldest spot above it',
    'caution.would-freeze':
      'The coldest spot is at or below the freezing point: ice there stops the flow and can burst a chiller. Set it warmer, or run more water over it.',
    'caution.near-freezing': (p: { reserve: string }) =>
      `Less than ${p.reserve} °C is left before ice forms (project default). A slower pump or fresher water uses that up.`,
    'caution.animals':
      'Most bony fish freeze near −0.7 °C (from memory), long before sea water does: this is a limit of the machine, not of the animals.',
  }),
  inputs: {
    salinity: quantity({ units: ['PSS-78'], limits: { min: 0, max: 40 }, reading: 'salinity' }),
    coldest: quantity({ units: ['degC', 'degF'], optional: true }),
  },
  fields: { salinityPss78: 'salinity', coldestC: 'coldest' },
  example: { salinity: { value: '33', unit: 'PSS-78' }, coldest: { value: '-1.2', unit: 'degC' } },
  sources: ['unesco-44', 'fish-freezing'],
  cautions: [{ code: 'animals', level: 'warning' }],
  plot: { vary: 'salinity', unit: 'PSS-78', from: 4, to: 40, figure: 'freezing' },
  published: ['seawater_freezing_point'],
  compute({ salinity, coldest }) {
    const water = { salinityPss78: salinity.value, gaugePressureKPa: 0 }
    const freezing = freezingOf(water)
    if (!freezing.ok) return freezing
    const on68 = freezingPoint68(salinity.value, 0)
    const s = enteredTerm(salinity)
    const figure = {
      key: 'freezing',
      value: freezing.value,
      unit: 'degC',
      figures: digits,
      kind: 'reading',
    } as const
    const working = [
      line('freezing-68', `(-0.0575 + 0.001710523 * sqrt(${s}) - 0.0002154996 * ${s}) * ${s}`, on68, 'degC'),
      line('freezing', `${valueTerm(on68, 'degC')} / 1.00024`, freezing.value, 'degC', ['freezing-68']),
    ]
    if (!coldest) return ok({ figures: [figure], working })
    const margin = freezingMargin({ ...water, coldestC: coldest.value })
    if (!margin.ok) return margin
    const cautions: BenchCaution[] =
      margin.value <= 0
        ? [{ code: 'would-freeze', level: 'warning' }]
        : margin.value < leastReserveC
          ? [{ code: 'near-freezing', level: 'warning', params: { reserve: leastReserveC } }]
          : []
    const by = `${enteredTerm(coldest)} - ${valueTerm(freezing.value, 'degC')}`
    return ok({
      figures: [
        figure,
        { key: 'margin', value: margin.value, unit: 'delta_degC', figures: marginDigits, kind: 'reading' },
      ],
      working: [...working, line('margin', by, margin.value, 'delta_degC', ['freezing'])],
      cautions,
      sources: ['project-default'],
    })
  },
})
