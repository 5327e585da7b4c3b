import {
  concentrationOfDilution,
  exactBathConcentration,
  nominalBathConcentration,
} from '../../domain/anaesthesia/bath-concentration.ts'
import { bufferMass } from '../../domain/anaesthesia/buffer-mass.ts'
import { stockMass } from '../../domain/anaesthesia/stock-mass.ts'
import { stockVolumeInBath, stockVolumeOnTop } from '../../domain/anaesthesia/stock-volume.ts'
import { doseLimits } from '../../domain/dose/dose-limits.ts'
import { ok, refuse, type Result } from '../../domain/result.ts'
import { convert } from '../../domain/units/convert.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { waterLimits } from '../../domain/water/water-limits.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type BenchLine, type Figure } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { strengthTerm } from './parts/strength-term.ts'
import { volumeUnits } from './parts/volume-input.ts'

const mgPerGram = 1000
const inWater = ['stock', 'reached'] as const
const withStock = ['stock', 'reached', 'make'] as const
const buffering = ['stock', 'make'] as const

/** Stock for an anaesthetic bath of tricaine, the strength that a mix has, and the powder and buffer for a bottle. */
export const tricaineBath = defineCalculator({
  id: 'tricaine-bath',
  group: 'dose',
  words: defineMessages({
    name: 'Tricaine bath',
    purpose:
      'Stock for an anaesthetic bath with its buffer, the strength that a mix has, or a bottle of stock.',
    search: 'anaesthetic anesthesia sedation euthanasia',
    formula: 'stock = target × finished bath ÷ strength; on top of the water ÷ (strength − target)',
    'input.find': 'What to find',
    'option.find.stock': 'Stock for a bath',
    'option.find.reached': 'Strength of a bath that is mixed',
    'option.find.make': 'Powder for a bottle of stock',
    'option.find.dilution': 'What a dilution of 1 to n means',
    'input.plane': 'What the veterinarian means the bath for',
    'option.plane.sedation': 'Sedation',
    'option.plane.surgery': 'Anaesthesia for a procedure',
    'option.plane.euthanasia': 'Euthanasia',
    'input.target': 'Target in the bath',
    'help.target': 'As the order says, for this species, size and temperature.',
    'input.filling': 'How the stock goes in',
    'option.filling.filled-up': 'Stock first, then filled up to the volume',
    'option.filling.on-top': 'Poured into water that is there already',
    'input.volume': 'Volume of the water',
    'help.volume': 'Filled up: of the finished bath. Otherwise: before the stock goes in.',
    'input.volumeError': 'Error of the volume',
    'input.strength': 'Strength of the stock',
    'input.strengthTolerance': 'Tolerance of the strength',
    'input.bottle': 'Bottle of stock',
    'option.bottle.dated': 'Dated, and within its shelf life',
    'option.bottle.undated': 'Without a date, or past its shelf life',
    'input.poured': 'Stock poured in',
    'input.made': 'Volume of stock to make',
    'input.buffer': 'Buffer',
    'option.buffer.now': 'Bicarbonate is weighed in now',
    'option.buffer.other': 'At the other step: the stock or the bath is buffered',
    'option.buffer.none': 'No buffer',
    'input.ratio': 'Parts of bicarbonate to one of tricaine',
    'help.ratio':
      'Two is common; one in hard, alkaline water, and sea water often needs less still (from memory). The measured pH decides.',
    'input.parts': 'Millilitres to one gram',
    'help.parts': 'The n of 1 to n on a label.',
    'result.stock': 'Stock to add',
    'result.tricaine': 'Tricaine in it',
    'result.buffer': 'Sodium bicarbonate',
    'result.reached': 'Strength of the bath',
    'result.nominal': 'As recipes reckon, without the volume of the stock',
    'result.powder': 'Tricaine to weigh',
    'line.stock': 'Stock',
    'line.tricaine': 'Tricaine in the stock',
    'line.buffer': 'Sodium bicarbonate',
    'line.reached': 'Strength with the volume of the stock',
    'line.nominal': 'Strength without the volume of the stock',
    'line.powder': 'Tricaine in the bottle',
    'line.dilution': 'A gram in so many millilitres',
    'refusal.target-not-below-stock':
      'The target is as strong as the stock or stronger: no volume of it is enough. Make a stronger stock, or check the two units.',
    'refusal.unbuffered-stock':
      'Tricaine without buffer is an acid bath. Buffer it; where the water itself is buffer enough, a veterinarian decides that by the measured pH, not this calculator.',
    'refusal.undated-stock':
      'A stock without a date, or past its shelf life, may be weaker than its label. Pour it away and make a fresh one.',
    'refusal.plane-not-stated':
      'Choose what the veterinarian means the bath for. Doses for sedation, a procedure and euthanasia differ by ten times.',
    'caution.plane-sedation': 'The veterinarian means this bath for sedation, by what was chosen.',
    'caution.plane-surgery': 'The veterinarian means this bath for anaesthesia, by what was chosen.',
    'caution.may-recover':
      'This is within what the label gives for anaesthesia of fish, 15 to 330 mg/L: an animal may recover. Check the target.',
    'caution.above-label':
      'The label gives 15 to 330 mg/L for fish, and more only for amphibians. This can kill. Check the target and what the bath is for.',
    'caution.deep-for-sedation':
      'Sedation of fish is usually at 50 to 75 mg/L (from memory): this may go deeper. Check the target.',
    'caution.below-label': 'The label begins at 15 mg/L for fish. Check the target and its unit.',
    'caution.plane-euthanasia':
      'By what was chosen this bath is meant to kill. Mark it, and keep it apart from every other. An animal that lies still may be alive: the veterinarian says how its death is confirmed.',
    'caution.finished-bath': 'The volume is that of the finished bath, with the stock in it.',
    'caution.water-before':
      'The volume is that of the water before the stock goes in; the bath becomes larger by the stock.',
    'caution.recipes':
      'Recipes often leave out the volume of the stock and so print a strength that is too high. The first figure has it in.',
    'caution.observe':
      'Watch the breathing of the animal the whole time, and have aerated water without the drug at hand.',
    'caution.measure-ph':
      'Tricaine makes water acid. Measure the pH before an animal goes in: 7.0 to 7.5, or that of its own water.',
    'caution.buffer-other':
      'No buffer is in this figure. Make sure that the stock or the bath has it before an animal goes in.',
    'caution.buffer-practice': 'How much bicarbonate it takes is common practice (from memory), not a law.',
    'caution.powder': 'Weigh the powder under a hood: it irritates. Write date and strength on the bottle.',
    'caution.licensed':
      'An anaesthetic is given on a veterinarian’s order, by people who are trained in it, as local law says.',
    'caution.food-fish': 'For fish that may be eaten the withdrawal time on the label applies.',
    'caution.label-range': 'The label’s range is 1 to 1,000 up to 1 to 20,000 (from memory): read the label.',
  }),
  inputs: {
    find: choice(['stock', 'reached', 'make', 'dilution']),
    plane: choice(['sedation', 'surgery', 'euthanasia'], {
      when: { find: inWater },
      missing: 'plane-not-stated',
    }),
    target: quantity({
      units: ['mg/L', 'g/L'],
      limits: { above: 0, max: doseLimits.mostTargetMgPerL, plausible: { min: 10, max: 1000 } },
      when: { find: ['stock'] },
    }),
    filling: choice(['filled-up', 'on-top'], { when: { find: ['stock'] } }),
    volume: quantity({
      units: volumeUnits,
      limits: { above: 0, max: waterLimits.mostLitres },
      when: { find: inWater },
    }),
    volumeError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'volume',
      when: { find: inWater },
    }),
    strength: quantity({
      units: ['g/L', 'mg/mL', 'percent_w_v'],
      limits: { above: 0, max: 2_000_000, plausible: { min: 1000, max: 100_000 } },
      when: { find: withStock },
    }),
    strengthTolerance: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'strength',
      when: { find: inWater },
    }),
    bottle: choice(['dated', 'undated'], { when: { find: inWater } }),
    poured: quantity({
      units: ['mL', 'L', 'uL'],
      limits: { above: 0, max: waterLimits.mostLitres },
      when: { find: ['reached'] },
    }),
    made: quantity({
      units: ['mL', 'L'],
      limits: { above: 0, max: waterLimits.mostLitres, plausible: { min: 0.01, max: 100 } },
      when: { find: ['make'] },
    }),
    buffer: choice(['now', 'other', 'none'], { when: { find: buffering } }),
    ratio: quantity({
      units: ['ratio'],
      limits: { min: 0, max: 10, plausible: { min: 0.2, max: 3 } },
      when: { find: buffering, buffer: ['now'] },
    }),
    parts: quantity({
      units: ['ratio'],
      limits: { min: 10, max: 1_000_000_000, plausible: { min: 1000, max: 20_000 } },
      when: { find: ['dilution'] },
    }),
  },
  fields: {
    targetMgPerL: 'target',
    bathLitres: 'volume',
    waterLitres: 'volume',
    waterMl: 'volume',
    stockGPerL: 'strength',
    stockMgPerMl: 'strength',
    stockMl: 'poured',
    bicarbonateRatio: 'ratio',
    tricaineG: 'strength',
    dilutionParts: 'parts',
  },
  example: {
    find: 'stock',
    plane: 'surgery',
    target: { value: '100', unit: 'mg/L' },
    filling: 'on-top',
    volume: { value: '10', unit: 'L' },
    volumeError: { value: '5', unit: 'percent' },
    strength: { value: '10', unit: 'g/L' },
    bottle: 'dated',
    buffer: 'now',
    ratio: { value: '2', unit: 'ratio' },
  },
  sources: ['mass-balance', 'tricaine-buffer-practice', 'cfr-529-2503'],
  cautions: [
    { code: 'licensed', level: 'note' },
    { code: 'food-fish', level: 'note' },
  ],
  plot: { vary: 'target', unit: 'mg/L', from: 20, to: 200, figure: 'stock' },
  published: [
    'stock_volume_mL_simple',
    'stock_volume_mL_exact',
    'buffer_mass_g',
    'bath_concentration_mg_per_L_nominal',
    'bath_concentration_mg_per_L_exact',
    'tricaine_mg_per_L_from_dilution',
  ],
  compute(given) {
    const { find, plane, target, filling, volume, strength, bottle, poured, made, buffer, ratio, parts } =
      given
    if (find === 'dilution' && parts) return ofDilution(parts)
    if (bottle === 'undated') return refuse('undated-stock', 'bottle')
    if (buffer === 'none') return refuse('unbuffered-stock', 'buffer')
    if (!strength) return refuse('blank', 'strength', { unit: 'g/L' })
    if (find === 'make' && made) {
      const powder = powderIn(strength, made)
      if (!powder.ok) return powder
      const { grams, working } = powder.value
      const buffered = bufferFor(grams, 'powder', ratio)
      if (!buffered.ok) return buffered
      return ok({
        figures: [{ key: 'powder', value: grams, unit: 'g', kind: 'dose' }, ...buffered.value.figures],
        working: [...working, ...buffered.value.working],
        cautions: [...buffered.value.cautions, { code: 'powder', level: 'warning' }],
      })
    }
    if (!volume) return refuse('blank', 'volume', { unit: 'L' })
    const before: BenchCaution[] = [
      ...(plane === 'euthanasia'
        ? [{ code: 'plane-euthanasia', level: 'warning' } as const]
        : [
            { code: `plane-${String(plane)}`, level: 'note' } as const,
            { code: 'observe', level: 'warning' } as const,
          ]),
    ]
    if (find === 'reached' && poured) {
      const reached = reachedBy(strength, poured, volume)
      if (!reached.ok) return reached
      const doubts = doubtsOf(plane, reached.value.figures[0].value)
      return ok({ ...reached.value, cautions: [...doubts, ...before, { code: 'recipes', level: 'note' }] })
    }
    if (!target || !filling) return refuse('blank', 'target', { unit: 'mg/L' })
    const asked = { targetMgPerL: target.value, stockGPerL: strength.value / mgPerGram }
    const onTop = filling === 'on-top'
    const stock = onTop
      ? stockVolumeOnTop({ ...asked, waterLitres: volume.value })
      : stockVolumeInBath({ ...asked, bathLitres: volume.value })
    if (!stock.ok) return stock
    const tricaine = stockMass({ stockGPerL: asked.stockGPerL, stockMl: stock.value })
    if (!tricaine.ok) return tricaine
    const buffered = bufferFor(tricaine.value, 'tricaine', ratio)
    if (!buffered.ok) return buffered
    const divisor = onTop ? `${strengthTerm(strength)} - ${enteredTerm(target)}` : strengthTerm(strength)
    return ok({
      figures: [
        { key: 'stock', value: stock.value, unit: 'mL', kind: 'dose' },
        { key: 'tricaine', value: tricaine.value, unit: 'g', kind: 'dose' },
        ...buffered.value.figures,
      ],
      working: [
        line(
          'stock',
          `${enteredTerm(target)} * ${enteredTerm(volume)} / (${divisor}) to mL`,
          stock.value,
          'mL',
        ),
        line(
          'tricaine',
          `${valueTerm(stock.value, 'mL')} * ${strengthTerm(strength)} to g`,
          tricaine.value,
          'g',
          ['stock'],
        ),
        ...buffered.value.working,
      ],
      cautions: [
        ...doubtsOf(plane, target.value),
        ...before,
        ...buffered.value.cautions,
        { code: onTop ? 'water-before' : 'finished-bath', level: 'note' },
      ],
    })
  },
})

interface Buffered {
  figures: Figure[]
  working: BenchLine[]
  cautions: BenchCaution[]
}

/** Bicarbonate for so much tricaine, or the word that it has to come from elsewhere. */
function bufferFor(tricaineG: number, rest: string, ratio: ParsedQuantity | undefined): Result<Buffered> {
  const measure: BenchCaution = { code: 'measure-ph', level: 'warning' }
  if (!ratio)
    return ok({ figures: [], working: [], cautions: [{ code: 'buffer-other', level: 'warning' }, measure] })
  const grams = bufferMass({ tricaineG, bicarbonateRatio: ratio.value })
  if (!grams.ok) return grams
  return ok({
    figures: [{ key: 'buffer', value: grams.value, unit: 'g', kind: 'dose' }],
    working: [
      line('buffer', `${valueTerm(tricaineG, 'g')} * ${enteredTerm(ratio)} to g`, grams.value, 'g', [rest]),
    ],
    cautions: [measure, { code: 'buffer-practice', level: 'note' }],
  })
}

function powderIn(
  strength: ParsedQuantity,
  made: ParsedQuantity,
): Result<{ grams: number; working: BenchLine[] }> {
  const stockMl = convert(made.value, 'L', 'mL')
  if (!stockMl.ok) return stockMl
  const grams = stockMass({ stockGPerL: strength.value / mgPerGram, stockMl: stockMl.value })
  if (!grams.ok) return grams
  const expression = `${enteredTerm(made)} * ${strengthTerm(strength)} to g`
  return ok({ grams: grams.value, working: [line('powder', expression, grams.value, 'g')] })
}

/** Of fish: the label's range, and what sedation usually takes. */
const labelMgPerL = { least: 15, most: 330 }
const mostSedationMgPerL = 75

/** A strength that does not go with what the veterinarian means it for; the veterinarian's target decides. */
function doubtsOf(plane: string | undefined, mgPerL: number): BenchCaution[] {
  const warning = (code: string): BenchCaution[] => [{ code, level: 'warning' }]
  if (plane === 'euthanasia') return mgPerL <= labelMgPerL.most ? warning('may-recover') : []
  if (mgPerL > labelMgPerL.most) return warning('above-label')
  if (plane === 'sedation' && mgPerL > mostSedationMgPerL) return warning('deep-for-sedation')
  return mgPerL < labelMgPerL.least ? warning('below-label') : []
}

function reachedBy(
  strength: ParsedQuantity,
  poured: ParsedQuantity,
  water: ParsedQuantity,
): Result<{ figures: [Figure, Figure]; working: BenchLine[] }> {
  const [stockMl, waterMl] = [convert(poured.value, 'L', 'mL'), convert(water.value, 'L', 'mL')]
  if (!stockMl.ok) return stockMl
  if (!waterMl.ok) return waterMl
  const mix = {
    stockMgPerMl: strength.value / mgPerGram,
    stockMl: stockMl.value,
    waterMl: waterMl.value,
  }
  const exact = exactBathConcentration(mix)
  if (!exact.ok) return exact
  const nominal = nominalBathConcentration(mix)
  if (!nominal.ok) return nominal
  const drug = `${enteredTerm(poured)} * ${strengthTerm(strength)}`
  const [stockTerm, waterTerm] = [enteredTerm(poured), enteredTerm(water)]
  return ok({
    figures: [
      { key: 'reached', value: exact.value, unit: 'mg/L' },
      { key: 'nominal', value: nominal.value, unit: 'mg/L' },
    ],
    working: [
      line('nominal', `${drug} / (${waterTerm}) to mg/L`, nominal.value, 'mg/L'),
      line('reached', `${drug} / (${waterTerm} + ${stockTerm}) to mg/L`, exact.value, 'mg/L'),
    ],
  })
}

function ofDilution(parts: ParsedQuantity) {
  const strength = concentrationOfDilution({ dilutionParts: parts.value })
  if (!strength.ok) return strength
  return ok({
    figures: [{ key: 'reached', value: strength.value, unit: 'mg/L' }] as const,
    working: [line('dilution', `1 g / (${enteredTerm(parts)} * 1 mL) to mg/L`, strength.value, 'mg/L')],
    cautions: [{ code: 'label-range', level: 'note' }] as const,
  })
}
