import { ok } from '../../domain/result.ts'
import {
  practicalSalinitySteps68,
  standardConductivityMSPerCm,
} from '../../domain/seawater/practical-salinity.ts'
import { conductivityFromSalinity as conductivityOf } from '../../domain/seawater/salinity-from-conductivity.ts'
import { temperature68 } from '../../domain/seawater/temperature-68.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator } from '../definition.ts'
import { quantity } from '../inputs.ts'
import { line } from '../line.ts'
import {
  practicalSalinityWords,
  salinityLines,
  scaleCautions,
  temperature68Line,
} from './parts/practical-salinity-lines.ts'

/** The temperature that compensating meters mostly show the conductivity of, °C. */
const usualReferenceC = 25

/** What a conductivity meter ought to show in sea water of a known salinity. */
export const conductivityFromSalinity = defineCalculator({
  id: 'conductivity-from-salinity',
  group: 'water',
  words: defineMessages({
    ...practicalSalinityWords,
    name: 'Conductivity from salinity',
    purpose: 'What a conductivity meter ought to show in sea water of a known salinity.',
    formula: 'conductivity = 42.914 mS/cm × the ratio that has this salinity on the scale of 1978',
    'input.salinity': 'Salinity',
    'input.temperature': 'Temperature of the water',
    'result.conductivity': 'Without compensation',
    'result.compensated': 'Compensated to 25 °C',
    'result.ratio': 'Ratio to the standard',
    'line.ratio': 'Ratio that has this salinity, found by search',
    'line.salinity': 'Salinity that it has',
    'line.conductivity': 'Conductivity',
    'line.compensated-ratio': 'Ratio at 25 °C, found by search',
    'line.compensated': 'Conductivity at 25 °C',
    'caution.compensated':
      'A meter that compensates comes near the second figure: along a straight line, near 2 % a degree (from memory).',
    'caution.check':
      'This tells whether a meter and a salinity agree, not which of them is right. Calibrate the meter in a standard solution.',
  }),
  inputs: {
    // below this the search would end in the noise of the scale, which has no zero
    salinity: quantity({ units: ['PSS-78'], limits: { min: 0.05, max: 42 }, reading: 'salinity' }),
    temperature: quantity({
      units: ['degC', 'degF'],
      limits: { min: -2, max: 40 },
      reading: 'temperature',
    }),
  },
  fields: { salinityPss78: 'salinity', temperatureC: 'temperature' },
  example: { salinity: { value: '34.5', unit: 'PSS-78' }, temperature: { value: '22.0', unit: 'degC' } },
  sources: ['unesco-44', 'conductivity-meters'],
  cautions: [
    { code: 'compensated', level: 'note' },
    { code: 'check', level: 'note' },
    { code: 'sea-water-only', level: 'note' },
  ],
  plot: { vary: 'temperature', unit: 'degC', from: 0, to: 35, figure: 'conductivity' },
  published: ['conductivity_ratio_from_salinity'],
  compute({ salinity, temperature }) {
    const salinityPss78 = salinity.value
    const here = conductivityOf({ salinityPss78, temperatureC: temperature.value })
    if (!here.ok) return here
    const compensated = conductivityOf({ salinityPss78, temperatureC: usualReferenceC })
    if (!compensated.ok) return compensated
    const { conductivityRatio, conductivityMSPerCm } = here.value
    const t68 = temperature68(temperature.value)
    const steps = practicalSalinitySteps68(conductivityRatio, t68, 0)
    const [ratio, atReference] = [
      valueTerm(conductivityRatio, 'ratio'),
      valueTerm(compensated.value.conductivityRatio, 'ratio'),
    ]
    const standard = String(standardConductivityMSPerCm)
    return ok({
      figures: [
        { key: 'conductivity', value: conductivityMSPerCm, unit: 'mS/cm', kind: 'reading' },
        {
          key: 'compensated',
          value: compensated.value.conductivityMSPerCm,
          unit: 'mS/cm',
          figures: 3,
          kind: 'reading',
        },
        { key: 'ratio', value: conductivityRatio, unit: 'ratio', kind: 'reading' },
      ],
      working: [
        temperature68Line(enteredTerm(temperature), t68),
        line('ratio', ratio, conductivityRatio, 'ratio'),
        ...salinityLines(t68, ratio, steps),
        line('compensated-ratio', atReference, compensated.value.conductivityRatio, 'ratio'),
        line('compensated', `${atReference} * ${standard}`, compensated.value.conductivityMSPerCm, 'mS/cm', [
          'compensated-ratio',
        ]),
        line('conductivity', `${ratio} * ${standard}`, conductivityMSPerCm, 'mS/cm', ['ratio']),
      ],
      cautions: scaleCautions(salinityPss78, temperature.value),
      ...(steps.lowSalinityTerm === 0 ? {} : { sources: ['hill-1986'] as const }),
    })
  },
})
