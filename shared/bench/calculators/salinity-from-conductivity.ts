import { ok } from '../../domain/result.ts'
import {
  practicalSalinitySteps68,
  ratioToStandard,
  standardConductivityMSPerCm,
} from '../../domain/seawater/practical-salinity.ts'
import { referenceSalinity } from '../../domain/seawater/reference-salinity.ts'
import {
  salinityFromConductivity as fromMeter,
  salinityFromConductivityRatio,
} from '../../domain/seawater/salinity-from-conductivity.ts'
import { temperature68 } from '../../domain/seawater/temperature-68.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import {
  practicalSalinityWords,
  salinityLines,
  scaleCautions,
  temperature68Line,
} from './parts/practical-salinity-lines.ts'

/** The temperature that a compensating meter shows the conductivity of, °C. */
const compensatedTo = { 'compensated-25': 25, 'compensated-20': 20 } as const
const meters = ['uncompensated', 'compensated-25', 'compensated-20'] as const

const exactDigits = 4
const approximateDigits = 3

/** Practical salinity from whatever a conductivity meter shows. */
export const salinityFromConductivity = defineCalculator({
  id: 'salinity-from-conductivity',
  group: 'water',
  weekly: true,
  words: defineMessages({
    ...practicalSalinityWords,
    name: 'Salinity from conductivity',
    purpose: 'The practical salinity of sea water from a conductivity meter, compensated or not.',
    formula: 'the practical salinity scale of 1978, from conductivity ÷ 42.914 mS/cm and the temperature',
    'input.measured': 'What the meter shows',
    'help.measured':
      'Many meters show the conductivity that the water would have at 25 °C. The manual or a symbol on the screen says so.',
    'option.measured.uncompensated': 'Conductivity as it is, without compensation',
    'option.measured.compensated-25': 'Conductivity compensated to 25 °C',
    'option.measured.compensated-20': 'Conductivity compensated to 20 °C',
    'option.measured.ratio': 'Ratio to the standard of 42.914 mS/cm',
    'input.conductivity': 'Conductivity',
    'input.conductivityError': 'Error of the meter',
    'input.ratio': 'Ratio of conductivities',
    'input.temperature': 'Temperature of the sample',
    'help.temperature': 'Measured where and when the conductivity was.',
    'result.salinity': 'Salinity',
    'line.reference': 'Salt in a kilogram of water',
    'result.reference': 'Salt in a kilogram of water',
    'refusal.compensation-not-said':
      'Say whether the meter compensates for temperature. A compensated reading taken with the true temperature is wrong by a tenth for every 5 °C.',
    'refusal.salinity-below-scale':
      'This water conducts too little for a salinity to be named. Check the unit, µS/cm or mS/cm; or take it as fresh water.',
    'refusal.salinity-above-scale':
      'This conducts better than sea water of salinity 42, where the scale ends. Check the unit, µS/cm or mS/cm, and the temperature; or thin the sample and measure again.',
    'caution.compensated':
      'Approximate: meters compensate along a straight line, near 2 % a degree (from memory), and sea water does not. The temperature of the water is left out on purpose.',
  }),
  inputs: {
    measured: choice([...meters, 'ratio'], { missing: 'compensation-not-said' }),
    conductivity: quantity({
      units: ['mS/cm', 'uS/cm', 'S/m'],
      limits: { above: 0, plausible: { min: 0.05, max: 75 } },
      when: { measured: meters },
      reading: 'conductivity',
    }),
    conductivityError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'conductivity',
      when: { measured: meters },
    }),
    ratio: quantity({ units: ['ratio'], limits: { above: 0 }, when: { measured: ['ratio'] } }),
    temperature: quantity({
      units: ['degC', 'degF'],
      limits: { min: -2, max: 40 },
      when: { measured: ['uncompensated', 'ratio'] },
      reading: 'temperature',
    }),
  },
  fields: {
    conductivityMSPerCm: 'conductivity',
    conductivityRatio: 'ratio',
    temperatureC: 'temperature',
  },
  example: {
    measured: 'uncompensated',
    conductivity: { value: '51.2', unit: 'mS/cm' },
    temperature: { value: '24.5', unit: 'degC' },
  },
  sources: ['unesco-44', 'teos-10'],
  cautions: [{ code: 'sea-water-only', level: 'note' }],
  plot: { vary: 'conductivity', unit: 'mS/cm', from: 1, to: 60, figure: 'salinity' },
  carries: [{ to: 'reading', parameter: 'salinity', figure: 'salinity' }],
  published: [
    'salinity_from_conductivity',
    'salinity_from_conductivity_ratio',
    'reference_salinity_from_practical',
  ],
  compute({ measured, conductivity, ratio, temperature }) {
    const compensated = measured === 'compensated-25' || measured === 'compensated-20'
    const temperatureC = compensated ? compensatedTo[measured] : (temperature?.value ?? NaN)
    const conductivityRatio = ratio?.value ?? ratioToStandard(conductivity?.value ?? NaN)
    const found = ratio
      ? salinityFromConductivityRatio({ conductivityRatio, temperatureC, gaugePressureKPa: 0 })
      : fromMeter({ conductivityMSPerCm: conductivity?.value ?? NaN, temperatureC })
    if (!found.ok) return found
    const reference = referenceSalinity({ salinityPss78: found.value })
    if (!reference.ok) return reference
    const t68 = temperature68(temperatureC)
    const steps = practicalSalinitySteps68(conductivityRatio, t68, 0)
    const shown = compensated || !temperature ? String(temperatureC) : enteredTerm(temperature)
    const measuredTerm = ratio ? enteredTerm(ratio) : conductivity ? enteredTerm(conductivity) : ''
    const figures = compensated ? approximateDigits : exactDigits
    return ok({
      figures: [
        { key: 'salinity', value: found.value, unit: 'PSS-78', figures, kind: 'reading' },
        { key: 'reference', value: reference.value, unit: 'g/kg', figures, kind: 'reading' },
      ],
      working: [
        temperature68Line(shown, t68),
        line(
          'ratio',
          ratio ? measuredTerm : `${measuredTerm} / ${String(standardConductivityMSPerCm)}`,
          conductivityRatio,
          'ratio',
        ),
        ...salinityLines(t68, valueTerm(conductivityRatio, 'ratio'), steps),
        line('reference', `${valueTerm(found.value, 'PSS-78')} * 35.16504 / 35`, reference.value, 'g/kg', [
          'salinity',
        ]),
      ],
      cautions: [
        ...(compensated ? [{ code: 'compensated', level: 'note' } as const] : []),
        ...scaleCautions(found.value, temperatureC),
      ],
      sources: [
        ...(steps.lowSalinityTerm === 0 ? [] : (['hill-1986'] as const)),
        ...(compensated ? (['conductivity-meters'] as const) : []),
      ],
    })
  },
})
