import { practicalOfReference, referenceSalinity } from '../../../domain/seawater/reference-salinity.ts'
import { ok, refuse, type Result } from '../../../domain/result.ts'
import type { ParsedQuantity } from '../../../domain/units/parse-quantity.ts'
import {
  saltMassByBalance,
  saltMassSimple,
  saltMassWithMoisture,
  saltSteps,
  saltWaterMass,
  type SaltRefusal,
} from '../../../domain/water/salinity-change/salt-mass.ts'
import { enteredTerm } from '../../../domain/working/entered-term.ts'
import { valueTerm } from '../../../domain/working/value-term.ts'
import type { BenchLine, Figure, Schedule } from '../../definition.ts'
import { line } from '../../line.ts'
import { densityLines } from './seawater-density-lines.ts'

type Scale = 'g/L' | 'g/kg' | 'PSS-78'

/** The salt for a whole rise, with what a plan of days needs. */
export interface Salt {
  saltKg: number
  /** In the scale as entered. */
  rise: number
  lines: BenchLine[]
  scale: Scale
  /** In g/L or g/kg. */
  start: number
  target: number
  saltTo(target: number): Result<number, SaltRefusal>
  /** The salt of one day, from one salinity to the next, as an expression in kg. */
  dayTerm(from: number, to: number): string
  dayRests: string[]
}

const mgPerGram = 1000

/** By grams in a litre. */
export function saltPerLitre(volume: ParsedQuantity, from: ParsedQuantity, to: ParsedQuantity): Result<Salt> {
  const [start, target] = [from.value / mgPerGram, to.value / mgPerGram]
  const saltTo = (targetGPerL: number) =>
    saltMassSimple({ systemLitres: volume.value, startGPerL: start, targetGPerL })
  const salt = saltTo(target)
  if (!salt.ok) return salt
  const water = enteredTerm(volume)
  const expression = `${water} * (${enteredTerm(to)} - ${enteredTerm(from)}) to kg`
  return ok({
    saltKg: salt.value,
    rise: target - start,
    lines: [line('salt', expression, salt.value, 'kg')],
    scale: 'g/L',
    start,
    target,
    saltTo,
    dayTerm: (a, b) => `${water} * (${valueTerm(b, 'g/L')} - ${valueTerm(a, 'g/L')})`,
    dayRests: [],
  })
}

/** By grams in a kilogram, with the mass of the water from its density; PSS-78 as reference salinity. */
export function saltPerKilogram(
  volume: ParsedQuantity,
  from: ParsedQuantity,
  to: ParsedQuantity,
  temperature: ParsedQuantity,
): Result<Salt> {
  if (from.unit !== to.unit) return refuse('dimensions-differ', 'target')
  const [start, target] = [inGPerKg('start', from), inGPerKg('target', to)]
  if (!start.ok) return start
  if (!target.ok) return target
  const given = {
    systemLitres: volume.value,
    startGPerKg: start.value.value,
    temperatureC: temperature.value,
  }
  const water = saltWaterMass(given)
  if (!water.ok) return water
  const saltTo = (targetGPerKg: number) => saltMassByBalance({ ...given, targetGPerKg })
  const salt = saltTo(target.value.value)
  if (!salt.ok) return salt
  const { practicalSalinity, densityKgPerM3, waterKg } = water.value
  const [s1, s2] = [start.value.value, target.value.value]
  const [low, high] = [valueTerm(s1, 'g/kg'), valueTerm(s2, 'g/kg')]
  const mass = valueTerm(waterKg, 'kg')
  const dense = valueTerm(densityKgPerM3, 'ratio')
  const scaled = [...start.value.lines, ...target.value.lines].map((each) => each.key)
  const lines = [
    ...start.value.lines,
    ...target.value.lines,
    line(
      'practical',
      `${low} * 35 / 35.16504`,
      practicalSalinity,
      'PSS-78',
      start.value.lines.map((each) => each.key),
    ),
    ...densityLines(practicalSalinity, 'practical', temperature.value),
    line('water', `${enteredTerm(volume)} * ${dense} kg/m3 to kg`, waterKg, 'kg', ['density']),
    line('salt', `${mass} * (${high} - ${low}) / (1000 - ${high}) to kg`, salt.value, 'kg', [
      'water',
      ...scaled,
    ]),
  ]
  const share = (at: number) => {
    const term = valueTerm(at, 'g/kg')
    return `(${term} - ${low}) / (1000 - ${term})`
  }
  return ok({
    saltKg: salt.value,
    rise: to.value - from.value,
    lines,
    scale: from.unit === 'PSS-78' ? 'PSS-78' : 'g/kg',
    start: s1,
    target: s2,
    saltTo,
    dayTerm: (a, b) => `${mass} * (${share(b)} - ${share(a)})`,
    dayRests: ['water'],
  })
}

function inGPerKg(key: string, entered: ParsedQuantity): Result<{ value: number; lines: BenchLine[] }> {
  if (entered.unit !== 'PSS-78') return ok({ value: entered.value, lines: [] })
  const reference = referenceSalinity({ salinityPss78: entered.value })
  if (!reference.ok) return refuse(reference.refusal.code, key, reference.refusal.params)
  const expression = `${enteredTerm(entered)} * 35.16504 / 35`
  return ok({
    value: reference.value,
    lines: [line(`${key}-kg`, expression, reference.value, 'g/kg')],
  })
}

interface Planned {
  figures: Figure[]
  lines: BenchLine[]
  schedule: Schedule
  /** Each day, in the scale as entered. */
  rise: number
}

/** The salt of each day, as it is weighed, where the salinity may rise only so much in a day. */
export function plannedDays(
  salt: Salt,
  perDay: ParsedQuantity,
  purity: ParsedQuantity | undefined,
): Result<Planned> {
  const { scale, start, target } = salt
  if ((perDay.unit === 'mg/L' ? 'g/L' : perDay.unit) !== scale) return refuse('dimensions-differ', 'perDay')
  const most = mostPerDay(perDay)
  if (!most.ok) return most
  const unit = scale === 'g/L' ? 'g/L' : 'g/kg'
  const steps = saltSteps({ start, target, mostPerDay: most.value, unit }, salt.saltTo)
  if (!steps.ok) return steps
  const days = steps.value.length
  const asEntered = (value: number) => (scale === 'PSS-78' ? practicalOf(value) : value)
  const lines: BenchLine[] = []
  const rows: number[][] = []
  for (const { day, from, to, saltKg } of steps.value) {
    const weighed = saltMassWithMoisture({ anhydrousKg: saltKg, purityPercent: purity?.value ?? 100 })
    if (!weighed.ok) return weighed
    const moist = purity ? ` / (${enteredTerm(purity)} / 100)` : ''
    const expression = `${salt.dayTerm(from, to)}${moist} to kg`
    lines.push(
      line(`day-${String(day)}`, expression, weighed.value, 'kg', salt.dayRests, {
        code: 'day',
        params: { day },
      }),
    )
    rows.push([day, asEntered(from), asEntered(to), weighed.value])
  }
  const rise = days === 0 ? 0 : salt.rise / days
  return ok({
    figures: [
      { key: 'days', value: days, unit: 'ratio', whole: true },
      { key: 'rise', value: rise, unit: scale },
    ],
    lines,
    schedule: {
      columns: [
        { key: 'day', unit: 'ratio', whole: true },
        { key: 'from', unit: scale },
        { key: 'to', unit: scale },
        { key: 'salt', unit: 'kg' },
      ],
      rows,
    },
    rise,
  })
}

function mostPerDay(perDay: ParsedQuantity): Result<number> {
  if (perDay.unit === 'mg/L') return ok(perDay.value / mgPerGram)
  if (perDay.unit !== 'PSS-78') return ok(perDay.value)
  const reference = referenceSalinity({ salinityPss78: perDay.value })
  return reference.ok ? reference : refuse(reference.refusal.code, 'perDay', reference.refusal.params)
}

/** Back on the practical scale; a target of PSS-78 lies on it. */
function practicalOf(gPerKg: number): number {
  const practical = practicalOfReference({ salinityGPerKg: gPerKg })
  return practical.ok ? practical.value : gPerKg
}
