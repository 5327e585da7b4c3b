import { describe, expect, it } from 'vitest'
import type { CautionFacts, DefaultRange, DoseTarget } from '../../../shared/domain/cautions/caution-facts.ts'
import { known, notApplicable, unknown } from '../../../shared/domain/cautions/fact.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { sayCaution } from '../../../shared/messages/say-caution.ts'
import { aLine, at, firedBy, someFacts } from './some-facts.ts'
import type { Change } from './some-facts.ts'

const plain = (text: string) => text.replaceAll('\u00a0', ' ')
const mg = (value: number, basis: DoseTarget['basis'] = 'active'): DoseTarget => ({
  value,
  unit: 'mg/L',
  basis,
})

describe('R29, R48: what is in the water already, and when', () => {
  const hours = (n: number) => new Date(Date.parse(at) + n * 3_600_000).toISOString()
  const withOther = (agent: AgentCode, other: AgentCode, from: number, until: number | null) =>
    firedBy(
      'R29',
      someFacts(agent, mg(2), {
        order: { startsAt: known(at), endsAt: known(hours(1)) },
        history: {
          agentUses: known([
            {
              agent: other,
              orderNumber: 'TO-0750',
              state: 'running',
              from: hours(from),
              until: until === null ? null : hours(until),
            },
          ]),
        },
      }),
    )
  it.each<[string, AgentCode, AgentCode, number, number | null, string[]]>([
    [
      'the same drug, not out of the water',
      'praziquantel',
      'praziquantel',
      -48,
      null,
      ['stop same-agent-together'],
    ],
    [
      'the same drug, out of it within a day',
      'praziquantel',
      'praziquantel',
      -48,
      -1,
      ['warning same-agent-same-day'],
    ],
    ['the same drug, out of it for longer', 'praziquantel', 'praziquantel', -48, -25, []],
    ['two oxidants within a day', 'hydrogen-peroxide', 'chloramine-t', -10, -9, ['stop agents-not-together']],
    ['formalin with chloramine-T', 'formalin', 'chloramine-t', 0, 1, ['stop agents-not-together']],
    ['the same two, two days apart', 'formalin', 'chloramine-t', -50, -49, []],
    ['any other in the water', 'praziquantel', 'sodium-chloride', -48, null, ['warning agent-in-water']],
    ['any other of the day', 'praziquantel', 'sodium-chloride', 5, 6, ['note agent-same-day']],
    ['formalin and permanganate are R08’s matter', 'formalin', 'potassium-permanganate', 0, 1, []],
  ])('R29: %s', (_, agent, other, from, until, expected) =>
    expect(withOther(agent, other, from, until)).toEqual(expected),
  )
  const plan = (startsIn: number, givenDoses = 0, lastGiven: number | null = null, intervalHours = 24) =>
    firedBy(
      'R48',
      someFacts('praziquantel', mg(2), {
        order: {
          startsAt: known(hours(startsIn)),
          spacing: known({
            intervalHours,
            lastGivenAt: lastGiven === null ? null : hours(lastGiven),
            givenDoses,
            plannedDoses: 3,
            readingDriven: false,
          }),
        },
      }),
    )
  it('R48: a start whose window has closed, one far ahead, and doses that count already', () => {
    expect(plan(-6)).toEqual([])
    expect(plan(-6.1)).toEqual(['warning start-past'])
    expect(plan(90 * 24)).toEqual([])
    expect(plan(90 * 24 + 1)).toEqual(['warning start-far'])
    expect(plan(0, 0, null, 1080)).toEqual([])
    expect(plan(0, 0, null, 1081)).toEqual(['warning plan-long'])
    expect(plan(-30, 1, -29)).toEqual(['note doses-carried'])
    expect(plan(2, 1, -29)).toEqual(['warning plan-counts-given'])
    // the first dose itself, given within its window but before its minute
    expect(plan(3, 1, -1)).toEqual(['note doses-carried'])
  })
})

/** A contact in minutes, and what the contacts of a day make together; null: left in the water. */
const contact = (minutes: number | null, minutesPerDay = minutes): Partial<CautionFacts['order']> =>
  minutes === null || minutesPerDay === null
    ? {
        timing: known('indefinite'),
        contactMinutes: notApplicable(),
        contactMinutesPerDay: notApplicable(),
      }
    : {
        timing: known('timed'),
        contactMinutes: known(minutes),
        contactMinutesPerDay: known(minutesPerDay),
      }

describe('R49: water and contact of the dose line that is named', () => {
  const named = (line: Partial<DefaultRange>, minutes: number | null, change: Change = {}) =>
    firedBy(
      'R49',
      someFacts('hydrogen-peroxide', mg(75), {
        ...change,
        order: { defaultRange: known(aLine(75, line)), ...contact(minutes) },
      }),
    )
  it.each<[string, number | null, number | null, string[]]>([
    ['exactly as long as the line', 30, 30, []],
    ['a little longer', 30, 31, ['warning contact-over-line']],
    ['exactly twice as long', 30, 60, ['warning contact-over-line']],
    ['longer than twice', 30, 61, ['stop contact-far-over-line']],
    ['ten times as long', 30, 300, ['stop contact-far-over-line']],
    ['a dip of ten minutes left for fourteen days', 10, 20_160, ['stop contact-far-over-line']],
    ['left in the water', 30, null, ['stop left-in-over-line']],
    ['a line to effect, for days', null, 20_160, []],
    ['a line to effect, left in the water', null, null, []],
  ])('%s', (_, longestContactMinutes, minutes, expected) =>
    expect(named({ longestContactMinutes }, minutes)).toEqual(expected),
  )
  it.each<[string, number, number, string[]]>([
    ['one bath a day', 30, 30, []],
    ['two, as long together as the line', 15, 30, []],
    ['two', 30, 60, ['warning day-over-line']],
    ['two and a little', 30, 60.1, ['stop day-far-over-line']],
    ['half an hour of every two hours', 30, 360, ['stop day-far-over-line']],
    ['one that is too long already', 40, 40, ['warning contact-over-line']],
  ])('adds up the baths of a day for a line of 30 minutes: %s', (_, minutes, minutesPerDay, expected) => {
    const line = aLine(75, { longestContactMinutes: 30 })
    const facts = someFacts('hydrogen-peroxide', mg(75), {
      order: { defaultRange: known(line), ...contact(minutes, minutesPerDay) },
    })
    expect(firedBy('R49', facts)).toEqual(expected)
  })
  it('says that it is the day that is too long', () => {
    const facts = someFacts('hydrogen-peroxide', mg(75), {
      order: { defaultRange: known(aLine(75, { longestContactMinutes: 30 })), ...contact(30, 360) },
    })
    const found = evaluateCautions({ facts, stage: 'design' }).cautions.find(({ ruleId }) => ruleId === 'R49')
    expect(found && plain(sayCaution(found, 'Europe/Lisbon').text)).toBe(
      'The dose line is for 30 minutes. All baths of a day together are 6 hours, far longer.',
    )
  })
  it('stops a line for a bath whose agent is to stay, though it names no minutes', () => {
    const bath = { stays: false, longestContactMinutes: null }
    expect(named(bath, null)).toEqual(['stop left-in-bath-line'])
    expect(named(bath, 20)).toEqual([])
    expect(named({ ...bath, longestContactMinutes: 30 }, null)).toEqual(['stop left-in-over-line'])
  })
  it.each<[string, number, number, string[]]>([
    ['for as long as such a bath is taken for', 60, 60, []],
    ['longer', 61, 61, ['warning contact-over-untimed-line']],
    ['exactly twice as long', 120, 120, ['warning contact-over-untimed-line']],
    ['longer than twice', 121, 121, ['stop contact-far-over-untimed-line']],
    ['for all but the whole day', 1380, 1380, ['stop contact-far-over-untimed-line']],
    ['for fourteen days', 20_160, 20_160, ['stop contact-far-over-untimed-line']],
    ['twice a day', 45, 90, ['warning contact-over-untimed-line']],
    ['an hour of every two', 60, 720, ['stop contact-far-over-untimed-line']],
  ])('a line for a bath that names no minutes, %s', (_, minutes, minutesPerDay, expected) => {
    const facts = someFacts('tricaine', mg(330), {
      order: {
        defaultRange: known(aLine(330, { stays: false })),
        ...contact(minutes, minutesPerDay),
      },
    })
    expect(firedBy('R49', facts)).toEqual(expected)
  })
  it('takes the one contact where nobody worked out the sum of a day', () => {
    const facts = someFacts('tricaine', mg(330), {
      order: {
        defaultRange: known(aLine(330, { stays: false })),
        ...contact(600),
        contactMinutesPerDay: unknown(),
      },
    })
    expect(firedBy('R49', facts)).toEqual(['stop contact-far-over-untimed-line'])
  })
  it('says that such a line names no time, and what its limit is', () => {
    const facts = someFacts('tricaine', mg(330), {
      order: { defaultRange: known(aLine(330, { stays: false })), ...contact(20) },
    })
    expect(firedBy('R49', facts)).toEqual([])
    const long = someFacts('tricaine', mg(330), {
      order: { defaultRange: known(aLine(330, { stays: false })), ...contact(60, 205.714) },
    })
    const { cautions } = evaluateCautions({ facts: long, stage: 'design' })
    const found = cautions.find(({ ruleId }) => ruleId === 'R49')
    expect(found && plain(sayCaution(found, 'Europe/Lisbon').text)).toBe(
      'The dose line is for a bath that has an end, and names no time. 3 hours 26 minutes, the longest bath or all baths of a day together, is far longer than the 60 minutes that such a bath may take.',
    )
  })
  it('stops a line of other water, and asks where nobody knows what water it is', () => {
    const inWater = (water: DefaultRange['water'], kind: CautionFacts['water']['kind']) =>
      named({ water }, 30, { water: { kind } })
    expect(inWater('fresh', known('marine'))).toEqual(['stop line-of-other-water'])
    expect(inWater('marine', known('fresh'))).toEqual(['stop line-of-other-water'])
    expect(inWater('marine', known('brackish'))).toEqual(['warning line-of-other-water'])
    expect(inWater('fresh', unknown())).toEqual(['warning line-water-unknown'])
    expect(inWater('fresh', known('fresh'))).toEqual([])
    for (const kind of ['fresh', 'brackish', 'marine'] as const)
      expect(inWater('both', known(kind))).toEqual([])
  })
  it('has nothing to say where no line is named: R26 compares with what fits', () => {
    const facts = someFacts('hydrogen-peroxide', mg(75), {
      order: { defaultRange: unknown(), ...contact(300) },
    })
    expect(firedBy('R49', facts)).toEqual([])
  })
})

describe('R26, R47: no line is named, and only lines for such water and such a contact count', () => {
  /** As the starter formulary has them: left in sea water, and two days in any. */
  const praziquantel = [aLine(2, { water: 'marine' }), aLine(10, { longestContactMinutes: 2880 })]
  const peroxide = [
    aLine(100, { water: 'fresh', longestContactMinutes: 60 }),
    aLine(75, { water: 'marine', longestContactMinutes: 30 }),
  ]
  const sedation = [aLine(330, { stays: false })]
  const of = (
    target: number,
    lines: readonly DefaultRange[],
    minutes: number | null,
    kind: CautionFacts['water']['kind'] = known('marine'),
    minutesPerDay = minutes,
  ) =>
    someFacts('praziquantel', mg(target), {
      order: { defaultRange: unknown(), agentRanges: known(lines), ...contact(minutes, minutesPerDay) },
      water: { kind },
    })
  it.each<[string, CautionFacts, string[]]>([
    ['2 mg/L left in', of(2, praziquantel, null), ['warning line-not-named']],
    ['20 mg/L left in is ten times 2', of(20, praziquantel, null), ['stop far-over-default']],
    ['10 mg/L for two days', of(10, praziquantel, 2880), ['warning line-not-named']],
    ['10 mg/L for longer', of(10, praziquantel, 2881), ['stop far-over-default']],
    ['left in fresh water', of(2, praziquantel, null, known('fresh')), ['stop no-line-fits']],
    [
      'left in, and the only line is for a bath',
      of(2, [aLine(10, { stays: false })], null),
      ['stop no-line-fits'],
    ],
    [
      '330 mg/L for two hours, and the only line is for a bath',
      of(330, sedation, 120),
      ['warning line-not-named'],
    ],
    ['the same for longer', of(330, sedation, 121), ['stop no-line-fits']],
    ['the same for ten hours', of(330, sedation, 600), ['stop no-line-fits']],
    ['the same for fourteen days', of(330, sedation, 20_160), ['stop no-line-fits']],
    ['the same an hour of every two', of(330, sedation, 60, known('marine'), 720), ['stop no-line-fits']],
    ['75 mg/L for half an hour', of(75, peroxide, 30), ['warning line-not-named']],
    ['75 mg/L for five hours', of(75, peroxide, 300), ['stop no-line-fits']],
    [
      '75 mg/L for half an hour, twice a day',
      of(75, peroxide, 30, known('marine'), 60),
      ['warning line-not-named'],
    ],
    [
      '75 mg/L for half an hour of every two',
      of(75, peroxide, 30, known('marine'), 360),
      ['stop no-line-fits'],
    ],
    ['100 mg/L is a figure for fresh water', of(100, peroxide, 30), ['warning over-default']],
    ['in water that nobody named', of(100, peroxide, 30, unknown()), ['warning line-not-named']],
  ])('%s', (_, facts, expected) => expect(firedBy('R26', facts)).toEqual(expected))
  it('R47 takes the highest line for the water, however long the contact', () => {
    expect(firedBy('R47', of(750, peroxide, 30))).toEqual([])
    expect(firedBy('R47', of(751, peroxide, 30))).toEqual(['stop beyond-every-line'])
    expect(firedBy('R47', of(751, peroxide, 30, known('fresh')))).toEqual([])
    expect(firedBy('R47', of(100, praziquantel, null))).toEqual([])
    expect(firedBy('R47', of(101, praziquantel, null))).toEqual(['stop beyond-every-line'])
  })
})

describe('R50: doses that stay in the water', () => {
  const course = (
    planned: number,
    given: { givenDoses?: number; stillIn?: CautionFacts['order']['dosesStillIn']; target?: number } = {},
    order: Partial<CautionFacts['order']> = {},
  ) =>
    someFacts('praziquantel', mg(given.target ?? 2), {
      order: {
        defaultRange: known(aLine(2)),
        ...contact(null),
        dosesStillIn: given.stillIn ?? known(0),
        spacing: known({
          intervalHours: 72,
          lastGivenAt: null,
          givenDoses: given.givenDoses ?? 0,
          plannedDoses: planned,
          readingDriven: false,
        }),
        ...order,
      },
    })
  it('are added up at the signature', () => {
    expect(firedBy('R50', course(1))).toEqual([])
    expect(firedBy('R50', course(2))).toEqual(['warning doses-add-up'])
    expect(firedBy('R50', course(3))).toEqual(['warning doses-add-up'])
    // three of a third each make what one may be
    expect(firedBy('R50', course(3, { target: 2 / 3 }))).toEqual([])
    // baths with an end do not add up
    expect(firedBy('R50', course(3, {}, contact(60)))).toEqual([])
    // an amended order: one to come, and one in the water
    expect(firedBy('R50', course(3, { givenDoses: 2, stillIn: known(0) }))).toEqual([])
    expect(firedBy('R50', course(3, { givenDoses: 2, stillIn: known(1) }))).toEqual(['warning doses-add-up'])
  })
  it('hold the next one at the tank while too much is in the water', () => {
    const atTank = (stillIn: CautionFacts['order']['dosesStillIn'], givenDoses = 2) =>
      firedBy('R50', course(4, { givenDoses, stillIn }), 'start')
    expect(atTank(known(0))).toEqual([])
    expect(atTank(known(1))).toEqual(['warning dose-on-dose'])
    expect(atTank(known(2))).toEqual(['stop dose-on-dose'])
    // where nobody can tell, all that went in is in
    expect(atTank(unknown())).toEqual(['stop dose-on-dose'])
    expect(atTank(unknown(), 0)).toEqual([])
  })
  it('say what the last one makes', () => {
    const { cautions } = evaluateCautions({ facts: course(3), stage: 'design' })
    const found = cautions.find(({ code }) => code === 'doses-add-up')
    expect(found && plain(sayCaution(found, 'Europe/Lisbon').text)).toBe(
      '3 doses of 2 mg/L each are to stay in the water. Unless the agent is out of it before each next one, the last makes up to 6 mg/L, 3.0 times the upper end of the dose line, 2 mg/L.',
    )
  })
})
