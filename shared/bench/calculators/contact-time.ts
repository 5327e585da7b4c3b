import {
  bafflingFactors,
  contactTimeValue,
  effectiveMinutes,
  minutesForContactTime,
  residualForContactTime,
} from '../../domain/disinfection/contact-time.ts'
import { disinfectionLimits } from '../../domain/disinfection/disinfection-limits.ts'
import { ok, refuse, type Result } from '../../domain/result.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { waterLimits } from '../../domain/water/water-limits.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type BenchLine, type Figure } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { volumeUnits } from './parts/volume-input.ts'

const overTime = ['ct', 'residual'] as const
const { mostResidualMgPerL, mostMinutes, mostFlowLPerMin, leastBaffling, mostBaffling } = disinfectionLimits
/** A CT is a plain number in the working; this takes the units off it, or puts them on. */
const oneOfExposure = '(1 mg/L * 1 minute)'

/** What a residual of chlorine or ozone has the time to do, and what is needed for a wanted contact time. */
export const contactTime = defineCalculator({
  id: 'contact-time',
  group: 'water',
  words: defineMessages({
    name: 'Contact time (CT)',
    purpose:
      'Residual times time, in a chamber with flow or in a still bath, or what is needed for a wanted CT.',
    formula: 'CT = residual × baffling factor × volume ÷ flow',
    'input.find': 'What to find',
    'option.find.ct': 'The contact time that there is',
    'option.find.residual': 'The residual that is needed',
    'option.find.minutes': 'The minutes that are needed',
    'input.residual': 'Residual at the end of the contact',
    'help.residual': 'By a test, not what was dosed.',
    'input.target': 'CT that is wanted',
    'help.target': 'For the organism, at this temperature and pH, from the work that the protocol names.',
    'input.contact': 'Where the contact is',
    'option.contact.flow': 'A chamber with flow',
    'option.contact.still': 'A still bath or bucket',
    'input.volume': 'Volume of the chamber',
    'input.volumeError': 'Error of the volume',
    'input.flow': 'Flow through the chamber',
    'input.baffling': 'How the water goes through',
    'option.baffling.unbaffled': 'Unbaffled, a bare tank: 0.1 (from memory)',
    'option.baffling.poor': 'Poor, an inlet and an outlet apart: 0.3 (from memory)',
    'option.baffling.average': 'Average, some baffles: 0.5 (from memory)',
    'option.baffling.superior': 'Superior, baffles all through: 0.7 (from memory)',
    'option.baffling.plug-flow': 'Plug flow, a long pipe: 1 (from memory)',
    'option.baffling.own': 'A factor found by a tracer',
    'input.factor': 'Baffling factor',
    'input.time': 'Time of the contact',
    'result.ct': 'Contact time',
    'result.residual': 'Residual needed',
    'result.minutes': 'Minutes that count',
    'line.minutes': 'Minutes that nine tenths of the water stay',
    'line.ct': 'Residual times minutes',
    'line.residual': 'Residual needed',
    'line.needed': 'Minutes needed',
    'caution.end-of-contact':
      'The residual is what a test finds at the end of the contact. What was dosed is used up on the way.',
    'caution.factor-from-memory':
      'The baffling factor is a grade from memory. A tracer test of this chamber is worth more.',
    'caution.ozone-in-sea-water':
      'Ozone in sea water makes bromine and bromate (common practice, from memory): measure total residual oxidants.',
    'caution.under-treatment': 'Do not feed an oxidant into a system under drug treatment.',
    'caution.temperature': 'The same CT does less in cold water, at another pH, or against another organism.',
  }),
  inputs: {
    find: choice(['ct', 'residual', 'minutes']),
    residual: quantity({
      units: ['mg/L', 'ug/L', 'g/L'],
      limits: { min: 0, max: mostResidualMgPerL, plausible: { max: 5000 } },
      when: { find: ['ct', 'minutes'] },
    }),
    target: quantity({
      units: ['mg_min/L'],
      limits: { min: 0, max: mostResidualMgPerL * mostMinutes },
      when: { find: ['residual', 'minutes'] },
    }),
    contact: choice(['flow', 'still'], { when: { find: overTime } }),
    volume: quantity({
      units: volumeUnits,
      limits: { above: 0, max: waterLimits.mostLitres },
      when: { find: overTime, contact: ['flow'] },
    }),
    volumeError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'volume',
      when: { find: overTime, contact: ['flow'] },
    }),
    flow: quantity({
      units: ['L/min', 'L/h', 'm3/h', 'mL/min', 'gal_us/min'],
      limits: { above: 0, max: mostFlowLPerMin },
      when: { find: overTime, contact: ['flow'] },
    }),
    baffling: choice(['unbaffled', 'poor', 'average', 'superior', 'plug-flow', 'own'], {
      when: { find: overTime, contact: ['flow'] },
    }),
    factor: quantity({
      units: ['ratio'],
      limits: { min: leastBaffling, max: mostBaffling },
      when: { find: overTime, contact: ['flow'], baffling: ['own'] },
    }),
    time: quantity({
      units: ['min', 's', 'h', 'd'],
      limits: { above: 0, max: mostMinutes },
      when: { find: overTime, contact: ['still'] },
    }),
  },
  fields: {
    residualMgPerL: 'residual',
    ctMgMinPerL: 'target',
    contactVolumeLitres: 'volume',
    flowLPerMin: 'flow',
    bafflingFactor: 'factor',
    minutes: 'time',
  },
  example: {
    find: 'ct',
    residual: { value: '0.4', unit: 'mg/L' },
    contact: 'flow',
    volume: { value: '500', unit: 'L' },
    volumeError: { value: '5', unit: 'percent' },
    flow: { value: '100', unit: 'L/min' },
    baffling: 'average',
  },
  sources: ['epa-contact-time', 'ozone-practice'],
  cautions: [
    { code: 'end-of-contact', level: 'note' },
    { code: 'ozone-in-sea-water', level: 'warning' },
    { code: 'under-treatment', level: 'warning' },
    { code: 'temperature', level: 'note' },
  ],
  plot: { vary: 'flow', unit: 'L/min', from: 20, to: 400, figure: 'ct' },
  published: ['ct_mg_min_per_L'],
  compute({ find, residual, target, contact, volume, flow, baffling, factor, time }) {
    if (find === 'minutes') {
      if (!residual || !target) return refuse('blank', 'residual', { unit: 'mg/L' })
      const needed = minutesForContactTime({ ctMgMinPerL: target.value, residualMgPerL: residual.value })
      if (!needed.ok) return needed
      const expression = `${enteredTerm(target)} * ${oneOfExposure} / (${enteredTerm(residual)}) to minute`
      return ok({
        figures: [{ key: 'minutes', value: needed.value, unit: 'min', figures: 3 }],
        working: [line('needed', expression, needed.value, 'min')],
      })
    }
    const share = factor ?? (baffling && baffling !== 'own' ? bafflingFactors[baffling] : undefined)
    const stay =
      contact === 'flow' && volume && flow && share !== undefined
        ? chamberMinutes(volume, flow, share)
        : stillMinutes(time)
    if (!stay.ok) return stay
    const { minutes, term, working, rests } = stay.value
    const cautions: BenchCaution[] =
      contact === 'flow' && baffling !== 'own' ? [{ code: 'factor-from-memory', level: 'note' }] : []
    const figures: Figure[] = [{ key: 'minutes', value: minutes, unit: 'min', figures: 3 }]
    if (find === 'residual' && target) {
      const needed = residualForContactTime({ ctMgMinPerL: target.value, minutes })
      if (!needed.ok) return needed
      const expression = `${enteredTerm(target)} * ${oneOfExposure} / (${term}) to mg/L`
      return ok({
        figures: [{ key: 'residual', value: needed.value, unit: 'mg/L', figures: 3 }, ...figures],
        working: [...working, line('residual', expression, needed.value, 'mg/L', rests)],
        cautions,
      })
    }
    if (!residual) return refuse('blank', 'residual', { unit: 'mg/L' })
    const ct = contactTimeValue({ residualMgPerL: residual.value, minutes })
    if (!ct.ok) return ct
    const expression = `${enteredTerm(residual)} * ${term} / ${oneOfExposure}`
    return ok({
      figures: [{ key: 'ct', value: ct.value, unit: 'mg_min/L', figures: 3 }, ...figures],
      working: [...working, line('ct', expression, ct.value, 'mg_min/L', rests)],
      cautions,
    })
  },
})

interface Stay {
  minutes: number
  /** The minutes in the lines that follow. */
  term: string
  working: BenchLine[]
  rests: string[]
}

function chamberMinutes(
  volume: ParsedQuantity,
  flow: ParsedQuantity,
  share: ParsedQuantity | number,
): Result<Stay> {
  const [bafflingFactor, factor] =
    typeof share === 'number' ? [share, String(share)] : [share.value, enteredTerm(share)]
  const minutes = effectiveMinutes({
    contactVolumeLitres: volume.value,
    flowLPerMin: flow.value,
    bafflingFactor,
  })
  if (!minutes.ok) return minutes
  const expression = `${factor} * ${enteredTerm(volume)} / (${enteredTerm(flow)}) to minute`
  return ok({
    minutes: minutes.value,
    term: valueTerm(minutes.value, 'min'),
    working: [line('minutes', expression, minutes.value, 'min')],
    rests: ['minutes'],
  })
}

function stillMinutes(time: ParsedQuantity | undefined): Result<Stay> {
  if (!time) return refuse('blank', 'time', { unit: 'min' })
  return ok({ minutes: time.value, term: enteredTerm(time), working: [], rests: [] })
}
