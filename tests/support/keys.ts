import type { Page } from 'playwright-core'
import { expect } from 'vitest'

/** What the keys are on: its role and name as a reader of the screen is told them, and what the eye is told. */
export interface Held {
  role: string
  name: string
  /** Nothing holds the keys but the page itself. */
  lost: boolean
  /** An outline stands around it, or around the edge of its field. */
  ringed: boolean
  /** Its middle is within the window, and nothing lies over it. */
  seen: boolean
  /** Where it stands among the controls of the sheet; -1 outside it. */
  at: number
}

const controls =
  'a[href], button:not([disabled]), input:not([disabled]), select:not([disabled]), textarea:not([disabled]), summary, [tabindex="0"]'

/** The control that the keys are on. */
export async function heldBy(page: Page): Promise<Held> {
  const client = await page.context().newCDPSession(page)
  try {
    const { result } = await client.send('Runtime.evaluate', { expression: 'document.activeElement' })
    const { nodes } = await client.send('Accessibility.getPartialAXTree', {
      ...(result.objectId === undefined ? {} : { objectId: result.objectId }),
      fetchRelatives: false,
    })
    const [node] = nodes
    const looks = await page.evaluate((controls) => {
      const of = document.activeElement ?? document.body
      const rings = [of, of.closest('.control')].flatMap((each) => {
        if (!each) return []
        const { outlineStyle, outlineWidth, outlineColor } = getComputedStyle(each)
        return [outlineStyle !== 'none' && parseFloat(outlineWidth) >= 2 && !/, 0\)$/.test(outlineColor)]
      })
      const { left, right, top, bottom } = of.getBoundingClientRect()
      const hit = document.elementFromPoint((left + right) / 2, (top + bottom) / 2)
      const all = [...document.querySelectorAll(`main :is(${controls})`)]
      return {
        lost: of === document.body || of === document.documentElement,
        ringed: rings.includes(true),
        seen: hit !== null && (of.contains(hit) || hit.contains(of)),
        at: all.indexOf(of),
      }
    }, controls)
    return { role: String(node?.role?.value ?? ''), name: String(node?.name?.value ?? ''), ...looks }
  } finally {
    await client.detach()
  }
}

/** Nobody who uses keys alone may lose sight of where they are. */
export function expectHeld(held: Held, after: string): void {
  expect(held.lost, `after ${after} the keys are on nothing`).toBe(false)
  expect(held, `after ${after}`).toMatchObject({ ringed: true, seen: true })
  expect(held.name, `after ${after}: the name of a ${held.role}`).toMatch(/\S/)
}

const mostStops = 80

/** Presses Tab, or Shift and Tab, until the keys are on a control of that name, looking at every stop on the way. */
export async function tabTo(
  page: Page,
  name: string | RegExp,
  role?: string,
  key: 'Tab' | 'Shift+Tab' = 'Tab',
): Promise<Held> {
  const stops: string[] = []
  for (let step = 0; step < mostStops; step += 1) {
    await page.keyboard.press(key)
    const held = await heldBy(page)
    // past the last control the browser takes the keys to its own bars, and then begins again
    if (held.lost && step > 0) continue
    expectHeld(held, `${key} from ${stops.at(-1) ?? 'the start'}`)
    stops.push(`${held.role} "${held.name}"`)
    const named = typeof name === 'string' ? held.name === name : name.test(held.name)
    if (named && (role === undefined || held.role === role)) return held
  }
  throw new Error(`${key} never came to ${String(name)}, only to\n${stops.join('\n')}`)
}
