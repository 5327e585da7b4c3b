import { describe, expect, it } from 'vitest'
import type { Order } from '../../../shared/contracts/orders.contract.ts'
import { doseStanding } from '../../../src/features/orders/dose-calendar.tsx'
import { orderLines } from '../../../src/features/orders/order-history.tsx'
import { quantityOfText } from '../../../src/features/orders/dose-text.tsx'

const dose: Order['calendar'][number] = {
  key: '1',
  dueAt: '2026-12-01T18:00:00.000Z',
  opensAt: '2026-12-01T12:00:00.000Z',
  closesAt: '2026-12-02T00:00:00.000Z',
  recorded: null,
  records: [],
}

type Recorded = (typeof dose)['records'][number]
const record: Recorded = {
  kind: 'given',
  happenedAt: '2026-12-01T18:05:00.000Z',
  by: 'Soren Brandt',
  stoppedAt: null,
  broke: [],
  warnings: 0,
  record: 'intact',
}

describe('the calendar of doses', () => {
  it('has a mark of its own for each state, both ends of the window included', () => {
    expect(doseStanding(dose, '2026-12-01T11:59:59Z')).toEqual({ mark: 'to-come', words: 'coming' })
    expect(doseStanding(dose, dose.opensAt)).toEqual({ mark: 'due', words: 'due' })
    expect(doseStanding(dose, dose.closesAt)).toEqual({ mark: 'due', words: 'due' })
    expect(doseStanding(dose, '2026-12-02T00:00:01Z')).toEqual({ mark: 'overdue', words: 'past' })
    const recorded = (kind: Recorded['kind']) =>
      doseStanding({ ...dose, recorded: kind, records: [{ ...record, kind }] }, '2026-12-05T00:00:00Z').mark
    expect([recorded('given'), recorded('recorded'), recorded('withheld'), recorded('refused')]).toEqual([
      'done',
      'done',
      'failed',
      'failed',
    ])
  })

  it('marks no dose as done that was against a rule, stopped, changed by hand or recorded twice', () => {
    const mark = (...records: Recorded[]) =>
      doseStanding({ ...dose, recorded: 'given', records }, '2026-12-05T00:00:00Z').mark
    expect(mark({ ...record, warnings: 2 })).toBe('done')
    expect(mark({ ...record, broke: ['Another amount was given than was worked out'] })).toBe('failed')
    expect(mark({ ...record, stoppedAt: '2026-12-01T18:15:00.000Z' })).toBe('failed')
    expect(mark({ ...record, record: 'broken' })).toBe('failed')
    expect(mark(record, { ...record, happenedAt: '2026-12-01T18:09:00.000Z' })).toBe('failed')
    expect(mark({ ...record, kind: 'withheld' }, record)).toBe('done')
  })
})

describe('what happened to an order', () => {
  it('is told in one line each, the newest first, with reasons where somebody gave one', () => {
    const signature = { printedName: 'Dr A', signedAt: '2026-12-01T13:00:00Z' }
    const lines = orderLines({
      createdAt: '2026-12-01T12:00:00Z',
      createdBy: 'Dr A',
      versions: [
        { versionNo: 1, signature, content: null, superseded: false },
      ] as unknown as Order['versions'],
      events: [
        { id: 'b', kind: 'hold-lifted', reason: 'Looked', happenedAt: '2026-12-01T15:00:00Z', by: 'Dr A' },
        { id: 'a', kind: 'held', reason: null, happenedAt: '2026-12-01T14:00:00Z', by: 'Keeper' },
      ],
    })
    expect(lines.map((line) => line.what)).toEqual([
      'Hold lifted: Looked',
      'Held',
      'Version 1 signed',
      'Written',
    ])
  })
})

describe('a quantity written by the server', () => {
  it('is taken apart at its first no-break space and stays whole as text', () => {
    expect(quantityOfText('4.36\u00a0g', 'dose')).toEqual({
      kind: 'dose',
      text: '4.36\u00a0g',
      number: '4.36',
    })
    expect(quantityOfText('2,180\u00a0L\u00a0±\u00a02\u00a0%', 'volume').number).toBe('2,180')
  })
})
