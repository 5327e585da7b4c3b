import { describe, expect, it } from 'vitest'
import type { BathSheet, RecordedDose } from '../../../shared/contracts/doses.contract.ts'
import { restInTheWay } from '../../../shared/messages/in-the-way.ts'
import {
  emptySecond,
  hasReadAll,
  secondBody,
  secondIsOpen,
} from '../../../src/features/doses/second-form-model.ts'
import {
  amountUnits,
  contactOf,
  doseToOpen,
  isBroken,
  lotToOpen,
  nextAct,
  openSteps,
  otherBaths,
  othersMayAct,
  otherCautions,
  ownBath,
  sheetMode,
  waitsForOthers,
} from '../../../src/features/doses/sheet-model.ts'

const now = '2026-12-01T18:20:00.000Z'
const lot = { id: 'l1', lotNumber: 'PZ-0317', state: 'usable', expiresOn: '2028-03-31' }
const first = { by: 'A', at: now, lotNumber: 'PZ-0317', amountText: '218\u00a0mL', mine: false }
const second = {
  by: 'B',
  at: now,
  lotNumber: 'PZ-0317',
  amountText: '219\u00a0mL',
  mine: true,
  agrees: true,
  differs: [],
  markCompared: true,
  alone: false,
  aloneText: null,
  differencePercent: 0.5,
}
const record = (given: Partial<RecordedDose> = {}): RecordedDose => ({
  id: 'd1',
  key: '1',
  kind: 'given',
  record: 'intact',
  amountText: '218\u00a0mL',
  lotNumber: 'PZ-0317',
  happenedAt: now,
  recordedAt: now,
  by: 'A',
  note: null,
  exceptions: [],
  struck: null,
  mayStrike: false,
  twice: false,
  otherStops: [],
  stop: null,
  ...given,
})
const running = (doseId: string, key: string, endsAt = now) => ({
  doseId,
  key,
  startedAt: now,
  endsAt,
  by: 'A',
})

const ended = {
  id: 's1',
  at: now,
  beforeStart: false,
  mayStrike: false,
  by: 'A',
  cause: 'time-up' as const,
  seen: null,
  rescue: null,
}

const sheet = (given: Partial<BathSheet> = {}): BathSheet => ({
  number: 'TO-0001',
  versionNo: 1,
  key: '1',
  now,
  dueAt: now,
  doses: 1,
  calendar: [],
  standing: null,
  state: 'due',
  recordFault: null,
  enclosureCode: 'QT-3',
  enclosureName: 'Tank QT-3',
  drug: 'formalin',
  productName: 'Formalin 37 %',
  form: 'liquid',
  treated: [],
  lots: [lot],
  lotId: 'l1',
  targetText: '100 µL/L as product',
  contactMinutes: 45,
  stopIf: 'any fish lies on its side',
  instructions: '',
  blind: false,
  signedAmountText: '218\u00a0mL',
  amountNowText: '218\u00a0mL',
  roundingText: null,
  amountNow: { value: '218', unit: 'mL' },
  working: [],
  driftPercent: 0,
  driftWithin: true,
  cautions: [],
  overrides: [],
  steps: [],
  record: 'intact',
  secondNeeded: true,
  lotChanged: false,
  first: null,
  second: null,
  secondShut: null,
  repeatAt: null,
  mayStart: false,
  why: ['x'],
  recorded: [],
  running: [],
  may: ['dose.give', 'dose.calculate-second'],
  ...given,
})

describe('how long a bath is to last', () => {
  it('is not said to be for good where the text of the order cannot be relied on', () => {
    expect(contactOf(sheet())).toBe(45)
    expect(contactOf(sheet({ contactMinutes: null }))).toBe('left-in')
    expect(contactOf(sheet({ contactMinutes: null, targetText: '', record: 'broken' }))).toBe('unknown')
  })
})

describe('whether somebody is shown amounts', () => {
  const blind = (given: Partial<BathSheet>) => sheet({ blind: true, ...given })
  it('keeps them from whoever may be the second person, until they say that they are not', () => {
    expect(sheetMode(blind({ first }), null)).toBe('blind')
    expect(sheetMode(blind({ first }), 'whole')).toBe('whole')
    expect(sheetMode(blind({ first }), 'second')).toBe('blind')
    expect(sheetMode(blind({ first, secondShut: 'begin-again' }), null)).toBe('blind')
  })
  it('shows them to the first person, to whoever knows them already, and where no second is needed', () => {
    const mine = { ...first, mine: true }
    expect(sheetMode(blind({ first: mine, secondShut: 'same-person' }), null)).toBe('whole')
    expect(sheetMode(blind({ first, secondShut: 'amount-seen' }), null)).toBe('whole')
    expect(sheetMode(blind({ first, secondNeeded: false }), null)).toBe('whole')
  })
  it('fetches them for nobody before the first calculation: whoever looks is no second person any more', () => {
    expect(sheetMode(blind({ secondShut: 'no-first' }), null)).toBe('same')
    expect(sheetMode(blind({ secondShut: 'no-first' }), 'whole')).toBe('whole')
  })
  it('fetches them for nobody who looks at a bath that runs or is over', () => {
    const recorded = { first, second, recorded: [record()] }
    for (const state of ['running', 'done'] as const) {
      expect(sheetMode(blind({ ...recorded, state }), null)).toBe('same')
      expect(sheetMode(blind({ ...recorded, state }), 'whole')).toBe('whole')
    }
  })
  it('needs no second reading where the server left nothing out', () => {
    expect(sheetMode(sheet({ first, second }), null)).toBe('same')
  })
  it('fetches them for nobody of a dose that is not given any more: they may be those of another order', () => {
    expect(sheetMode(blind({ state: 'ended' }), null)).toBe('same')
    expect(sheetMode(blind({ state: 'ended' }), 'whole')).toBe('whole')
  })
  it('looks again by itself while somebody waits for the first calculation', () => {
    expect(waitsForOthers(blind({ secondShut: 'no-first' }))).toBe(true)
    expect(waitsForOthers(blind({ first, secondShut: 'begin-again' }))).toBe(true)
    expect(waitsForOthers(blind({ first }))).toBe(false)
    expect(waitsForOthers(sheet({ secondShut: 'no-first' }))).toBe(false)
  })
})

describe('the next act at the tank', () => {
  it('goes from calculating to the second person, to giving, to the running bath', () => {
    expect(nextAct(sheet())).toBe('calculate')
    expect(nextAct(sheet({ first }))).toBe('wait-for-second')
    expect(nextAct(sheet({ first, second }))).toBe('resolve')
    expect(nextAct(sheet({ first, second, mayStart: true }))).toBe('give')
    // another lot in the hand is worked out anew
    expect(nextAct(sheet({ first, second, lotChanged: true }))).toBe('calculate')
    expect(nextAct(sheet({ first, second, state: 'running', recorded: [record()] }))).toBe('running')
    const over = record({ stop: ended })
    expect(nextAct(sheet({ state: 'done', recorded: [over] }))).toBe('done')
  })
  it('begins again after a disagreement, and waits again for the second person after that', () => {
    const differs = { ...second, agrees: false, differs: ['amount' as const] }
    expect(nextAct(sheet({ first, second: differs }))).toBe('calculate')
    const later = { ...first, at: '2026-12-01T18:25:00.000Z' }
    expect(nextAct(sheet({ first: later, second: differs }))).toBe('wait-for-second')
  })
  it('asks when an agent that was left in the water is out of it', () => {
    const left = { contactMinutes: null, state: 'done' as const }
    expect(nextAct(sheet({ ...left, recorded: [record()] }))).toBe('in-the-water')
    expect(nextAct(sheet({ ...left, recorded: [record({ kind: 'withheld' })] }))).toBe('done')
  })
  it('is looked at again by itself while somebody else may act', () => {
    const differs = { ...second, agrees: false }
    expect(othersMayAct(sheet({ first, second: differs }))).toBe(true)
    expect(othersMayAct(sheet({ state: 'running' }))).toBe(true)
    expect(othersMayAct(sheet())).toBe(false)
    expect(othersMayAct(sheet({ state: 'done', first }))).toBe(false)
  })
  it('is broken with its record, and stays so when every dose is recorded', () => {
    for (const record of ['broken', 'unknown-key'] as const)
      expect(isBroken(sheet({ state: 'done', record }))).toBe(true)
    expect(isBroken(sheet({ state: 'broken' }))).toBe(true)
    expect(isBroken(sheet({ state: 'done' }))).toBe(false)
  })
  it('is closed while the order is held, ended or broken', () => {
    for (const state of ['held', 'ended', 'broken'] as const) expect(nextAct(sheet({ state }))).toBe('closed')
  })
})

describe('what the sheet shows once', () => {
  const step = {
    ruleId: 'R31',
    text: 'Water tested',
    level: 'stop' as const,
    state: 'unknown' as const,
    help: null,
    changed: [],
    resolve: [],
    place: 'readings' as const,
    overridden: false,
  }
  const caution = {
    ruleId: 'R31',
    code: 'c',
    level: 'stop' as const,
    title: 'Missing',
    text: 'No.',
    resolve: [],
    overridden: null,
    finding: null,
  }
  it('says a caution in its step and not a second time', () => {
    const one = sheet({
      steps: [step, { ...step, ruleId: 'R39', place: 'second-calculation' }, { ...step, state: 'met' }],
      cautions: [caution, { ...caution, ruleId: 'R42', title: 'First use' }],
      why: ['Missing. No.', 'The order is held.'],
    })
    expect(openSteps(one)).toEqual([step])
    expect(openSteps(sheet({ steps: [{ ...step, overridden: true }] }))).toEqual([])
    expect(otherCautions(one).map(({ ruleId }) => ruleId)).toEqual(['R42'])
    expect(restInTheWay(one)).toEqual(['The order is held.'])
  })
  it('has its own time for the bath that is to end first, and tells of every other one', () => {
    const two = sheet({
      state: 'running',
      recorded: [record({ id: 'd1' }), record({ id: 'd3' })],
      running: [running('d2', '2'), running('d1', '1'), running('d3', '1')],
    })
    expect(ownBath(two)?.doseId).toBe('d1')
    expect(otherBaths(two).map(({ doseId }) => doseId)).toEqual(['d2', 'd3'])
    const done = sheet({ state: 'done', running: [running('d2', '2')] })
    expect(ownBath(done)).toBeNull()
    expect(otherBaths(done)).toHaveLength(1)
  })
  it('opens the dose that runs, else the late one, the due one, the next', () => {
    const dose = (key: string, state: BathSheet['calendar'][number]['state']) => ({
      key,
      dueAt: now,
      opensAt: now,
      latestAt: now,
      state,
    })
    expect(doseToOpen([dose('1', 'given'), dose('2', 'late'), dose('3', 'running')])).toBe('3')
    expect(doseToOpen([dose('1', 'given'), dose('2', 'due'), dose('3', 'coming')])).toBe('2')
    expect(doseToOpen([dose('1', 'given'), dose('2', 'coming')])).toBe('2')
    expect(doseToOpen([dose('1', 'given'), dose('2', 'given')])).toBe('2')
    expect(doseToOpen([])).toBeNull()
  })
  it('offers a usable lot only, and the unit of the working first', () => {
    expect(lotToOpen(sheet())).toBe('l1')
    expect(lotToOpen(sheet({ lots: [{ ...lot, state: 'expired' }] }))).toBe('')
    expect(amountUnits({ amountNow: { value: '1', unit: 'L' }, form: 'liquid' })[0]).toBe('L')
    expect(amountUnits({ amountNow: null, form: 'powder' })[0]).toBe('g')
  })
})

describe('the form of the second calculation', () => {
  const read = {
    enclosure: ' qt-3 ',
    mark: '0.68 m',
    strength: { value: '37', unit: 'percent_w_w' },
    lot: 'PZ-0317',
  }
  it('takes the amount only after what was read', () => {
    const empty = emptySecond('mL')
    expect(hasReadAll(empty)).toBe(false)
    expect(hasReadAll({ ...empty, ...read, mark: ' ' })).toBe(false)
    expect(hasReadAll({ ...empty, ...read, strength: { value: 'x', unit: 'percent_w_w' } })).toBe(false)
    expect(secondIsOpen({ ...empty, ...read })).toBe('Type the amount that you worked out.')
    const whole = { ...empty, ...read, amount: { value: '219', unit: 'mL' } }
    expect(secondIsOpen(whole)).toBe(false)
    expect(secondBody(whole, 'id')).toEqual({
      id: 'id',
      enclosureRead: 'qt-3',
      markRead: '0.68 m',
      lotRead: 'PZ-0317',
      strengthRead: { value: '37', unit: 'percent_w_w' },
      amount: { value: '219', unit: 'mL' },
    })
  })
})
