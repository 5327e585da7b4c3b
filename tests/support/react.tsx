import { act } from 'react'
import type { ReactNode } from 'react'
import { createRoot } from 'react-dom/client'
import { MemoryRouter } from 'react-router-dom'
import { afterEach, beforeEach, expect, vi } from 'vitest'

declare global {
  var IS_REACT_ACT_ENVIRONMENT: boolean
}

const cleanUps: (() => void)[] = []
let noises: string[] = []

/** Call once in a test file that draws components: takes them away again, and fails a test that wrote to the console. */
export function drawsComponents(): void {
  beforeEach(() => {
    globalThis.IS_REACT_ACT_ENVIRONMENT = true
    noises = []
    for (const level of ['error', 'warn'] as const) {
      vi.spyOn(console, level).mockImplementation((...words) => void noises.push(words.map(String).join(' ')))
    }
  })
  afterEach(() => {
    for (const cleanUp of cleanUps.splice(0).reverse()) cleanUp()
    vi.restoreAllMocks()
    document.body.replaceChildren()
    expect(noises, 'the console').toEqual([])
  })
}

/** Draws a component inside a router; gives its place in the page and a way to draw it again. */
export async function draw(
  component: ReactNode,
  at = '/',
): Promise<{ place: HTMLElement; again(next: ReactNode): Promise<void> }> {
  const place = document.createElement('div')
  document.body.append(place)
  const root = createRoot(place)
  const put = (what: ReactNode) =>
    act(async () => root.render(<MemoryRouter initialEntries={[at]}>{what}</MemoryRouter>))
  await put(component)
  cleanUps.push(() => {
    act(() => root.unmount())
    place.remove()
  })
  return { place, again: put }
}

/** A press of a key on what has the focus; the browser's own reaction to it is not imitated. */
export async function press(key: string, more: KeyboardEventInit = {}): Promise<KeyboardEvent> {
  const event = new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...more })
  await act(async () => void (document.activeElement ?? document.body).dispatchEvent(event))
  return event
}

/** Types into a field as a person would see it: the whole text at once, with the event that React listens to. */
export async function type(field: HTMLInputElement | HTMLTextAreaElement, text: string): Promise<void> {
  const prototype =
    field instanceof HTMLTextAreaElement ? HTMLTextAreaElement.prototype : HTMLInputElement.prototype
  await act(async () => {
    field.focus()
    Object.getOwnPropertyDescriptor(prototype, 'value')?.set?.call(field, text)
    field.dispatchEvent(new Event('input', { bubbles: true }))
  })
}

/** Chooses an option of a native select. */
export async function choose(select: HTMLSelectElement, value: string): Promise<void> {
  await act(async () => {
    Object.getOwnPropertyDescriptor(HTMLSelectElement.prototype, 'value')?.set?.call(select, value)
    select.dispatchEvent(new Event('change', { bubbles: true }))
  })
}

/** Presses a button or link with the pointer. */
export async function click(element: Element): Promise<void> {
  await act(async () => {
    element.dispatchEvent(new MouseEvent('mousedown', { bubbles: true, cancelable: true }))
    if (element instanceof HTMLElement) element.click()
  })
}

/** Moves the focus, as Tab or a script would. */
export async function focus(element: HTMLElement): Promise<void> {
  await act(async () => element.focus())
}

/** Leaves a field. */
export async function leave(element: HTMLElement): Promise<void> {
  await act(async () => element.blur())
}

/** The one element that a selector finds; none or several fail the test. */
export function one<E extends Element = HTMLElement>(place: ParentNode, selector: string): E {
  const all = place.querySelectorAll<E>(selector)
  expect(all.length, selector).toBe(1)
  return all[0] as E
}

/** The button, link or menu item with this name. */
export function named(place: ParentNode, name: string | RegExp): HTMLElement {
  const of = (element: Element) => element.getAttribute('aria-label') ?? element.textContent?.trim() ?? ''
  const all = [...place.querySelectorAll<HTMLElement>('button, a, [role="menuitem"], [role="radio"]')]
  const found = all.filter((element) =>
    typeof name === 'string' ? of(element) === name : name.test(of(element)),
  )
  expect(found.length, `named ${name}: ${all.map(of).join(' | ')}`).toBe(1)
  return found[0] as HTMLElement
}
