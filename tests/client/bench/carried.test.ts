import { describe, expect, it } from 'vitest'
import { calculators } from '../../../shared/bench/calculators.ts'
import { bathDose } from '../../../shared/bench/calculators/bath-dose.ts'
import { copperSulfate } from '../../../shared/bench/calculators/copper-sulfate.ts'
import { specificGravity } from '../../../shared/bench/calculators/specific-gravity.ts'
import { tankVolume } from '../../../shared/bench/calculators/tank-volume.ts'
import type { AnyCalculator, Carry } from '../../../shared/bench/definition.ts'
import { evaluate } from '../../../shared/bench/evaluate.ts'
import { computeVolume } from '../../../shared/domain/water/compute-volume.ts'
import type { VolumeSheet } from '../../../shared/domain/water/volume-sheet.ts'
import { carriedOf } from '../../../src/features/bench/carried.ts'
import { draftLeft, exampleDraft, keptDraft } from '../../../src/features/bench/bench-draft.ts'
import { carriedOrder, fieldsOf } from '../../../src/features/orders/order-form-model.ts'
import { draftOfCarried } from '../../../src/features/water/carried-volume.ts'
import { emptyDraft, sheetOf, workOut } from '../../../src/features/water/volume-form-model.ts'
import { emptyField, readingOf, withComputed } from '../../../src/features/water/reading-form-model.ts'
import { carryState, readCarried, saidNote } from '../../../src/lib/bench-carry.ts'

const originOf = (input: string) => (input === 'target' ? 'the order' : undefined)

function tryCarry(of: AnyCalculator, body: object = of.example, by: Carry | undefined = of.carries?.[0]) {
  const evaluation = evaluate(of, body)
  if (!evaluation.ok || !by) throw new Error(JSON.stringify(evaluation))
  return carriedOf(of, by, { body, answer: evaluation.answer, originOf }, 'e')
}

function carry(...given: Parameters<typeof tryCarry>) {
  const carried = tryCarry(...given)
  if (!carried) throw new Error('nothing carried')
  return carried
}

describe('what is carried from the bench', () => {
  it('goes through the history of the window and is understood by its own form alone', () => {
    for (const of of calculators)
      for (const by of of.carries ?? []) {
        const carried = tryCarry(of, of.example, by)
        // an example that asks the other way round has nothing to carry
        if (!carried) continue
        expect(readCarried(by.to, JSON.parse(JSON.stringify(carryState(carried)))), of.id).toEqual(carried)
        expect(readCarried(by.to === 'order' ? 'volume' : 'order', carryState(carried))).toBeNull()
      }
    for (const state of [null, {}, { bench: 1 }, { bench: { to: 'order' } }, 'x'])
      expect(readCarried('order', state)).toBeNull()
  })

  it('names only inputs that the calculator has', () => {
    for (const of of calculators)
      for (const by of of.carries ?? []) {
        if (by.to !== 'order') continue
        const { target, basis, division } = by
        const named = [target, division, typeof basis === 'object' ? basis.input : basis]
        for (const name of named) if (name !== undefined) expect(Object.keys(of.inputs)).toContain(name)
      }
  })

  it('is for an order the target with its basis and the smallest step, not the amount', () => {
    const carried = carry(bathDose)
    if (carried.to !== 'order') throw new Error(carried.to)
    expect(carried).toMatchObject({
      enclosureId: 'e',
      target: { value: '75', unit: 'mg/L' },
      basis: 'active',
      division: { value: '1', unit: 'mL' },
    })
    expect(carried.said.name).toBe('Bath dose')
    expect(carried.said.result).toMatch(/^1\d\d\u00a0mL \(\d/)
    expect(carried.said.inputs).toContain('Net volume of the water: 1,000\u00a0L')
    expect(carried.said.inputs).toContain('Target in the water: 75\u00a0mg/L (the order)')
    expect(carried.said.working.at(-1)).toMatch(/ = .*mL$/)
    const { fields } = fieldsOf(carriedOrder(carried), 'America/Halifax')
    expect(fields).toMatchObject({ target: { value: '75', unit: 'mg/L' }, basis: 'active', productId: null })
  })

  it('calls a target of copper by the name that orders have for it', () => {
    const copper = carry(copperSulfate)
    expect(copper).toMatchObject({ basis: 'free', target: { value: '0.2', unit: 'mg/L' } })
    const compound = {
      ...copperSulfate.example,
      targetOf: 'compound',
      target: { value: '0.8', unit: 'g/m3' },
    }
    // 0.8 g/m³ is 0.8 mg/L: orders have no grams a cubic metre
    expect(carry(copperSulfate, compound)).toMatchObject({
      basis: 'salt',
      target: { value: '0.8', unit: 'mg/L' },
    })
  })

  it('is for a volume the whole sheet, in the parts of that water, with errors open that nobody stated', () => {
    const carried = carry(tankVolume)
    if (carried.to !== 'volume') throw new Error(carried.to)
    const start = emptyDraft(
      [
        { code: 'QS-3', kind: 'sump' },
        { code: 'QT-3', kind: 'enclosure' },
        { code: 'QT-4', kind: 'enclosure' },
      ],
      false,
    )
    const draft = draftOfCarried(carried.sheet as VolumeSheet, start, 'QT-3')
    expect(draft.parts.map(({ key, name, shape, error }) => [key, name, shape, error])).toEqual([
      ['qt-3', 'QT-3', 'rectangular', '2'],
      ['qs-3', 'QS-3', 'stated', ''],
      ['qt-4', 'QT-4', 'rectangular', '2'],
    ])
    expect(draft.displacement).toMatchObject({
      by: 'share',
      share: { value: '12', unit: 'percent' },
      error: '',
    })
    // nothing goes through while an error is open
    expect(workOut({ ...draft, parts: draft.parts.slice(0, 2) }).ok).toBe(false)
    const stated = {
      ...draft,
      parts: draft.parts.slice(0, 2).map((part) => ({ ...part, error: part.error || '5' })),
      pipes: draft.pipes.map((pipe) => ({ ...pipe, error: '10' })),
      displacement: { ...draft.displacement, error: '20' },
    }
    const [bench, form] = [computeVolume(carried.sheet as VolumeSheet), computeVolume(sheetOf(stated))]
    if (!bench.ok || !form.ok) throw new Error(JSON.stringify([bench, form]))
    expect(form.value.netLitres).toBeCloseTo(bench.value.netLitres, 9)
  })

  it('is for a volume without a sheet a stated figure', () => {
    const evaluation = evaluate(tankVolume, tankVolume.example)
    if (!evaluation.ok) throw new Error('no answer')
    const { figures } = evaluation.answer
    const answer = {
      ...evaluation.answer,
      range: { low: figures[0].value * 0.9, high: figures[0].value * 1.1 },
    }
    const carried = carriedOf(
      tankVolume,
      { to: 'volume' },
      { body: tankVolume.example, answer, originOf },
      null,
    )
    expect(carried).toMatchObject({ sheet: { method: 'stated', errorPercent: 10 } })
    if (carried?.to !== 'volume') throw new Error()
    const draft = draftOfCarried(carried.sheet as VolumeSheet, emptyDraft([], false), 'QT-3')
    expect(draft).toMatchObject({ method: 'stated', error: '10', statedVolume: { unit: 'L' } })
  })

  it('is for a reading a figure with how it was worked out as its note, as long as that figure stands', () => {
    const note = 'From the bench: Specific gravity, 35.2.'
    const field = withComputed(
      emptyField('i', 'salinity', undefined),
      { value: '35.2', unit: 'PSS-78' },
      note,
    )
    expect(readingOf(field, '')).toMatchObject({ value: { value: '35.2', unit: 'PSS-78' }, note })
    expect(readingOf({ ...field, value: '35.0' }, '')).not.toHaveProperty('note')
    // 77.0 °F is 25.0 °C exactly
    const warm = withComputed(
      emptyField('i', 'temperature', undefined),
      { value: '77.0', unit: 'degF' },
      note,
    )
    expect(warm).toMatchObject({ value: '77.0', unit: 'degF' })
    const kelvin = withComputed(
      emptyField('i', 'temperature', undefined),
      { value: '298.15', unit: 'K' },
      note,
    )
    expect(kelvin).toMatchObject({ value: '25.000', unit: 'degC' })
    const wrong = withComputed(emptyField('i', 'salinity', undefined), { value: '3', unit: 'L' }, note)
    expect(wrong.value).toBe('')
    const ph = withComputed(emptyField('i', 'ph', undefined), { value: '8.10', unit: 'pH' }, note)
    expect(readingOf(ph, '')).toMatchObject({ value: { value: '8.10', unit: 'pH' }, note })
  })

  it('is no reading where the figure is only what was typed', () => {
    const typed = {
      find: 'gravity',
      salinity: { value: '35', unit: 'PSS-78' },
      temperature: { value: '25', unit: 'degC' },
      reference: { value: '25', unit: 'degC' },
    }
    expect(carry(specificGravity)).toMatchObject({ to: 'reading', parameter: 'salinity' })
    expect(() => carry(specificGravity, typed)).toThrow('nothing carried')
  })

  it('fits into a note, and says when the working did not', () => {
    const said = { name: 'Bath dose', result: '1\u00a0mL', inputs: ['a: 1'], working: ['b: 1 = 1'] }
    expect(saidNote(said)).toBe('From the bench: Bath dose, 1\u00a0mL. Asked: a: 1. Working: b: 1 = 1.')
    const long = saidNote({ ...said, working: ['x'.repeat(2000)] })
    expect(long).toContain('too long')
    expect(saidNote({ ...said, inputs: ['x'.repeat(3000)] }).length).toBeLessThanOrEqual(2000)
  })

  it('leaves the fields behind for whoever comes back, and takes nothing that is not theirs', () => {
    const draft = exampleDraft(bathDose)
    expect(draftLeft(bathDose, keptDraft(draft, null))).toEqual(draft)
    expect(draftLeft(bathDose, null)).toBeNull()
    const odd = { draft: { target: 7, volume: { value: 1, unit: 'L' }, form: 'solid', other: 'x' } }
    expect(draftLeft(bathDose, odd)).toMatchObject({
      form: 'solid',
      target: { value: '' },
      volume: { value: '' },
    })
    expect(draftLeft(bathDose, odd)).not.toHaveProperty('other')
  })
})
