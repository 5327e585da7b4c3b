import type { ReactNode } from 'react'
import { partWords } from '../../shared/messages/parts.ts'
import { Button } from './button.tsx'
import { useMedia } from './use-media.ts'

/** The filters of a list: open beside it, folded above it where the list stands below; says how many are in use. */
export function Filters({
  inUse,
  onShowAll,
  children,
}: {
  inUse: number
  onShowAll: () => void
  children: ReactNode
}) {
  const besideTheList = useMedia('(min-width: 901px)')
  return (
    <details className="fold" open={besideTheList}>
      <summary>{partWords.filters({ inUse })}</summary>
      <div className="stack gap-3">
        {children}
        {inUse > 0 ? (
          <p>
            <Button size="small" onClick={onShowAll}>
              {partWords.showAll}
            </Button>
          </p>
        ) : null}
      </div>
    </details>
  )
}
