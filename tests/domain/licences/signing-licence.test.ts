import { describe, expect, it } from 'vitest'
import { scheduleOf } from '../../../shared/domain/licences/controlled-agents.ts'
import type { HeldLicence } from '../../../shared/domain/licences/licence-classes.ts'
import { signingLicence } from '../../../shared/domain/licences/signing-licence.ts'
import type { SigningQuestion } from '../../../shared/domain/licences/signing-licence.ts'

const held = (id: string, given: Partial<HeldLicence> = {}): HeldLicence => ({
  id,
  class: 'veterinary',
  jurisdiction: 'Norrell Sound',
  number: id.toUpperCase(),
  validFrom: '2024-01-01',
  validUntil: '2027-12-31',
  endedOn: null,
  void: false,
  superseded: false,
  ...given,
})
const registration = (id: string, given: Partial<HeldLicence> = {}) =>
  held(id, { class: 'controlled-substance', ...given })

const ask = (licences: HeldLicence[], given: Partial<SigningQuestion<HeldLicence>> = {}) => {
  const { choices, licence, registration, lacks } = signingLicence({
    licences,
    on: '2026-12-01',
    accepted: ['Norrell Sound', 'Outer Skerries'],
    chosenId: null,
    controlledSchedule: null,
    ...given,
  })
  return {
    choices: choices.map(({ id }) => id),
    licence: licence?.id ?? null,
    registration: registration?.id ?? null,
    lacks: lacks.map(({ code }) => code),
  }
}

describe('the licence that signs', () => {
  it('is the only valid one, by itself', () => {
    expect(ask([held('a')])).toEqual({ choices: ['a'], licence: 'a', registration: null, lacks: [] })
    expect(ask([held('a'), held('b', { validUntil: '2026-11-30' })]).licence).toBe('a')
  })

  it('is chosen by the signer where several are valid, and never for them', () => {
    const two = [held('a'), held('b', { jurisdiction: 'OUTER SKERRIES' })]
    expect(ask(two)).toEqual({
      choices: ['a', 'b'],
      licence: null,
      registration: null,
      lacks: ['licence-not-chosen'],
    })
    expect(ask(two, { chosenId: 'b' })).toMatchObject({ licence: 'b', lacks: [] })
    expect(ask(two, { chosenId: 'c' })).toMatchObject({ licence: null, lacks: ['chosen-licence-not-valid'] })
  })

  it('is never a chosen one that is not valid, though another is', () => {
    const some = [held('a'), held('b', { validUntil: '2026-11-30' })]
    expect(ask(some, { chosenId: 'b' })).toMatchObject({
      licence: null,
      lacks: ['chosen-licence-not-valid'],
    })
  })

  it.each([
    [[], 'no-licence'],
    [[held('a', { validUntil: '2026-11-30' })], 'licence-ended'],
    [[held('a', { endedOn: '2026-11-30' })], 'licence-ended'],
    [[held('a', { validFrom: '2026-12-02' })], 'licence-not-yet'],
    [[held('a', { jurisdiction: 'Elsewhere' })], 'licence-not-accepted-here'],
    [[held('a', { void: true })], 'no-licence'],
    [[held('a', { superseded: true })], 'no-licence'],
    [[registration('a')], 'no-licence'],
  ] as const)('says what lacks of %j', (licences, code) => {
    expect(ask([...licences])).toMatchObject({ choices: [], licence: null, lacks: [code] })
  })

  it('names the licence that ended and its last day', () => {
    const { lacks } = signingLicence({
      licences: [held('a', { validUntil: '2026-01-31' }), held('b', { validUntil: '2026-11-30' })],
      on: '2026-12-01',
      accepted: ['Norrell Sound'],
      chosenId: null,
      controlledSchedule: null,
    })
    expect(lacks[0]?.params).toEqual({ number: 'B', jurisdiction: 'Norrell Sound', on: '2026-11-30' })
  })

  it('counts both days of the period', () => {
    expect(ask([held('a', { validUntil: '2026-12-01' })]).lacks).toEqual([])
    expect(ask([held('a', { validFrom: '2026-12-01' })]).lacks).toEqual([])
  })
})

describe('a controlled drug', () => {
  it('is known by its code', () => {
    expect([scheduleOf('butorphanol'), scheduleOf('ketamine')]).toEqual(['IV', 'III'])
    expect([scheduleOf('copper'), scheduleOf('toString')]).toEqual([null, null])
  })

  it('asks for a registration besides the licence', () => {
    const asked = { controlledSchedule: 'IV' } as const
    expect(ask([held('a')], asked)).toMatchObject({ licence: null, lacks: ['no-registration'] })
    expect(ask([held('a'), registration('r')], asked)).toMatchObject({
      licence: 'a',
      registration: 'r',
      lacks: [],
    })
    // nothing else does
    expect(ask([held('a'), registration('r')])).toMatchObject({ registration: null, lacks: [] })
  })

  it('takes the registration that lasts longest', () => {
    const some = [held('a'), registration('r', { validUntil: '2026-12-26' }), registration('s')]
    expect(ask(some, { controlledSchedule: 'III' }).registration).toBe('s')
  })

  it.each([
    [registration('r', { validUntil: '2026-11-30' }), 'registration-ended'],
    [registration('r', { endedOn: '2026-11-30' }), 'registration-ended'],
    [registration('r', { validFrom: '2026-12-02' }), 'registration-not-yet'],
    [registration('r', { jurisdiction: 'Outer Skerries' }), 'registration-elsewhere'],
    [registration('r', { jurisdiction: 'Elsewhere' }), 'registration-elsewhere'],
    [registration('r', { void: true }), 'no-registration'],
  ] as const)('says what lacks of %j', (other, code) => {
    const answer = ask([held('a'), other], { controlledSchedule: 'IV' })
    expect(answer).toEqual({ choices: ['a'], licence: null, registration: null, lacks: [code] })
  })

  it('goes by the jurisdiction of the licence that was chosen', () => {
    const some = [held('a'), held('b', { jurisdiction: 'Outer Skerries' }), registration('r')]
    const asked = { controlledSchedule: 'IV' } as const
    expect(ask(some, { ...asked, chosenId: 'a' })).toMatchObject({ licence: 'a', registration: 'r' })
    expect(ask(some, { ...asked, chosenId: 'b' }).lacks).toEqual(['registration-elsewhere'])
    expect(ask(some, asked)).toMatchObject({ registration: null, lacks: ['licence-not-chosen'] })
  })

  it('says everything that lacks, not only the first', () => {
    expect(ask([], { controlledSchedule: 'III' }).lacks).toEqual(['no-licence', 'no-registration'])
  })
})
