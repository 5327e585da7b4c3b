import { useSyncExternalStore } from 'react'

/** For whom this page was drawn, and whether somebody else, or nobody, is signed in on this browser by now. */
export interface PagePerson {
  /** Everything that is written on this page is written by this person; null while nobody is signed in. */
  id: string | null
  /** The printed name of whoever is signed in instead; null while it is the same person. */
  other: string | null
  /** The session of this person has ended while the page was open; what was typed on it stays until they are back. */
  ended: boolean
}

let state: PagePerson = { id: null, other: null, ended: false }
const listeners = new Set<() => void>()

function tell(next: PagePerson): void {
  if (next.id === state.id && next.other === state.other && next.ended === state.ended) return
  state = next
  for (const listener of listeners) listener()
}

export const pagePerson = {
  now: (): PagePerson => state,
  /** The page is drawn for this person, or for nobody. */
  drawnFor: (id: string | null): void => tell({ id, other: null, ended: false }),
  /** The server answered in the name of somebody else. */
  differs: (other: string): void => tell({ ...state, other, ended: false }),
  /** The server knows nobody any more; of a page that is nobody's there is nothing to say. */
  sessionEnded: (): void => tell({ ...state, other: null, ended: state.id !== null }),
  subscribe(listener: () => void): () => void {
    listeners.add(listener)
    return () => listeners.delete(listener)
  },
}

export const usePagePerson = (): PagePerson => useSyncExternalStore(pagePerson.subscribe, pagePerson.now)
