import { ok } from '../../domain/result.ts'
import { minutesToFraction, turnoversToFraction } from '../../domain/water/flow/wash-out.ts'
import { wellMixedConcentration } from '../../domain/water/flow/well-mixed-concentration.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { volumeUnits } from './parts/volume-input.ts'

/** How long a flow takes to wash a drug out of a tank, or what is left of it after a time. */
export const washOut = defineCalculator({
  id: 'wash-out',
  group: 'exchange',
  weekly: true,
  words: defineMessages({
    name: 'Wash-out by flow',
    purpose:
      'How long a flow of clean water takes to wash a share of something out, or what is left after a time.',
    search: 'flush',
    formula: 'time = −(volume ÷ flow) × ln(share left)',
    'input.find': 'What to find',
    'option.find.time': 'The time it takes',
    'option.find.left': 'What is left after a time',
    'input.volume': 'Net volume of the water',
    'input.volumeError': 'Error of the volume',
    'input.flow': 'Flow of clean water',
    'input.removed': 'Share to wash out',
    'input.initial': 'Concentration at the start',
    'input.elapsed': 'Time that it flows',
    'result.time': 'Time',
    'result.turnovers': 'Turnovers',
    'result.left': 'Concentration left',
    'result.share-left': 'Share left',
    'line.turnovers': 'Turnovers that leave the rest',
    'line.time': 'Time',
    'line.share-left': 'Share left',
    'line.left': 'Concentration left',
    'caution.lower-bound':
      'A tank has dead corners: this is the least time. Confirm it by a test before animals or water go on.',
    'caution.more-left':
      'A tank has dead corners: more may be left than this. Confirm it by a test before animals or water go on.',
    'caution.plug-flow':
      'Raceways do not mix like a tank, and carbon, ozone, UV or a skimmer remove drugs faster.',
  }),
  inputs: {
    find: choice(['time', 'left']),
    volume: quantity({ units: volumeUnits, limits: { above: 0 }, netVolume: true }),
    volumeError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'volume',
    }),
    flow: quantity({ units: ['L/min', 'L/h', 'm3/h', 'mL/min', 'gal_us/min'], limits: { above: 0 } }),
    removed: quantity({ units: ['percent'], limits: { min: 0, max: 99.9999 }, when: { find: ['time'] } }),
    initial: quantity({ units: ['mg/L', 'ug/L', 'g/L'], limits: { min: 0 }, when: { find: ['left'] } }),
    elapsed: quantity({ units: ['min', 'h', 'd'], limits: { min: 0 }, when: { find: ['left'] } }),
  },
  fields: {
    volumeLitres: 'volume',
    flowLPerMin: 'flow',
    fraction: 'removed',
    initialMgPerL: 'initial',
    minutes: 'elapsed',
  },
  example: {
    find: 'time',
    volume: { value: '1000', unit: 'L' },
    flow: { value: '25', unit: 'L/min' },
    removed: { value: '95', unit: 'percent' },
  },
  sources: ['stirred-tank'],
  cautions: [{ code: 'plug-flow', level: 'note' }],
  plot: { vary: 'elapsed', unit: 'min', from: 0, to: 480, figure: 'left' },
  published: [
    'turnovers_to_fraction_remaining',
    'time_to_fraction_remaining_min',
    'well_mixed_concentration',
  ],
  compute({ find, volume, flow, removed, initial, elapsed }) {
    const [water, through] = [enteredTerm(volume), enteredTerm(flow)]
    if (find === 'left' && initial && elapsed) {
      const left = wellMixedConcentration({
        initialMgPerL: initial.value,
        inflowMgPerL: 0,
        flowLPerMin: flow.value,
        volumeLitres: volume.value,
        lossPerMin: 0,
        minutes: elapsed.value,
      })
      if (!left.ok) return left
      const share = Math.exp((-flow.value / volume.value) * elapsed.value)
      return ok({
        figures: [
          { key: 'left', value: left.value, unit: 'mg/L' },
          { key: 'share-left', value: share * 100, unit: 'percent' },
        ],
        cautions: [{ code: 'more-left', level: 'warning' }],
        working: [
          line(
            'share-left',
            `exp(-(${through} * ${enteredTerm(elapsed)} / (${water}))) * 100`,
            share * 100,
            'percent',
          ),
          line(
            'left',
            `${enteredTerm(initial)} * ${valueTerm(share * 100, 'percent')} / 100 to mg/L`,
            left.value,
            'mg/L',
            ['share-left'],
          ),
        ],
      })
    }
    const percent = removed?.value ?? 0
    const fraction = 1 - percent / 100
    const turnovers = turnoversToFraction(fraction)
    if (!turnovers.ok) return turnovers
    const minutes = minutesToFraction({ fraction, volumeLitres: volume.value, flowLPerMin: flow.value })
    if (!minutes.ok) return minutes
    return ok({
      figures: [
        { key: 'time', value: minutes.value, unit: 'min' },
        { key: 'turnovers', value: turnovers.value, unit: 'ratio' },
      ],
      cautions: [{ code: 'lower-bound', level: 'warning' }],
      working: [
        line('turnovers', `-log(1 - ${String(percent)} / 100)`, turnovers.value, 'ratio'),
        line(
          'time',
          `${valueTerm(turnovers.value, 'ratio')} * ${water} / (${through}) to minute`,
          minutes.value,
          'min',
          ['turnovers'],
        ),
      ],
    })
  },
})
