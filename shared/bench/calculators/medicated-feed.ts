import { drugInFeed } from '../../domain/feed/drug-in-feed.ts'
import { feedLimits } from '../../domain/feed/feed-limits.ts'
import { gelBatchDays, gelBatchDrug } from '../../domain/feed/gel-batch.ts'
import { doseTaken, drugPerDay, feedPerDay } from '../../domain/feed/per-day.ts'
import { premixForBatch, premixKgPerTonne } from '../../domain/feed/premix.ts'
import { ok, refuse, type Result } from '../../domain/result.ts'
import { convert } from '../../domain/units/convert.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import {
  defineCalculator,
  type BenchCaution,
  type BenchLine,
  type Figure,
  type Outcome,
} from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { massFigure } from './parts/mass-figure.ts'

const gramsPerKilogram = 1000
const mixed = ['batch', 'strength'] as const
const planned = [...mixed, 'day'] as const
const ofGroup = ['day', 'taken'] as const
const massUnits = ['kg', 'g', 't', 'lb'] as const

/** How strong a feed has to be, what to weigh into a batch of it, and what a group is to take or has taken in a day. */
export const medicatedFeed = defineCalculator({
  id: 'medicated-feed',
  group: 'body',
  words: defineMessages({
    name: 'Medicated feed',
    purpose:
      'How strong a feed or a gel has to be, what to weigh into a batch, and what a group takes and has taken.',
    search: 'premix gel oral',
    formula: 'strength = dose ÷ (feeding rate ÷ 100)',
    'input.find': 'What to find',
    'option.find.batch': 'What to weigh into a batch',
    'option.find.strength': 'How strong the feed has to be',
    'option.find.day': 'What a group is to take in a day',
    'option.find.taken': 'What a group has taken in a day',
    'input.feed': 'Kind of feed',
    'option.feed.dry': 'Dry feed',
    'option.feed.gel': 'Gel food',
    'input.dose': 'Dose a day',
    'help.dose': 'For a kilogram of animal, as the order says, of what the strength of the premix is of.',
    'input.rate': 'Feeding rate',
    'help.rate':
      'Per cent of the body mass a day, of the feed as it is fed: a gel with its water and binder.',
    'input.additive': 'What is mixed in',
    'option.additive.active': 'The drug itself',
    'option.additive.premix': 'A premix',
    'input.premix': 'Strength of the premix',
    'input.batch': 'Batch of feed',
    'help.batch': 'Finished: with the premix in it, and a gel with its water and binder.',
    'input.biomass': 'Mass of the group',
    'help.biomass': 'All animals together. With it the batch is told in days.',
    'input.biomassError': 'Error of the mass',
    'input.fed': 'Drug in the feed that was fed',
    'input.eaten': 'Feed eaten in the day',
    'help.eaten': 'What was given, less what was left over.',
    'result.taken': 'Dose taken',
    'result.strength': 'Drug in a kilogram of feed',
    'result.short-ton': 'Drug in a US short ton of feed',
    'result.per-tonne': 'Premix in a tonne of feed',
    'result.drug': 'Drug to weigh',
    'result.premix': 'Premix to weigh',
    'result.drug-in-it': 'Drug in it',
    'result.drug-day': 'Drug a day',
    'result.feed-day': 'Feed a day',
    'result.days': 'The batch lasts',
    'line.fed': 'Drug in a kilogram of the feed',
    'line.taken': 'Dose taken, a mean of the group',
    'line.strength': 'Drug in a kilogram of feed, the same number of grams in a tonne',
    'line.short-ton': 'Drug in a US short ton',
    'line.per-tonne': 'Premix in a tonne',
    'line.drug': 'Drug in the batch',
    'line.premix': 'Premix in the batch',
    'line.drug-day': 'Drug a day',
    'line.feed-day': 'Feed a day',
    'line.days': 'Days that the batch lasts',
    'refusal.more-drug-than-feed':
      'At this feeding rate the feed would have to hold more drug than feed. Check the dose and the rate.',
    'refusal.target-above-premix':
      'The feed would have to be stronger than this premix. Take a stronger premix, or check the dose and the feeding rate.',
    'caution.as-fed':
      'The feeding rate is of the gel as it is fed. Weigh the batch after water and binder are in it, or the dose is wrong.',
    'caution.sick-eat-less':
      'Sick animals eat less and take less drug. What they took is the strength of the feed times what they ate: write down what was left.',
    'caution.mean-of-group':
      'It is a mean: the animal that did not eat has taken nothing, and the sickest eat least.',
    'caution.authority':
      'Medicated feed is regulated. This figure is no permission: the order, the label and local law say what may be fed, and to whom.',
  }),
  inputs: {
    find: choice(['batch', 'strength', 'day', 'taken']),
    feed: choice(['dry', 'gel']),
    dose: quantity({
      units: ['mg/kg', 'ug/kg'],
      limits: { above: 0, max: feedLimits.mostDoseMgPerKg, plausible: { min: 0.01, max: 300 } },
      when: { find: planned },
    }),
    rate: quantity({
      units: ['percent'],
      limits: { above: 0, max: feedLimits.mostRatePercent, plausible: { min: 0.1, max: 20 } },
      when: { find: planned },
    }),
    fed: quantity({
      units: ['mg/kg_w_w', 'g/kg_w_w', 'percent_w_w', 'g/ton_us'],
      limits: { min: 0, max: 100, plausible: { max: 5 } },
      when: { find: ['taken'] },
    }),
    eaten: quantity({
      units: massUnits,
      limits: { min: 0, max: feedLimits.mostFeedKg * gramsPerKilogram },
      when: { find: ['taken'] },
    }),
    additive: choice(['active', 'premix'], { when: { find: mixed } }),
    premix: quantity({
      units: ['percent_w_w', 'g/kg_w_w', 'mg/g_w_w', 'mg/kg_w_w'],
      limits: { above: 0, max: 100 },
      when: { find: mixed, additive: ['premix'] },
    }),
    batch: quantity({
      units: massUnits,
      limits: { above: 0, max: feedLimits.mostBatchG },
      when: { find: ['batch'] },
    }),
    biomass: quantity({
      units: massUnits,
      limits: { above: 0, max: feedLimits.mostBiomassKg * gramsPerKilogram },
      optional: true,
    }),
    biomassError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'biomass',
      when: { find: ofGroup },
    }),
  },
  fields: {
    doseMgPerKg: 'dose',
    feedingRatePercentBw: 'rate',
    targetGPerTonne: 'premix',
    premixPercentWw: 'premix',
    batchG: 'batch',
    biomassKg: 'biomass',
    mgPerKgFeed: 'fed',
    eatenKg: 'eaten',
  },
  example: {
    find: 'batch',
    feed: 'gel',
    dose: { value: '50', unit: 'mg/kg' },
    rate: { value: '2.5', unit: 'percent' },
    additive: 'active',
    batch: { value: '400', unit: 'g' },
    biomass: { value: '4', unit: 'kg' },
  },
  sources: ['feed-arithmetic', 'nist-sp-811'],
  cautions: [{ code: 'authority', level: 'note' }],
  plot: { vary: 'rate', unit: 'percent', from: 0.5, to: 10, figure: 'strength' },
  published: [
    'drug_per_day_mg',
    'feed_per_day_kg',
    'drug_concentration_in_feed_mg_per_kg',
    'drug_concentration_in_feed_g_per_short_ton',
    'premix_kg_per_tonne',
    'gel_batch_drug_mg',
    'gel_batch_fish_days',
  ],
  compute({ find, feed, dose, rate, fed, eaten, additive, premix, batch, biomass }) {
    if ((find === 'day' || find === 'taken') && !biomass) return refuse('blank', 'biomass', { unit: 'kg' })
    if (find === 'taken' && fed && eaten && biomass) return takenBy(fed, eaten, biomass)
    if (!dose || !rate) return refuse('blank', 'dose', { unit: 'mg/kg' })
    const strength = strengthOf(dose, rate)
    if (!strength.ok) return strength
    const mixing = find === 'day' ? ok(none) : mixingOf(strength.value.mgPerKg, dose, rate, premix, batch)
    if (!mixing.ok) return mixing
    const day = biomass ? dayOf(dose, rate, biomass, batch) : ok(none)
    if (!day.ok) return day
    const parts =
      find === 'day'
        ? [day.value, strength.value]
        : find === 'batch'
          ? [mixing.value, strength.value, day.value]
          : [strength.value, mixing.value, day.value]
    const [first, ...rest] = parts.flatMap(({ figures }) => figures)
    if (first === undefined) return refuse('not-chosen', additive === undefined ? 'additive' : 'batch')
    const cautions: BenchCaution[] = [
      ...(feed === 'gel' ? [{ code: 'as-fed', level: 'warning' } as const] : []),
      { code: 'sick-eat-less', level: 'note' },
    ]
    return ok({
      figures: [first, ...rest],
      working: [strength.value, mixing.value, day.value].flatMap(({ working }) => working),
      cautions,
    })
  },
})

interface Part {
  figures: Figure[]
  working: BenchLine[]
}
const none: Part = { figures: [], working: [] }

function strengthOf(dose: ParsedQuantity, rate: ParsedQuantity): Result<Part & { mgPerKg: number }> {
  const strength = drugInFeed({ doseMgPerKg: dose.value, feedingRatePercentBw: rate.value })
  if (!strength.ok) return strength
  const { mgPerKg, gPerShortTon } = strength.value
  return ok({
    mgPerKg,
    figures: [
      { key: 'strength', value: mgPerKg, unit: 'mg/kg_w_w' },
      { key: 'short-ton', value: gPerShortTon, unit: 'g/ton_us' },
    ],
    working: [
      line('strength', `${String(dose.value)} * 100 / ${enteredTerm(rate)}`, mgPerKg, 'mg/kg_w_w'),
      line('short-ton', `${valueTerm(mgPerKg, 'mg/kg_w_w')} * 0.90718474`, gPerShortTon, 'g/ton_us', [
        'strength',
      ]),
    ],
  })
}

/** What goes into a batch, and into a tonne where it is a premix. */
function mixingOf(
  mgPerKg: number,
  dose: ParsedQuantity,
  rate: ParsedQuantity,
  premix: ParsedQuantity | undefined,
  batch: ParsedQuantity | undefined,
): Result<Part> {
  const strength = `${valueTerm(mgPerKg, 'mg/kg_w_w')} mg/kg`
  const figures: Figure[] = []
  const working: BenchLine[] = []
  if (batch) {
    const milligrams = gelBatchDrug({
      doseMgPerKg: dose.value,
      feedingRatePercentBw: rate.value,
      batchG: batch.value,
    })
    if (!milligrams.ok) return milligrams
    const grams = convert(milligrams.value, 'mg', 'g')
    if (!grams.ok) return grams
    figures.push(massFigure(premix ? 'drug-in-it' : 'drug', grams.value))
    working.push(line('drug', `${strength} * ${enteredTerm(batch)} to g`, grams.value, 'g', ['strength']))
  }
  if (premix) {
    const asked = { targetGPerTonne: mgPerKg, premixPercentWw: premix.value }
    const perTonne = premixKgPerTonne(asked)
    if (!perTonne.ok) return perTonne
    const share = `(${enteredTerm(premix)} / 100)`
    figures.push({ key: 'per-tonne', value: perTonne.value, unit: 'kg', kind: 'dose' })
    working.push(
      line('per-tonne', `${strength} * 1 tonne / ${share} to kg`, perTonne.value, 'kg', ['strength']),
    )
    if (batch) {
      const grams = premixForBatch({ ...asked, batchG: batch.value })
      if (!grams.ok) return grams
      figures.unshift(massFigure('premix', grams.value))
      working.push(
        line(
          'premix',
          `${valueTerm(perTonne.value, 'kg')} / (1 tonne) * ${enteredTerm(batch)} to g`,
          grams.value,
          'g',
          ['per-tonne'],
        ),
      )
    }
  }
  return ok({ figures, working })
}

/** What a group takes and eats in a day, and how many days a batch lasts it. */
function dayOf(
  dose: ParsedQuantity,
  rate: ParsedQuantity,
  biomass: ParsedQuantity,
  batch: ParsedQuantity | undefined,
): Result<Part> {
  const group = { biomassKg: biomass.value / gramsPerKilogram, feedingRatePercentBw: rate.value }
  const drug = drugPerDay({ biomassKg: group.biomassKg, doseMgPerKg: dose.value })
  if (!drug.ok) return drug
  const eaten = feedPerDay(group)
  if (!eaten.ok) return eaten
  const mass = enteredTerm(biomass)
  const part: Part = {
    figures: [
      { key: 'drug-day', value: drug.value, unit: 'mg', kind: 'dose' },
      { key: 'feed-day', value: eaten.value, unit: 'kg', kind: 'dose' },
    ],
    working: [
      line('drug-day', `${enteredTerm(dose)} * ${mass} to mg`, drug.value, 'mg'),
      line('feed-day', `${mass} * ${enteredTerm(rate)} / 100 to kg`, eaten.value, 'kg'),
    ],
  }
  if (!batch) return ok(part)
  const days = gelBatchDays({ ...group, batchG: batch.value })
  if (!days.ok) return days
  part.figures.unshift({ key: 'days', value: days.value, unit: 'd', figures: 3 })
  part.working.push(
    line(
      'days',
      `${enteredTerm(batch)} / (${valueTerm(eaten.value, 'kg')}) * 1 day to day`,
      days.value,
      'd',
      ['feed-day'],
    ),
  )
  return ok(part)
}

/** The dose that was taken, by what was eaten. */
function takenBy(fed: ParsedQuantity, eaten: ParsedQuantity, biomass: ParsedQuantity): Result<Outcome> {
  const strength = convert(Number(fed.entered.value), fed.entered.unit, 'mg/kg_w_w')
  if (!strength.ok) return strength
  const taken = doseTaken({
    mgPerKgFeed: strength.value,
    eatenKg: eaten.value / gramsPerKilogram,
    biomassKg: biomass.value / gramsPerKilogram,
  })
  if (!taken.ok) return taken
  const isTyped = fed.entered.unit === 'mg/kg_w_w'
  const term = valueTerm(strength.value, 'mg/kg_w_w')
  const expression = `${term} mg/kg * ${enteredTerm(eaten)} / (${enteredTerm(biomass)})`
  return ok({
    figures: [{ key: 'taken', value: taken.value, unit: 'mg/kg', figures: 3 }],
    working: [
      ...(isTyped ? [] : [line('fed', `${enteredTerm(fed)} * 10000`, strength.value, 'mg/kg_w_w')]),
      line('taken', expression, taken.value, 'mg/kg', isTyped ? [] : ['fed']),
    ],
    cautions: [{ code: 'mean-of-group', level: 'note' }],
  })
}
