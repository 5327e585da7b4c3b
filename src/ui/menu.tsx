import { useEffect, useId, useRef, useState } from 'react'
import type { KeyboardEvent, ReactNode } from 'react'
import { classNames } from './class-names.ts'

/**
 * A button with a menu under it. Arrows, Home, End and first letters move; Esc and leaving it close it. Its items are
 * links and buttons with `role="menuitem"` or `menuitemradio`.
 */
export function Menu({
  label,
  face,
  buttonClass = 'ghost',
  side = 'right',
  className,
  children,
}: {
  /** Name of the button for readers, when its face does not say it. */
  label?: string
  face: ReactNode
  buttonClass?: string
  side?: 'left' | 'right'
  className?: string
  children: (close: () => void) => ReactNode
}) {
  const id = useId()
  const [open, setOpen] = useState(false)
  const button = useRef<HTMLButtonElement>(null)
  const list = useRef<HTMLDivElement>(null)

  const items = () => [...(list.current?.querySelectorAll<HTMLElement>('[role^="menuitem"]') ?? [])]
  const close = (back = true) => {
    setOpen(false)
    if (back) button.current?.focus()
  }

  useEffect(() => {
    if (!open) return
    items()[0]?.focus()
    const outside = (event: MouseEvent) => {
      const target = event.target as Node
      if (!list.current?.contains(target) && !button.current?.contains(target)) setOpen(false)
    }
    document.addEventListener('mousedown', outside)
    return () => document.removeEventListener('mousedown', outside)
  }, [open])

  const onKeyDown = (event: KeyboardEvent) => {
    const all = items()
    const at = all.indexOf(document.activeElement as HTMLElement)
    const to = {
      ArrowDown: (at + 1) % all.length,
      ArrowUp: (at - 1 + all.length) % all.length,
      Home: 0,
      End: all.length - 1,
    }[event.key]
    if (to !== undefined) {
      event.preventDefault()
      all[to]?.focus()
    } else if (event.key === 'Escape') {
      event.preventDefault()
      event.stopPropagation()
      close()
    } else if (event.key === 'Tab') {
      setOpen(false)
    } else if (event.key.length === 1 && /\S/.test(event.key)) {
      const after = [...all.slice(at + 1), ...all.slice(0, at + 1)]
      after
        .find((item) => item.textContent?.trim().toLowerCase().startsWith(event.key.toLowerCase()))
        ?.focus()
      event.stopPropagation()
    }
  }

  return (
    <div className="menu-anchor">
      <button
        ref={button}
        type="button"
        className={buttonClass}
        aria-haspopup="menu"
        aria-expanded={open}
        aria-controls={open ? id : undefined}
        aria-label={label}
        onClick={() => setOpen(!open)}
        onKeyDown={(event) => {
          if (event.key === 'ArrowDown' && !open) {
            event.preventDefault()
            setOpen(true)
          }
        }}
      >
        {face}
      </button>
      {open ? (
        <div
          ref={list}
          id={id}
          role="menu"
          aria-label={label}
          className={classNames('menu', side === 'left' && 'menu-left', className)}
          onKeyDown={onKeyDown}
        >
          {children(() => close(false))}
        </div>
      ) : null}
    </div>
  )
}
