import { useRef, useState } from 'react'
import type { KeyboardEvent } from 'react'
import { classNames } from './class-names.ts'

export interface Segment<V extends string> {
  value: V
  label: string
  /** Why this cell can't be chosen now. */
  shut?: string
}

export interface SegmentedChoiceProps<V extends string> {
  segments: readonly Segment<V>[]
  /** `null`: nothing is chosen, which is where a choice that goes on the record begins. */
  value: V | null
  onChange: (next: V) => void
  label?: string
  labelledBy?: string
  describedBy?: string | undefined
  touch?: boolean
}

/** The cell that an arrow, Home or End leads to; `null` for any other key. */
export function segmentAfterKey(key: string, from: number, count: number): number | null {
  if (key === 'ArrowRight' || key === 'ArrowDown') return (from + 1) % count
  if (key === 'ArrowLeft' || key === 'ArrowUp') return (from - 1 + count) % count
  if (key === 'Home') return 0
  if (key === 'End') return count - 1
  return null
}

/**
 * One of a few cells. Arrows move the focus and Enter or Space chooses: an arrow on the way through must not put
 * something on the record that nobody meant.
 */
export function SegmentedChoice<V extends string>({
  segments,
  value,
  onChange,
  label,
  labelledBy,
  describedBy,
  touch,
}: SegmentedChoiceProps<V>) {
  const cells = useRef<(HTMLButtonElement | null)[]>([])
  const chosen = segments.findIndex((segment) => segment.value === value)
  const [visited, setVisited] = useState<number | null>(null)
  const stop = visited ?? (chosen >= 0 ? chosen : 0)

  const onKeyDown = (event: KeyboardEvent, at: number) => {
    const next = segmentAfterKey(event.key, at, segments.length)
    if (next === null) return
    event.preventDefault()
    setVisited(next)
    cells.current[next]?.focus()
  }

  return (
    <div
      className={classNames('seg', touch && 'seg-touch')}
      role="radiogroup"
      aria-label={label}
      aria-labelledby={labelledBy}
      aria-describedby={describedBy}
      onBlur={(event) => {
        if (!event.currentTarget.contains(event.relatedTarget)) setVisited(null)
      }}
    >
      {segments.map((segment, i) => (
        <button
          key={segment.value}
          ref={(node) => {
            cells.current[i] = node
          }}
          type="button"
          role="radio"
          aria-checked={segment.value === value}
          aria-disabled={segment.shut ? true : undefined}
          title={segment.shut}
          tabIndex={i === stop ? 0 : -1}
          onKeyDown={(event) => onKeyDown(event, i)}
          onClick={() => {
            if (!segment.shut) onChange(segment.value)
          }}
        >
          {segment.label}
        </button>
      ))}
    </div>
  )
}
