let pressed = false

if (typeof document !== 'undefined') {
  document.addEventListener('pointerdown', () => (pressed = true), true)
  for (const end of ['pointerup', 'pointercancel'])
    document.addEventListener(end, () => (pressed = false), true)
}

/**
 * Runs at once, or, while a pointer is down, after it was let go. A field that is left by pressing on something below must
 * not change its height between press and release: what was pressed would move away and the click be lost.
 */
export function afterPress(run: () => void): void {
  if (!pressed) return run()
  const ends = ['pointerup', 'pointercancel']
  const once = () => {
    for (const end of ends) document.removeEventListener(end, once)
    setTimeout(run) // the click comes first
  }
  for (const end of ends) document.addEventListener(end, once)
}
