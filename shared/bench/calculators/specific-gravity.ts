import { ok } from '../../domain/result.ts'
import { pureWaterDensity68, seawaterDensity68 } from '../../domain/seawater/seawater-density.ts'
import {
  salinityFromSpecificGravity,
  specificGravityFromSalinity,
} from '../../domain/seawater/specific-gravity.ts'
import { temperature68 } from '../../domain/seawater/temperature-68.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchLine } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { densityLines, densityLineWords, pureExpression } from './parts/seawater-density-lines.ts'

/** Salinity from a hydrometer or refractometer, and the specific gravity that a salinity has. */
export const specificGravity = defineCalculator({
  id: 'specific-gravity',
  group: 'water',
  weekly: true,
  words: defineMessages({
    name: 'Specific gravity and salinity',
    purpose:
      'Salinity from a hydrometer or refractometer, or the specific gravity that a salinity should show.',
    search: 'hydrometer refractometer',
    formula: 'SG = density of the water ÷ density of pure water at the reference temperature (EOS-80)',
    'input.find': 'What to find',
    'option.find.salinity': 'Salinity',
    'option.find.gravity': 'Specific gravity',
    'input.gravity': 'Specific gravity read',
    'input.salinity': 'Salinity',
    'input.temperature': 'Temperature of the water',
    'help.temperature': 'Of the water in the instrument when it was read.',
    'input.reference': 'Reference temperature of the instrument',
    'help.reference': 'Printed on it: 25/25 °C, 20/20 °C, 60 °F (15.56 °C) and others.',
    'input.instrument': 'Instrument',
    'option.instrument.hydrometer': 'Hydrometer',
    'option.instrument.seawater': 'Refractometer scaled for sea water',
    'option.instrument.brine': 'Refractometer scaled for brine (NaCl)',
    'result.salinity': 'Salinity',
    'result.gravity': 'Specific gravity',
    'result.density': 'Density of the water',
    ...densityLineWords,
    'line.reference68': 'Reference temperature on that scale',
    'line.reference-density': 'Pure water at the reference temperature',
    'line.salinity': 'Salinity, found by halving; put back below',
    'line.gravity': 'Specific gravity',
    'refusal.reference-temperature-not-stated':
      'Type the reference temperature of the instrument. 1.025 is a salinity of 33.2 on a 25/25 °C scale, 32.9 on 20/20 °C, 32.6 on 60/60 °F (15.56 °C), and 37.2 at 25 °C against water of 4 °C.',
    'refusal.salinity-as-specific-gravity':
      'This looks like a salinity. A specific gravity is written like 1.025.',
    'refusal.lighter-than-fresh-water':
      'This is lighter than fresh water at that temperature. Check both temperatures.',
    'refusal.salinity-above-scale': 'This would be a salinity above 42, where the scale ends.',
    'caution.brine': 'A scale for brine reads about 1.5 too high in sea water near 35 (from memory).',
    'caution.compensated':
      'A refractometer that compensates for temperature already shows what it would at its reference temperature: then type that as the temperature of the water.',
    'caution.low': 'Below a salinity of 2 a hydrometer says little; use a conductivity meter.',
    'caution.instrument': 'Check the instrument against a standard solution, and rinse it with fresh water.',
  }),
  inputs: {
    find: choice(['salinity', 'gravity']),
    gravity: quantity({ units: ['SG'], when: { find: ['salinity'] } }),
    salinity: quantity({
      units: ['PSS-78'],
      limits: { min: 0, max: 42 },
      when: { find: ['gravity'] },
      reading: 'salinity',
    }),
    temperature: quantity({
      units: ['degC', 'degF'],
      limits: { min: -2, max: 40, plausible: { max: 35 } },
      reading: 'temperature',
    }),
    reference: quantity({
      units: ['degC', 'degF'],
      limits: { min: 0, max: 40 },
      missing: 'reference-temperature-not-stated',
    }),
    instrument: choice(['hydrometer', 'seawater', 'brine'], { optional: true, when: { find: ['salinity'] } }),
  },
  fields: {
    specificGravity: 'gravity',
    salinityPss78: 'salinity',
    waterTemperatureC: 'temperature',
    referenceTemperatureC: 'reference',
  },
  example: {
    find: 'salinity',
    gravity: { value: '1.025', unit: 'SG' },
    temperature: { value: '25', unit: 'degC' },
    reference: { value: '25', unit: 'degC' },
  },
  sources: ['unesco-44'],
  cautions: [{ code: 'instrument', level: 'note' }],
  carries: [{ to: 'reading', parameter: 'salinity', figure: 'salinity' }],
  published: ['salinity_from_specific_gravity', 'specific_gravity_from_salinity'],
  compute({ find, gravity, salinity, temperature, reference, instrument }) {
    const temperatures = {
      waterTemperatureC: temperature.value,
      referenceTemperatureC: reference.value,
    }
    const found =
      find === 'salinity'
        ? salinityFromSpecificGravity({ specificGravity: gravity?.value ?? NaN, ...temperatures })
        : ok(salinity?.value ?? NaN)
    if (!found.ok) return found
    const shown = specificGravityFromSalinity({ salinityPss78: found.value, ...temperatures })
    // a salinity just above 1 reads as a gravity only where a person typed it
    if (!shown.ok && find === 'gravity') return shown
    const t = temperature68(temperature.value)
    const density = seawaterDensity68(found.value, t)
    const ratio = density / pureWaterDensity68(temperature68(reference.value))
    const [salt, sg] = [
      { key: 'salinity', value: found.value, unit: 'PSS-78', figures: 3, kind: 'reading' },
      { key: 'gravity', value: ratio, unit: 'SG', figures: 5, kind: 'reading' },
    ] as const
    const dense = { key: 'density', value: density, unit: 'kg/m3', figures: 6, kind: 'reading' } as const
    return ok({
      figures: find === 'salinity' ? [salt, dense] : [sg, dense],
      working: workingOf(found.value, temperature.value, reference.value),
      cautions: [
        ...(instrument === 'brine' || instrument === 'seawater'
          ? [{ code: 'compensated', level: 'warning' as const }]
          : []),
        ...(instrument === 'brine' ? [{ code: 'brine', level: 'warning' as const }] : []),
        ...(found.value < 2 ? [{ code: 'low', level: 'warning' as const }] : []),
      ],
    })
  },
})

function workingOf(salinity: number, temperatureC: number, referenceC: number): BenchLine[] {
  const r = temperature68(referenceC)
  const reference = pureWaterDensity68(r)
  const density = seawaterDensity68(salinity, temperature68(temperatureC))
  const number = (value: number) => valueTerm(value, 'ratio')
  return [
    line('reference68', `1.00024 * ${valueTerm(referenceC, 'degC')}`, r, 'degC'),
    line('reference-density', pureExpression(valueTerm(r, 'degC')), reference, 'ratio', ['reference68']),
    line('salinity', valueTerm(salinity, 'PSS-78'), salinity, 'PSS-78'),
    ...densityLines(salinity, 'salinity', temperatureC),
    line('gravity', `${number(density)} / ${number(reference)}`, density / reference, 'SG', [
      'density',
      'reference-density',
    ]),
  ]
}
