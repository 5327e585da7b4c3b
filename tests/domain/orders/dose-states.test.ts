import { describe, expect, it } from 'vitest'
import { listDoseStates } from '../../../shared/domain/orders/dose-states.ts'
import type { DoseRecord } from '../../../shared/domain/orders/dose-states.ts'
import { plannedDoses } from '../../../shared/domain/orders/planned-doses.ts'

// Three daily doses at 14:20 facility time (UTC−4), each with 6 h either way: the windows are a project default.
const plan = plannedDoses(
  { startsAt: '2026-12-01T18:20:00Z', doses: 3, intervalHours: 24 },
  'America/Halifax',
)
const timed = { timed: true, ended: false }
const record = (doseKey: string, kind: DoseRecord['kind'], endedAt: string | null = null): DoseRecord => ({
  doseKey,
  kind,
  endedAt,
})

describe('the calendar of doses', () => {
  it('goes by the window of each dose while it has no record, both ends included', () => {
    const at = (now: string) => listDoseStates(plan, [], timed, now)
    expect(at('2026-12-01T12:19:59Z')).toEqual(['coming', 'coming', 'coming'])
    expect(at('2026-12-01T12:20:00Z')).toEqual(['due', 'coming', 'coming'])
    expect(at('2026-12-02T00:20:00Z')).toEqual(['due', 'coming', 'coming'])
    expect(at('2026-12-02T00:20:01Z')).toEqual(['late', 'coming', 'coming'])
  })

  it('goes by the records where there are any; a timed bath runs until it has an end', () => {
    const now = '2026-12-03T20:00:00Z'
    expect(listDoseStates(plan, [record('1', 'given', now), record('2', 'given')], timed, now)).toEqual([
      'given',
      'running',
      'due',
    ])
    expect(listDoseStates(plan, [record('1', 'given')], { timed: false, ended: false }, now)[0]).toBe('given')
    expect(listDoseStates(plan, [record('1', 'withheld'), record('2', 'refused')], timed, now)).toEqual([
      'withheld',
      'refused',
      'due',
    ])
  })

  it('never hides a dose that went in behind one that was withheld or given twice', () => {
    const now = '2026-12-01T19:00:00Z'
    const both = [record('1', 'withheld'), record('1', 'recorded', now)]
    expect(listDoseStates(plan, both, timed, now)[0]).toBe('given')
    expect(listDoseStates(plan, [...both].reverse(), timed, now)[0]).toBe('given')
    const twice = [record('1', 'given', now), record('1', 'recorded')]
    expect(listDoseStates(plan, twice, timed, now)[0]).toBe('running')
  })

  it('says of an ended order what is not given any more', () => {
    const ended = { timed: true, ended: true }
    expect(listDoseStates(plan, [record('1', 'given', 'x')], ended, '2026-12-01T19:00:00Z')).toEqual([
      'given',
      'not-given',
      'not-given',
    ])
  })
})
