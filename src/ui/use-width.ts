import { useLayoutEffect, useRef, useState } from 'react'
import type { RefObject } from 'react'

/** Width of an element in CSS px, followed as it changes; `fallback` where nothing is laid out. */
export function useWidth<E extends HTMLElement>(fallback: number): [RefObject<E | null>, number] {
  const element = useRef<E>(null)
  const [width, setWidth] = useState(fallback)
  useLayoutEffect(() => {
    const node = element.current
    if (!node) return
    const measure = () => {
      const now = Math.round(node.clientWidth)
      if (now > 0) setWidth(now)
    }
    measure()
    if (typeof ResizeObserver === 'undefined') return
    const observer = new ResizeObserver(measure)
    observer.observe(node)
    return () => observer.disconnect()
  }, [])
  return [element, width]
}
