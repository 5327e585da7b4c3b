import { exceeds } from '../../domain/cautions/exceeds.ts'
import { ok } from '../../domain/result.ts'
import {
  continuousExchangeLitres,
  swapFraction,
  swapLitres,
} from '../../domain/water/salinity-change/swap.ts'
import { stepwiseSchedule, type SalinityStep } from '../../domain/water/salinity-change/stepwise.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type BenchLine } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { volumeUnits } from './parts/volume-input.ts'

const salinity = (more: object = {}) =>
  quantity({ units: ['PSS-78'], limits: { min: 0, max: 42 }, ...more } as const)

/** Faster than these is faster than common practice. @source salinity-practice */
const usualDown = 4
const usualUp = 3
/** Below this the new water is fresh, and the change may be for a dip. */
const brackishFrom = 0.5

/** Litres to swap for another salinity: at once, day by day at a limit, or running through. */
export const salinityChange = defineCalculator({
  id: 'salinity-change',
  group: 'exchange',
  weekly: true,
  words: defineMessages({
    name: 'Change of salinity',
    purpose:
      'How much water to swap to reach another salinity: at once, in daily steps at a limit, or running through.',
    search: 'hyposalinity dip freshwater',
    formula: 'litres = volume × (from − to) ÷ (from − replacement)',
    'input.way': 'How it is changed',
    'option.way.steps': 'In daily steps',
    'option.way.once': 'At once',
    'option.way.through': 'Running through, at a constant level',
    'input.start': 'Salinity now',
    'input.target': 'Salinity wanted',
    'input.replacement': 'Salinity of the replacement water',
    'help.replacement': 'Fresh water is 0.',
    'input.volume': 'Net volume of the water',
    'input.volumeError': 'Error of the volume',
    'input.perDay': 'Largest change in a day',
    'result.litres': 'Water to swap in all',
    'result.days': 'Days',
    'result.step': 'Change each day',
    'result.share': 'Share of the water',
    'column.day': 'Day',
    'column.from': 'From',
    'column.to': 'To',
    'column.litres': 'Litres to swap',
    'axis.column.to': 'Salinity after the step',
    'line.share': 'Share of the water',
    'line.litres': 'Water to swap',
    'line.days': 'Days',
    'line.step': 'Change each day',
    'line.day': (p: { day: string }) => `Day ${p.day}`,
    'line.sum': 'Water to swap in all',
    'line.through': 'Water to run through',
    'refusal.target-beyond-replacement':
      'A swap goes no further than the salinity of the replacement water, and a flow does not quite reach it. Check the three salinities, or take other water.',
    'refusal.target-behind-start':
      'This replacement water leads the other way. Check the three salinities, or take other water.',
    'caution.faster-than-usual': (p: { usual: string }) =>
      `This is faster than is common practice (${p.usual} a day, no source). The order decides.`,
    'caution.within-a-day': (p: { usual: string }) =>
      `Within a day this is more than is common practice (${p.usual} a day, no source). Change it in daily steps, unless the order is for a dip or says otherwise.`,
    'caution.dip':
      'For a freshwater dip match the temperature to ±1 °C and the pH to ±0.2, read both before the animals go in, dechlorinate the water and aerate it (from memory).',
    'caution.order': 'Never for sharks, rays or invertebrates without a veterinary order.',
    'caution.measure':
      'Measure again before each step: density is left out here, and a step that came out otherwise moves the next.',
    'caution.instrument': 'A low target for parasites is decided by 1 g/kg: use a calibrated instrument.',
  }),
  inputs: {
    way: choice(['steps', 'once', 'through']),
    start: salinity({ reading: 'salinity' }),
    target: salinity(),
    replacement: salinity(),
    volume: quantity({ units: volumeUnits, limits: { above: 0 }, netVolume: true }),
    volumeError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'volume',
    }),
    perDay: quantity({
      units: ['PSS-78'],
      difference: true,
      limits: { above: 0, max: 42 },
      when: { way: ['steps'] },
    }),
  },
  fields: {
    startSalinity: 'start',
    targetSalinity: 'target',
    replacementSalinity: 'replacement',
    volumeLitres: 'volume',
    mostPerDay: 'perDay',
  },
  example: {
    way: 'steps',
    start: { value: '35', unit: 'PSS-78' },
    target: { value: '16', unit: 'PSS-78' },
    replacement: { value: '0', unit: 'PSS-78' },
    volume: { value: '2000', unit: 'L' },
    perDay: { value: '3', unit: 'PSS-78' },
  },
  sources: ['salt-balance', 'salinity-practice'],
  cautions: [
    { code: 'order', level: 'warning' },
    { code: 'measure', level: 'note' },
    { code: 'instrument', level: 'note' },
  ],
  plot: { across: 'day', up: 'to' },
  published: [
    'water_swap_fraction',
    'water_swap_litres',
    'continuous_dilution_litres',
    'stepwise_days',
    'stepwise_schedule_salinity',
    'stepwise_schedule_swap_litres',
  ],
  compute({ way, start, target, replacement, volume, perDay }) {
    const change = {
      startSalinity: start.value,
      targetSalinity: target.value,
      replacementSalinity: replacement.value,
      volumeLitres: volume.value,
    }
    const cautions = cautionsOfChange(change)
    const water = enteredTerm(volume)
    const [from, to, fresh] = [enteredTerm(start), enteredTerm(target), enteredTerm(replacement)]
    if (way === 'steps' && perDay) {
      const plan = stepwiseSchedule({ ...change, mostPerDay: perDay.value })
      return plan.ok
        ? ok(planned(plan.value, change, { water, from, to, fresh, perDay: enteredTerm(perDay) }))
        : plan
    }
    if (way === 'through') {
      const litres = continuousExchangeLitres(change)
      if (!litres.ok) return litres
      const expression =
        start.value === target.value
          ? `${water} * 0 to L`
          : `${water} * log((${from} - ${fresh}) / (${to} - ${fresh})) to L`
      return ok({
        figures: [{ key: 'litres', value: litres.value, unit: 'L', kind: 'volume' }],
        working: [line('through', expression, litres.value, 'L')],
        cautions,
      })
    }
    const fraction = swapFraction(change)
    if (!fraction.ok) return fraction
    const litres = swapLitres(change)
    if (!litres.ok) return litres
    const percent = fraction.value * 100
    const share = start.value === target.value ? '0' : `(${from} - ${to}) / (${from} - ${fresh}) * 100`
    return ok({
      figures: [
        { key: 'litres', value: litres.value, unit: 'L', kind: 'volume' },
        { key: 'share', value: percent, unit: 'percent' },
      ],
      working: [
        line('share', share, percent, 'percent'),
        line('litres', `${water} * ${valueTerm(percent, 'percent')} / 100 to L`, litres.value, 'L', [
          'share',
        ]),
      ],
      cautions,
    })
  },
})

type Change = Parameters<typeof swapLitres>[0]

/** What is to be said of a change without steps: its size, and the water that it is made with. */
function cautionsOfChange({ startSalinity, targetSalinity, replacementSalinity }: Change): BenchCaution[] {
  const whole = targetSalinity - startSalinity
  const usual = whole < 0 ? usualDown : usualUp
  return [
    ...(exceeds(Math.abs(whole), usual)
      ? [{ code: 'within-a-day', level: 'warning', params: { usual } } as const]
      : []),
    ...(replacementSalinity < brackishFrom ? [{ code: 'dip', level: 'warning' } as const] : []),
  ]
}

interface Terms {
  water: string
  from: string
  to: string
  fresh: string
  perDay: string
}

function planned(
  steps: readonly SalinityStep[],
  change: { startSalinity: number; targetSalinity: number; replacementSalinity: number },
  terms: Terms,
) {
  const days = steps.length
  const whole = change.targetSalinity - change.startSalinity
  const step = days === 0 ? 0 : whole / days
  const difference = whole < 0 ? `(${terms.from} - ${terms.to})` : `(${terms.to} - ${terms.from})`
  const litres = steps.reduce((sum, each) => sum + each.swapLitres, 0)
  const fresh = valueTerm(change.replacementSalinity, 'PSS-78')
  const daily: BenchLine[] = steps.map((each) => {
    const [from, to] = [valueTerm(each.fromSalinity, 'PSS-78'), valueTerm(each.toSalinity, 'PSS-78')]
    return line(
      `day-${String(each.day)}`,
      `${terms.water} * (${from} - ${to}) / (${from} - ${fresh}) to L`,
      each.swapLitres,
      'L',
      [],
      { code: 'day', params: { day: each.day } },
    )
  })
  const sum = daily.map((each) => valueTerm(each.value, 'L')).join(' + ') || '0 L'
  const usual = whole < 0 ? usualDown : usualUp
  const cautions: BenchCaution[] =
    Math.abs(step) > usual ? [{ code: 'faster-than-usual', level: 'warning', params: { usual } }] : []
  return {
    figures: [
      { key: 'litres', value: litres, unit: 'L', kind: 'volume' },
      { key: 'days', value: days, unit: 'ratio', whole: true },
      { key: 'step', value: step, unit: 'PSS-78', kind: 'reading' },
    ] as const,
    working: [
      line('days', `ceil(${difference} / ${terms.perDay})`, days, 'ratio'),
      ...(days === 0
        ? []
        : [
            line('step', `(${terms.to} - ${terms.from}) / ${valueTerm(days, 'ratio')}`, step, 'PSS-78', [
              'days',
            ]),
          ]),
      ...daily,
      line(
        'sum',
        `${sum} to L`,
        litres,
        'L',
        daily.map((each) => each.key),
      ),
    ],
    schedule: {
      columns: [
        { key: 'day', unit: 'ratio', whole: true },
        { key: 'from', unit: 'PSS-78', figures: 3 },
        { key: 'to', unit: 'PSS-78', figures: 3 },
        { key: 'litres', unit: 'L' },
      ],
      rows: steps.map((each) => [each.day, each.fromSalinity, each.toSalinity, each.swapLitres]),
    } as const,
    cautions,
  }
}
