import { describe, expect, it } from 'vitest'
import { findConnectedWater } from '../../../shared/domain/connections/connected-water.ts'
import { type Isolation, chooseVolume } from '../../../shared/domain/connections/choose-volume.ts'
import {
  type VolumeDetermination,
  findVolumeMismatches,
} from '../../../shared/domain/connections/volume-determination.ts'
import { aBody, aSmallMap, aValve, turned } from './a-water-map.ts'

function waterAt(body: string, at: string, map = aSmallMap()) {
  const water = findConnectedWater(map, body, at)
  if (!water.ok) throw new Error('the map of this test has no such water')
  return water.value
}
const whole: VolumeDetermination = {
  determinationId: 'whole',
  waterBodyIds: ['q5', 'q6', 'sump'],
  connectionStates: [
    { connectionId: 'q5-sump', state: 'open' },
    { connectionId: 'q5-q6', state: 'open' },
  ],
  netVolumeLitres: 4200,
  errorPercent: 2,
  method: 'dilution',
  displacementSubtracted: true,
  determinedAt: '2026-03-02T10:00:00Z',
  confirmedAt: '2026-03-02T11:00:00Z',
}
const part: VolumeDetermination = {
  ...whole,
  determinationId: 'part',
  waterBodyIds: ['q6'],
  connectionStates: [{ connectionId: 'q5-q6', state: 'shut' }],
  netVolumeLitres: 2000,
  determinedAt: '2026-03-03T10:00:00Z',
}
const open = '2026-03-20T10:00:00Z'
const shut = '2026-04-10T10:00:00Z'
const isolation: Isolation = {
  isolationId: 'iso',
  waterBodyIds: ['q6'],
  isolatedAt: '2026-03-20T09:00:00Z',
  isolatedBy: 'S. Brandt',
  test: { method: 'dye', passed: true, testedAt: '2026-03-20T09:30:00Z' },
  endedAt: null,
}

describe('a volume determination', () => {
  it('holds for its own bodies and valve state', () => {
    expect(findVolumeMismatches(whole, waterAt('q6', open))).toEqual([])
    expect(findVolumeMismatches(part, waterAt('q6', shut))).toEqual([])
  })
  it('does not hold once a valve is turned, a body joins, or a connection is added', () => {
    expect(findVolumeMismatches(part, waterAt('q6', open)).map((m) => m.code)).toEqual([
      'water-body-missing',
      'water-body-missing',
      'connection-differs',
      'connection-not-named',
    ])
    expect(findVolumeMismatches(whole, waterAt('q6', shut)).map((m) => m.code)).toContain('water-body-extra')
    const map = aSmallMap()
    const grown = {
      bodies: [...map.bodies, aBody('loop')],
      connections: [...map.connections, aValve('q6', 'loop')],
      ledger: [...map.ledger, turned('q6-loop', 'shut', '2026-04-09T00:00:00Z')],
    }
    expect(findVolumeMismatches(part, waterAt('q6', shut, grown))).toEqual([
      { code: 'connection-not-named', params: { connectionId: 'q6-loop' } },
    ])
  })
  it('does not hold where a valve it names is unknown', () => {
    const map = { ...aSmallMap(), ledger: [] }
    expect(findVolumeMismatches(whole, waterAt('q6', open, map)).map((m) => m.code)).toEqual([
      'connection-differs',
      'connection-differs',
    ])
  })
})

describe('the volume to dose by', () => {
  it('is the newest that holds', () => {
    const older = {
      ...whole,
      determinationId: 'older',
      determinedAt: '2026-03-01T10:00:00Z',
      netVolumeLitres: 4100,
    }
    const later = {
      ...whole,
      determinationId: 'later',
      determinedAt: '2026-12-01T10:00:00Z',
      netVolumeLitres: 1,
    }
    expect(chooseVolume(waterAt('q6', open), ['q6'], [older, later, whole, part], [])).toEqual({
      ok: true,
      value: { determination: whole, basis: 'connected-water', isolationId: null },
    })
    expect(chooseVolume(waterAt('q6', shut), ['q6'], [whole, part], [])).toMatchObject({
      value: { determination: { determinationId: 'part' }, basis: 'connected-water' },
    })
  })
  it('waits for the second person, and falls back on an older confirmed one', () => {
    const waiting = {
      ...whole,
      determinationId: 'waiting',
      determinedAt: '2026-03-19T10:00:00Z',
      confirmedAt: null,
    }
    expect(chooseVolume(waterAt('q6', open), ['q6'], [waiting], [])).toMatchObject({
      refusal: { code: 'determination-not-confirmed', params: { determinationId: 'waiting' } },
    })
    expect(chooseVolume(waterAt('q6', open), ['q6'], [waiting, whole], [])).toMatchObject({
      value: { determination: { determinationId: 'whole' } },
    })
  })
  it('is never for less than the connected water without an isolation', () => {
    expect(chooseVolume(waterAt('q6', open), ['q6'], [part], [])).toMatchObject({
      refusal: { code: 'smaller-than-connected-water', params: { determinationId: 'part' } },
    })
  })
  it('is for the isolated part once that is recorded and tested', () => {
    const water = waterAt('q6', open)
    expect(chooseVolume(water, ['q6'], [whole, part], [isolation])).toMatchObject({
      value: { determination: { determinationId: 'part' }, basis: 'isolation', isolationId: 'iso' },
    })
    const untested = { ...isolation, test: null }
    const leaking = { ...isolation, test: { method: 'dye', passed: false, testedAt: '2026-03-20T09:30:00Z' } }
    expect(chooseVolume(water, ['q6'], [whole, part], [untested])).toMatchObject({
      refusal: { code: 'isolation-test-missing' },
    })
    expect(chooseVolume(water, ['q6'], [whole, part], [leaking])).toMatchObject({
      refusal: { code: 'isolation-test-failed' },
    })
    const ended = { ...isolation, endedAt: '2026-03-20T09:59:00Z' }
    expect(chooseVolume(water, ['q6'], [whole, part], [ended])).toMatchObject({
      value: { determination: { determinationId: 'whole' } },
    })
  })
  it('is refused where nothing was determined, or everything for another valve state', () => {
    expect(chooseVolume(waterAt('hall', open), ['hall'], [whole, part], [])).toMatchObject({
      refusal: { code: 'no-determination' },
    })
    expect(chooseVolume(waterAt('q6', shut), ['q6'], [whole], [])).toMatchObject({
      refusal: { code: 'no-determination-for-this-valve-state', params: { determinationId: 'whole' } },
    })
  })
})
