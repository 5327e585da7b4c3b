import type { ReactNode } from 'react'
import { History } from 'lucide-react'
import { Icon } from './icon.tsx'

/** A line the system read for itself: what is so, then where it is known from. Not a control. */
export function ComputedLine({ what, from }: { what: ReactNode; from: ReactNode }) {
  return (
    <p className="computed-line">
      <Icon of={History} />
      <span>
        <b>{what}</b>
        {', '}
        {from}
      </span>
    </p>
  )
}
