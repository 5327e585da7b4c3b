import { useEffect } from 'react'

/** Tells the sheet around a form whether something unsaved stands in it; a form that is gone has nothing. */
export function useTellUnsaved(unsaved: boolean, tell: (unsaved: boolean) => void): void {
  useEffect(() => {
    tell(unsaved)
    return () => tell(false)
  }, [unsaved, tell])
}
