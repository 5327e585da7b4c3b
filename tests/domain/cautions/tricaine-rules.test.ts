import { describe, expect, it } from 'vitest'
import type { CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { known, notApplicable, unknown } from '../../../shared/domain/cautions/fact.ts'
import { sayCaution } from '../../../shared/messages/say-caution.ts'
import { cautions, firedBy, minutesAgo, read, someFacts } from './some-facts.ts'
import type { Change } from './some-facts.ts'

const bath = (change: Change = {}) =>
  someFacts('tricaine', { value: 100, unit: 'mg/L', basis: 'salt' }, change)
const plain = (text: string) => text.replaceAll('\u00a0', ' ')

describe('R18: tricaine is buffered, and the bath is of the pH of home', () => {
  const homes = (...values: number[]) => known(values.map((value) => ({ value, at: minutesAgo(60) })))
  const start = (change: Change) => firedBy('R18', bath(change), 'start')

  it('sea water of 8.1 that fell to 7.2 without a buffer stops (reference case)', () => {
    const found = start({ order: { isBuffered: known(false) }, water: { pH: read(7.2), homePh: homes(8.1) } })
    expect(found).toEqual(['stop tricaine-unbuffered', 'stop tricaine-ph-differs'])
  })
  it('asks for the buffer while writing and at the dose, and does not take silence for an answer', () => {
    for (const stage of ['design', 'start'] as const) {
      const said = (isBuffered: CautionFacts['order']['isBuffered']) =>
        firedBy('R18', bath({ order: { isBuffered } }), stage)
      expect(said(known(true))).toEqual([])
      expect(said(known(false))).toEqual(['stop tricaine-unbuffered'])
      expect(said(unknown())).toEqual(['stop tricaine-buffer-unknown'])
      expect(said(notApplicable())).toEqual(['stop tricaine-buffer-unknown'])
    }
  })
  it.each<[string, Change['water'], string[]]>([
    ['exactly 6.8', { pH: read(6.8) }, []],
    ['6.79', { pH: read(6.79) }, ['stop tricaine-acid']],
    ['never measured', { pH: unknown() }, ['stop tricaine-ph-unknown']],
    ['measured 4 h ago', { pH: read(7.4, 240) }, []],
    ['measured longer ago', { pH: read(7.4, 241) }, ['stop tricaine-ph-unknown']],
    ['0.3 below home', { pH: read(7.8), homePh: homes(8.1) }, []],
    ['0.31 below home', { pH: read(7.79), homePh: homes(8.1) }, ['stop tricaine-ph-differs']],
    ['0.31 above home', { pH: read(8.41), homePh: homes(8.1) }, ['stop tricaine-ph-differs']],
    ['one of two homes far', { pH: read(7.9), homePh: homes(8, 7.5) }, ['stop tricaine-ph-differs']],
    ['home never measured', { homePh: unknown() }, ['stop tricaine-home-ph-unknown']],
    ['no home known', { homePh: homes() }, ['stop tricaine-home-ph-unknown']],
    [
      'home measured too long ago',
      { homePh: known([{ value: 8, at: minutesAgo(241) }]) },
      ['stop tricaine-home-ph-unknown'],
    ],
  ])('at the dose, %s', (_, water, expected) => expect(start({ water })).toEqual(expected))
  it('while the order is written there is no bath to measure', () =>
    expect(firedBy('R18', bath({ water: { pH: read(6), homePh: unknown() } }))).toEqual([]))
  it('is of tricaine alone', () => {
    const other = someFacts(
      'praziquantel',
      { value: 2, unit: 'mg/L', basis: 'active' },
      {
        order: { isBuffered: unknown() },
      },
    )
    expect(firedBy('R18', other, 'start')).toEqual([])
  })
  it('says both figures and the most that they may be apart', () => {
    const facts = bath({ water: { pH: known(7.2, minutesAgo(5), 'reading', '7.20'), homePh: homes(8.1) } })
    const found = cautions(facts, 'start').find(({ code }) => code === 'tricaine-ph-differs')
    expect(found && plain(sayCaution(found, 'UTC').text)).toBe(
      'The bath reads pH 7.20, the water that the animals come from pH 8.1: more than pH 0.3 apart.',
    )
  })
})

describe('facts that an order was signed without, because nobody asked for them then', () => {
  const { isBuffered: _, ...order } = bath().order
  const { homePh: __, ...water } = bath().water
  const signed = { ...bath(), order, water } as unknown as CautionFacts

  it('are unknown, and the order is judged all the same', () =>
    expect(firedBy('R18', signed)).toEqual(['stop tricaine-buffer-unknown']))
  it('have not changed because they are known now', () => {
    const { cautions: found } = evaluateCautions({ facts: bath(), stage: 'start', factsAtSigning: signed })
    expect(found).toEqual([])
  })
})
