import { saltMassWithMoisture } from '../../domain/water/salinity-change/salt-mass.ts'
import { measureAmount } from '../../domain/dose/measure-amount.ts'
import { ok, refuse } from '../../domain/result.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type Figure } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { measuredFigure } from './parts/measured-figure.ts'
import { plannedDays, saltPerKilogram, saltPerLitre } from './parts/salt-answers.ts'
import { densityLineWords } from './parts/seawater-density-lines.ts'
import { volumeInputs, volumeWords } from './parts/volume-input.ts'

const gramsPerKilogram = 1000
/** A rise of more than this in a day is faster than common practice. @source salinity-practice */
const usualRise = 3

/** Salt to weigh for a rise of the salinity, in grams per litre or by mass, at once or in days. */
export const saltMass = defineCalculator({
  id: 'salt-mass',
  group: 'exchange',
  words: defineMessages({
    name: 'Salt to add',
    purpose:
      'How much salt raises the salinity: in grams per litre, or by mass for sea water; at once or in daily steps.',
    formula: 'salt = volume × rise; by mass, mass of the water × rise ÷ (1000 − target); ÷ purity',
    'input.by': 'How the salinity is measured',
    'option.by.per-litre': 'Grams per litre (salt baths in fresh water)',
    'option.by.per-kilogram': 'g/kg or PSS-78 (brackish and sea water)',
    ...volumeWords,
    'input.startPerLitre': 'Salt in the water now',
    'help.startPerLitre': 'Fresh water is 0.',
    'input.targetPerLitre': 'Salt wanted in the water',
    'input.start': 'Salinity now',
    'input.target': 'Salinity wanted',
    'help.target': 'On the same scale as the salinity now.',
    'input.temperature': 'Temperature of the water',
    'help.temperature': 'For its density.',
    'input.perDay': 'Largest rise in a day',
    'help.perDay': 'Left open, all of it at once.',
    'input.purity': 'Purity of the salt',
    'help.purity':
      'By label or assay; a sea salt mix holds water, often 10 to 15 % (from memory). Left open, 100 %.',
    'input.purityTolerance': 'Tolerance of the purity',
    'input.division': 'Smallest step of the balance',
    'result.salt': 'Salt, dry and pure',
    'result.weighed': 'Salt to weigh',
    'result.days': 'Days',
    'result.rise': 'Rise each day',
    'column.day': 'Day',
    'column.from': 'From',
    'column.to': 'To',
    'column.salt': 'Salt to weigh, kg',
    'line.start-kg': 'Salinity now, in g/kg',
    'line.target-kg': 'Salinity wanted, in g/kg',
    'line.practical': 'Practical salinity, for the density',
    ...densityLineWords,
    'line.water': 'Mass of the water',
    'line.salt': 'Salt, dry and pure',
    'line.weighed': 'Salt to weigh',
    'line.days': 'Days, the next whole number',
    'line.rise': 'Rise each day',
    'line.day': (p: { day: string }) => `Day ${p.day}`,
    'refusal.target-not-above-start':
      'Salt only raises a salinity. To lower it, swap water: see the change of salinity.',
    'caution.at-once': (p: { usual: string }) =>
      `All of it at once is a rise of more than ${p.usual}. With animals in the water a rise of 1 to 3 a day is common practice (no source), unless the order is for a bath or a dip.`,
    'caution.faster-than-usual': (p: { usual: string }) =>
      `This is faster than is common practice (1 to ${p.usual} a day, no source). The order decides.`,
    'caution.pour':
      'Dissolve the salt apart and add it slowly where the water moves. Undissolved salt burns animals that lie on it (from memory).',
    'caution.sea-salt':
      'Common salt is not sea salt: sea animals need the mix. Take no salt with iodine or an anti-caking agent (from memory).',
    'caution.measure': 'Measure when all is dissolved, and before each next step.',
  }),
  inputs: {
    by: choice(['per-litre', 'per-kilogram']),
    ...volumeInputs,
    startPerLitre: quantity({
      units: ['g/L', 'mg/L'],
      limits: { min: 0, max: 300_000 },
      when: { by: ['per-litre'] },
    }),
    targetPerLitre: quantity({
      units: ['g/L', 'mg/L'],
      limits: { min: 0, max: 300_000, plausible: { max: 40_000 } },
      when: { by: ['per-litre'] },
    }),
    start: quantity({
      units: ['g/kg', 'PSS-78'],
      limits: { min: 0, max: 42 },
      when: { by: ['per-kilogram'] },
      reading: 'salinity',
    }),
    target: quantity({
      units: ['g/kg', 'PSS-78'],
      limits: { min: 0, max: 300, plausible: { max: 42 } },
      when: { by: ['per-kilogram'] },
    }),
    temperature: quantity({
      units: ['degC', 'degF'],
      limits: { min: -2, max: 40 },
      when: { by: ['per-kilogram'] },
      reading: 'temperature',
    }),
    perDay: quantity({
      units: ['g/L', 'g/kg', 'PSS-78'],
      difference: true,
      limits: { above: 0 },
      optional: true,
    }),
    purity: quantity({
      units: ['percent_w_w'],
      limits: { above: 0, min: 0.1, max: 100, plausible: { min: 50 } },
      optional: true,
    }),
    purityTolerance: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'purity',
    }),
    division: quantity({ units: ['g', 'kg', 'mg', 'lb', 'oz_av'], limits: { above: 0 }, optional: true }),
  },
  fields: {
    systemLitres: 'volume',
    startGPerL: 'startPerLitre',
    targetGPerL: 'targetPerLitre',
    startGPerKg: 'start',
    targetGPerKg: 'target',
    temperatureC: 'temperature',
    purityPercent: 'purity',
    anhydrousKg: 'volume',
    mostPerDay: 'perDay',
  },
  example: {
    by: 'per-kilogram',
    volume: { value: '1000', unit: 'L' },
    start: { value: '16', unit: 'PSS-78' },
    target: { value: '22', unit: 'PSS-78' },
    temperature: { value: '25', unit: 'degC' },
    perDay: { value: '3', unit: 'PSS-78' },
    purity: { value: '88', unit: 'percent_w_w' },
  },
  sources: ['salt-balance', 'treatment-practice'],
  cautions: [
    { code: 'pour', level: 'warning' },
    { code: 'sea-salt', level: 'note' },
    { code: 'measure', level: 'note' },
  ],
  plot: { across: 'day', up: 'to' },
  published: ['salt_mass_simple_kg', 'salt_mass_by_mass_balance_kg', 'salt_mass_with_moisture_kg'],
  compute(given) {
    const { by, volume, startPerLitre, targetPerLitre, start, target, temperature } = given
    const { perDay, purity, division } = given
    const salt =
      by === 'per-litre'
        ? startPerLitre && targetPerLitre
          ? saltPerLitre(volume, startPerLitre, targetPerLitre)
          : refuse('blank', 'startPerLitre', { unit: 'g/L' })
        : start && target && temperature
          ? saltPerKilogram(volume, start, target, temperature)
          : refuse('blank', 'start', { unit: 'g/kg' })
    if (!salt.ok) return salt
    const { saltKg, rise, lines } = salt.value
    const weighed = saltMassWithMoisture({ anhydrousKg: saltKg, purityPercent: purity?.value ?? 100 })
    if (!weighed.ok) return weighed
    const grams = weighed.value * gramsPerKilogram
    const measured = measureAmount(grams, 'g', division ? { division: division.entered } : undefined)
    if (!measured.ok) return measured
    const plan = perDay ? plannedDays(salt.value, perDay, purity) : ok(undefined)
    if (!plan.ok) return plan
    const pure: Figure = { key: 'salt', value: saltKg, unit: 'kg' }
    const onBalance = measuredFigure('weighed', grams, 'g', measured.value)
    // in kilograms the figure is the very value of its line
    const main: Figure =
      division && onBalance.unit !== 'kg'
        ? onBalance
        : { ...(division ? onBalance : {}), key: 'weighed', value: weighed.value, unit: 'kg' }
    return ok({
      figures: [
        ...(purity || division ? ([main, pure] as const) : ([pure] as const)),
        ...(plan.value?.figures ?? []),
      ],
      working: [
        ...lines,
        ...(purity
          ? [
              line(
                'weighed',
                `${valueTerm(saltKg, 'kg')} / (${enteredTerm(purity)} / 100) to kg`,
                weighed.value,
                'kg',
                ['salt'],
              ),
            ]
          : []),
        ...(plan.value?.lines ?? []),
      ],
      ...(plan.value ? { schedule: plan.value.schedule } : {}),
      ...tooFast(rise, plan.value?.rise),
    })
  },
})

/** The caution of a rise that is faster than common practice, with the work that it rests on. */
function tooFast(rise: number, eachDay: number | undefined) {
  if ((eachDay ?? rise) <= usualRise * (1 + 1e-9)) return {}
  const code = eachDay === undefined ? 'at-once' : 'faster-than-usual'
  const caution: BenchCaution = { code, level: 'warning', params: { usual: usualRise } }
  return { cautions: [caution], sources: ['salinity-practice'] as const }
}
