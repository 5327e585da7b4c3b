import { useEffect, useState } from 'react'

/** A value once it has stopped changing for a while: what is judged while somebody types. */
export function useSettled<T>(value: T, forMs: number): T {
  const [settled, setSettled] = useState(value)
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), forMs)
    return () => clearTimeout(timer)
  }, [value, forMs])
  return settled
}
