import { useEffect, useRef, useState } from 'react'
import { TextField } from '../ui/text-field.tsx'
import type { ListState } from './list-state.ts'

const pauseMs = 300
/** The longest search that the server takes. */
const longest = 200

/**
 * Searches a list while somebody types, once they pause, and at once on Enter. What stands in the address is where it
 * begins, and it follows when the search is taken away there.
 */
export function SearchField({ label, list }: { label: string; list: ListState }) {
  const inAddress = list.get('q') ?? ''
  const [typed, setTyped] = useState(inAddress)
  const asked = useRef(inAddress)
  useEffect(() => {
    if (inAddress === asked.current) return
    asked.current = inAddress
    setTyped(inAddress)
  }, [inAddress])
  const search = () => {
    if (typed.trim() === inAddress) return
    asked.current = typed.trim()
    list.set({ q: typed.trim() })
  }
  useEffect(() => {
    const timer = setTimeout(search, pauseMs)
    return () => clearTimeout(timer)
    // `search` is made anew on every drawing; what was typed is what matters
  }, [typed, inAddress])
  return (
    <form
      role="search"
      onSubmit={(event) => {
        event.preventDefault()
        search()
      }}
    >
      <TextField
        label={label}
        type="search"
        maxLength={longest}
        value={typed}
        onChange={(event) => setTyped(event.target.value)}
      />
    </form>
  )
}
