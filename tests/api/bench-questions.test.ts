import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { local } from '../domain/quarantine/a-clock.ts'
import table from '../published-values/clock-cases/clock-dates.json' with { type: 'json' }
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
beforeAll(async () => {
  api = await startApi()
})
afterAll(() => api.stop())

const post = async (question: string, body: object | string) =>
  (await api.as('keeper')).agent
    .post(`/api/bench/${question}`)
    .set('Content-Type', 'application/json')
    .send(typeof body === 'string' ? body : JSON.stringify(body))

const arrived = [
  { at: '2026-03-01T09:00:00Z', kind: 'arrival', quarantineKind: 'fish' },
  { at: '2026-03-01T10:00:00Z', kind: 'closed' },
]
const question = { zone: 'Europe/Lisbon', asOf: '2026-03-02', quarantineKind: 'fish', events: arrived }

describe('the quarantine clock of the bench', () => {
  it('gives every date of the reference table, in whatever order the events are listed', async () => {
    for (const { id, zone, requiredDays, deathExtensionDays, maskingWindowDays, ...row } of table) {
      // an instant inside an event of the table is written as a local time there too
      const events = row.events.map(({ at, ...event }, index) => ({
        ...event,
        eventId: `${id} ${String(index)}`,
        at: local(at, zone),
      }))
      const asked = {
        zone,
        asOf: local(row.asOf, zone),
        quarantineKind: 'fish',
        policy: { requiredDays, deathExtensionDays, maskingWindowDays },
        events,
      }
      const reply = await post('quarantine-clock', asked)
      expect(reply.status, `${id} ${reply.text}`).toBe(200)
      expect(reply.body, id).toMatchObject(row.expected)
      const reversed = await post('quarantine-clock', { ...asked, events: [...events].reverse() })
      expect(reversed.body, id).toEqual(reply.body)
    }
  })

  it('says in words what moved, what is unmet and what holds, and the policy that counted', async () => {
    const events = [
      ...arrived,
      { at: '2026-03-25T07:00:00Z', kind: 'death', eventId: 'death' },
      { at: '2026-03-25T08:00:00Z', kind: 'locked', cause: 'veterinarian', eventId: 'lock' },
      { at: '2026-03-25T09:00:00Z', kind: 'pause-started', pauseId: 'p', cause: 'life-support-failure' },
    ]
    const { body } = await post('quarantine-clock', { ...question, asOf: '2026-03-26', events })
    expect(body).toMatchObject({
      status: 'locked',
      dayNumber: 25,
      earliestClearanceOn: null,
      holds: [{ eventId: 'lock', kind: 'lock', cause: 'veterinarian' }, { kind: 'pause' }],
      extensions: [{ eventId: 'death', kind: 'death', untilOn: '2026-04-08', state: 'standing' }],
      policy: { requiredDays: 30, deathExtensionDays: 14, criteria: [] },
    })
    for (const each of [...body.reasons, ...body.unmet]) {
      expect(each.text).toMatch(/^[A-Z0-9].* /)
      expect(each.text).not.toMatch(/undefined|null|NaN|\{/)
    }
    expect(body.unmet.map((one: { code: string }) => one.code)).toContain('locked')
  })

  it('asks a day at its end, by the calendar of the zone', async () => {
    const late = [
      ...arrived,
      {
        at: '2026-03-02T23:30:00Z',
        kind: 'addition',
        what: 'wet-material',
        quarantineKind: null,
        into: 'same-water',
      },
    ]
    const at = async (zone: string, asOf: string) =>
      (await post('quarantine-clock', { ...question, zone, asOf, events: late })).body.day0On
    expect(await at('Europe/Lisbon', '2026-03-01')).toBe('2026-03-01')
    expect(await at('Europe/Lisbon', '2026-03-02')).toBe('2026-03-02')
    // half past eleven in Lisbon is the third in Tokyo already
    expect(await at('Asia/Tokyo', '2026-03-02')).toBe('2026-03-01')
    expect(await at('Asia/Tokyo', '2026-03-03')).toBe('2026-03-03')
  })

  it.each([
    ['a zone that is none', { zone: 'Atlantis/Deep' }, '/zone', 'unknown-zone'],
    [
      'two events of one name',
      { events: arrived.map((each) => ({ ...each, eventId: 'same' })) },
      '/events/1/eventId',
      'duplicate-event',
    ],
    [
      'a result from before its sample',
      {
        events: [
          ...arrived,
          {
            at: '2026-03-02T09:00:00Z',
            kind: 'sample-result',
            sampleId: 's',
            testKey: 't',
            takenAt: '2026-03-03T09:00:00Z',
            result: 'negative',
          },
        ],
      },
      '/events/2',
      'sample-taken-after-report',
    ],
    [
      'a void of an event that is none',
      { events: [...arrived, { at: '2026-03-02T09:00:00Z', kind: 'voided', voidsEventId: 'u' }] },
      '/events/2/voidsEventId',
      'unknown-event',
    ],
    [
      'a void of itself',
      {
        events: [...arrived, { eventId: 'v', at: '2026-03-02T09:00:00Z', kind: 'voided', voidsEventId: 'v' }],
      },
      '/events/2/voidsEventId',
      'unknown-event',
    ],
    [
      'the end of a pause that never began',
      { events: [...arrived, { at: '2026-03-02T09:00:00Z', kind: 'pause-ended', pauseId: 'p' }] },
      '/events/2/pauseId',
      'unknown-pause',
    ],
    [
      'a criterion that the policy lacks',
      {
        events: [
          ...arrived,
          { at: '2026-03-02T09:00:00Z', kind: 'criterion-declared', criterionId: 'fat', met: true },
        ],
      },
      '/events/2/criterionId',
      'unknown-criterion',
    ],
  ])('refuses %s, saying where', async (_, change, pointer, code) => {
    const reply = await post('quarantine-clock', { ...question, ...change })
    expect(reply.status).toBe(422)
    expect(reply.body.errors).toMatchObject([{ pointer, code }])
    expect(reply.body.errors[0].detail).toMatch(/ /)
  })

  it.each([
    ['an event of no kind', { events: [{ at: '2026-03-01T09:00:00Z', kind: 'party' }] }],
    ['an event without a time', { events: [{ kind: 'closed' }] }],
    ['half a day', { policy: { requiredDays: 30.5 } }],
    ['days before nothing', { policy: { requiredDays: -1 } }],
    ['a day that the calendar lacks', { asOf: '2026-02-30' }],
    ['a field that it does not know', { caseId: 'mine' }],
    ['no events at all, not even an empty list', { events: null }],
  ])('refuses %s as bad input', async (_, change) => {
    const reply = await post('quarantine-clock', { ...question, ...change })
    expect([400, 422]).toContain(reply.status)
    expect(reply.body.code).toBe('bad-input')
  })

  it('answers the largest question that it takes without holding up anybody else', async () => {
    const criteria = Array.from({ length: 10 }, (_, at) => ({
      criterionId: `c${String(at)}`,
      kind: 'negatives',
      testKey: 't',
      count: 10,
      daysApart: 0,
      daysAfterMasking: 0,
    }))
    const results = Array.from({ length: 498 }, (_, at) => ({
      at: new Date(Date.UTC(2026, 2, 2) + at * 60_000).toISOString(),
      kind: 'sample-result',
      sampleId: String(at),
      testKey: 't',
      takenAt: '2026-03-01T12:00:00Z',
      result: at % 7 === 6 ? 'positive' : 'negative',
    }))
    const begin = performance.now()
    const reply = await post('quarantine-clock', {
      ...question,
      asOf: '2026-04-30',
      policy: { criteria },
      events: [...arrived, ...results],
    })
    expect(reply.status).toBe(200)
    expect(performance.now() - begin).toBeLessThan(3000)
  })

  it('has no day while nothing happened', async () => {
    const { body } = await post('quarantine-clock', { ...question, events: [] })
    expect(body).toMatchObject({ status: 'open', day0On: null, dayNumber: null, earliestClearanceOn: null })
  })
})

const house = {
  at: '2026-03-02T12:00:00Z',
  bodies: [
    { waterBodyId: 'A', kind: 'enclosure', litres: 11_400 },
    { waterBodyId: 'B', kind: 'enclosure', litres: 600 },
    { waterBodyId: 'S', kind: 'sump', litres: 1000 },
    { waterBodyId: 'C', kind: 'enclosure' },
  ],
  connections: [
    { connectionId: 'a-s', kind: 'pump', bodyAId: 'A', bodyBId: 'S' },
    { connectionId: 'b-s', kind: 'valve', bodyAId: 'B', bodyBId: 'S' },
    { connectionId: 'b-c', kind: 'valve', bodyAId: 'B', bodyBId: 'C' },
  ],
  ledger: [
    { connectionId: 'a-s', state: 'open', at: '2026-03-01T08:00:00Z' },
    { connectionId: 'b-s', state: 'open', at: '2026-03-01T08:00:00Z' },
    { connectionId: 'b-s', state: 'shut', at: '2026-03-02T08:00:00Z' },
    { connectionId: 'b-c', state: 'shut', at: '2026-03-01T08:00:00Z' },
  ],
}

describe('connected water of the bench', () => {
  it('joins what is open at that instant, and adds up the volumes that are known', async () => {
    const { body, status } = await post('connected-water', house)
    expect(status).toBe(200)
    expect(body.waters).toMatchObject([
      { waterBodyIds: ['A', 'S'], litres: 12_400, litresNotKnownOf: [] },
      { waterBodyIds: ['B'], litres: 600 },
      { waterBodyIds: ['C'], litres: null, litresNotKnownOf: ['C'] },
    ])
    const before = await post('connected-water', { ...house, at: '2026-03-02T07:59:59Z' })
    expect(before.body.waters[0]).toMatchObject({ waterBodyIds: ['A', 'B', 'S'], litres: 13_000 })
    const reversed = await post('connected-water', { ...house, bodies: [...house.bodies].reverse() })
    expect(reversed.body).toEqual(body)
  })

  it('takes a valve of which nobody wrote down the state as open, and names it', async () => {
    const { body } = await post('connected-water', { ...house, ledger: [] })
    expect(body.waters).toMatchObject([
      { waterBodyIds: ['A', 'B', 'C', 'S'], litres: null, unknownConnectionIds: ['a-s', 'b-c', 'b-s'] },
    ])
  })

  it('takes the later of two entries of one instant, and none that is struck through', async () => {
    const again = { connectionId: 'b-s', state: 'open', at: '2026-03-02T08:00:00Z' }
    const open = await post('connected-water', { ...house, ledger: [...house.ledger, again] })
    expect(open.body.waters[0].waterBodyIds).toEqual(['A', 'B', 'S'])
    const struck = { ...house, ledger: [...house.ledger, { ...again, voided: true }] }
    expect((await post('connected-water', struck)).body.waters[0].waterBodyIds).toEqual(['A', 'S'])
  })

  it.each([
    [
      'a valve that leads nowhere',
      { connections: [{ connectionId: 'x', kind: 'valve', bodyAId: 'A', bodyBId: 'Z' }], ledger: [] },
      '/connections/0/bodyBId',
      'unknown-connection-end',
    ],
    [
      'an entry of no valve',
      { ledger: [{ connectionId: 'x', state: 'open', at: '2026-03-01T08:00:00Z' }] },
      '/ledger/0/connectionId',
      'unknown-connection',
    ],
    [
      'two bodies of one name',
      { bodies: [...house.bodies, { waterBodyId: 'A', kind: 'loop' }] },
      '/bodies/4/waterBodyId',
      'duplicate-name',
    ],
  ])('refuses %s, saying where', async (_, change, pointer, code) => {
    const reply = await post('connected-water', { ...house, ...change })
    expect(reply.status).toBe(422)
    expect(reply.body.errors).toMatchObject([{ pointer, code }])
  })

  it('refuses a volume of nothing as bad input', async () => {
    const bodies = [{ waterBodyId: 'A', kind: 'enclosure', litres: 0 }]
    const reply = await post('connected-water', { ...house, bodies, connections: [], ledger: [] })
    expect(reply.body.code).toBe('bad-input')
  })
})

it('asks who it is before it reads either question', async () => {
  for (const address of ['quarantine-clock', 'connected-water'])
    expect((await api.anonymous().post(`/api/bench/${address}`).send('{')).status).toBe(401)
})
