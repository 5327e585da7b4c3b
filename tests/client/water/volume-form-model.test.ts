import { describe, expect, it } from 'vitest'
import { determineVolume } from '../../../shared/contracts/water-volumes.contract.ts'
import { shapeNames } from '../../../shared/domain/water/tank-shape.ts'
import { volumeDrawing } from '../../../src/features/water/volume-drawing-model.ts'
import {
  draftOfSheet,
  emptyDraft,
  isDisplacementOpen,
  isUnfinished,
  measuresOf,
  sheetOf,
  workOut,
} from '../../../src/features/water/volume-form-model.ts'
import type { VolumeDraft } from '../../../src/features/water/volume-form-model.ts'

const bodies = [
  { code: 'QS-3', kind: 'sump' as const },
  { code: 'QT-3', kind: 'enclosure' as const },
  { code: 'QL', kind: 'loop' as const },
]
const m = (value: string) => ({ value, unit: 'm' })
const filled = (): VolumeDraft => {
  const draft = emptyDraft(bodies, false)
  const [tank, sump] = draft.parts
  if (!tank || !sump) throw new Error('a part is missing')
  return {
    ...draft,
    parts: [
      { ...tank, measures: { length: m('2.40'), width: m('1.20'), depth: m('0.68') } },
      { ...sump, measures: { length: m('1.10'), width: m('0.60'), depth: m('0.40') } },
    ],
    displacement: { ...draft.displacement, by: 'volume', volume: { value: '41.0', unit: 'L' } },
  }
}
const sent = (draft: VolumeDraft) => ({
  id: '019a0000-0000-7000-8000-000000000001',
  happenedAt: '2026-12-01T12:00:00Z',
  waterBodyIds: ['019a0000-0000-7000-8000-000000000002'],
  sheet: sheetOf(draft),
})

describe('the form of a volume', () => {
  it('opens with a part for each tank and sump, tanks first, and nothing said', () => {
    const draft = emptyDraft(bodies, false)
    expect(draft.parts.map((part) => [part.name, part.role])).toEqual([
      ['QT-3', 'tank'],
      ['QS-3', 'sump'],
    ])
    const result = workOut(draft)
    expect(!result.ok && isUnfinished(result.refusal)).toBe(true)
    expect(isDisplacementOpen(draft)).toBe(true)
  })

  it('works out what the server works out, and sends what the contract takes', () => {
    const draft = filled()
    const result = workOut(draft)
    // 2.40 × 1.20 × 0.68 + 1.10 × 0.60 × 0.40 m, less 41 L (mensuration, by hand)
    expect(result.ok && result.value.netLitres).toBeCloseTo(2181.4, 9)
    expect(determineVolume.body?.safeParse(sent(draft)).success).toBe(true)
  })

  it('names the measure that is a slip', () => {
    const draft = filled()
    const [tank] = draft.parts
    if (tank) draft.parts[0] = { ...tank, measures: { ...tank.measures, depth: m('68') } }
    const result = workOut(draft)
    expect(result.ok ? null : result.refusal).toMatchObject({ field: 'parts.0.depth', code: 'above-most' })
    expect(!result.ok && isUnfinished(result.refusal)).toBe(false)
  })

  it('sends every shape as the contract takes it, and draws it', () => {
    for (const shape of shapeNames) {
      const draft = filled()
      const [tank] = draft.parts
      if (!tank) throw new Error('a part is missing')
      const measures = Object.fromEntries(
        measuresOf[shape].map((name) => [
          name,
          name === 'volume'
            ? { value: '500', unit: 'L' }
            : m(name === 'depth' ? '0.5' : name === 'shortAxis' || name === 'sideWidth' ? '1.0' : '2.0'),
        ]),
      )
      draft.parts = [{ ...tank, shape, measures }]
      draft.displacement.by = 'none'
      const parsed = determineVolume.body?.safeParse(sent(draft))
      expect(parsed?.error?.issues, shape).toBeUndefined()
      const result = workOut(draft)
      expect(result.ok ? null : result.refusal, shape).toBeNull()
      const drawing = volumeDrawing(sheetOf(draft), result.ok ? result.value.working : [])
      expect(drawing?.tanks[0]?.litresText, shape).toMatch(/L$/)
      expect(drawing?.inWords, shape).not.toMatch(/undefined|NaN/)
    }
  })

  it('keeps walls and pipes for measuring again, never the depth nor what stands in the water', () => {
    const again = draftOfSheet(sheetOf(filled()), emptyDraft(bodies, false))
    expect(again.parts[0]?.measures).toEqual({ length: m('2.40'), width: m('1.20') })
    expect(isDisplacementOpen(again)).toBe(true)
    const metered = draftOfSheet(
      {
        method: 'metered',
        startReading: { value: '1', unit: 'L' },
        endReading: { value: '2', unit: 'L' },
        errorPercent: 1,
      },
      emptyDraft(bodies, false),
    )
    expect(metered).toMatchObject({ method: 'metered', endReading: { value: '' } })
  })
})
