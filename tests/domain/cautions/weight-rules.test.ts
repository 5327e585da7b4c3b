import { describe, expect, it } from 'vitest'
import type { CautionFacts, WeightFact } from '../../../shared/domain/cautions/caution-facts.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { known, unknown } from '../../../shared/domain/cautions/fact.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import { sayCaution } from '../../../shared/messages/say-caution.ts'
import { at, minutesAgo, someFacts } from './some-facts.ts'

const minutesPerDay = 1440

/** A weight so many days old of an adult fish, plausible and weighed. */
const weight = (ageDays: number, more: Partial<WeightFact> = {}): WeightFact => ({
  animalId: 'animal',
  label: 'HP-0419',
  taxonGroup: 'teleost',
  lifeStage: 'adult',
  grams: 1350,
  at: minutesAgo(ageDays * minutesPerDay),
  measured: true,
  plausible: true,
  ...more,
})

function injected(
  agent: AgentCode,
  weights: WeightFact[],
  more: Partial<CautionFacts['animals']> = {},
): CautionFacts {
  const facts = someFacts(agent, { value: 10, unit: 'mg/kg', basis: 'base' })
  return {
    ...facts,
    route: 'injection',
    animals: { ...facts.animals, weights: known(weights, at), neverWeighed: known([], at), ...more },
  }
}

const found = (facts: CautionFacts, stage: 'design' | 'start' = 'design') =>
  evaluateCautions({ facts, stage }).cautions.filter(({ ruleId }) => ruleId === 'R33')
const levels = (facts: CautionFacts) => found(facts).map(({ code, level }) => `${level} ${code}`)

// Source of every limit here: treatments reference, rule R33, a project default (P)
describe('R33, the weight that a dose goes by', () => {
  it.each([
    ['an adult fish', 90, {}],
    ['a growing fish', 30, { lifeStage: 'juvenile' }],
    ['a fish of unknown stage', 30, { lifeStage: 'unknown' }],
    ['a penguin', 14, { taxonGroup: 'bird' }],
    ['a young penguin', 14, { taxonGroup: 'bird', lifeStage: 'juvenile' }],
    ['an animal newly hatched', 7, { lifeStage: 'fry' }],
    ['a chick', 7, { taxonGroup: 'bird', lifeStage: 'fry' }],
    ['an adult turtle', 90, { taxonGroup: 'reptile' }],
  ] as const)('counts for %s for %d days, and not a minute longer', (_, days, more) => {
    expect(levels(injected('enrofloxacin', [weight(days, more)]))).toEqual([])
    expect(levels(injected('enrofloxacin', [weight(days + 1 / minutesPerDay, more)]))).toEqual([
      'warning weight-old',
    ])
  })

  it('stops a drug of narrow margin once the weight is more than twice too old, and no other', () => {
    expect(levels(injected('ketamine', [weight(180)]))).toEqual(['warning weight-old'])
    expect(levels(injected('ketamine', [weight(181)]))).toEqual(['stop weight-old'])
    expect(levels(injected('enrofloxacin', [weight(1000)]))).toEqual(['warning weight-old'])
  })

  it('names the animals, one sentence for those of one limit and one level', () => {
    const facts = injected('ketamine', [
      weight(95, { label: 'HP-0001' }),
      weight(100, { label: 'HP-0002' }),
      weight(200, { label: 'HP-0003' }),
      weight(40, { label: 'HP-0004', lifeStage: 'juvenile' }),
      weight(1, { label: 'HP-0005' }),
    ])
    expect(
      found(facts).map((one) => [one.level, sayCaution(one, 'Europe/Lisbon').text.split('.')[0]]),
    ).toEqual([
      ['stop', 'The newest weight is more than 90\u00a0days old: HP-0003'],
      ['warning', 'The newest weight is more than 90\u00a0days old: HP-0001, HP-0002'],
      ['warning', 'The newest weight is more than 30\u00a0days old: HP-0004'],
    ])
  })

  it('stops without a weight, and where it is not known whether there is one', () => {
    expect(levels(injected('meloxicam', [], { neverWeighed: known(['HP-0007']) }))).toEqual([
      'stop weight-missing',
    ])
    expect(levels(injected('meloxicam', [weight(1)], { weights: unknown() }))).toEqual([
      'stop weight-unknown',
    ])
    expect(levels(injected('meloxicam', [weight(1)], { neverWeighed: unknown() }))).toEqual([
      'stop weight-unknown',
    ])
  })

  it('warns of a weight outside the band of the taxon, and of one that nobody weighed; no band says nothing', () => {
    expect(levels(injected('meloxicam', [weight(1, { plausible: false })]))).toEqual([
      'warning weight-implausible',
    ])
    expect(levels(injected('meloxicam', [weight(1, { measured: false })]))).toEqual([
      'warning weight-estimated',
    ])
    expect(levels(injected('meloxicam', [weight(1, { plausible: null })]))).toEqual([])
  })

  it('is asked at the dose as well, and never of a bath', () => {
    expect(found(injected('meloxicam', [weight(91)]), 'start').map(({ code }) => code)).toEqual([
      'weight-old',
    ])
    expect(levels({ ...injected('meloxicam', [weight(91)]), route: 'immersion' })).toEqual([])
  })
})
