import { useEffect, useRef } from 'react'
import { isSingleKey } from './single-keys.ts'

/** Two keys count as one command when they come within this time. */
const pairWithinMs = 1500

/**
 * The keys of the frame: `g` then a digit goes to a sheet, `Ctrl K`, `⌘ K` and `/` find, `?` lists the keys. Single
 * letters never act while somebody types, and not at all when they are turned off; `Ctrl K` always does.
 */
export function useSheetKeys({
  singleKeys,
  onSheet,
  onFind,
  onKeyList,
}: {
  singleKeys: boolean
  onSheet: (number: number) => void
  onFind: () => void
  onKeyList: () => void
}) {
  const handlers = useRef({ onSheet, onFind, onKeyList })
  handlers.current = { onSheet, onFind, onKeyList }

  useEffect(() => {
    let wentAt = -Infinity
    const onKeyDown = (event: KeyboardEvent) => {
      if (
        (event.ctrlKey || event.metaKey) &&
        !event.altKey &&
        !event.shiftKey &&
        event.key.toLowerCase() === 'k'
      ) {
        event.preventDefault()
        handlers.current.onFind()
        return
      }
      if (!singleKeys || !isSingleKey(event)) return
      const key = event.key
      const paired = event.timeStamp - wentAt <= pairWithinMs
      wentAt = -Infinity
      if (key === 'g') {
        wentAt = event.timeStamp
      } else if (paired && /^[1-8]$/.test(key)) {
        event.preventDefault()
        handlers.current.onSheet(Number(key))
      } else if (key === '/') {
        event.preventDefault()
        handlers.current.onFind()
      } else if (key === '?') {
        event.preventDefault()
        handlers.current.onKeyList()
      }
    }
    document.addEventListener('keydown', onKeyDown)
    return () => document.removeEventListener('keydown', onKeyDown)
  }, [singleKeys])
}
