import { describe, expect, it } from 'vitest'
import { listCaseSteps } from '../../../shared/domain/protocol/list-case-steps.ts'
import type { ProtocolStep } from '../../../shared/domain/protocol/protocol-content.ts'
import { addDays } from '../../../shared/domain/time/facility-date.ts'

const step = (key: string, day: number, untilDay = day, daily = false): ProtocolStep => ({
  key,
  kind: daily ? 'observe' : 'sample',
  day,
  untilDay,
  daily,
  name: key,
  short: key,
})
const leg = { day0On: '2026-05-01', untilOn: null }
const state = (
  one: ProtocolStep,
  asOfOn: string,
  given: { records?: [string, 'done' | 'failed'][]; looked?: string[]; untilOn?: string } = {},
) =>
  listCaseSteps(
    [one],
    { ...leg, untilOn: given.untilOn ?? null },
    (given.records ?? []).map(([on, outcome], i) => ({
      recordId: String(i),
      stepKey: one.key,
      outcome,
      on,
    })),
    given.looked ?? [],
    asOfOn,
  )[0]

describe('steps of a case', () => {
  const sample = step('sample', 14, 16)
  it.each([
    ['2026-05-14', 'to-come', 0],
    ['2026-05-15', 'due', 0],
    ['2026-05-17', 'due', 0],
    ['2026-05-18', 'overdue', 1],
    ['2026-05-20', 'overdue', 3],
  ] as const)('on %s a step of day 14 to 16 is %s', (asOfOn, expected, lateDays) => {
    expect(state(sample, asOfOn)).toMatchObject({ state: expected, lateDays, on: '2026-05-15' })
  })

  it('are done once done, failed until then, and only by records of the leg', () => {
    expect(state(sample, '2026-05-20', { records: [['2026-05-16', 'failed']] })?.state).toBe('failed')
    const both: [string, 'done' | 'failed'][] = [
      ['2026-05-17', 'done'],
      ['2026-05-16', 'failed'],
    ]
    expect(state(sample, '2026-05-20', { records: both })).toMatchObject({
      state: 'done',
      doneOn: '2026-05-17',
    })
    expect(state(sample, '2026-05-18', { records: [['2026-04-30', 'done']] })?.state).toBe('overdue')
  })

  it('of an ended leg show only what was done', () => {
    expect(state(sample, '2026-06-20', { untilOn: '2026-05-20' })).toBeUndefined()
    const done: [string, 'done'][] = [['2026-05-16', 'done']]
    expect(state(sample, '2026-06-20', { untilOn: '2026-05-20', records: done })?.state).toBe('done')
    expect(state(sample, '2026-06-20', { untilOn: '2026-05-16', records: done })).toBeUndefined()
  })

  const daily = step('look', 0, 30, true)
  const days = (from: string, count: number) => Array.from({ length: count }, (_, i) => addDays(from, i))
  it('wanted every day are due until somebody looked, and late when yesterday had no look', () => {
    const untilYesterday = days('2026-05-01', 9)
    expect(state(daily, '2026-05-10', { looked: untilYesterday })).toMatchObject({
      state: 'due',
      daily: { doneDays: 9, passedDays: 10, missedOn: [] },
    })
    expect(state(daily, '2026-05-10', { looked: [...untilYesterday, '2026-05-10'] })?.state).toBe('done')
    expect(state(daily, '2026-05-10', { looked: days('2026-05-01', 8) })).toMatchObject({
      state: 'overdue',
      lateDays: 1,
      daily: { missedOn: ['2026-05-09'] },
    })
  })

  it('wanted every day go on after the last day of the protocol, while the animals are here', () => {
    expect(state(daily, '2026-06-10', { looked: days('2026-05-01', 40) })?.state).toBe('due')
  })
})
