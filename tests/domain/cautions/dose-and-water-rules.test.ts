import { describe, expect, it } from 'vitest'
import type { CautionFacts, DoseTarget } from '../../../shared/domain/cautions/caution-facts.ts'
import { known, unknown } from '../../../shared/domain/cautions/fact.ts'
import { agentCodes } from '../../../shared/domain/formulary/agent.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import { instantOfLocalTime } from '../../../shared/domain/time/local-time.ts'
import { aLine, cautions, firedBy, formalin, read, someFacts } from './some-facts.ts'
import type { Change } from './some-facts.ts'

// Sources: as each rule names them; expected outcomes of the marked cases as computed in the treatments reference,
// section 4.1 (C). The rest is our own reading of the same rules (P).

const mg = (value: number, basis: DoseTarget['basis'] = 'active'): DoseTarget => ({
  value,
  unit: 'mg/L',
  basis,
})
const cuso = (target: DoseTarget, kind: 'fresh' | 'brackish' | 'marine', change: Change = {}) =>
  someFacts('copper-sulfate', target, { ...change, water: { kind: known(kind), ...change?.water } })

describe('R26, R27, R47: the figure itself', () => {
  /** No line is named; the formulary has two, 2 and 10 mg/L. */
  const unnamed = {
    order: {
      defaultRange: unknown(),
      agentRanges: known([aLine(2), aLine(10)]),
    },
  } satisfies Change
  const range = (
    low: number | null,
    high: number,
    basis: 'active' | 'salt' | 'free' | 'product' = 'active',
    unit: 'mg/L' | 'uL/L' | 'ug/L' = 'mg/L',
  ) => ({ order: { defaultRange: known(aLine(high, { low, unit, basis })) } }) satisfies Change
  it.each<[string, CautionFacts, string[]]>([
    ['at the upper end', someFacts('praziquantel', mg(2), range(2, 2)), []],
    ['just above', someFacts('praziquantel', mg(2.1), range(2, 2)), ['warning over-default']],
    ['exactly twice', someFacts('praziquantel', mg(4), range(2, 2)), ['warning over-default']],
    ['more than twice', someFacts('praziquantel', mg(4.1), range(2, 2)), ['stop far-over-default']],
    [
      'ten times: a slip of the decimal point',
      someFacts('praziquantel', mg(20), range(2, 2)),
      ['stop far-over-default'],
    ],
    ['half of the lower end', someFacts('praziquantel', mg(1), range(2, 2)), []],
    ['less than half', someFacts('praziquantel', mg(0.99), range(2, 2)), ['warning under-default']],
    [
      'other unit, same basis',
      someFacts('praziquantel', mg(2.1), range(null, 2000, 'active', 'ug/L')),
      ['warning over-default'],
    ],
    [
      'formalin by mass against a line by volume',
      someFacts('formalin', mg(271, 'product'), range(null, 250, 'product', 'uL/L')),
      ['warning over-default'],
    ],
    [
      'formalin by mass at the line',
      someFacts('formalin', mg(270, 'product'), range(null, 250, 'product', 'uL/L')),
      [],
    ],
    [
      'formalin by volume against a line by mass',
      someFacts('formalin', formalin(24), range(15, 25, 'product', 'mg/L')),
      ['warning over-default'],
    ],
    [
      'copper as salt against a line of free copper',
      cuso(mg(0.8, 'salt'), 'marine', range(0.15, 0.2, 'free')),
      ['warning over-default'],
    ],
    ['copper as salt inside the line', cuso(mg(0.78, 'salt'), 'marine', range(0.15, 0.2, 'free')), []],
    [
      'bases that nothing joins',
      someFacts('chloroquine', mg(10, 'base'), range(5, 10, 'salt')),
      ['stop default-not-comparable'],
    ],
    [
      'no line at all',
      someFacts('methylene-blue', mg(2), { order: { defaultRange: unknown() } }),
      ['stop no-default-range'],
    ],
    [
      'no line named: the highest counts',
      someFacts('praziquantel', mg(10), unnamed),
      ['warning line-not-named'],
    ],
    [
      'no line named, above the highest',
      someFacts('praziquantel', mg(11), unnamed),
      ['warning over-default'],
    ],
    [
      'no line named, far above the highest',
      someFacts('praziquantel', mg(21), unnamed),
      ['stop far-over-default'],
    ],
    [
      'no line named, bases that nothing joins',
      someFacts('praziquantel', mg(2, 'salt'), unnamed),
      ['stop default-not-comparable'],
    ],
  ])('R26: %s', (_, facts, expected) => expect(firedBy('R26', facts)).toEqual(expected))
  it.each<[string, CautionFacts, string[]]>([
    ['ten times the highest line', someFacts('praziquantel', mg(100), unnamed), []],
    ['beyond it', someFacts('praziquantel', mg(100.1), unnamed), ['stop beyond-every-line']],
    [
      'a thousand times, though the order names a line of its own',
      someFacts('praziquantel', mg(2000), {
        order: {
          ...unnamed.order,
          defaultRange: known(aLine(2000)),
        },
      }),
      ['stop beyond-every-line'],
    ],
    ['another basis, four times as far', someFacts('praziquantel', mg(400, 'salt'), unnamed), []],
    ['and beyond', someFacts('praziquantel', mg(401, 'salt'), unnamed), ['stop beyond-every-line']],
    [
      'copper as salt against a line of free copper: 7.86 mg/L is ten times 0.2 mg/L',
      cuso(mg(7.9, 'salt'), 'marine', {
        order: { agentRanges: known([aLine(0.2, { basis: 'free' })]) },
      }),
      ['stop beyond-every-line'],
    ],
    ['no line at all is the matter of R26', someFacts('methylene-blue', mg(5000)), []],
  ])('R47: %s', (_, facts, expected) => {
    expect(firedBy('R47', facts)).toEqual(expected)
    expect(firedBy('R47', facts, 'start')).toEqual(expected)
    for (const caution of cautions(facts).filter(({ ruleId }) => ruleId === 'R47'))
      expect(caution.overridable).toBe(false)
  })
  it('R27: no basis is a stop that nobody overrides', () => {
    const without = someFacts('copper-sulfate', mg(0.2, null))
    expect(firedBy('R27', without)).toEqual(['stop basis-missing'])
    expect(cautions(without).find(({ ruleId }) => ruleId === 'R27')).toMatchObject({
      overridable: false,
      mark: 'C',
    })
    expect(firedBy('R27', someFacts('copper-sulfate', mg(0.2), { order: { target: unknown() } }))).toEqual([
      'stop basis-missing',
    ])
  })
})

describe('R28: spacing of doses, in true hours', () => {
  const zone = 'Europe/Lisbon'
  const spaced = (lastGivenAt: string, doseAt: string, intervalHours = 24, more = {}) => {
    const spacing = {
      intervalHours,
      lastGivenAt,
      givenDoses: 1,
      plannedDoses: 3,
      readingDriven: false,
      ...more,
    }
    return firedBy(
      'R28',
      { ...someFacts('praziquantel', mg(2), { order: { spacing: known(spacing) } }), at: doseAt },
      'start',
    )
  }
  const saturday = instantOfLocalTime('2026-03-28', '14:00', zone)
  it.each([
    ['next day 08:30, clock forward: 17.5 h (reference case)', '2026-03-29', '08:30', ['warning dose-early']],
    ['next day 09:15: 18.25 h (reference case)', '2026-03-29', '09:15', []],
    ['30 h later', '2026-03-29', '21:00', []],
    ['30 h 01 later', '2026-03-29', '21:01', ['warning dose-late']],
    ['11 h 59 later', '2026-03-29', '02:59', ['stop dose-very-early']],
  ])('%s', (_, date, time, expected) =>
    expect(spaced(saturday, instantOfLocalTime(date, time, zone))).toEqual(expected),
  )
  it('other intervals have a fifth of their length', () => {
    const after = (hours: number) => new Date(Date.parse(saturday) + hours * 3_600_000).toISOString()
    expect(spaced(saturday, after(38.4), 48)).toEqual([])
    expect(spaced(saturday, after(38.3), 48)).toEqual(['warning dose-early'])
    expect(spaced(saturday, after(57.7), 48)).toEqual(['warning dose-late'])
  })
  it('past the plan is a stop; reading-driven additions are spaced by their own limits', () => {
    expect(spaced(saturday, instantOfLocalTime('2026-03-29', '14:00', zone), 24, { givenDoses: 3 })).toEqual([
      'stop doses-past-plan',
    ])
    expect(
      spaced(saturday, instantOfLocalTime('2026-03-28', '15:00', zone), 24, { readingDriven: true }),
    ).toEqual([])
  })
  it('does not let a dose come before the bath of the last one is over', () => {
    const baths = (intervalHours: number, contactMinutes: number, plannedDoses = 3) =>
      firedBy(
        'R28',
        someFacts('formalin', formalin(167), {
          order: {
            contactMinutes: known(contactMinutes),
            spacing: known({
              intervalHours,
              lastGivenAt: null,
              givenDoses: 0,
              plannedDoses,
              readingDriven: false,
            }),
          },
        }),
        'design',
      )
    expect(baths(2, 240)).toEqual(['stop interval-within-contact'])
    expect(baths(1, 60)).toEqual(['stop interval-within-contact'])
    expect(baths(24, 60)).toEqual([])
    expect(baths(0, 60, 1)).toEqual([])
  })
  it('an assay on day 8 asks for another dose; without a calendar interval nothing is early (reference case)', () => {
    expect(firedBy('R28', someFacts('praziquantel', mg(2)), 'start')).toEqual([])
  })
})

describe('R01, R31: oxygen, whatever the bath', () => {
  it.each(agentCodes)('%s waits for oxygen that was read and is high enough', (agent) => {
    const bath = (oxygenMgPerL: CautionFacts['water']['oxygenMgPerL']) =>
      someFacts(agent, mg(2), { water: { oxygenMgPerL } })
    expect(firedBy('R01', bath(read(3.1)), 'start')).toEqual(['stop oxygen-low'])
    expect(firedBy('R01', bath(unknown()), 'start')).toEqual(['stop oxygen-unknown'])
    expect(firedBy('R31', bath(unknown()), 'start')).toEqual(['stop test-missing'])
    expect(firedBy('R31', bath(read(7, 31)), 'start')).toEqual(['stop test-old'])
    expect(firedBy('R01', bath(read(5)), 'start')).toEqual([])
    expect(firedBy('R31', bath(read(5)), 'start')).toEqual([])
  })
})

describe('R31, R32, R34: readings, volume, lot', () => {
  it('R31: readings that the drug asks for, by their own age', () => {
    const stale = (water: Partial<CautionFacts['water']>) =>
      firedBy('R31', someFacts('formalin', formalin(150), { water }), 'start')
    expect(stale({ oxygenMgPerL: read(7, 30), temperatureC: read(18, 240) })).toEqual([])
    expect(stale({ oxygenMgPerL: read(7, 31), temperatureC: read(18, 241) })).toEqual([
      'stop test-old',
      'stop test-old',
    ])
    expect(stale({ oxygenMgPerL: unknown() })).toEqual(['stop test-missing'])
    expect(stale({ freeCopperMgPerL: unknown() })).toEqual([])
    const copper = cuso(mg(0.15, 'free'), 'marine', {
      water: { kind: known('marine'), freeCopperMgPerL: unknown() },
    })
    expect(firedBy('R31', copper, 'start')).toEqual(['stop test-missing'])
    const unknownKind = someFacts('copper-sulfate', mg(0.15, 'free'), {
      water: { kind: unknown(), freeCopperMgPerL: unknown(), alkalinityMgPerLCaCO3: unknown() },
    })
    expect(firedBy('R31', unknownKind, 'start')).toEqual(['stop test-missing', 'stop test-missing'])
  })
  const determined = (change: object) =>
    known({
      netVolumeLitres: 2220,
      method: 'geometry' as const,
      displacementSubtracted: true,
      errorPercent: 4,
      determinedOn: '2026-03-02',
      holdsForValves: true,
      previousLitres: null,
      ...change,
    })
  it.each<[string, CautionFacts['volume']['determination'], string[]]>([
    ['sound', determined({}), []],
    ['gross', determined({ displacementSubtracted: false }), ['volume-gross']],
    ['a meter sees only water', determined({ displacementSubtracted: false, method: 'metered' }), []],
    ['12 months old', determined({ determinedOn: '2025-05-14' }), []],
    ['12 months and a day', determined({ determinedOn: '2025-05-13' }), ['volume-old']],
    ['estimated, 10 %', determined({ method: 'estimated', errorPercent: 10 }), []],
    ['estimated, 11 %', determined({ method: 'estimated', errorPercent: 11 }), ['volume-estimated']],
    [
      'estimated, error not told',
      determined({ method: 'estimated', errorPercent: null }),
      ['volume-estimated-error-unknown'],
    ],
    ['other valves', determined({ holdsForValves: false }), ['volume-other-valves']],
    ['measured, 10 %', determined({ method: 'metered', errorPercent: 10 }), []],
    ['measured, 11 %', determined({ method: 'metered', errorPercent: 11 }), ['volume-error-large']],
    ['twice the one before', determined({ previousLitres: 1110 }), []],
    ['three times the one before', determined({ previousLitres: 740 }), ['volume-differs']],
  ])('R32: %s', (_, determination, codes) => {
    const of = (agent: AgentCode) => firedBy('R32', someFacts(agent, mg(2), { volume: { determination } }))
    expect(of('formalin')).toEqual(codes.map((code) => `stop ${code}`))
    expect(of('praziquantel')).toEqual(codes.map((code) => `warning ${code}`))
  })
  it('R32: stops where there is no volume, whatever the drug', () => {
    const facts = someFacts('praziquantel', mg(2), { volume: { determination: unknown() } })
    expect(firedBy('R32', facts)).toEqual(['stop volume-unknown'])
  })
  it.each<[string, object, string]>([
    ['± 91 %', { errorPercent: 91 }, 'volume-error-large'],
    ['estimated, ± 51 %', { method: 'estimated', errorPercent: 51 }, 'volume-estimated'],
    ['ten times the one before', { previousLitres: 222 }, 'volume-differs'],
    ['a tenth of the one before', { previousLitres: 22_200 }, 'volume-differs'],
  ])('R32: %s stops whatever the drug', (_, change, code) => {
    const facts = someFacts('praziquantel', mg(2), { volume: { determination: determined(change) } })
    for (const stage of ['design', 'start'] as const)
      expect(firedBy('R32', facts, stage)).toEqual([`stop ${code}`])
  })
  it.each<[string, Partial<CautionFacts['lot']>, string[]]>([
    ['last day', { expiresOn: known('2026-05-14') }, []],
    ['expired yesterday', { expiresOn: known('2026-05-13') }, ['stop lot-expired']],
    ['expiry unknown', { expiresOn: unknown() }, ['stop lot-expiry-unknown']],
    ['recalled', { status: known('recalled') }, ['stop lot-recalled']],
    ['set aside', { status: known('quarantined') }, ['stop lot-quarantined']],
    ['not chosen', { status: unknown() }, ['stop lot-status-unknown']],
    ['stock past its use', { beyondUseOn: known('2026-05-01') }, ['stop lot-beyond-use']],
    ['stock without a date', { beyondUseOn: unknown() }, ['stop lot-beyond-use-unknown']],
  ])('R34: %s', (_, lot, expected) =>
    expect(firedBy('R34', someFacts('praziquantel', mg(2), { lot }), 'start')).toEqual(expected),
  )
  it('R34: judges by the facility’s day, not that of UTC', () => {
    const facts = {
      ...someFacts('praziquantel', mg(2), { lot: { expiresOn: known('2026-05-14') } }),
      zone: 'Pacific/Kiritimati',
    }
    expect(firedBy('R34', facts, 'start')).toEqual(['stop lot-expired'])
  })
})

describe('R39, R41, R42', () => {
  const due = (agent: AgentCode, change: Change) => firedBy('R39', someFacts(agent, mg(2), change), 'start')
  const first = { order: { dosesGiven: known(0) } } satisfies Change
  it('R39: hazards, large waters and large amounts, at the first dose', () => {
    expect(due('formalin', first)).toEqual(['note second-calculation'])
    expect(due('praziquantel', first)).toEqual([])
    const large = known({
      netVolumeLitres: 10_001,
      method: 'dilution' as const,
      displacementSubtracted: true,
      errorPercent: 2,
      determinedOn: '2026-03-02',
      holdsForValves: true,
      previousLitres: null,
    })
    expect(due('praziquantel', { ...first, volume: { determination: large } })).toEqual([
      'note second-calculation',
    ])
    expect(due('praziquantel', { order: { dosesGiven: known(0), amountGrams: known(1000.1) } })).toEqual([
      'note second-calculation',
    ])
    expect(
      due('praziquantel', {
        order: { dosesGiven: known(0), amountGrams: unknown(), amountMillilitres: known(1001) },
      }),
    ).toEqual(['note second-calculation'])
    expect(due('praziquantel', { ...first, volume: { determination: unknown() } })).toEqual([
      'note second-calculation',
    ])
  })
  it('R39: again after a change, and above 1.25 of the plan; not for top-ups inside signed limits', () => {
    expect(due('formalin', {})).toEqual([])
    expect(due('formalin', { order: { changedSinceLastCalculation: known(true) } })).toEqual([
      'note second-calculation',
    ])
    expect(due('formalin', { order: { amountShareOfPlan: known(1.25) } })).toEqual([])
    expect(due('formalin', { order: { amountShareOfPlan: known(1.26) } })).toEqual([
      'note second-calculation',
    ])
    expect(
      due('copper-sulfate', { order: { dosesGiven: known(0), isTopUpInsideLimits: known(true) } }),
    ).toEqual([])
    expect(due('formalin', { order: { dosesGiven: unknown() } })).toEqual(['note second-calculation'])
  })
  it('R39 carries its effect', () => {
    const facts = someFacts('formalin', formalin(150), first)
    expect(cautions(facts, 'start').find(({ ruleId }) => ruleId === 'R39')?.effects).toEqual([
      { kind: 'secondCalculation' },
    ])
  })
  it('R41: weak and handled animals', () => {
    const of = (animals: Partial<CautionFacts['animals']>) =>
      firedBy('R41', someFacts('praziquantel', mg(2), { animals }), 'start')
    expect(of({ unwellPercent: known(5) })).toEqual([])
    expect(of({ unwellPercent: known(5.1) })).toEqual(['warning animals-unwell'])
    expect(of({ handledInLast24h: known(true) })).toEqual(['warning animals-handled'])
    expect(of({ unwellPercent: unknown(), handledInLast24h: unknown() })).toHaveLength(2)
  })
  it('R42: first use in a taxon', () => {
    const of = (withoutExperience: CautionFacts['animals']['withoutExperience']) =>
      firedBy('R42', someFacts('praziquantel', mg(2), { animals: { withoutExperience } }))
    expect(of(known(['Rhinoptera bonasus']))).toEqual(['warning first-use'])
    expect(of(known([]))).toEqual([])
    expect(of(unknown())).toEqual(['warning first-use-unknown'])
  })
})
