import { useSyncExternalStore } from 'react'

/** For whom this page was drawn, and whether somebody else is signed in on this browser by now. */
export interface PagePerson {
  /** Everything that is written on this page is written by this person; null while nobody is signed in. */
  id: string | null
  /** The printed name of whoever is signed in instead; null while it is the same person. */
  other: string | null
}

let state: PagePerson = { id: null, other: null }
const listeners = new Set<() => void>()

function tell(next: PagePerson): void {
  if (next.id === state.id && next.other === state.other) return
  state = next
  for (const listener of listeners) listener()
}

export const pagePerson = {
  now: (): PagePerson => state,
  /** The page is drawn for this person, or for nobody. */
  drawnFor: (id: string | null): void => tell({ id, other: null }),
  /** The server answered in the name of somebody else. */
  differs: (other: string): void => tell({ ...state, other }),
  subscribe(listener: () => void): () => void {
    listeners.add(listener)
    return () => listeners.delete(listener)
  },
}

export const usePagePerson = (): PagePerson => useSyncExternalStore(pagePerson.subscribe, pagePerson.now)
