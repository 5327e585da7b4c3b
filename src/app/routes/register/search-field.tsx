import { useEffect, useState } from 'react'
import type { ListState } from '../../../lib/list-state.ts'
import { TextField } from '../../../ui/text-field.tsx'

const pauseMs = 300

/** Searches a list while somebody types, once they pause; what stands in the address is where it begins. */
export function SearchField({ label, list }: { label: string; list: ListState }) {
  const inAddress = list.get('q') ?? ''
  const [typed, setTyped] = useState(inAddress)
  const { set } = list
  useEffect(() => {
    if (typed.trim() === inAddress) return
    const timer = setTimeout(() => set({ q: typed.trim() }), pauseMs)
    return () => clearTimeout(timer)
    // `set` is made anew on every drawing; what was typed is what matters
  }, [typed, inAddress])
  return (
    <TextField label={label} type="search" value={typed} onChange={(event) => setTyped(event.target.value)} />
  )
}
