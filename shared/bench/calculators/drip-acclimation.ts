import { ok, refuse, type Result } from '../../domain/result.ts'
import { convert } from '../../domain/units/convert.ts'
import { acclimationLitres, acclimationSalinity } from '../../domain/water/flow/drip-acclimation.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchLine, type Figure } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'

const scales = ['PSS-78', 'g/kg'] as const
const quarters = [0, 0.25, 0.5, 0.75, 1] as const

/** Water of the tank dripped into the vessel of an arrival until the salinities are near enough. */
export const dripAcclimation = defineCalculator({
  id: 'drip-acclimation',
  group: 'exchange',
  words: defineMessages({
    name: 'Drip acclimation',
    purpose:
      'How fast, or how long, water of the tank drips into the vessel of an arrival until the salinities are near enough.',
    formula: 'water = vessel × (difference ÷ difference left − 1)',
    'input.find': 'What to find',
    'option.find.drip': 'The drip for a time',
    'option.find.time': 'The time for a drip',
    'input.vessel': 'Water in the vessel',
    'help.vessel': 'What the animals came in. None is taken out while it drips.',
    'input.start': 'Salinity in the vessel',
    'input.tank': 'Salinity of the tank',
    'input.near': 'Difference that is near enough',
    'help.near': 'As the veterinarian says for these animals.',
    'input.duration': 'Time that it may take',
    'input.drip': 'Drip',
    'help.drip': 'Caught in a measure for a minute; drops differ.',
    'result.drip': 'Drip',
    'result.time': 'Time',
    'result.added': 'Water of the tank that drips in',
    'result.fastest': 'Change in an hour, at the beginning',
    'line.added': 'Water of the tank that drips in',
    'line.drip': 'Drip',
    'line.time': 'Time',
    'line.fastest': 'Change in an hour, at the beginning',
    'column.minutes': 'Time',
    'column.litres': 'Litres dripped in',
    'column.salinity': 'Salinity',
    'caution.ammonia':
      'Opened shipping water loses carbon dioxide, its pH rises and its ammonia turns poisonous. Test it, and do not drip for long into water that holds ammonia (from memory).',
    'caution.holds':
      'The vessel has to hold all of it. The change is fastest at the beginning: begin slower, or watch the animals.',
    'caution.other': 'Temperature and pH come nearer too, but not by this arithmetic. Measure both.',
  }),
  inputs: {
    find: choice(['drip', 'time']),
    vessel: quantity({ units: ['L', 'mL', 'gal_us', 'gal_imp'], limits: { above: 0, max: 100_000_000 } }),
    start: quantity({ units: scales, limits: { min: 0, max: 120, plausible: { max: 42 } } }),
    tank: quantity({
      units: scales,
      limits: { min: 0, max: 120, plausible: { max: 42 } },
      reading: 'salinity',
    }),
    near: quantity({
      difference: true,
      units: scales,
      limits: { above: 0, max: 120, plausible: { max: 5 } },
    }),
    duration: quantity({
      units: ['min', 'h'],
      limits: { above: 0, max: 100_000 },
      when: { find: ['drip'] },
    }),
    drip: quantity({
      units: ['mL/min', 'L/h', 'L/min'],
      limits: { above: 0, max: 10_000 },
      when: { find: ['time'] },
    }),
  },
  fields: {
    startLitres: 'vessel',
    startSalinity: 'start',
    tankSalinity: 'tank',
    nearEnough: 'near',
    addedLitres: 'near',
    value: 'duration',
  },
  example: {
    find: 'drip',
    vessel: { value: '4', unit: 'L' },
    start: { value: '30', unit: 'PSS-78' },
    tank: { value: '35', unit: 'PSS-78' },
    near: { value: '1', unit: 'PSS-78' },
    duration: { value: '90', unit: 'min' },
  },
  sources: ['salt-balance', 'treatment-practice'],
  cautions: [
    { code: 'ammonia', level: 'warning' },
    { code: 'holds', level: 'note' },
    { code: 'other', level: 'note' },
  ],
  plot: { across: 'minutes', up: 'salinity' },
  compute({ find, vessel, start, tank, near, duration, drip }) {
    if (tank.unit !== start.unit) return refuse('dimensions-differ', 'tank')
    if (near.unit !== start.unit) return refuse('dimensions-differ', 'near')
    const water = {
      startLitres: vessel.value,
      startSalinity: start.value,
      tankSalinity: tank.value,
    }
    const added = acclimationLitres({ ...water, nearEnough: near.value })
    if (!added.ok) return added
    const litres = added.value
    const scale = start.unit === 'g/kg' ? 'g/kg' : 'PSS-78'
    const [filled, high, low] = [
      enteredTerm(vessel),
      ...(start.value > tank.value ? [start, tank] : [tank, start]).map(enteredTerm),
    ]
    const apart = `(${String(high)} - ${String(low)})`
    const expression = litres === 0 ? '0 L' : `${filled} * (${apart} / (${enteredTerm(near)}) - 1) to L`
    const lines: BenchLine[] = [line('added', expression, litres, 'L')]
    const found = find === 'drip' ? duration : drip
    if (!found) return refuse('blank', find === 'drip' ? 'duration' : 'drip', { unit: 'min' })
    const minutes = find === 'drip' ? found.value : litres / found.value
    const litresPerMinute = find === 'drip' ? litres / found.value : found.value
    const mlPerMinute = convert(litresPerMinute, 'L/min', 'mL/min')
    if (!mlPerMinute.ok) return mlPerMinute
    const result: Figure =
      find === 'drip'
        ? { key: 'drip', value: mlPerMinute.value, unit: 'mL/min' }
        : { key: 'time', value: minutes, unit: 'min' }
    const quotient = `${valueTerm(litres, 'L')} / (${enteredTerm(found)})`
    lines.push(
      line(
        result.key,
        `${quotient} to ${find === 'drip' ? 'mL/minute' : 'minute'}`,
        result.value,
        result.unit,
        ['added'],
      ),
    )
    const rate = find === 'drip' ? valueTerm(mlPerMinute.value, 'mL/min') : enteredTerm(found)
    const fastest = (Math.abs(start.value - tank.value) * litresPerMinute * 60) / vessel.value
    lines.push(
      line(
        'fastest',
        `${apart} * (${rate}) * 60 minute / (${filled})`,
        fastest,
        scale,
        find === 'drip' ? ['drip'] : [],
      ),
    )
    const rows = rowsOf(water, litres, minutes)
    if (!rows.ok) return rows
    return ok({
      figures: [
        result,
        { key: 'added', value: litres, unit: 'L', kind: 'volume' },
        { key: 'fastest', value: fastest, unit: scale },
      ],
      working: lines,
      schedule: {
        columns: [
          { key: 'minutes', unit: 'min', figures: 3 },
          { key: 'litres', unit: 'L', figures: 3 },
          { key: 'salinity', unit: scale, figures: 3 },
        ],
        rows: rows.value,
      },
    })
  },
})

/** Where the vessel is after each quarter of the time. */
function rowsOf(
  water: { startLitres: number; startSalinity: number; tankSalinity: number },
  litres: number,
  minutes: number,
): Result<number[][]> {
  const rows: number[][] = []
  for (const part of quarters) {
    const reached = acclimationSalinity({ ...water, addedLitres: litres * part })
    if (!reached.ok) return reached
    rows.push([minutes * part, litres * part, reached.value])
  }
  return ok(rows)
}
