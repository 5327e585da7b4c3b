import type { ReactNode } from 'react'
import { useModal } from './use-modal.ts'

/** A side area that comes in over the sheet and goes back with Esc. */
export function Drawer({
  label,
  onBack,
  children,
}: {
  label: string
  onBack: () => void
  children: ReactNode
}) {
  const dialog = useModal(onBack)
  return (
    <dialog ref={dialog} className="drawer" aria-label={label}>
      {children}
    </dialog>
  )
}
