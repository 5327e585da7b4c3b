import type { ReactNode } from 'react'
import { Check } from 'lucide-react'
import { classNames } from './class-names.ts'
import { Icon } from './icon.tsx'

/** A state in words. `late` is magenta, for what is overdue; `done` carries a check; colour is never alone. */
export function Tag({
  kind = 'plain',
  children,
}: {
  kind?: 'plain' | 'solid' | 'late' | 'done'
  children: ReactNode
}) {
  return (
    <span className={classNames('tag', kind !== 'plain' && `tag-${kind}`)}>
      {kind === 'done' ? <Icon of={Check} /> : null}
      {children}
    </span>
  )
}
