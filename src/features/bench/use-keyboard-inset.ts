import { useEffect } from 'react'

/** Below this it is the browser's own bar that moves, not a keyboard. */
const leastKeyboardPx = 80
const property = '--keyboard'

/**
 * Keeps `--keyboard` of the page at the height, CSS px, by which a keyboard on the screen covers its foot, and the field
 * that is typed in above what stands there. Where the page itself becomes shorter, and where there is no such keyboard,
 * it is 0.
 */
export function useKeyboardInset(): void {
  useEffect(() => {
    const seen = window.visualViewport
    if (!seen) return
    const { style } = document.documentElement
    let inset = 0
    const follow = () => {
      // a page that is pinched larger is also seen in part only
      const hidden = seen.scale > 1.05 ? 0 : window.innerHeight - seen.height - seen.offsetTop
      const now = hidden < leastKeyboardPx ? 0 : Math.round(hidden)
      if (now === inset) return
      const grew = now > inset
      inset = now
      style.setProperty(property, `${String(inset)}px`)
      if (grew) document.activeElement?.scrollIntoView({ block: 'nearest' })
    }
    follow()
    seen.addEventListener('resize', follow)
    seen.addEventListener('scroll', follow)
    return () => {
      seen.removeEventListener('resize', follow)
      seen.removeEventListener('scroll', follow)
      style.removeProperty(property)
    }
  }, [])
}
