import { startTransition, useOptimistic, useState } from 'react'
import { useNavigate, useSearchParams } from 'react-router-dom'

/** What a list is searched, filtered and sorted by, as it stands in the address. */
export interface ListState {
  /** A filter or `q`, `sort`, `direction`, `cursor`; undefined when it is not in the address. */
  get: (name: string) => string | undefined
  /** Sets filters and goes back to the first page; an empty value takes a filter away. */
  set: (changes: Readonly<Record<string, string | undefined>>) => void
  /** Whether a search or a filter leaves rows out. */
  narrowed: boolean
  /** Takes the search and every filter away; the order stays. */
  showAll: () => void
  /** What the fold of filters needs to know. */
  filters: { inUse: number; onShowAll: () => void }
  cursor: string | undefined
  /** Number of the first row shown, from 1. */
  from: number
  /** Goes to the page that begins at a cursor. */
  next: (cursor: string, shown: number) => void
  /** Goes to the page before; undefined on the first. */
  before: (() => void) | undefined
}

const notFilters = ['sort', 'direction', 'cursor', 'from']

/**
 * The state of a list, kept in the address bar, so that a link, a reload and the way back show the same rows.
 * Cursors are opaque; the pages that were passed are remembered, and a page opened by its link leads back to the first.
 */
export function useListState(): ListState {
  const [inAddress] = useSearchParams()
  // The address follows when the router has got there; until then what was asked for counts, so that a box stays ticked.
  const [search, setSearch] = useOptimistic(inAddress)
  const navigate = useNavigate()
  const [passed, setPassed] = useState<{ cursor: string | null; from: number }[]>([])
  const change = (changes: Readonly<Record<string, string | undefined>>) => {
    const next = new URLSearchParams(search)
    for (const [name, value] of Object.entries(changes)) {
      if (value) next.set(name, value)
      else next.delete(name)
    }
    startTransition(async () => {
      setSearch(next)
      await navigate(`?${next}`, { replace: true })
    })
  }
  const cursor = search.get('cursor') ?? undefined
  const from = Number(search.get('from') ?? '1') || 1
  const narrowedBy = [...new Set(search.keys())].filter((name) => !notFilters.includes(name))
  const set: ListState['set'] = (changes) => {
    setPassed([])
    change({ ...changes, cursor: undefined, from: undefined })
  }
  const showAll = () => set(Object.fromEntries(narrowedBy.map((name) => [name, undefined])))
  return {
    get: (name) => search.get(name) ?? undefined,
    set,
    narrowed: narrowedBy.length > 0,
    showAll,
    filters: { inUse: narrowedBy.filter((name) => name !== 'q').length, onShowAll: showAll },
    cursor,
    from,
    next: (nextCursor, shown) => {
      setPassed([...passed, { cursor: cursor ?? null, from }])
      change({ cursor: nextCursor, from: String(from + shown) })
    },
    before:
      cursor === undefined
        ? undefined
        : () => {
            const last = passed.at(-1)
            setPassed(passed.slice(0, -1))
            change({
              cursor: last?.cursor ?? undefined,
              from: last && last.from > 1 ? String(last.from) : undefined,
            })
          },
  }
}
