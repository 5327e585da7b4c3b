import { useEffect } from 'react'
import { frameWords } from '../../../shared/messages/frame.ts'

/** Names the page in the tab and to readers: "Quarantine · Pratique". Every screen calls it once. */
export function useSheetTitle(sheet: string): void {
  useEffect(() => {
    document.title = frameWords.titled({ sheet })
  }, [sheet])
}
