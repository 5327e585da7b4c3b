import { useCallback, useEffect, useRef } from 'react'
import { useBlocker } from 'react-router-dom'
import type { Blocker } from 'react-router-dom'

/**
 * Keeps a form with unsaved text from being left unasked: by a link or the way back inside the application, and by
 * closing the page, where the browser asks in its own words.
 *
 * @returns the blocker, to be shown as a question while its state is `blocked`; and `letGo`, for leaving after a save
 */
export function useLeaveGuard(unsaved: boolean): { blocker: Blocker; letGo: () => void } {
  const free = useRef(false)
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      unsaved && !free.current && currentLocation.pathname !== nextLocation.pathname,
  )
  useEffect(() => {
    if (!unsaved) return
    const ask = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', ask)
    return () => window.removeEventListener('beforeunload', ask)
  }, [unsaved])
  const letGo = useCallback(() => {
    free.current = true
  }, [])
  return { blocker, letGo }
}
