import { ok, refuse } from '../../domain/result.ts'
import { evaporationTopUp } from '../../domain/water/salinity-change/evaporation.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator } from '../definition.ts'
import { quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { volumeInputs, volumeWords } from './parts/volume-input.ts'

const scales = ['PSS-78', 'g/kg'] as const
/** A fall of more than this in a day is faster than common practice. @source salinity-practice */
const usualFall = 4

/** Fresh water that puts back what evaporated, by the salinity that rose. */
export const evaporation = defineCalculator({
  id: 'evaporation',
  group: 'exchange',
  words: defineMessages({
    name: 'Evaporation top-up',
    purpose: 'How much fresh water puts back what evaporated, told by the salinity that rose.',
    formula: 'fresh water = volume now × (reading − target) ÷ target',
    ...volumeWords,
    'help.volume': 'As it is now, with the level fallen.',
    'input.reading': 'Salinity now',
    'input.target': 'Salinity before, and wanted again',
    'result.fresh': 'Fresh water to add',
    'result.restored': 'Volume after it',
    'line.fresh': 'Fresh water to add',
    'line.restored': 'Volume after it',
    'refusal.salinity-not-risen':
      'The salinity has not risen: nothing is to be topped up with fresh water. Check both figures.',
    'caution.otherwise':
      'Only evaporation is put back with fresh water. Where water was lost or salt was added, the salinity says nothing about the level.',
    'caution.chlorine': 'Take chlorine and chloramine out of tap water first, and match the temperature.',
    'caution.fast': (p: { usual: string }) =>
      `The salinity falls by more than ${p.usual}. Spread it over days: with animals in the water 4 to 5 a day is the most in common practice (no source).`,
  }),
  inputs: {
    ...volumeInputs,
    reading: quantity({
      units: scales,
      limits: { min: 0, max: 120, plausible: { max: 60 } },
      reading: 'salinity',
    }),
    target: quantity({ units: scales, limits: { above: 0, max: 120, plausible: { max: 60 } } }),
  },
  fields: { systemLitres: 'volume', readingSalinity: 'reading', targetSalinity: 'target' },
  example: {
    volume: { value: '2000', unit: 'L' },
    reading: { value: '36.2', unit: 'PSS-78' },
    target: { value: '35', unit: 'PSS-78' },
  },
  sources: ['salt-balance'],
  cautions: [
    { code: 'otherwise', level: 'note' },
    { code: 'chlorine', level: 'note' },
  ],
  published: ['evaporation_topup_L'],
  compute({ volume, reading, target }) {
    if (reading.unit !== target.unit) return refuse('dimensions-differ', 'target')
    const fresh = evaporationTopUp({
      systemLitres: volume.value,
      readingSalinity: reading.value,
      targetSalinity: target.value,
    })
    if (!fresh.ok) return fresh
    const [water, now, wanted] = [enteredTerm(volume), enteredTerm(reading), enteredTerm(target)]
    const restored = volume.value + fresh.value
    const fast = reading.value - target.value > usualFall
    return ok({
      figures: [
        { key: 'fresh', value: fresh.value, unit: 'L', kind: 'volume' },
        { key: 'restored', value: restored, unit: 'L', kind: 'volume' },
      ],
      working: [
        line('fresh', `${water} * (${now} - ${wanted}) / ${wanted} to L`, fresh.value, 'L'),
        line('restored', `${water} + ${valueTerm(fresh.value, 'L')} to L`, restored, 'L', ['fresh']),
      ],
      ...(fast
        ? {
            cautions: [{ code: 'fast', level: 'warning', params: { usual: usualFall } } as const],
            sources: ['salinity-practice'] as const,
          }
        : {}),
    })
  },
})
