import { feedLimits } from '../../domain/feed/feed-limits.ts'
import { groupBiomassRange } from '../../domain/feed/group-biomass.ts'
import { ok, refuse } from '../../domain/result.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution } from '../definition.ts'
import { quantity } from '../inputs.ts'
import { line } from '../line.ts'

const gramsPerKilogram = 1000

/** What a group weighs by its count and a mean weight, and what it has grown since by its feed. */
export const groupBiomassCalculator = defineCalculator({
  id: 'group-biomass',
  group: 'body',
  words: defineMessages({
    name: 'Mass of a group',
    purpose: 'What a group weighs by count and mean weight, and what feed has added since the weighing.',
    search: 'biomass',
    formula: 'mass = count × mean weight + feed given ÷ feed conversion',
    'input.count': 'Number of animals',
    'input.countError': 'Error of the number',
    'input.meanWeight': 'Mean weight',
    'help.meanWeight': 'Of a sample at the last weighing: its mass divided by its count.',
    'input.meanWeightError': 'Error of the mean weight',
    'input.feedGiven': 'Feed given since the weighing',
    'input.feedConversion': 'Feed conversion',
    'help.feedConversion':
      'Kilograms of feed for one kilogram of growth. The growth is the feed divided by it, not multiplied.',
    'result.biomass': 'Mass of the group',
    'result.weighed': 'When it was weighed',
    'result.gain': 'Grown since',
    'line.weighed': 'Mass when it was weighed',
    'line.gain': 'Growth by the feed',
    'line.biomass': 'Mass now',
    'refusal.count-not-whole': 'Type the number of animals as a whole number, also where it is an estimate.',
    'caution.sample':
      'A mean is as good as its sample: take animals of all sizes, from more than one netting.',
    'caution.growth-guessed':
      'Growth by feed is a guess: sick animals turn feed into less. Weigh a sample again before a dose rests on it.',
  }),
  inputs: {
    count: quantity({ units: ['ratio'], limits: { above: 0, max: feedLimits.mostCount }, whole: true }),
    countError: quantity({
      units: ['percent'],
      limits: { min: 0, max: feedLimits.mostErrorPercent },
      optional: true,
      errorOf: 'count',
    }),
    meanWeight: quantity({
      units: ['g', 'kg', 'mg', 'lb', 'oz_av'],
      limits: { above: 0, max: feedLimits.mostMeanWeightG, plausible: { min: 0.001, max: 500_000 } },
    }),
    meanWeightError: quantity({
      units: ['percent'],
      limits: { min: 0, max: feedLimits.mostErrorPercent },
      optional: true,
      errorOf: 'meanWeight',
    }),
    feedGiven: quantity({
      units: ['kg', 'g', 't', 'lb'],
      limits: { min: 0, max: feedLimits.mostFeedKg * gramsPerKilogram },
      optional: true,
    }),
    feedConversion: quantity({
      units: ['ratio'],
      limits: {
        min: feedLimits.leastFeedConversion,
        max: feedLimits.mostFeedConversion,
        plausible: { min: 0.5, max: 5 },
      },
      optional: true,
    }),
  },
  fields: {
    meanWeightG: 'meanWeight',
    feedGivenKg: 'feedGiven',
    countErrorPercent: 'countError',
    meanWeightErrorPercent: 'meanWeightError',
  },
  example: {
    count: { value: '5000', unit: 'ratio' },
    countError: { value: '5', unit: 'percent' },
    meanWeight: { value: '10', unit: 'g' },
    meanWeightError: { value: '10', unit: 'percent' },
    feedGiven: { value: '40', unit: 'kg' },
    feedConversion: { value: '1', unit: 'ratio' },
  },
  sources: ['feed-arithmetic'],
  cautions: [{ code: 'sample', level: 'note' }],
  published: ['group_biomass_kg'],
  compute({ count, countError, meanWeight, meanWeightError, feedGiven, feedConversion }) {
    if (feedGiven && !feedConversion) return refuse('blank', 'feedConversion')
    if (feedConversion && !feedGiven) return refuse('blank', 'feedGiven', { unit: 'kg' })
    const group = groupBiomassRange({
      count: count.value,
      meanWeightG: meanWeight.value,
      feedGivenKg: (feedGiven?.value ?? 0) / gramsPerKilogram,
      feedConversion: feedConversion?.value ?? 1,
      countErrorPercent: countError?.value ?? 0,
      meanWeightErrorPercent: meanWeightError?.value ?? 0,
    })
    if (!group.ok) return group
    const { biomassKg, weighedKg, gainKg, lowKg, highKg } = group.value
    const stated = (countError?.value ?? 0) + (meanWeightError?.value ?? 0) > 0
    const weighed = `${enteredTerm(count)} * ${enteredTerm(meanWeight)} to kg`
    const cautions: BenchCaution[] = gainKg > 0 ? [{ code: 'growth-guessed', level: 'warning' }] : []
    const range = stated ? { range: { low: lowKg, high: highKg } } : {}
    if (!feedGiven || !feedConversion)
      return ok({
        figures: [{ key: 'biomass', value: biomassKg, unit: 'kg' }],
        working: [line('weighed', weighed, weighedKg, 'kg')],
        ...range,
      })
    return ok({
      figures: [
        { key: 'biomass', value: biomassKg, unit: 'kg' },
        { key: 'weighed', value: weighedKg, unit: 'kg' },
        { key: 'gain', value: gainKg, unit: 'kg' },
      ],
      working: [
        line('weighed', weighed, weighedKg, 'kg'),
        line('gain', `${enteredTerm(feedGiven)} / ${enteredTerm(feedConversion)} to kg`, gainKg, 'kg'),
        line('biomass', `${valueTerm(weighedKg, 'kg')} + ${valueTerm(gainKg, 'kg')}`, biomassKg, 'kg', [
          'weighed',
          'gain',
        ]),
      ],
      cautions,
      ...range,
    })
  },
})
