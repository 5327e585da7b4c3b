import { useState } from 'react'
import { expect, it, vi } from 'vitest'
import { SegmentedChoice } from '../../../src/ui/segmented-choice.tsx'
import { click, draw, drawsComponents, focus, press } from '../../support/react.tsx'

drawsComponents()

type Use = 'labelled' | 'extralabel' | 'unknown'

function Choice({
  start = null,
  onUse,
  shut,
}: {
  start?: Use | null
  onUse?: (use: Use) => void
  shut?: string
}) {
  const [use, setUse] = useState<Use | null>(start)
  return (
    <SegmentedChoice
      label="Use"
      segments={[
        { value: 'labelled', label: 'As labelled' },
        { value: 'extralabel', label: 'Extralabel', ...(shut ? { shut } : {}) },
        { value: 'unknown', label: 'Not known' },
      ]}
      value={use}
      onChange={(next) => {
        setUse(next)
        onUse?.(next)
      }}
    />
  )
}

const cells = (place: HTMLElement) => [...place.querySelectorAll<HTMLButtonElement>('[role="radio"]')]
const checked = (place: HTMLElement) =>
  cells(place).filter((cell) => cell.getAttribute('aria-checked') === 'true')

it('begins with nothing chosen where the choice goes on the record', async () => {
  const { place } = await draw(<Choice />)
  expect(checked(place)).toEqual([])
  expect(cells(place).map((cell) => cell.tabIndex)).toEqual([0, -1, -1])
})

it('is one tab stop, on the chosen cell', async () => {
  const { place } = await draw(<Choice start="unknown" />)
  expect(cells(place).map((cell) => cell.tabIndex)).toEqual([-1, -1, 0])
})

it('moves with arrows, Home and End without choosing anything', async () => {
  const onUse = vi.fn()
  const { place } = await draw(<Choice onUse={onUse} />)
  const [first, second, third] = cells(place)
  await focus(first!)
  await press('ArrowRight')
  expect(document.activeElement).toBe(second)
  await press('End')
  expect(document.activeElement).toBe(third)
  await press('ArrowRight')
  expect(document.activeElement).toBe(first)
  await press('ArrowLeft')
  expect(document.activeElement).toBe(third)
  await press('Home')
  expect(document.activeElement).toBe(first)
  expect(onUse).not.toHaveBeenCalled()
})

it('chooses the cell that is pressed, which is what Enter and Space do to a button', async () => {
  const onUse = vi.fn()
  const { place } = await draw(<Choice onUse={onUse} />)
  await click(cells(place)[1]!)
  expect(onUse).toHaveBeenLastCalledWith('extralabel')
  expect(checked(place).map((cell) => cell.textContent)).toEqual(['Extralabel'])
})

it('can be reached but not chosen when a cell is shut, and says why', async () => {
  const onUse = vi.fn()
  const { place } = await draw(<Choice onUse={onUse} shut="Needs a reason" />)
  const cell = cells(place)[1]!
  expect(cell.getAttribute('aria-disabled')).toBe('true')
  expect(cell.title).toBe('Needs a reason')
  await click(cell)
  expect(onUse).not.toHaveBeenCalled()
})

it('leaves other keys to the page', async () => {
  const { place } = await draw(<Choice />)
  await focus(cells(place)[0]!)
  expect((await press('a')).defaultPrevented).toBe(false)
})
