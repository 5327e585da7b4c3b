import { useId } from 'react'
import type { ComponentProps, ReactNode } from 'react'

/** A tick for what to include or show. Never ticked beforehand where it attests to a fact. */
export function Tick({
  label,
  hint,
  ...input
}: { label: ReactNode; hint?: ReactNode } & ComponentProps<'input'>) {
  const id = useId()
  return (
    <label className="tick">
      <input {...input} type="checkbox" aria-describedby={hint ? id : undefined} />
      <span>
        {label}
        {hint ? (
          <span id={id} className="hint block">
            {hint}
          </span>
        ) : null}
      </span>
    </label>
  )
}
