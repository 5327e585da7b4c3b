import { describe, expect, it } from 'vitest'
import { todayKindNames } from '../../../shared/domain/today/today-kinds.ts'
import { sayWork } from '../../../shared/messages/say-today.ts'
import { addressOfWork } from '../../../src/features/today/address-of.ts'
import { dueItemsOf } from '../../../src/features/today/due-items.ts'
import { chosenLanes, lanesSeenBy, lateText, viewToday } from '../../../src/features/today/today-model.ts'
import { aDose, anObservationDue, at, someWork, zone } from './some-work.ts'

const vet = { at, zone, roles: ['veterinarian'] as const, preferred: undefined }

describe('the lanes', () => {
  it('are those of the roles, the own first', () => {
    expect(lanesSeenBy(['veterinarian'])).toEqual(['decide', 'doses', 'watch'])
    expect(lanesSeenBy(['administrator'])).toEqual(['people'])
    expect(viewToday([], { ...vet, roles: ['keeper'] }).lanes).toEqual(['watch', 'doses'])
    expect(viewToday([], { ...vet, roles: ['keeper', 'registrar'] }).lanes).toEqual([
      'watch',
      'register',
      'doses',
    ])
  })
  it('begin with the one that somebody chose, unless it is none of theirs', () => {
    expect(viewToday([], { ...vet, preferred: 'watch' }).lanes).toEqual(['watch', 'decide', 'doses'])
    expect(chosenLanes(['keeper'], 'decide')).toEqual(['watch'])
    expect(chosenLanes(['keeper', 'technician'], undefined)).toEqual(['doses', 'watch'])
  })
})

describe('the sheet', () => {
  const draft = someWork('order-draft', { at: '2026-12-01T12:00:00Z' })
  const lateDose = aDose({ state: 'late', latestAt: '2026-12-01T15:00:00Z' })
  const coming = aDose({ state: 'coming', dueAt: '2026-12-01T20:10:00Z' })
  const done = aDose({ state: 'done', dueAt: null, at: '2026-12-01T13:00:00Z' })
  const call = someWork('urgent-call', { state: 'late', latestAt: '2026-12-01T18:10:00Z' })
  const view = viewToday([lateDose, draft, coming, done, call], vet)

  it('puts work into bands of time and columns of lanes', () => {
    expect(
      view.bands.map((band) => [band.key, band.cells.map(({ lane, items }) => [lane, items.length])]),
    ).toEqual([
      [
        'late',
        [
          ['decide', 0],
          ['doses', 1],
          ['watch', 0],
        ],
      ],
      [
        'now',
        [
          ['decide', 1],
          ['doses', 0],
          ['watch', 0],
        ],
      ],
      [
        '16:00',
        [
          ['decide', 0],
          ['doses', 1],
          ['watch', 0],
        ],
      ],
    ])
  })
  it('keeps urgent calls over the bands and what was done below them', () => {
    expect(view.urgent).toEqual([call])
    expect(view.done).toEqual([done])
    expect(view.bands.flatMap(({ cells }) => cells.flatMap(({ items }) => items))).not.toContain(call)
  })
  it('counts what waits for this person, urgent calls with it, and what is late in the bands', () => {
    expect(view).toMatchObject({ waits: 2, waitsLate: 0, othersLate: 1, empty: false })
  })
  it('says that a day is clear when nothing is left, also after a busy one', () => {
    expect(viewToday([], vet).empty).toBe(true)
    expect(viewToday([done], vet).empty).toBe(true)
    expect(viewToday([coming], vet).empty).toBe(false)
  })
})

describe('how late', () => {
  it.each([
    ['2026-12-01T18:05:00Z', '15 min late'],
    ['2026-12-01T13:20:00Z', '5 h late'],
    ['2026-11-29T13:20:00Z', '2 d late'],
  ])('%s is %s', (latestAt, words) =>
    expect(lateText(aDose({ state: 'late', latestAt }), at, zone)).toBe(words),
  )
  it('is not said of what is on time', () => expect(lateText(aDose(), at, zone)).toBe(''))
})

describe('the words', () => {
  const say = (item: Parameters<typeof sayWork>[0]) => sayWork(item, at, zone)
  it('name the work and its place', () => {
    expect(say(aDose())).toEqual({ title: 'Praziquantel bath, QT-3', note: 'TO-0734, dose 2' })
    expect(say(anObservationDue())).toEqual({
      title: 'Daily watch, QT-6 Cownose ray',
      note: 'Q-115, day 19 of 30, last 30\u00a0Nov\u00a02026, 08:05, T. Okafor-Lind',
    })
  })
  it('never say how much a second person is to find', () => {
    const item = someWork('second-calculation', {
      at,
      params: {
        number: 'TO-1',
        key: '1',
        enclosure: 'QT-3',
        agent: 'formalin',
        by: 'S. Brandt',
        amount: '48 mL',
      },
    })
    expect(JSON.stringify(say(item))).not.toContain('48')
  })
  it('say something of every kind, without holes where a figure is missing', () => {
    for (const kind of todayKindNames) {
      const key = kind === 'setting-proposed' ? 'facility.name' : '1'
      const params = {
        key,
        kind: 'purchase',
        code: 'count-differs',
        number: 'TO-1',
        step: 'Skin scrape',
        enclosure: 'QT-1',
      }
      const { title, note } = say(someWork(kind, { params }))
      expect(title.length, kind).toBeGreaterThan(3)
      expect(`${title} ${note}`, kind).not.toMatch(/undefined|null|NaN|\[object/)
    }
  })
})

describe('the address of the work', () => {
  it('is where it is done', () => {
    expect(addressOfWork(aDose())).toBe('/orders/TO-0734/sheet?dose=2')
    expect(addressOfWork(anObservationDue())).toBe('/enclosures/QT-6/observe')
    expect(addressOfWork(anObservationDue({ state: 'done' }))).toBe('/quarantine/Q-115')
    expect(addressOfWork(someWork('volume-to-confirm', { params: { enclosure: 'KH 1' } }))).toBe(
      '/enclosures/KH%201/volumes',
    )
    expect(addressOfWork(someWork('urgent-call', { params: { noticeId: 'n-1' } }))).toBe('/urgent/n-1')
  })
  it('is known for every kind', () => {
    for (const kind of todayKindNames) expect(addressOfWork(someWork(kind)), kind).toMatch(/^\//)
  })
})

describe('the hour ruler', () => {
  const items = [
    aDose({ id: 'late', state: 'late', dueAt: '2026-11-30T13:00:00Z', latestAt: '2026-11-30T19:00:00Z' }),
    aDose({ id: 'due' }),
    aDose({ id: 'tonight', state: 'coming', dueAt: '2026-12-02T03:30:00Z' }),
    aDose({ id: 'tomorrow', state: 'coming', dueAt: '2026-12-02T13:00:00Z' }),
    aDose({ id: 'held', state: 'waiting' }),
    aDose({ id: 'done', state: 'done', dueAt: null, at: '2026-12-01T12:05:00Z' }),
    anObservationDue({ id: 'any-time' }),
    anObservationDue({ id: 'looked', state: 'done', at: '2026-12-01T12:30:00Z' }),
    someWork('order-draft', { id: 'draft' }),
  ]
  const ruler = (roles: Parameters<typeof chosenLanes>[0], preferred?: string) =>
    dueItemsOf({ at, on: '2026-12-01', items }, { zone, roles, preferred })

  it('has what is late and what has an hour today, of the own lanes', () => {
    expect(
      ruler(['technician']).map(({ id, state, time, dueMinute }) => [id, state, time, dueMinute]),
    ).toEqual([
      ['late', 'overdue', '23 h late', 0],
      ['due', 'due', '14:00', 840],
      ['tonight', 'due', '23:30', 1410],
      ['done', 'done', '08:05', 485],
    ])
  })
  it('puts work that is due on days on no hour until it is done', () => {
    expect(ruler(['keeper']).map(({ id, time }) => [id, time])).toEqual([['looked', '08:30']])
  })
  it('follows the lane that somebody chose', () => {
    expect(ruler(['veterinarian'])).toEqual([])
    expect(ruler(['veterinarian'], 'watch').map(({ id }) => id)).toEqual(['looked'])
  })
  it('leads each mark to its work and names it', () => {
    expect(ruler(['technician'])[1]).toMatchObject({
      what: 'Praziquantel bath, QT-3',
      to: '/orders/TO-0734/sheet?dose=2',
    })
  })
})
