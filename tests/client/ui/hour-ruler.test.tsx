import { Route, Routes, useLocation } from 'react-router-dom'
import { describe, expect, it } from 'vitest'
import { HourRuler } from '../../../src/ui/hour-ruler.tsx'
import { layHourRuler } from '../../../src/ui/hour-ruler-geometry.ts'
import type { DueItem } from '../../../src/ui/hour-ruler-geometry.ts'
import { click, draw, drawsComponents, focus, one, press } from '../../support/react.tsx'

drawsComponents()

const item = (time: string, state: DueItem['state'], what = 'free copper test, QT-2', n = 0): DueItem => ({
  id: `${time} ${state} ${n}`,
  dueMinute: Number(time.slice(0, 2)) * 60 + Number(time.slice(3)),
  state,
  time,
  what,
  to: `/item/${time}-${n}`,
})
const many = (time: string, state: DueItem['state'], count: number) =>
  Array.from({ length: count }, (_, n) => item(time, state, 'watch', n))

const lay = (items: DueItem[], width = 1408, now = 860) => layHourRuler(items, width, now, '3 overdue')
const near = (value: number | undefined, expected: number) => expect(value).toBeCloseTo(expected, 0)

/* Places are those of the design drawings, 1408 px wide at 14:20 and 788 px wide. */
describe('the drawing', () => {
  it('stands a tick 1.5 px right of its half hour, hollow when done', () => {
    const [done, due] = lay([item('06:30', 'done'), item('16:10', 'due')]).ranks
    near(done?.ticks[0]?.x, 382.8)
    expect(done?.ticks[0]?.hollow).toBe(true)
    near(due?.ticks[0]?.x, 940.2)
    expect(due?.ticks[0]?.hollow).toBe(false)
  })

  it('stands items of one half hour side by side, up to five', () => {
    const [rank] = lay(many('16:00', 'due', 5)).ranks
    expect(rank?.ticks.map((tick) => tick.x.toFixed(1))).toEqual([
      '940.2',
      '945.9',
      '951.6',
      '957.3',
      '963.0',
    ])
    expect(rank?.count).toBeNull()
  })

  it('makes more than five one tick and a number: all when all are done, else what is still to do', () => {
    const [done] = lay(many('08:00', 'done', 8)).ranks
    expect(done?.count).toMatchObject({ text: '8', anchor: 'start', ink: false })
    near(done?.count?.x, 477.3)
    const [mixed] = lay([...many('14:00', 'due', 6), ...many('14:00', 'done', 1)]).ranks
    expect(mixed?.ticks).toHaveLength(1)
    // left of the tick, because now is near
    expect(mixed?.count).toMatchObject({ text: '6', anchor: 'end', ink: true })
    near(mixed?.count?.x, 819.8)
  })

  it('does not move a tick when it is done', () => {
    const before = lay([item('15:00', 'due'), item('15:10', 'due', 'b', 1)]).ranks[0]?.ticks.map(
      (tick) => tick.x,
    )
    const after = lay([item('15:00', 'done'), item('15:10', 'due', 'b', 1)]).ranks[0]?.ticks.map(
      (tick) => tick.x,
    )
    expect(after).toEqual(before)
  })

  it('takes overdue items out of their hour into rings at the left end, up to three', () => {
    const three = lay(many('09:00', 'overdue', 3))
    expect(three.ranks).toEqual([])
    expect(three.overdue.rings).toEqual([8, 23, 38])
    expect(three.overdue.words).toEqual({ x: 49, text: '3 overdue' })
    expect(lay(many('09:00', 'overdue', 7)).overdue.rings).toEqual([8])
  })

  it('leaves out the hour names that now or the overdue group would cover', () => {
    const names = lay(many('09:00', 'overdue', 3)).hourNames.map((hour) => hour.text)
    expect(names).toEqual(['02', '04', '06', '08', '10', '12', '16', '18', '20', '22'])
  })

  it('is coarser below 1000 px: whole hours, a name every four, and the number in place of many rings', () => {
    const narrow = lay([...many('09:00', 'overdue', 5), item('08:40', 'due')], 788)
    expect(narrow.tickWidth).toBe(3.6)
    expect(narrow.hourNames.map((hour) => hour.text)).toEqual(['04', '08', '12', '16', '20'])
    expect(narrow.overdue).toMatchObject({ rings: [], number: '5', words: null })
    near(narrow.ranks[0]?.ticks[0]?.x, 264.2)
  })

  it('writes the time left of the mark near midnight', () => {
    expect(lay([], 1408, 1439).nowTextLeft).toBe(true)
    expect(lay([], 1408, 860).nowTextLeft).toBe(false)
  })
})

describe('the list of links', () => {
  const items = [
    item('16:00', 'due', 'Skin scrape, QT-6 cownose ray'),
    item('07:00', 'done'),
    item('09:00', 'overdue', 'Morning count, QF-1'),
  ]

  function Where() {
    return <p data-where>{useLocation().pathname}</p>
  }
  const ruler = (
    <>
      <Where />
      <Routes>
        <Route path="*" element={<HourRuler items={items} now="14:20" nowMinute={860} />} />
      </Routes>
    </>
  )
  const links = (place: HTMLElement) => [...place.querySelectorAll<HTMLAnchorElement>('ol a')]

  it('is in time order with the overdue first, each named by time, what, where and state', async () => {
    const { place } = await draw(ruler)
    expect(one(place, 'nav').getAttribute('aria-label')).toBe('Due today')
    expect(links(place).map((link) => link.textContent)).toEqual([
      '09:00, Morning count, QF-1, overdue',
      '07:00, free copper test, QT-2, done',
      '16:00, Skin scrape, QT-6 cownose ray, due',
    ])
    const description = document.getElementById(one(place, 'nav').getAttribute('aria-describedby') ?? '')
    expect(description?.textContent).toBe('1 overdue, 1 done, 1 to do. It is 14:20.')
  })

  it('is one tab stop; arrows go from tick to tick, Home and End to the ends', async () => {
    const { place } = await draw(ruler)
    const [first, second, third] = links(place)
    expect(links(place).map((link) => link.tabIndex)).toEqual([0, -1, -1])
    await focus(first!)
    await press('ArrowRight')
    expect(document.activeElement).toBe(second)
    await press('End')
    expect(document.activeElement).toBe(third)
    await press('ArrowRight')
    expect(document.activeElement).toBe(third)
    await press('ArrowLeft')
    expect(document.activeElement).toBe(second)
    await press('Home')
    expect(document.activeElement).toBe(first)
    expect(links(place).map((link) => link.tabIndex)).toEqual([0, -1, -1])
  })

  it('names the focused tick in a tip under the ruler', async () => {
    const { place } = await draw(ruler)
    expect(place.querySelector('.ruler-tip')).toBeNull()
    await focus(links(place)[2]!)
    expect(one(place, '.ruler-tip').textContent).toBe('16:00 Skin scrape, QT-6 cownose ray')
  })

  it('opens the item', async () => {
    const { place } = await draw(ruler)
    await click(links(place)[2]!)
    expect(one(place, '[data-where]').textContent).toBe('/item/16:00-0')
  })

  it('hides the drawing from readers', async () => {
    const { place } = await draw(ruler)
    expect(place.querySelector('svg')?.getAttribute('aria-hidden')).toBe('true')
  })
})
