import { useEffect, useRef } from 'react'
import type { RefObject } from 'react'

const focusable = 'button, a[href], input, select, textarea, [tabindex="0"]'

/**
 * Opens a native dialog while it is mounted and gives the focus back when it goes. The browser holds the focus inside
 * and makes the rest inert.
 *
 * @param onBack called for Esc and for a press beside the dialog; the caller decides whether to go
 */
export function useModal(onBack: () => void): RefObject<HTMLDialogElement | null> {
  const dialog = useRef<HTMLDialogElement>(null)
  const back = useRef(onBack)
  back.current = onBack

  useEffect(() => {
    const node = dialog.current
    if (!node) return
    const before = document.activeElement
    if (!node.open) node.showModal()
    const first = node.querySelector<HTMLElement>('[data-first-focus]')
    if (first) first.focus()
    else if (!node.contains(document.activeElement)) node.querySelector<HTMLElement>(focusable)?.focus()
    const onCancel = (event: Event) => {
      event.preventDefault()
      back.current()
    }
    // the browser closes by itself at the second Esc, whatever the page says; only our own state may close it
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key !== 'Escape' || event.defaultPrevented) return
      event.preventDefault()
      event.stopPropagation()
      back.current()
    }
    const onMouseDown = (event: MouseEvent) => {
      if (event.target === node) back.current()
    }
    node.addEventListener('cancel', onCancel)
    node.addEventListener('keydown', onKeyDown)
    node.addEventListener('mousedown', onMouseDown)
    return () => {
      node.removeEventListener('cancel', onCancel)
      node.removeEventListener('keydown', onKeyDown)
      node.removeEventListener('mousedown', onMouseDown)
      if (node.open) node.close()
      if (before instanceof HTMLElement && before.isConnected) before.focus()
    }
  }, [])
  return dialog
}
