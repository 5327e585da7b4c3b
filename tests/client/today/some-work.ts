import type { TodayWork } from '../../../shared/contracts/today.contract.ts'

let last = 0

/** A piece of work as the server tells it. */
export const someWork = (kind: TodayWork['kind'], given: Partial<TodayWork> = {}): TodayWork => ({
  id: `${kind}:${String(++last)}`,
  kind,
  state: 'waiting',
  dueAt: null,
  latestAt: null,
  dueOn: null,
  latestOn: null,
  at: null,
  params: {},
  acts: [],
  ...given,
})

export const zone = 'America/Halifax'
/** 14:20 at the facility. */
export const at = '2026-12-01T18:20:00Z'

export const aDose = (given: Partial<TodayWork> = {}) =>
  someWork('dose', {
    state: 'due',
    dueAt: '2026-12-01T18:00:00Z',
    latestAt: '2026-12-02T00:00:00Z',
    params: { number: 'TO-0734', key: '2', enclosure: 'QT-3', drug: 'praziquantel', amount: '4.36\u00a0g' },
    ...given,
  })
export const anObservationDue = (given: Partial<TodayWork> = {}) =>
  someWork('observation', {
    state: 'due',
    dueOn: '2026-12-01',
    latestOn: '2026-12-01',
    params: {
      case: 'Q-115',
      name: 'Cownose ray',
      enclosure: 'QT-6',
      day: 19,
      required: 30,
      step: 'Daily watch',
      lastAt: '2026-11-30T12:05:00Z',
      lastBy: 'T. Okafor-Lind',
    },
    ...given,
  })
