import { useSyncExternalStore } from 'react'

/** Day, night watch, or as the device is set. It follows the person, not the clock. */
export type ThemeChoice = 'day' | 'night' | 'device'

export const themeChoices: readonly ThemeChoice[] = ['day', 'night', 'device']

const lastKey = 'pratique.theme'
const keyOf = (personId: string) => `${lastKey}.${personId}`
const listeners = new Set<() => void>()
let choice: ThemeChoice = 'day'

/** Local storage can be refused (private windows, full disks); the theme then lasts as long as the page. */
function kept(key: string): ThemeChoice | null {
  try {
    const value = localStorage.getItem(key)
    return themeChoices.find((known) => known === value) ?? null
  } catch {
    return null
  }
}

function keep(key: string, value: ThemeChoice): void {
  try {
    localStorage.setItem(key, value)
  } catch {
    // not kept, see above
  }
}

const darkDevice = () => window.matchMedia('(prefers-color-scheme: dark)')

function apply(): void {
  const shown = choice === 'device' ? (darkDevice().matches ? 'night' : 'day') : choice
  document.documentElement.dataset.theme = shown
  const ground = { day: '#fbfaf6', night: '#0a1218' }[shown]
  document.querySelector('meta[name="theme-color"]')?.setAttribute('content', ground)
  for (const listener of listeners) listener()
}

/** Before anything is drawn: the theme last used on this device, and from then on the device's own changes. */
export function startTheme(): void {
  choice = kept(lastKey) ?? 'day'
  darkDevice().addEventListener('change', () => {
    if (choice === 'device') apply()
  })
  apply()
}

/**
 * Somebody signed in: their own choice on this device, else the one they keep on the server, else what is shown now.
 */
export function themeFor(personId: string, onServer: string | undefined): void {
  const own = kept(keyOf(personId)) ?? themeChoices.find((known) => known === onServer)
  if (own) chooseTheme(own, personId)
}

/** Chooses a theme, for the device and, where somebody is signed in, for that person. */
export function chooseTheme(next: ThemeChoice, personId?: string): void {
  choice = next
  keep(lastKey, next)
  if (personId !== undefined) keep(keyOf(personId), next)
  apply()
}

/** The choice in force. */
export function useThemeChoice(): ThemeChoice {
  return useSyncExternalStore(
    (changed) => {
      listeners.add(changed)
      return () => listeners.delete(changed)
    },
    () => choice,
  )
}
