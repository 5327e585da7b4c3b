import { measureAmount } from '../../domain/dose/measure-amount.ts'
import { bleachVolume } from '../../domain/neutralisation/bleach-volume.ts'
import { neutralisationLimits } from '../../domain/neutralisation/neutralisation-limits.ts'
import { ok } from '../../domain/result.ts'
import { convert } from '../../domain/units/convert.ts'
import { waterLimits } from '../../domain/water/water-limits.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator } from '../definition.ts'
import { quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { measuredFigure } from './parts/measured-figure.ts'
import { strengthTerm } from './parts/strength-term.ts'
import { volumeUnits } from './parts/volume-input.ts'

const mgPerLOfOnePercent = 10_000

/** Bleach in a disinfecting solution for nets, tanks and boots. */
export const bleachSolution = defineCalculator({
  id: 'bleach-solution',
  group: 'water',
  words: defineMessages({
    name: 'Bleach solution',
    purpose: 'How much bleach makes a disinfecting solution of so much chlorine.',
    formula: 'bleach = target × volume ÷ available chlorine',
    'input.target': 'Chlorine in the solution',
    'input.volume': 'Volume of the finished solution',
    'input.volumeError': 'Error of the volume',
    'input.strength': 'Available chlorine of the bleach',
    'help.strength':
      'By weight in volume, as the label says. Household bleach holds a few per cent and loses it with age.',
    'input.strengthTolerance': 'Tolerance of the bleach',
    'input.division': 'Smallest step of the measure',
    'result.amount': 'Bleach to measure',
    'line.amount': 'Bleach in the finished solution',
    'refusal.target-above-bleach':
      'The solution would be stronger than this bleach. Check both units, or take a stronger bleach.',
    'caution.never-mix':
      'Never mix bleach with acid, ammonia or formalin: it gives off poisonous gas. Gloves and fresh air.',
    'caution.kills':
      'Chlorine kills aquatic animals. Neutralise and rinse, and test total chlorine before use.',
    'caution.old': 'Bleach weakens with age and warmth: measure the chlorine of the solution.',
    'caution.dirt': 'Dirt and slime use chlorine up. Clean first, then disinfect.',
  }),
  inputs: {
    target: quantity({
      units: ['mg/L', 'g/L', 'percent_w_v'],
      limits: {
        above: 0,
        max: neutralisationLimits.mostChlorineMgPerL,
        plausible: { min: 1, max: 10_000 },
      },
    }),
    volume: quantity({ units: volumeUnits, limits: { above: 0, max: waterLimits.mostLitres } }),
    volumeError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'volume',
    }),
    strength: quantity({
      units: ['percent_w_v', 'g/L', 'mg/mL'],
      limits: {
        above: 0,
        max: neutralisationLimits.mostBleachPercentWv * mgPerLOfOnePercent,
        plausible: { min: 10_000, max: 150_000 },
      },
    }),
    strengthTolerance: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'strength',
    }),
    division: quantity({ units: ['mL', 'L', 'uL'], limits: { above: 0 }, optional: true }),
  },
  fields: {
    targetChlorineMgPerL: 'target',
    volumeLitres: 'volume',
    availableChlorinePercentWv: 'strength',
  },
  example: {
    target: { value: '200', unit: 'mg/L' },
    volume: { value: '100', unit: 'L' },
    strength: { value: '5.25', unit: 'percent_w_v' },
    strengthTolerance: { value: '10', unit: 'percent' },
    division: { value: '10', unit: 'mL' },
  },
  sources: ['mass-balance', 'bleach-practice'],
  cautions: [
    { code: 'never-mix', level: 'warning' },
    { code: 'kills', level: 'warning' },
    { code: 'old', level: 'note' },
    { code: 'dirt', level: 'note' },
  ],
  published: ['bleach_volume_mL'],
  compute({ target, volume, strength, division }) {
    const percent = convert(strength.value, 'mg/L', 'percent_w_v')
    if (!percent.ok) return percent
    const millilitres = bleachVolume({
      targetChlorineMgPerL: target.value,
      volumeLitres: volume.value,
      availableChlorinePercentWv: percent.value,
    })
    if (!millilitres.ok) return millilitres
    const measured = measureAmount(millilitres.value, 'mL', division && { division: division.entered })
    if (!measured.ok) return measured
    const expression = `${strengthTerm(target)} * ${enteredTerm(volume)} / (${strengthTerm(strength)}) to mL`
    return ok({
      figures: [measuredFigure('amount', millilitres.value, 'mL', measured.value)],
      working: [line('amount', expression, millilitres.value, 'mL')],
    })
  },
})
