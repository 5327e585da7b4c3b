import { describe, expect, it } from 'vitest'
import type { WaterMap } from '../../../shared/domain/connections/water-map.ts'
import { listWaterEntries } from '../../../shared/domain/quarantine/list-water-entries.ts'
import type { CaseForEntries, PlaceEntry } from '../../../shared/domain/quarantine/list-water-entries.ts'

// Rules K06 a and b: into the same or connected water, and into the same room. Tanks A and B are joined by a valve that
// is shut from 10 May on; C has its own water in the same room; D stands elsewhere.
const map: WaterMap = {
  bodies: ['A', 'B', 'C', 'D'].map((id) => ({ waterBodyId: `w${id}`, kind: 'enclosure', enclosureId: id })),
  connections: [{ connectionId: 'v', kind: 'valve', bodyAId: 'wA', bodyBId: 'wB' }],
  ledger: [
    {
      entryId: '1',
      connectionId: 'v',
      state: 'open',
      at: '2026-05-01T00:00:00Z',
      recordedAt: '2026-05-01T00:00:00Z',
    },
    {
      entryId: '2',
      connectionId: 'v',
      state: 'shut',
      at: '2026-05-10T00:00:00Z',
      recordedAt: '2026-05-10T00:00:00Z',
    },
  ],
}
const places = ['A', 'B', 'C', 'D'].map((id) => ({
  enclosureId: id,
  waterBodyId: `w${id}`,
  airSpace: id === 'D' ? null : 'hall',
}))
const fish: CaseForEntries = {
  caseId: 'fish',
  closedAt: '2026-05-02T12:00:00Z',
  endedAt: null,
  stays: [{ animalId: 'f1', enclosureId: 'A', from: '2026-05-02T10:00:00Z', until: null }],
}
const entry = (change: Partial<PlaceEntry>): PlaceEntry => ({
  entryId: 'm1',
  animalId: 'x',
  enclosureId: 'A',
  fromEnclosureId: null,
  at: '2026-05-05T10:00:00Z',
  quarantineKind: 'fish',
  animalName: 'wrasse',
  animalCount: 2,
  ...change,
})
const into = (entries: PlaceEntry[], one: CaseForEntries = fish) => {
  const listed = listWaterEntries(map, places, [one], entries)
  if (!listed.ok) throw new Error(listed.refusal.code)
  return listed.value.map((event) => (event.kind === 'addition' ? event.into : event.kind))
}

describe('additions that the ledger of places shows', () => {
  it.each([
    ['into the same tank', {}, ['same-water']],
    ['over an open valve', { enclosureId: 'B' }, ['connected-water']],
    ['over a valve shut since', { enclosureId: 'B', at: '2026-05-11T10:00:00Z' }, ['same-room']],
    ['into other water of the same room', { enclosureId: 'C' }, ['same-room']],
    ['elsewhere', { enclosureId: 'D' }, []],
    ['before the batch was closed', { at: '2026-05-02T11:00:00Z' }, []],
    ['of the batch itself', { animalId: 'f1' }, []],
    ['into a group of the batch', { animalId: 'f1', joinsGroup: true }, ['same-water']],
    ['from one tank of that water to another', { fromEnclosureId: 'B' }, []],
    ['from another tank of the room into that water', { fromEnclosureId: 'C' }, ['same-water']],
    ['from one tank of the room to another', { enclosureId: 'C', fromEnclosureId: 'B' }, []],
  ] as const)('%s', (_what, change, expected) => {
    expect(into([entry(change)])).toEqual(expected)
  })

  it('ends with the case, and counts for nothing while the batch is open', () => {
    expect(into([entry({})], { ...fish, endedAt: '2026-05-04T00:00:00Z' })).toEqual([])
    expect(into([entry({})], { ...fish, closedAt: null })).toEqual([])
  })

  it('says who came, under an id of its own for each case', () => {
    const listed = listWaterEntries(map, places, [fish, { ...fish, caseId: 'other' }], [entry({})])
    expect(listed.ok && listed.value).toMatchObject([
      { eventId: 'm1 fish', caseId: 'fish', animalName: 'wrasse', animalCount: 2, quarantineKind: 'fish' },
      { eventId: 'm1 other', caseId: 'other' },
    ])
  })

  it('does not depend on the order of entries', () => {
    const entries = [entry({}), entry({ entryId: 'm2', at: '2026-05-06T10:00:00Z', enclosureId: 'B' })]
    expect(into([...entries].reverse()).sort()).toEqual(into(entries).sort())
  })
})
