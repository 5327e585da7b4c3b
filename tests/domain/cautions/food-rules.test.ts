import { describe, expect, it } from 'vitest'
import type { CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { known, unknown } from '../../../shared/domain/cautions/fact.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import { anAnimal, cautions, firedBy, minutesAgo, read, someFacts } from './some-facts.ts'
import type { Change } from './some-facts.ts'

const trout = anAnimal('salmonid', { scientificName: 'Oncorhynchus mykiss', commonName: 'rainbow trout' })
const named = [{ label: trout.label, commonName: trout.commonName, enclosureCode: trout.enclosureCode }]
const yes = known({ yes: named, notSaid: [] })
const never = known({ yes: [], notSaid: [] })
const notSaid = known({ yes: [], notSaid: named })
const bath = (
  agent: AgentCode,
  foodOrRelease: CautionFacts['animals']['foodOrRelease'],
  change: Change = {},
) =>
  someFacts(
    agent,
    { value: 100, unit: 'mg/L', basis: 'active' },
    { ...change, animals: { inWater: known([trout]), ...change.animals, foodOrRelease } },
  )

describe('R37: what is forbidden in animals that may be eaten or set free', () => {
  it('enrofloxacin for a lot that is to be set free stops, and nobody overrides it (reference case)', () => {
    const [found] = cautions(bath('enrofloxacin', yes))
    expect(found).toMatchObject({
      ruleId: 'R37',
      level: 'stop',
      code: 'prohibited-in-food',
      overridable: false,
    })
  })
  it.each<[string, AgentCode, CautionFacts['animals']['foodOrRelease'], string[]]>([
    ['metronidazole too', 'metronidazole', yes, ['stop prohibited-in-food']],
    ['never eaten nor set free', 'metronidazole', never, []],
    ['nobody said', 'metronidazole', notSaid, ['stop food-or-release-not-said']],
    ['nothing is known', 'metronidazole', unknown(), ['stop food-or-release-unknown']],
    [
      'one may be, of another nobody said',
      'enrofloxacin',
      known({ yes: named, notSaid: named }),
      ['stop food-or-release-not-said', 'stop prohibited-in-food'],
    ],
    ['another agent', 'praziquantel', yes, []],
  ])('%s', (_, agent, food, expected) => expect(firedBy('R37', bath(agent, food))).toEqual(expected))
  it('is asked by whatever route', () => {
    const facts: CautionFacts = { ...bath('enrofloxacin', yes), route: 'injection' }
    expect(firedBy('R37', facts)).toEqual(['stop prohibited-in-food'])
  })
  it('holds the dose of an order that was signed before somebody said so, and only then', () => {
    const { foodOrRelease: _, ...animals } = bath('metronidazole', never).animals
    const signed = { ...bath('metronidazole', never), at: minutesAgo(60), animals } as unknown as CautionFacts
    const codes = (food: CautionFacts['animals']['foodOrRelease']) =>
      evaluateCautions({ facts: bath('metronidazole', food), stage: 'start', factsAtSigning: signed })
        .cautions.filter(({ ruleId }) => ruleId === 'R37')
        .map(({ code }) => code)
    expect(codes(notSaid)).toEqual([])
    expect(codes(known({ yes: named, notSaid: [] }, minutesAgo(90)))).toEqual([])
    expect(codes(known({ yes: named, notSaid: [] }, minutesAgo(30)))).toEqual(['prohibited-in-food'])
  })
})

describe('R19: tricaine in fish that may be eaten', () => {
  const hold = 'note tricaine-food-hold'
  const fish = (scientificName: string, change: Change = {}) => {
    const one = { ...anAnimal('teleost', { scientificName }), label: trout.label }
    return firedBy('R19', bath('tricaine', yes, { ...change, animals: { inWater: known([one]) } }))
  }
  it('a trout at 18 °C passes, and is held for 21 days', () => {
    const facts = bath('tricaine', yes)
    expect(firedBy('R19', facts)).toEqual([hold])
    const [note] = cautions(facts).filter(({ ruleId }) => ruleId === 'R19')
    expect(note?.effects).toEqual([{ kind: 'holdUntil', days: 21 }])
  })
  it('asks for the family', () => {
    for (const name of ['Ictalurus punctatus', 'Esox lucius', 'perca flavescens', 'Sander vitreus'])
      expect(fish(name), name).toEqual([hold])
    for (const name of ['Oreochromis niloticus', 'Percalates novemaculeatus', ''])
      expect(fish(name), name).toEqual(['stop tricaine-food-family', hold])
    expect(firedBy('R19', bath('tricaine', yes, { animals: { inWater: unknown() } }))).toEqual([
      'stop tricaine-food-family',
      hold,
    ])
  })
  it.each<[string, Change['water'], string[]]>([
    ['exactly 10 °C', { temperatureC: read(10) }, ['stop tricaine-food-cold', hold]],
    ['10.1 °C', { temperatureC: read(10.1) }, [hold]],
    [
      '10.1 °C now, 10 °C three hours ago',
      { temperatureC: read(10.1), recentTemperaturesC: known([{ value: 10, at: minutesAgo(180) }]) },
      ['stop tricaine-food-cold', hold],
    ],
    ['not known', { temperatureC: unknown() }, ['stop tricaine-food-temperature-unknown', hold]],
  ])('asks for the temperature: %s', (_, water, expected) =>
    expect(firedBy('R19', bath('tricaine', yes, { water }))).toEqual(expected),
  )
  it('asks where nobody said, and says nothing of animals that are never eaten', () => {
    expect(firedBy('R19', bath('tricaine', notSaid))).toEqual(['stop food-or-release-not-said'])
    expect(firedBy('R19', bath('tricaine', unknown()))).toEqual(['stop food-or-release-unknown'])
    expect(firedBy('R19', bath('tricaine', never, { water: { temperatureC: read(5) } }))).toEqual([])
  })
})
