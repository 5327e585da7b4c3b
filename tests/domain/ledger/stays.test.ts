import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import { listStays } from '../../../shared/domain/ledger/list-stays.ts'
import { checkMove } from '../../../shared/domain/ledger/check-move.ts'
import { enclosureAt, listInhabitants } from '../../../shared/domain/ledger/list-inhabitants.ts'
import type { Move } from '../../../shared/domain/ledger/move.ts'

const at = (n: number) => new Date(Date.UTC(2026, 3, 1, n)).toISOString()
let moved = 0
function move(from: string | null, to: string | null, hour: number, more: Partial<Move> = {}): Move {
  moved += 1
  return {
    moveId: `m${moved}`,
    animalId: 'ray',
    fromEnclosureId: from,
    toEnclosureId: to,
    at: at(hour),
    recordedAt: at(hour),
    ...more,
  }
}
const life = [
  move(null, 'van', 0),
  move('van', 'qt-6', 5),
  move('qt-6', 'hall', 700),
  move('hall', null, 900),
]

describe('where an animal was', () => {
  it('is one enclosure at a time from arrival to departure, and none outside', () => {
    const stays = listStays([...life].reverse())
    expect(stays.ok && stays.value.map((stay) => [stay.enclosureId, stay.from, stay.until])).toEqual([
      ['van', at(0), at(5)],
      ['qt-6', at(5), at(700)],
      ['hall', at(700), at(900)],
    ])
    const list = stays.ok ? stays.value : []
    expect([-1, 0, 4, 5, 800, 900].map((n) => enclosureAt(list, at(n)))).toEqual([
      null,
      'van',
      'van',
      'qt-6',
      'hall',
      null,
    ])
  })
  it('refuses a move out of an enclosure the animal is not in, and says where it is', () => {
    expect(checkMove(life.slice(0, 2), move('hall', 'qt-5', 10))).toMatchObject({
      refusal: {
        code: 'not-in-enclosure',
        field: 'fromEnclosureId',
        params: { fromEnclosureId: 'hall', actualEnclosureId: 'qt-6' },
      },
    })
    expect(checkMove(life, move('hall', 'qt-5', 901))).toMatchObject({
      refusal: { code: 'not-in-enclosure', params: { actualEnclosureId: '' } },
    })
  })
  it('refuses a late entry that what is already recorded contradicts', () => {
    const late = move('qt-6', 'qt-5', 300)
    expect(checkMove(life, late)).toMatchObject({
      refusal: {
        code: 'contradicts-later-move',
        params: { moveId: late.moveId, otherMoveId: life[2]?.moveId },
      },
    })
    expect(checkMove(life.slice(0, 2), late).ok).toBe(true)
  })
  it.each([
    ['same-enclosure', move('qt-6', 'qt-6', 9)],
    ['no-place-named', move(null, null, 9)],
    ['two-moves-at-one-instant', move('qt-6', 'hall', 5)],
    ['several-animals', move('qt-6', 'hall', 9, { animalId: 'tang' })],
    ['not-an-instant', move('qt-6', 'hall', 9, { at: 'yesterday' })],
  ])('refuses a move: %s', (code, bad) => {
    expect(checkMove(life.slice(0, 2), bad)).toMatchObject({ refusal: { code } })
  })
  it('leaves out a voided move', () => {
    const slip = move('qt-6', 'hall', 9, { voided: true })
    expect(listStays([...life, slip])).toEqual(listStays(life))
  })
  it('never overlaps itself, whatever was accepted', () => {
    const tries = fc.array(
      fc.record({
        from: fc.constantFrom(null, 'a', 'b', 'c'),
        to: fc.constantFrom(null, 'a', 'b', 'c'),
        hour: fc.integer({ min: 0, max: 30 }),
      }),
      { maxLength: 40 },
    )
    fc.assert(
      fc.property(tries, (list) => {
        let ledger: Move[] = []
        for (const { from, to, hour } of list) {
          const next = move(from, to, hour)
          if (checkMove(ledger, next).ok) ledger = [...ledger, next]
        }
        const stays = listStays(ledger)
        if (!stays.ok) return false
        return stays.value.every((stay, i) => {
          const next = stays.value[i + 1]
          return !next || (stay.until !== null && stay.until <= next.from)
        })
      }),
    )
  })
})

describe('who is in an enclosure', () => {
  it('is told for several enclosures at once, at an instant', () => {
    const ray = listStays(life)
    const tang = listStays([move(null, 'qt-5', 2, { animalId: 'tang' })])
    const all = [...(ray.ok ? ray.value : []), ...(tang.ok ? tang.value : [])]
    expect(listInhabitants(all, ['qt-5', 'qt-6'], at(6))).toEqual(['ray', 'tang'])
    expect(listInhabitants(all, ['qt-5', 'qt-6'], at(700))).toEqual(['tang'])
    expect(listInhabitants(all, [], at(6))).toEqual([])
  })
})
