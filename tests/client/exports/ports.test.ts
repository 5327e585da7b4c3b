import { describe, expect, it } from 'vitest'
import type { History, HistoryEvent } from '../../../shared/contracts/exports.contract.ts'
import { portsOf } from '../../../src/features/exports/ports.ts'

const zone = 'America/Halifax'
const plain = (text: string) => text.replaceAll('\u00a0', ' ')
const event = (over: Partial<HistoryEvent>): HistoryEvent => ({
  eventId: 'e1',
  kind: 'purchase',
  on: '2026-09-14',
  at: '2026-09-14T16:25:00.000Z',
  exact: true,
  delta: 24,
  countAfter: 24,
  found: null,
  from: null,
  to: { code: 'QT-3', name: 'Quarantine tank 3' },
  otherAccession: null,
  transaction: 'TR-0001',
  counterparty: 'Point Ansel Hatchery',
  reference: 'INV-2231',
  theirNumber: null,
  deadOnArrival: null,
  sourceCode: 'C',
  transport: null,
  permits: [],
  documents: [],
  note: null,
  recordedAt: '2026-09-14T17:00:00.000Z',
  recordedBy: 'Joss Pell',
  voided: null,
  ...over,
})
const history = (events: HistoryEvent[], over: Partial<History> = {}): History => ({
  animalId: '019a0000-0000-7000-8000-000000000000',
  accession: 'HP-0388',
  form: 'group',
  name: null,
  commonName: 'Diamondback terrapin',
  scientificName: 'Malaclemys terrapin',
  sex: 'mixed',
  lifeStage: 'adult',
  heldAs: 'owned',
  owner: null,
  since: '2026-09-14',
  count: { basis: 'counted', ledger: 23, low: null, high: null },
  place: { code: 'TP-2', name: 'Shore tank 2' },
  from: null,
  until: null,
  opening: 0,
  gained: 24,
  lost: 1,
  closing: 23,
  totals: [],
  origins: [],
  events,
  identifiers: [],
  fingerprint: 'a'.repeat(64),
  asOf: '2026-12-01T18:20:00.000Z',
  may: [],
  ...over,
})
const death = event({
  eventId: 'e2',
  kind: 'death',
  on: '2026-09-20',
  at: '2026-09-20T12:00:00.000Z',
  delta: -1,
  countAfter: 23,
  to: null,
  transaction: null,
  counterparty: null,
  reference: null,
  sourceCode: null,
})

describe('custody as ports', () => {
  it('begins where it is now and goes back to where it came from', () => {
    const ports = portsOf(
      history([event({}), death], {
        origins: [
          {
            kind: 'born',
            on: '2019-08',
            approximate: true,
            birthKind: 'hatched',
            locality: null,
            method: null,
            latitude: null,
            longitude: null,
            uncertaintyMetres: null,
          },
        ],
      }),
      zone,
    )
    expect(ports.map(({ when, title, state }) => [plain(when), plain(title), state])).toEqual([
      ['Now', 'TP-2, Shore tank 2', 'now'],
      ['20 Sep 2026, 09:00', 'Death', 'made'],
      ['14 Sep 2026, 13:25', 'Bought from Point Ansel Hatchery', 'made'],
      ['Aug 2019', 'Hatched about Aug 2019', 'made'],
    ])
    expect(plain(ports[2]?.details.join(' ') ?? '')).toBe(
      '24 animals, 24 after it. Into QT-3, Quarantine tank 3. Transaction TR-0001. Their paper INV-2231. Source code C, bred in captivity.',
    )
  })

  it('says a month as a month, and has no port for a count on the way', () => {
    const ports = portsOf(
      history([
        event({ on: '2026-09', exact: false }),
        event({ eventId: 'e3', kind: 'counted', delta: 0, found: { low: 24, high: 24 }, transaction: null }),
      ]),
      zone,
    )
    expect(ports.map((port) => plain(port.when))).toEqual(['Now', 'Sep 2026'])
  })

  it('strikes what was entered wrongly, and ends when nothing is left', () => {
    const voided = { reason: 'Counted twice', at: '2026-09-21T12:00:00.000Z', by: 'Joss Pell' }
    const ports = portsOf(history([event({}), { ...death, voided }], { place: null }), zone)
    expect(ports.map((port) => port.state)).toEqual(['struck', 'made'])
    expect(ports[0]?.details.join(' ')).toBe('Struck out: Counted twice')
  })
})
