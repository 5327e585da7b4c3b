import { ok } from '../../domain/result.ts'
import { computeTurnover } from '../../domain/water/compute-turnover.ts'
import { flowForTurnover } from '../../domain/water/flow-for-turnover.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { volumeUnits } from './parts/volume-input.ts'

const flowUnits = ['L/min', 'L/h', 'm3/h', 'mL/min', 'gal_us/min'] as const

/** How long a flow takes to pass a volume once, or the flow that does it in a given time. */
export const turnover = defineCalculator({
  id: 'turnover',
  group: 'volume',
  words: defineMessages({
    name: 'Turnover',
    purpose: 'How long a flow takes to pass the water once, or the flow that a turnover time asks for.',
    formula: 'time = volume ÷ flow',
    'input.find': 'What to find',
    'option.find.time': 'Turnover time',
    'option.find.flow': 'Flow',
    'input.volume': 'Volume of the water',
    'input.flow': 'Flow',
    'input.time': 'Turnover time',
    'result.time': 'Turnover time',
    'result.per-day': 'Turnovers a day',
    'result.flow': 'Flow needed',
    'caution.flow': 'A pump gives less than its label against height and a dirty filter: measure the flow.',
  }),
  inputs: {
    find: choice(['time', 'flow']),
    volume: quantity({ units: volumeUnits, limits: { above: 0 }, netVolume: true }),
    flow: quantity({ units: flowUnits, limits: { above: 0 }, when: { find: ['time'] } }),
    time: quantity({ units: ['min', 'h', 'd'], limits: { above: 0 }, when: { find: ['flow'] } }),
  },
  fields: { turnover: 'time' },
  example: {
    find: 'time',
    volume: { value: '25000', unit: 'gal_us' },
    flow: { value: '400', unit: 'gal_us/min' },
  },
  sources: ['stirred-tank', 'nist-sp-811'],
  cautions: [{ code: 'flow', level: 'note' }],
  published: ['turnover_min', 'turnovers_per_day', 'flow_for_turnover_L_per_min'],
  compute({ find, volume, flow, time }) {
    if (find === 'flow' && time) {
      const needed = flowForTurnover({ volume: volume.entered, turnover: time.entered })
      if (!needed.ok) return needed
      const { litresPerMinute, working } = needed.value
      return ok({ figures: [{ key: 'flow', value: litresPerMinute, unit: 'L/min' }], working })
    }
    const found = computeTurnover({
      volume: volume.entered,
      flow: flow?.entered ?? { value: '', unit: 'L/min' },
    })
    if (!found.ok) return found
    const { minutes, perDay, working } = found.value
    return ok({
      figures: [
        { key: 'time', value: minutes, unit: 'min' },
        { key: 'per-day', value: perDay, unit: 'per_d' },
      ],
      working,
    })
  },
})
