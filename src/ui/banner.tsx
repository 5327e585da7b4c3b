import type { ReactNode } from 'react'
import type { LucideIcon } from 'lucide-react'
import { Icon } from './icon.tsx'

/** Across the whole sheet: signal lost, practice mode, read only. One drawing, at most one act. */
export function Banner({ icon, children, act }: { icon: LucideIcon; children: ReactNode; act?: ReactNode }) {
  return (
    <div className="banner" role="status">
      <Icon of={icon} />
      <span>{children}</span>
      {act}
    </div>
  )
}
