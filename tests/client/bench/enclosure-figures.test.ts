import { describe, expect, it } from 'vitest'
import { bathDose } from '../../../shared/bench/calculators/bath-dose.ts'
import { copperSulfate } from '../../../shared/bench/calculators/copper-sulfate.ts'
import { unionisedAmmoniaCalculator } from '../../../shared/bench/calculators/unionised-ammonia.ts'
import { salinityChange } from '../../../shared/bench/calculators/salinity-change.ts'
import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import type { WaterOfEnclosure } from '../../../shared/contracts/water.contract.ts'
import { emptyDraft } from '../../../src/features/bench/bench-draft.ts'
import {
  enclosureFigures,
  fillableInputs,
  noteOf,
  originOf,
  withEnclosureFigures,
} from '../../../src/features/bench/enclosure-figures.ts'
import type { FoundFigure } from '../../../src/features/bench/enclosure-figures.ts'

const zone = 'America/Halifax'
const now = '2026-12-01T18:20:00.000Z'
const nothing = {
  enclosure: { code: 'QT-3' },
  bodies: [{ id: 'b', code: 'QT-3' }],
  latest: [],
  volume: { volume: null, usable: false, holds: false, basis: null, refusal: 'no-determination' },
}
const volume = {
  happenedAt: '2026-11-30T14:00:00.000Z',
  happenedOn: '2026-11-30',
  recordedBy: 'Test technician',
  method: 'geometry',
  netVolumeLitres: 2181.4000000000001,
  errorPercent: 1.7891,
  codes: ['QT-3', 'QS-3'],
}
const reading = (parameter: string, value: string, unit: string, happenedAt: string, below = false) => ({
  parameter,
  value: { value, unit },
  below,
  happenedAt,
  recordedBy: 'Test keeper',
  waterBodyCode: 'QS-3',
})
const water = (given: object = {}) => ({ ...nothing, ...given }) as unknown as WaterOfEnclosure
const usable = (more: object = {}) => ({
  volume: {
    volume: { ...volume, ...more },
    usable: true,
    holds: true,
    basis: 'connected-water',
    refusal: null,
  },
})
const noteFor = (of: AnyCalculator, one: WaterOfEnclosure, name: string, at = now) => {
  const found = enclosureFigures(of, one, zone)
  const draft = withEnclosureFigures(emptyDraft(of, {}), found, {})
  return { given: draft[name], ...(found[name] ? noteOf(found[name], draft[name], at) : {}) }
}

describe('figures of an enclosure on the bench', () => {
  it('go only into inputs that say so', () => {
    expect(fillableInputs(bathDose)).toEqual(['volume', 'volumeError'])
    expect(fillableInputs(copperSulfate)).toEqual(['measured', 'volume', 'volumeError'])
  })

  it('are the volume to dose by, its error, where they come from and how old they are', () => {
    const found = noteFor(bathDose, water(usable()), 'volume')
    expect(found.given).toEqual({ value: '2181.4', unit: 'L' })
    expect(found.says).toContain('by Test technician and confirmed; covers QT-3, QS-3.')
    expect(found.says).toContain('28\u00a0h ago')
    expect(found.old).toBeUndefined()
    expect(noteFor(bathDose, water(usable()), 'volumeError').given).toEqual({
      value: '1.79',
      unit: 'percent',
    })
  })

  it('are unknown, and said to be, where nothing may be used', () => {
    const none = noteFor(bathDose, water(), 'volume')
    expect(none.given).toMatchObject({ value: '' })
    expect(none.says).toMatch(/no volume to dose by.*Nobody has determined/)
    expect(noteFor(bathDose, water(), 'volumeError').says).toContain('not known')
    const unconfirmed = {
      volume: { ...usable().volume, usable: false, refusal: 'determination-not-confirmed' },
    }
    expect(noteFor(bathDose, water(unconfirmed), 'volume').given).toMatchObject({ value: '' })
    expect(noteFor(bathDose, water(usable({ errorPercent: null })), 'volumeError').given).toMatchObject({
      value: '',
    })
    expect(noteFor(salinityChange, water(), 'start').says).toBe('QT-3: no reading of salinity. Unknown.')
    expect(noteFor(bathDose, water({ bodies: [] }), 'volume').says).toContain('It has no water.')
  })

  it('say when they are older than they may be, to the minute', () => {
    const at = (happenedAt: string) => water({ latest: [reading('salinity', '33.1', 'PSS-78', happenedAt)] })
    // 24 h, and a minute more
    expect(noteFor(salinityChange, at('2026-11-30T18:20:00.000Z'), 'start').old).toBeUndefined()
    const old = noteFor(salinityChange, at('2026-11-30T18:19:00.000Z'), 'start')
    expect(old.given).toEqual({ value: '33.1', unit: 'PSS-78' })
    expect(old.old).toMatch(/^Too old: it counts for 24\u00a0hours/)
    expect(noteFor(bathDose, water(usable({ happenedOn: '2025-11-30' })), 'volume').old).toMatch(
      /12\u00a0months/,
    )
  })

  it('are left out where the true value lies below the figure', () => {
    const row = reading('copper-free', '0.05', 'mg/L', '2026-12-01T17:20:00.000Z', true)
    const found = noteFor(copperSulfate, water({ latest: [row] }), 'measured')
    expect(found.given).toMatchObject({ value: '' })
    expect(found.says).toMatch(/QS-3: .*0\.05.*, read 1\u00a0h ago by Test keeper/)
    expect(found.says).toContain('type the figure you mean')
  })

  it('keep what a person typed and offer the figure beside it; another enclosure takes away only its own', () => {
    const found = enclosureFigures(bathDose, water(usable()), zone)
    const typed = { ...emptyDraft(bathDose, {}), volume: { value: '2200', unit: 'L' } }
    const kept = withEnclosureFigures(typed, found, {})
    expect(kept['volume']).toEqual({ value: '2200', unit: 'L' })
    expect(kept['volumeError']).toEqual({ value: '1.79', unit: 'percent' })
    expect(noteOf(found['volume'] as FoundFigure, kept['volume'], now)).toMatchObject({
      says: expect.stringMatching(/^Changed by you\./),
      take: { value: '2181.4', unit: 'L' },
    })
    expect(originOf(found['volume'], kept['volume'], zone)).toBeUndefined()
    expect(originOf(found['volume'], found['volume']?.fill ?? undefined, zone)).toContain(
      'found 30\u00a0Nov\u00a02026, 10:00, UTC−4 by Test technician',
    )
    const other = withEnclosureFigures(kept, enclosureFigures(bathDose, water(), zone), found)
    expect(other['volume']).toEqual({ value: '2200', unit: 'L' })
    expect(other['volumeError']).toEqual({ value: '', unit: 'percent' })
  })
})

describe('the scale of a pH', () => {
  const of = unionisedAmmoniaCalculator
  const ph = (scale: string | null) =>
    water({ latest: [{ ...reading('ph', '8.1', 'pH', '2026-12-01T18:00:00.000Z'), scale }] })
  const filled = (scale: string | null, stood: string) =>
    withEnclosureFigures(
      { ...emptyDraft(of, {}), calibration: stood },
      enclosureFigures(of, ph(scale), zone),
      {},
    )
  it('goes with the reading, whatever stood there before', () => {
    expect(filled('total', 'nbs')).toMatchObject({ ph: { value: '8.1' }, calibration: 'total' })
    expect(filled('nbs', 'unknown')).toMatchObject({ calibration: 'nbs' })
  })
  it('is asked for where nobody noted it', () => {
    expect(filled(null, 'nbs')).toMatchObject({ ph: { value: '8.1' }, calibration: '' })
  })
  it('is left alone where the pH was typed', () => {
    const draft = { ...emptyDraft(of, {}), ph: { value: '8.0', unit: 'pH' }, calibration: 'nbs' }
    expect(withEnclosureFigures(draft, enclosureFigures(of, ph('total'), zone), {})).toMatchObject({
      ph: { value: '8.0' },
      calibration: 'nbs',
    })
  })
})
