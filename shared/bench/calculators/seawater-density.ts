import { ok } from '../../domain/result.ts'
import { referenceSalinity, saltGPerLitre } from '../../domain/seawater/reference-salinity.ts'
import {
  densityPerSalinity68,
  densityPerSalinityAndHalf68,
  pureWaterDensity68,
  seawaterDensity as densityOf,
} from '../../domain/seawater/seawater-density.ts'
import { temperature68 } from '../../domain/seawater/temperature-68.ts'
import { waterMass } from '../../domain/seawater/water-mass.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchLine, type Figure } from '../definition.ts'
import { quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { temperature68Line } from './parts/practical-salinity-lines.ts'
import { perHalfExpression, perSalinityExpression, pureExpression } from './parts/seawater-density-lines.ts'
import { volumeUnits } from './parts/volume-input.ts'

/** The equations of 1980 and 2010 agree to a hundredth of a kilogram in a cubic metre. */
const densityDigits = 6

/** What sea water weighs, by the litre and by the tank, and how much salt is in it. */
export const seawaterDensity = defineCalculator({
  id: 'seawater-density',
  group: 'water',
  words: defineMessages({
    name: 'Density of sea water',
    purpose:
      'What sea water weighs, what the water of a tank weighs, and the salt in it by mass and by volume.',
    formula: 'density = pure water + A × salinity + B × salinity^1.5 + 0.00048314 × salinity² (EOS-80)',
    'input.salinity': 'Salinity',
    'help.salinity': 'Fresh water is 0.',
    'input.temperature': 'Temperature of the water',
    'input.volume': 'Net volume of the water',
    'help.volume': 'Only for the weight of the water in a tank.',
    'input.volumeError': 'Error of the volume',
    'result.mass': 'Weight of the water',
    'result.density': 'Density',
    'result.reference': 'Salt in a kilogram of water',
    'result.salt': 'Salt in a litre of water',
    'line.t68': 'Temperature on the scale of 1968',
    'line.pure': 'Pure water at this temperature',
    'line.per-salinity': 'A, what each unit of salinity adds',
    'line.per-half': 'B, for salinity to the power 1.5',
    'line.density': 'Density',
    'line.reference': 'Salt in a kilogram of water',
    'line.salt': 'Salt in a litre of water',
    'line.mass': 'Weight of the water',
    'caution.three-figures':
      'Practical salinity, g/kg and g/L are three figures, up to 3 % apart. Weigh out salt by g/L.',
    'caution.water-only':
      'This is the water alone. The tank, its stand, rock and sand come on top: a structural engineer says what a floor bears.',
    'caution.standard-water':
      'For the salts of sea water at the surface. A bath of common salt has another density at the same salinity.',
  }),
  inputs: {
    salinity: quantity({ units: ['PSS-78'], limits: { min: 0, max: 42 }, reading: 'salinity' }),
    temperature: quantity({
      units: ['degC', 'degF'],
      limits: { min: -2, max: 40 },
      reading: 'temperature',
    }),
    volume: quantity({ units: volumeUnits, limits: { above: 0 }, optional: true, netVolume: true }),
    volumeError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'volume',
    }),
  },
  fields: { salinityPss78: 'salinity', temperatureC: 'temperature', volumeLitres: 'volume' },
  example: {
    salinity: { value: '34', unit: 'PSS-78' },
    temperature: { value: '24.5', unit: 'degC' },
    volume: { value: '11400', unit: 'L' },
    volumeError: { value: '2', unit: 'percent' },
  },
  sources: ['unesco-44', 'teos-10'],
  cautions: [
    { code: 'three-figures', level: 'note' },
    { code: 'standard-water', level: 'note' },
  ],
  plot: { vary: 'salinity', unit: 'PSS-78', from: 0, to: 42, figure: 'density' },
  published: ['seawater_density_1atm', 'reference_salinity_from_practical'],
  compute({ salinity, temperature, volume }) {
    const water = { salinityPss78: salinity.value, temperatureC: temperature.value }
    const density = densityOf(water)
    if (!density.ok) return density
    const reference = referenceSalinity(water)
    if (!reference.ok) return reference
    const salt = saltGPerLitre(water)
    if (!salt.ok) return salt
    const mass = volume && waterMass({ volumeLitres: volume.value, ...water })
    if (mass && !mass.ok) return mass
    const others: [Figure, ...Figure[]] = [
      { key: 'density', value: density.value, unit: 'kg/m3', figures: densityDigits, kind: 'reading' },
      { key: 'reference', value: reference.value, unit: 'g/kg', kind: 'reading' },
      { key: 'salt', value: salt.value, unit: 'g/L', kind: 'reading' },
    ]
    const working = [
      ...densityLines(salinity, temperature, density.value),
      line('reference', `${enteredTerm(salinity)} * 35.16504 / 35`, reference.value, 'g/kg'),
      line(
        'salt',
        // grams in a kilogram stand as a plain number: the unit that is missing is written out
        `${valueTerm(reference.value, 'g/kg')} g / (1 kg) * ${valueTerm(density.value, 'kg/m3')} to g/L`,
        salt.value,
        'g/L',
        ['reference', 'density'],
      ),
    ]
    if (!volume || !mass) return ok({ figures: others, working })
    return ok({
      figures: [{ key: 'mass', value: mass.value, unit: 'kg', kind: 'reading' }, ...others],
      working: [
        ...working,
        line(
          'mass',
          `${enteredTerm(volume)} * ${valueTerm(density.value, 'kg/m3')} to kg`,
          mass.value,
          'kg',
          ['density'],
        ),
      ],
      cautions: [{ code: 'water-only', level: 'warning' }],
    })
  },
})

/** EOS-80 at the surface, step by step: ends in the line `density`. */
function densityLines(salinity: ParsedQuantity, temperature: ParsedQuantity, density: number): BenchLine[] {
  const t68 = temperature68(temperature.value)
  const [pure, each, half] = [
    pureWaterDensity68(t68),
    densityPerSalinity68(t68),
    densityPerSalinityAndHalf68(t68),
  ]
  const s = enteredTerm(salinity)
  const t = valueTerm(t68, 'degC')
  const [w, a, b] = [valueTerm(pure, 'kg/m3'), valueTerm(each, 'kg/m3'), valueTerm(half, 'kg/m3')]
  return [
    temperature68Line(enteredTerm(temperature), t68),
    line('pure', `(${pureExpression(t)}) * 1 kg/m3`, pure, 'kg/m3', ['t68']),
    line('per-salinity', `(${perSalinityExpression(t)}) * 1 kg/m3`, each, 'kg/m3', ['t68']),
    line('per-half', `(${perHalfExpression(t)}) * 1 kg/m3`, half, 'kg/m3', ['t68']),
    line(
      'density',
      `${w} + ${a} * ${s} + ${b} * ${s} * sqrt(${s}) + 0.00048314 kg/m3 * ${s}^2`,
      density,
      'kg/m3',
      ['pure', 'per-salinity', 'per-half'],
    ),
  ]
}
