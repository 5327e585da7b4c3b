import {
  dilutionFor,
  injectionSites,
  injectionVolume,
  injectionVolumeRange,
  leastGraduations,
  roundInjection,
} from '../../domain/injection/injection-volume.ts'
import { ok, refuse, type Result } from '../../domain/result.ts'
import { convert } from '../../domain/units/convert.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import type { UnitCode } from '../../domain/units/unit-table.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type BenchLine, type Figure } from '../definition.ts'
import { quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { strengthTerm } from './parts/strength-term.ts'

const mostErrorPercent = 5
const gramsPerKilogram = 1000
/** A concentration in water. As the strength of a bottle it is a slip of a thousand or more. */
const unitsOfWater: readonly UnitCode[] = ['mg/L', 'ug/L', 'g/m3']

/** The volume to inject for a weighed animal, as the syringe can take it. */
export const injection = defineCalculator({
  id: 'injection',
  group: 'dose',
  weekly: true,
  words: defineMessages({
    name: 'Injection',
    purpose:
      'The volume for a weighed animal, rounded to the syringe, with what the rounding makes of the dose.',
    formula: 'volume = dose × weight ÷ strength',
    'input.dose': 'Dose',
    'help.dose': 'As the order says, of what the strength is of.',
    'input.weight': 'Weight of the animal',
    'help.weight': 'Weighed, not reckoned from its length.',
    'input.weightError': 'Error of the weight',
    'input.strength': 'Strength of the solution',
    'input.strengthTolerance': 'Tolerance of the strength',
    'input.graduation': 'Smallest step of the syringe',
    'input.mostPerSite': 'Largest volume for one site',
    'help.mostPerSite': 'As the order says.',
    'result.volume': 'Volume to inject',
    'result.exact': 'Unrounded',
    'result.drug': 'Drug for this weight',
    'result.taken': 'Drug in the rounded volume',
    'result.error': 'Rounding makes of the dose',
    'result.sites': 'Sites to divide it over',
    'result.each': 'Volume for each site',
    'line.sites': 'Sites to divide it over',
    'line.each': 'Volume for each site',
    'line.drug': 'Drug needed',
    'line.volume': 'Volume, unrounded',
    'line.taken': 'Drug in the rounded volume',
    'line.share': 'The rounded volume in per cent of the unrounded one',
    'refusal.strength-of-a-water':
      'Give the strength as the label has it, in mg/mL, g/L or % w/v. In milligrams or micrograms per litre it is a thousandth of that or less.',
    'refusal.below-half-graduation':
      'The volume is less than half of the smallest step of this syringe. Dilute the solution, or take a finer syringe.',
    'caution.dilute': (p: { least: string; parts: string }) =>
      `The volume is less than ${p.least} steps of this syringe. Thinned to 1 in ${p.parts} it would be enough; only with a diluent that the label or the veterinarian names.`,
    'caution.rounding':
      'The rounding alone changes the dose by more than 5 %. Dilute, or take a finer syringe.',
    'caution.divide': (p: { sites: string }) =>
      `The volume is above the largest for one site. Divide it over ${p.sites} sites, and do not give it in one.`,
    'caution.decimal':
      'One decimal place is a tenfold dose. Read the milligrams and the millilitres together.',
    'caution.site': 'The largest volume for one site is set by the order; above it the dose is divided.',
  }),
  inputs: {
    dose: quantity({
      units: ['mg/kg', 'ug/kg'],
      limits: { above: 0, max: 10_000, plausible: { min: 0.001, max: 500 } },
    }),
    weight: quantity({
      units: ['kg', 'g', 'lb', 'oz_av', 'mg'],
      limits: { above: 0, max: 20_000_000, plausible: { min: 0.1, max: 3_000_000 } },
    }),
    weightError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'weight',
    }),
    strength: quantity({
      units: ['mg/mL', 'g/L', 'percent_w_v'],
      limits: { above: 0, max: 2_000_000 },
    }),
    strengthTolerance: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'strength',
    }),
    graduation: quantity({ units: ['mL', 'uL'], limits: { above: 0, max: 0.1 }, optional: true }),
    mostPerSite: quantity({ units: ['mL', 'uL'], limits: { above: 0 }, optional: true }),
  },
  fields: {
    doseMgPerKg: 'dose',
    weightKg: 'weight',
    strengthMgPerMl: 'strength',
    graduationMl: 'graduation',
    mostPerSiteMl: 'mostPerSite',
    weightPercent: 'weightError',
    strengthPercent: 'strengthTolerance',
  },
  example: {
    dose: { value: '10', unit: 'mg/kg' },
    weight: { value: '1.35', unit: 'kg' },
    strength: { value: '22.7', unit: 'mg/mL' },
    graduation: { value: '0.01', unit: 'mL' },
  },
  sources: ['injection-practice'],
  cautions: [
    { code: 'decimal', level: 'note' },
    { code: 'site', level: 'note' },
  ],
  published: ['injection_volume_mL', 'injection_volume_rounded_mL', 'injection_rounding_error_percent'],
  compute({ dose, weight, weightError, strength, strengthTolerance, graduation, mostPerSite }) {
    if (unitsOfWater.includes(strength.entered.unit)) return refuse('strength-of-a-water', 'strength')
    const weightKg = weight.value / gramsPerKilogram
    const strengthMgPerMl = strength.value / gramsPerKilogram
    const volume = injectionVolume({ doseMgPerKg: dose.value, weightKg, strengthMgPerMl })
    if (!volume.ok) return volume
    const millilitres = volume.value
    const milligrams = dose.value * weightKg
    const working = [
      line('drug', `${enteredTerm(dose)} * ${enteredTerm(weight)} to mg`, milligrams, 'mg'),
      line(
        'volume',
        `${valueTerm(milligrams, 'mg')} / (${strengthTerm(strength)}) to mL`,
        millilitres,
        'mL',
        ['drug'],
      ),
    ]
    const exact = { value: millilitres, unit: 'mL', kind: 'dose' } as const
    const drug = { key: 'drug', value: milligrams, unit: 'mg', kind: 'dose' } as const
    // worked out here: to ask again at both ends would be to ask with a strength in mg/L
    const range = rangeIn(graduation?.entered.unit ?? 'mL', millilitres, {
      weightPercent: weightError?.value ?? 0,
      strengthPercent: strengthTolerance?.value ?? 0,
    })
    if (!range.ok) return range
    if (!graduation) {
      const split = divided(millilitres, valueTerm(millilitres, 'mL'), ['volume'], mostPerSite)
      if (!split.ok) return split
      return ok({
        figures: [{ key: 'volume', ...exact }, drug, ...split.value.figures],
        working: [...working, ...split.value.working],
        cautions: split.value.cautions,
        ...range.value,
      })
    }
    const { value: stepText, unit } = graduation.entered
    const inStep = convert(millilitres, 'mL', unit)
    const step = convert(graduation.value, 'L', 'mL')
    if (!inStep.ok) return inStep
    if (!step.ok) return step
    const rounded = roundInjection(inStep.value, stepText)
    if (!rounded.ok) return rounded
    const parts = dilutionFor(millilitres, step.value)
    if (!parts.ok) return parts
    const { text, millilitres: taken, errorPercent } = rounded.value
    const takenTerm = valueTerm(taken, unit)
    const takenMl = convert(taken, unit, 'mL')
    if (!takenMl.ok) return takenMl
    const split = divided(takenMl.value, takenTerm, [], mostPerSite)
    if (!split.ok) return split
    const cautions: BenchCaution[] = []
    if (parts.value > 1)
      cautions.push({
        code: 'dilute',
        level: 'warning',
        params: { least: leastGraduations, parts: parts.value },
      })
    if (Math.abs(errorPercent) > mostErrorPercent) cautions.push({ code: 'rounding', level: 'warning' })
    return ok({
      figures: [
        { key: 'volume', value: inStep.value, unit, measured: text, kind: 'dose' },
        { key: 'exact', ...exact },
        drug,
        { key: 'error', value: errorPercent, unit: 'percent', figures: 2, kind: 'reading' },
        { key: 'taken', value: takenMl.value * strengthMgPerMl, unit: 'mg', kind: 'dose' },
        ...split.value.figures,
      ],
      working: [
        ...working,
        line(
          'taken',
          `${takenTerm} * ${strengthTerm(strength)} to mg`,
          takenMl.value * strengthMgPerMl,
          'mg',
        ),
        line(
          'share',
          `${takenTerm} / (${valueTerm(millilitres, 'mL')}) * 100`,
          (taken / inStep.value) * 100,
          'percent',
          ['volume'],
        ),
        ...split.value.working,
      ],
      cautions: [...split.value.cautions, ...cautions],
      ...range.value,
    })
  },
})

/** What the stated errors make of the volume, in the unit that it is given in; nothing where none is stated. */
function rangeIn(
  unit: UnitCode,
  millilitres: number,
  errors: Parameters<typeof injectionVolumeRange>[1],
): Result<{ range?: { low: number; high: number } }> {
  if (errors.weightPercent === 0 && errors.strengthPercent === 0) return ok({})
  const ends = injectionVolumeRange(millilitres, errors)
  if (!ends.ok) return ends
  const low = convert(ends.value.low, 'mL', unit)
  const high = convert(ends.value.high, 'mL', unit)
  if (!low.ok) return low
  return high.ok ? ok({ range: { low: low.value, high: high.value } }) : high
}

interface Split {
  figures: readonly Figure[]
  working: readonly BenchLine[]
  cautions: readonly BenchCaution[]
}

/** A volume over its sites, where it is more than one of them may get. */
function divided(
  millilitres: number,
  term: string,
  rests: readonly string[],
  mostPerSite: ParsedQuantity | undefined,
): Result<Split> {
  const one: Split = { figures: [], working: [], cautions: [] }
  if (!mostPerSite) return ok(one)
  const most = convert(mostPerSite.value, 'L', 'mL')
  if (!most.ok) return most
  const sites = injectionSites(millilitres, most.value)
  if (!sites.ok) return sites
  if (sites.value === 1) return ok(one)
  const each = millilitres / sites.value
  return ok({
    figures: [
      { key: 'sites', value: sites.value, unit: 'ratio', whole: true },
      { key: 'each', value: each, unit: 'mL', kind: 'dose' },
    ],
    working: [
      line('sites', `ceil(${term} / (${enteredTerm(mostPerSite)}))`, sites.value, 'ratio', rests),
      line('each', `${term} / ${valueTerm(sites.value, 'ratio')} to mL`, each, 'mL', [...rests, 'sites']),
    ],
    cautions: [{ code: 'divide', level: 'warning', params: { sites: sites.value } }],
  })
}
