import { ammoniaFromChloramine } from '../../domain/neutralisation/ammonia-from-chloramine.ts'
import { chlorineMasses } from '../../domain/neutralisation/chlorine-masses.ts'
import { neutralisationLimits } from '../../domain/neutralisation/neutralisation-limits.ts'
import { thiosulfateNeeded } from '../../domain/neutralisation/thiosulfate-needed.ts'
import {
  practicalThiosulfateRatio,
  stoichiometricThiosulfateRatio,
  type ThiosulfateForm,
} from '../../domain/neutralisation/thiosulfate-ratio.ts'
import { ok, refuse } from '../../domain/result.ts'
import { waterLimits } from '../../domain/water/water-limits.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type BenchLine, type Figure } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { massFigure } from './parts/mass-figure.ts'
import { volumeUnits } from './parts/volume-input.ts'

/** Thiosulfate for the chlorine in a water, and the ammonia that chloramine leaves behind. */
export const dechlorination = defineCalculator({
  id: 'dechlorination',
  group: 'water',
  words: defineMessages({
    name: 'Dechlorination',
    purpose: 'Thiosulfate for tap water or a spent disinfectant, and the ammonia that chloramine leaves.',
    search: 'chlorine chloramine tap',
    formula: 'mass = total chlorine × volume × ratio',
    'input.water': 'What has the chlorine in it',
    'option.water.spent-disinfectant': 'A disinfectant that is thrown away',
    'option.water.tap-water': 'Tap water that comes in',
    'input.form': 'Form of the thiosulfate',
    'option.form.pentahydrate': 'Pentahydrate, crystals',
    'option.form.anhydrous': 'Anhydrous, powder',
    'input.chlorine': 'Total chlorine by a test',
    'help.chlorine': 'Measured, free and combined together. What the waterworks says is no reading.',
    'input.chlorineError': 'Error of the test',
    'input.chloramine': 'Monochloramine in it, as Cl₂',
    'input.volume': 'Volume of the water',
    'input.volumeError': 'Error of the volume',
    'result.amount': 'Thiosulfate to weigh',
    'result.least': 'With the least ratio in use',
    'result.equation': 'By the equation alone',
    'result.ammonia': 'Ammonia nitrogen left by the chloramine',
    'line.ratio': 'Ratio in use, for a milligram of chlorine',
    'line.least-ratio': 'Least ratio in use',
    'line.equation-ratio': 'Ratio by the equation, to tetrathionate',
    'line.amount': 'Thiosulfate',
    'line.least': 'Thiosulfate with the least ratio',
    'line.equation': 'Thiosulfate by the equation',
    'line.ammonia': 'One nitrogen for each Cl₂',
    'refusal.thiosulfate-form-not-stated':
      'Choose the form that is on the jar. Of the anhydrous powder it takes 0.637 of the mass of the crystals.',
    'refusal.chlorinated-water-not-stated':
      'Choose what has the chlorine in it. Tap water and spent disinfectant have ratios of their own.',
    'refusal.chloramine-above-chlorine':
      'Monochloramine is a part of the total chlorine and cannot be more. Check both readings.',
    'caution.measured-zero':
      'This is a plan. Animals go in, and water goes out, when a test of total chlorine reads nothing.',
    'caution.ammonia-left':
      'Thiosulfate takes the chlorine and leaves the ammonia. Bind it or let the filter take it, and test before animals go in.',
    'caution.chloramine-asked':
      'Many waterworks use chloramine, which leaves ammonia in the water. Ask them, or test for ammonia afterwards.',
    'caution.never-mix':
      'Never mix bleach with acid, ammonia or formalin: it gives off poisonous gas. Neutralise it by itself.',
    'caution.oxygen': 'Thiosulfate in excess takes oxygen from the water: aerate it.',
    'caution.tap-practice': 'Ten times the chlorine for tap water is common practice (from memory).',
    'caution.discharge': 'What may go down the drain is set by local law.',
  }),
  inputs: {
    water: choice(['spent-disinfectant', 'tap-water'], { missing: 'chlorinated-water-not-stated' }),
    form: choice(['pentahydrate', 'anhydrous'], { missing: 'thiosulfate-form-not-stated' }),
    chlorine: quantity({
      units: ['mg/L', 'ug/L', 'g/L'],
      limits: { min: 0, max: neutralisationLimits.mostChlorineMgPerL, plausible: { max: 10_000 } },
      reading: 'total-chlorine',
    }),
    chlorineError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'chlorine',
    }),
    chloramine: quantity({
      units: ['mg/L', 'ug/L'],
      limits: { min: 0, max: neutralisationLimits.mostChlorineMgPerL },
      optional: true,
    }),
    volume: quantity({
      units: volumeUnits,
      limits: { above: 0, max: waterLimits.mostLitres },
      netVolume: true,
    }),
    volumeError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'volume',
    }),
  },
  fields: {
    chlorineMgPerL: 'chlorine',
    volumeLitres: 'volume',
    chlorinatedWater: 'water',
    monochloramineMgCl2PerL: 'chloramine',
    ratioMgPerMg: 'water',
  },
  example: {
    water: 'spent-disinfectant',
    form: 'pentahydrate',
    chlorine: { value: '200', unit: 'mg/L' },
    volume: { value: '1000', unit: 'L' },
    volumeError: { value: '5', unit: 'percent' },
  },
  sources: ['thiosulfate-stoichiometry', 'iupac-weights'],
  cautions: [
    { code: 'measured-zero', level: 'warning' },
    { code: 'oxygen', level: 'note' },
    { code: 'discharge', level: 'note' },
  ],
  published: [
    'thiosulfate_ratio_stoichiometric',
    'thiosulfate_ratio_practical',
    'thiosulfate_g',
    'ammonia_released_from_chloramine_mg_N_per_L',
  ],
  compute({ water, form, chlorine, chloramine, volume }) {
    if (chloramine && chloramine.value > chlorine.value)
      return refuse('chloramine-above-chlorine', 'chloramine')
    const practice = practicalThiosulfateRatio({ form, chlorinatedWater: water })
    if (!practice.ok) return practice
    const equation = stoichiometricThiosulfateRatio({ form, product: 'tetrathionate' })
    if (!equation.ok) return equation
    const { least, most } = practice.value
    const share = form === 'anhydrous' ? ` * ${molar('anhydrous')} / ${molar('pentahydrate')}` : ''
    const pentahydrate = (ratio: number) =>
      String(Number(((ratio * masses.pentahydrate) / masses[form]).toPrecision(3)))
    const ratios = [
      { key: 'amount', of: 'ratio', ratio: most, expression: `${pentahydrate(most)}${share}` },
      ...(least < most
        ? [{ key: 'least', of: 'least-ratio', ratio: least, expression: `${pentahydrate(least)}${share}` }]
        : []),
      {
        key: 'equation',
        of: 'equation-ratio',
        ratio: equation.value,
        expression: `2 * ${molar(form)} / ${String(chlorineMasses.chlorineGPerMol)}`,
      },
    ]
    const figures: Figure[] = []
    const working: BenchLine[] = []
    for (const { key, of, ratio, expression } of ratios) {
      const grams = thiosulfateNeeded({
        chlorineMgPerL: chlorine.value,
        volumeLitres: volume.value,
        ratioMgPerMg: ratio,
      })
      if (!grams.ok) return grams
      figures.push(massFigure(key, grams.value))
      const needed = `${enteredTerm(chlorine)} * ${enteredTerm(volume)} * ${valueTerm(ratio, 'ratio')} to g`
      working.push(line(of, expression, ratio, 'ratio'), line(key, needed, grams.value, 'g', [of]))
    }
    const cautions: BenchCaution[] =
      water === 'spent-disinfectant'
        ? [{ code: 'never-mix', level: 'warning' }]
        : [{ code: 'tap-practice', level: 'note' }]
    if (chloramine) {
      const ammonia = ammoniaFromChloramine({ monochloramineMgCl2PerL: chloramine.value })
      if (!ammonia.ok) return ammonia
      figures.push({ key: 'ammonia', value: ammonia.value, unit: 'mg/L', figures: 3 })
      const { nitrogenGPerMol, chlorineGPerMol } = chlorineMasses
      const freed = `${enteredTerm(chloramine)} * ${String(nitrogenGPerMol)} / ${String(chlorineGPerMol)} to mg/L`
      working.push(line('ammonia', freed, ammonia.value, 'mg/L'))
      if (chloramine.value > 0) cautions.unshift({ code: 'ammonia-left', level: 'warning' })
    } else if (water === 'tap-water') cautions.push({ code: 'chloramine-asked', level: 'note' })
    const [first, ...rest] = figures
    if (first === undefined) return refuse('not-chosen', 'water')
    return ok({
      figures: [first, ...rest],
      working,
      cautions,
      sources:
        water === 'tap-water' ? ['dechlorination-practice'] : ['thiosulfate-support-note', 'piper-1982'],
    })
  },
})

const masses = chlorineMasses.thiosulfateGPerMol

/** A molar mass as a table prints it, without the last binary digits of its sum. */
const molar = (form: ThiosulfateForm): string => String(Number(masses[form].toPrecision(9)))
