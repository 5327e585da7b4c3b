import { useState } from 'react'
import { describe, expect, it, vi } from 'vitest'
import { Combobox } from '../../../src/ui/combobox.tsx'
import type { ComboboxProps } from '../../../src/ui/combobox.tsx'
import { markedParts, matchingOptions } from '../../../src/ui/combobox-model.ts'
import { click, draw, drawsComponents, focus, leave, one, press, type } from '../../support/react.tsx'

drawsComponents()

const enclosures = [
  { value: 'QT-3', name: 'QT-3', detail: '14 yellow tang', aside: '2,220 L' },
  { value: 'QT-5', name: 'QT-5', detail: '10 lined seahorse' },
  { value: 'QF-1', name: 'QF-1', detail: '7 lake sturgeon' },
]

function Enclosure(
  props: Partial<ComboboxProps> & { onValue?: (value: string | null) => void; start?: string },
) {
  const [value, setValue] = useState<string | null>(props.start ?? null)
  return (
    <Combobox
      label="Enclosure"
      options={enclosures}
      value={value}
      {...props}
      onChange={(next) => {
        setValue(next)
        props.onValue?.(next)
      }}
    />
  )
}

const rows = (place: HTMLElement) =>
  [...place.querySelectorAll('[role="option"]')].map((row) => row.textContent)

describe('a combobox', () => {
  it('is named by its label, and closed until somebody asks', async () => {
    const { place } = await draw(<Enclosure />)
    const input = one<HTMLInputElement>(place, '[role="combobox"]')
    expect(one(place, 'label').getAttribute('for')).toBe(input.id)
    expect(input.getAttribute('aria-expanded')).toBe('false')
    expect(rows(place)).toEqual([])
  })

  it('opens with the arrow, moves through the list and round its end, and chooses with Enter', async () => {
    const onValue = vi.fn()
    const { place } = await draw(<Enclosure onValue={onValue} />)
    const input = one<HTMLInputElement>(place, '[role="combobox"]')
    await focus(input)
    await press('ArrowDown')
    expect(input.getAttribute('aria-expanded')).toBe('true')
    const active = () =>
      place.querySelector(`[id="${input.getAttribute('aria-activedescendant')}"]`)?.textContent
    expect(active()).toContain('QT-3')
    await press('ArrowDown')
    await press('ArrowDown')
    expect(active()).toContain('QF-1')
    await press('ArrowDown')
    expect(active()).toContain('QT-3')
    await press('ArrowUp')
    expect(active()).toContain('QF-1')
    const enter = await press('Enter')
    expect(enter.defaultPrevented).toBe(true)
    expect(onValue).toHaveBeenLastCalledWith('QF-1')
    expect(input.value).toBe('QF-1')
    expect(input.getAttribute('aria-expanded')).toBe('false')
  })

  it('filters by every typed word in name or detail, and underlines the match', async () => {
    const { place } = await draw(<Enclosure />)
    const input = one<HTMLInputElement>(place, '[role="combobox"]')
    await type(input, 'qt')
    expect(rows(place)).toHaveLength(2)
    expect(place.querySelector('u')?.textContent).toBe('QT')
    await type(input, 'qt sea')
    expect(rows(place)).toEqual(['QT-510 lined seahorse'])
    await type(input, 'penguin')
    expect(rows(place)[0]).toContain('Nothing matches')
  })

  it('never chooses by itself: leaving or Esc puts back what was chosen', async () => {
    const onValue = vi.fn()
    const { place } = await draw(<Enclosure onValue={onValue} start="QT-3" />)
    const input = one<HTMLInputElement>(place, '[role="combobox"]')
    await type(input, 'lake')
    await press('ArrowDown')
    const escape = await press('Escape')
    expect(escape.defaultPrevented).toBe(true)
    expect(input.value).toBe('QT-3')
    await type(input, 'lake')
    await leave(input)
    expect(input.value).toBe('QT-3')
    expect(onValue).not.toHaveBeenCalled()
  })

  it('lets Esc through to the dialog when its list is closed', async () => {
    const { place } = await draw(<Enclosure />)
    await focus(one(place, '[role="combobox"]'))
    expect((await press('Escape')).defaultPrevented).toBe(false)
  })

  it('means nothing chosen when the text is emptied', async () => {
    const onValue = vi.fn()
    const { place } = await draw(<Enclosure onValue={onValue} start="QT-3" />)
    await type(one<HTMLInputElement>(place, '[role="combobox"]'), '')
    expect(onValue).toHaveBeenLastCalledWith(null)
  })

  it('is chosen from with the pointer', async () => {
    const onValue = vi.fn()
    const { place } = await draw(<Enclosure onValue={onValue} />)
    const input = one<HTMLInputElement>(place, '[role="combobox"]')
    await click(input)
    await click(place.querySelectorAll('[role="option"]')[1]!)
    expect(onValue).toHaveBeenLastCalledWith('QT-5')
  })

  it('asks the server from the second letter on, and shows what comes without filtering it again', async () => {
    const onSearch = vi.fn()
    const { place } = await draw(<Enclosure onSearch={onSearch} />)
    const input = one<HTMLInputElement>(place, '[role="combobox"]')
    await type(input, 'z')
    expect(onSearch).not.toHaveBeenCalled()
    expect(rows(place)[0]).toContain('at least 2 letters')
    await type(input, 'ze')
    expect(onSearch).toHaveBeenCalledExactlyOnceWith('ze')
    expect(rows(place)).toHaveLength(3)
  })
})

describe('matching', () => {
  it('does not mind accents or case', () => {
    const options = [{ value: '1', name: 'Östergötland', detail: 'Café' }]
    expect(matchingOptions(options, 'oster cafe')).toHaveLength(1)
  })

  it('underlines at the place as shown, even where letters carry accents', () => {
    expect(markedParts('Östergötland', 'got')).toEqual([
      { text: 'Öster', marked: false },
      { text: 'göt', marked: true },
      { text: 'land', marked: false },
    ])
    expect(markedParts('QT-3', '')).toEqual([{ text: 'QT-3', marked: false }])
  })
})
