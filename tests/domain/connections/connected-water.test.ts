import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import {
  findConnectedWater,
  listConnectedWaters,
} from '../../../shared/domain/connections/connected-water.ts'
import { connectionStateAt } from '../../../shared/domain/connections/connection-state-at.ts'
import { listConnectedWaterSpells } from '../../../shared/domain/connections/list-connected-water-spells.ts'
import { listWaterSources } from '../../../shared/domain/connections/list-water-sources.ts'
import type { WaterMap } from '../../../shared/domain/connections/water-map.ts'
import { aBody, aSmallMap, aValve, turned } from './a-water-map.ts'

const names = ['a', 'b', 'c', 'd', 'e', 'f']
const aMap = fc
  .record({
    pairs: fc.uniqueArray(fc.tuple(fc.constantFrom(...names), fc.constantFrom(...names)), {
      maxLength: 9,
      selector: ([a, b]) => `${a}-${b}`,
    }),
    turns: fc.array(
      fc.record({ pick: fc.nat(8), open: fc.boolean(), hour: fc.integer({ min: 0, max: 48 }) }),
      { maxLength: 25 },
    ),
  })
  .map(({ pairs, turns }): WaterMap => {
    const connections = pairs.filter(([a, b]) => a !== b).map(([a, b]) => aValve(a, b))
    return {
      bodies: names.map(aBody),
      connections,
      ledger: turns.flatMap(({ pick, open, hour }, i) => {
        const valve = connections[pick % Math.max(1, connections.length)]
        const at = new Date(Date.UTC(2026, 3, 1, hour)).toISOString()
        return valve ? [{ ...turned(valve.connectionId, open ? 'open' : 'shut', at), entryId: `e${i}` }] : []
      }),
    }
  })
const at = '2026-04-02T06:00:00.000Z'

describe('the state of a valve', () => {
  const ledger = aSmallMap().ledger
  it('is unknown before the first entry, and that of the newest entry from its instant on', () => {
    expect(connectionStateAt('q5-q6', ledger, '2026-02-28T00:00:00Z')).toBe('unknown')
    expect(connectionStateAt('q5-q6', ledger, '2026-03-01T08:00:00Z')).toBe('open')
    expect(connectionStateAt('q5-q6', ledger, '2026-04-03T10:39:59+01:00')).toBe('open')
    expect(connectionStateAt('q5-q6', ledger, '2026-04-03T10:40:00+01:00')).toBe('shut')
  })
  it('takes the later record of one instant, and leaves out a voided one', () => {
    const corrected = turned('q5-q6', 'open', '2026-04-03T09:40:00Z', '2026-04-04T08:00:00Z')
    expect(connectionStateAt('q5-q6', [corrected, ...ledger], '2026-04-05T00:00:00Z')).toBe('open')
    const voided = { ...corrected, voided: true }
    expect(connectionStateAt('q5-q6', [voided, ...ledger], '2026-04-05T00:00:00Z')).toBe('shut')
  })
})

describe('connected water', () => {
  it('joins what open valves join, and names the shut valve on the edge', () => {
    const before = findConnectedWater(aSmallMap(), 'q6', '2026-04-03T09:39:00Z')
    expect(before.ok && before.value.waterBodyIds).toEqual(['q5', 'q6', 'sump'])
    expect(before.ok && before.value.enclosureIds).toEqual(['tank-q5', 'tank-q6'])
    const after = findConnectedWater(aSmallMap(), 'q6', '2026-04-03T09:41:00Z')
    expect(after.ok && after.value.waterBodyIds).toEqual(['q6'])
    expect(after.ok && after.value.connections).toEqual([
      { connectionId: 'q5-q6', state: 'shut', inside: false },
    ])
  })
  it('counts a valve that nobody recorded as open, and says so', () => {
    const map: WaterMap = { bodies: [aBody('a'), aBody('b')], connections: [aValve('a', 'b')], ledger: [] }
    const water = findConnectedWater(map, 'a', '2026-04-01T00:00:00Z')
    expect(water.ok && water.value.waterBodyIds).toEqual(['a', 'b'])
    expect(water.ok && water.value.unknownConnectionIds).toEqual(['a-b'])
  })
  it('leaves out bodies and valves outside their time', () => {
    const map: WaterMap = {
      bodies: [aBody('a'), { ...aBody('b'), existsUntil: '2026-04-01T00:00:00Z' }],
      connections: [aValve('a', 'b')],
      ledger: [turned('a-b', 'open', '2026-01-01T00:00:00Z')],
    }
    const late = findConnectedWater(map, 'a', '2026-04-01T00:00:00Z')
    expect(late.ok && late.value.waterBodyIds).toEqual(['a'])
    expect(findConnectedWater(map, 'b', '2026-04-01T00:00:00Z')).toMatchObject({
      ok: false,
      refusal: { code: 'unknown-water-body', field: 'waterBodyId' },
    })
  })
  it('refuses what it cannot answer', () => {
    expect(listConnectedWaters(aSmallMap(), '2026-04-01')).toMatchObject({
      refusal: { code: 'not-an-instant' },
    })
    const broken: WaterMap = { bodies: [aBody('a')], connections: [aValve('a', 'gone')], ledger: [] }
    expect(listConnectedWaters(broken, '2026-04-01T00:00:00Z')).toMatchObject({
      refusal: { code: 'unknown-connection-end', params: { connectionId: 'a-gone' } },
    })
  })

  it('puts every body into exactly one water, whatever is open', () => {
    fc.assert(
      fc.property(aMap, (map) => {
        const waters = listConnectedWaters(map, at)
        const all = waters.ok ? waters.value.flatMap((one) => one.waterBodyIds) : []
        return all.length === names.length && new Set(all).size === names.length
      }),
    )
  })
  it('does not depend on the order of rows, nor on which end is called A', () => {
    fc.assert(
      fc.property(aMap, (map) => {
        const turnedRound: WaterMap = {
          bodies: [...map.bodies].reverse(),
          connections: [...map.connections]
            .reverse()
            .map((one) => ({ ...one, bodyAId: one.bodyBId, bodyBId: one.bodyAId })),
          ledger: [...map.ledger].reverse(),
        }
        expect(listConnectedWaters(turnedRound, at)).toEqual(listConnectedWaters(map, at))
      }),
    )
  })
  it('never parts water by opening a valve', () => {
    fc.assert(
      fc.property(aMap, fc.nat(8), (map, pick) => {
        const valve = map.connections[pick % Math.max(1, map.connections.length)]
        if (!valve) return true
        const opened = {
          ...map,
          ledger: [...map.ledger, { ...turned(valve.connectionId, 'open', at), entryId: 'z' }],
        }
        return names.every((name) => {
          const before = findConnectedWater(map, name, at)
          const after = findConnectedWater(opened, name, at)
          return (
            before.ok &&
            after.ok &&
            before.value.waterBodyIds.every((id) => after.value.waterBodyIds.includes(id))
          )
        })
      }),
    )
  })
})

describe('spells of connected water', () => {
  it('follow one another without gaps and change only when the water does', () => {
    const spells = listConnectedWaterSpells(aSmallMap(), 'q6', '2026-03-01T08:00:00Z', '2026-05-01T00:00:00Z')
    expect(
      spells.ok && spells.value.map(({ from, until, water }) => [from, until, water.waterBodyIds]),
    ).toEqual([
      ['2026-03-01T08:00:00Z', '2026-04-03T09:40:00Z', ['q5', 'q6', 'sump']],
      ['2026-04-03T09:40:00Z', '2026-05-01T00:00:00Z', ['q6']],
    ])
  })
  it('are not cut by a valve elsewhere', () => {
    const map = aSmallMap()
    const spells = listConnectedWaterSpells(map, 'hall', '2026-03-01T00:00:00Z', '2026-05-01T00:00:00Z')
    expect(spells.ok && spells.value.length).toBe(1)
  })
  it('refuse an interval that runs backwards', () => {
    const spells = listConnectedWaterSpells(aSmallMap(), 'q6', '2026-05-01T00:00:00Z', '2026-04-01T00:00:00Z')
    expect(spells).toMatchObject({ refusal: { code: 'interval-backwards', field: 'until' } })
  })
})

describe('where the water of a body came from', () => {
  const sources = (waterBodyId: string, from: string, until: string, map = aSmallMap()) => {
    const found = listWaterSources(map, waterBodyId, from, until)
    return found.ok ? found.value.map((one) => [one.from, one.until, ...one.enclosureIds]) : found.refusal
  }
  it('is remembered through a valve that was shut since', () => {
    expect(sources('q6', '2026-03-15T00:00:00Z', '2026-05-01T00:00:00Z')).toEqual([
      ['2026-03-15T00:00:00Z', '2026-04-03T09:40:00Z', 'tank-q5', 'tank-q6'],
      ['2026-04-03T09:40:00Z', '2026-05-01T00:00:00Z', 'tank-q6'],
    ])
  })
  it('does not run backwards in time: what went in after the valve was shut stays where it is', () => {
    expect(sources('q6', '2026-04-04T00:00:00Z', '2026-05-01T00:00:00Z')).toEqual([
      ['2026-04-04T00:00:00Z', '2026-05-01T00:00:00Z', 'tank-q6'],
    ])
    expect(sources('hall', '2026-01-01T00:00:00Z', '2026-05-01T00:00:00Z')).toEqual([
      ['2026-01-01T00:00:00Z', '2026-05-01T00:00:00Z', 'tank-hall'],
    ])
  })
  it('goes over water in between, and comes with what was opened later', () => {
    const map: WaterMap = {
      bodies: ['q5', 'q6', 'q7', 'sump'].map(aBody),
      connections: [aValve('q7', 'sump'), aValve('q5', 'sump'), aValve('q5', 'q6')],
      ledger: [
        turned('q7-sump', 'open', '2026-01-01T00:00:00Z'),
        turned('q5-sump', 'shut', '2026-01-01T00:00:00Z'),
        turned('q5-q6', 'shut', '2026-01-01T00:00:00Z'),
        turned('q7-sump', 'shut', '2026-02-01T00:00:00Z'),
        turned('q5-sump', 'open', '2026-02-10T00:00:00Z'),
        turned('q5-q6', 'open', '2026-03-01T00:00:00Z'),
      ],
    }
    const from = '2026-01-15T00:00:00Z'
    // q7 gave to the sump until February, the sump to q5, and q5 to q6 at the instant asked about
    expect(sources('q6', from, '2026-03-01T00:00:00Z', map)).toEqual([
      [from, '2026-02-01T00:00:00Z', 'tank-q5', 'tank-q6', 'tank-q7'],
      ['2026-02-01T00:00:00Z', '2026-03-01T00:00:00Z', 'tank-q5', 'tank-q6'],
    ])
    expect(sources('q6', from, '2026-02-28T00:00:00Z', map)).toEqual([
      [from, '2026-02-28T00:00:00Z', 'tank-q6'],
    ])
  })
  it('holds at every instant at least what the body was joined to then', () => {
    fc.assert(
      fc.property(aMap, fc.constantFrom(...names), (map, name) => {
        const from = '2025-01-01T00:00:00.000Z'
        const found = listWaterSources(map, name, from, at)
        const spells = listConnectedWaterSpells(map, name, from, at)
        if (!found.ok || !spells.ok) return false
        return spells.value.every(({ from: start, water }) => {
          const source = found.value.find((one) => one.from <= start && start < one.until)
          return water.enclosureIds.every((id) => source?.enclosureIds.includes(id))
        })
      }),
    )
  })
})
