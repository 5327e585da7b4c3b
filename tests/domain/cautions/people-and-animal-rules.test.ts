import { describe, expect, it } from 'vitest'
import type { CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { known, notApplicable, unknown } from '../../../shared/domain/cautions/fact.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import { sayCaution } from '../../../shared/messages/say-caution.ts'
import { at, cautions, firedBy, formalin, someFacts } from './some-facts.ts'
import type { Change } from './some-facts.ts'

describe('R40: people where formalin goes in', () => {
  const start = (order: Change['order']) =>
    firedBy('R40', someFacts('formalin', formalin(100), { order }), 'start')
  it('warns where the room is not aired or nobody said so; not where it is, nor at a pond', () => {
    expect(start({ isAired: known(true) })).toEqual([])
    expect(start({ isAired: known(false) })).toEqual(['warning room-not-aired'])
    expect(start({ isAired: unknown() })).toEqual(['warning room-air-unknown'])
    expect(start({ isAired: known(false), setting: known('pond') })).toEqual([])
    expect(start({ isAired: unknown(), setting: unknown() })).toEqual(['warning room-air-unknown'])
  })
  it('names the place and the time from which people may stay there, 30 minutes from the dose', () => {
    const facts = someFacts('formalin', formalin(100), { order: { isAired: known(false) } })
    const found = cautions(facts, 'start').find(({ ruleId }) => ruleId === 'R40')
    expect(found?.effects).toEqual([{ kind: 'reentry', minutes: 30 }])
    const text = found && sayCaution(found, 'UTC').text.replaceAll('\u00a0', ' ')
    expect(text).toContain('At QT-3.')
    expect(text).toContain('until 14 May 2026, 14:50')
  })
  it('is a condition while the order is written, and of formalin alone', () => {
    const facts = someFacts('formalin', formalin(100), { order: { isAired: unknown() } })
    expect(firedBy('R40', facts)).toEqual([])
    const { conditions } = evaluateCautions({ facts, stage: 'design' })
    expect(conditions.find(({ ruleId }) => ruleId === 'R40')?.state).toBe('unknown')
    const other = someFacts(
      'chloramine-t',
      { value: 20, unit: 'mg/L', basis: 'active' },
      {
        order: { isAired: known(false) },
      },
    )
    expect(firedBy('R40', other, 'start')).toEqual([])
  })
})

const given = (agent: AgentCode, change: Change = {}): CautionFacts => ({
  ...someFacts(agent, { value: 1, unit: 'mg/kg', basis: 'active' }, change),
  route: 'injection',
})

describe('R44: anti-inflammatories on top of each other', () => {
  const hours = (n: number) => new Date(Date.parse(at) + n * 3_600_000).toISOString()
  const withOther = (agent: AgentCode, other: AgentCode, from: number, until: number) =>
    firedBy(
      'R44',
      given(agent, {
        order: { startsAt: known(at), endsAt: known(hours(1)) },
        history: {
          animalUses: known([
            { agent: other, orderNumber: 'TO-0750', state: 'ended', from: hours(from), until: hours(until) },
          ]),
        },
      }),
    )
  const fires = ['warning anti-inflammatories-together']
  it.each<[AgentCode, AgentCode, number, number, string[]]>([
    ['meloxicam', 'ketoprofen', -80, -71.9, fires],
    ['meloxicam', 'ketoprofen', -80, -72, []],
    ['meloxicam', 'meloxicam', -10, 10, fires],
    ['meloxicam', 'dexamethasone', 72.9, 80, fires],
    ['meloxicam', 'dexamethasone', 73, 80, []],
    ['dexamethasone', 'ketoprofen', -1, 2, fires],
    ['dexamethasone', 'dexamethasone', -1, 2, []],
    ['meloxicam', 'enrofloxacin', -1, 2, []],
    ['enrofloxacin', 'meloxicam', -1, 2, []],
  ])('%s beside %s, from %d h to %d h', (agent, other, from, until, expected) =>
    expect(withOther(agent, other, from, until)).toEqual(expected),
  )
  it('says that it does not know, and is silent where nothing is given to the animals themselves', () => {
    const uses = (animalUses: CautionFacts['history']['animalUses']) =>
      firedBy('R44', given('meloxicam', { history: { animalUses } }))
    expect(uses(unknown())).toEqual(['warning animal-uses-unknown'])
    expect(uses(notApplicable())).toEqual([])
    const bath = someFacts(
      'meloxicam',
      { value: 1, unit: 'mg/L', basis: 'active' },
      {
        history: { animalUses: unknown() },
      },
    )
    expect(firedBy('R44', bath)).toEqual([])
  })
})

describe('R43: itraconazole from bulk powder', () => {
  const found = (isFromBulk: CautionFacts['lot']['isFromBulk'], agent: AgentCode = 'itraconazole') =>
    firedBy('R43', { ...given(agent, { lot: { isFromBulk } }), route: 'by-mouth' })
  it('warns of it, and where nobody recorded it; not of an approved product, nor of another drug', () => {
    expect(found(known(true))).toEqual(['warning itraconazole-from-bulk'])
    expect(found(unknown())).toEqual(['warning itraconazole-source-unknown'])
    expect(found(known(false))).toEqual([])
    expect(found(notApplicable())).toEqual([])
    expect(found(known(true), 'voriconazole')).toEqual([])
  })
})
