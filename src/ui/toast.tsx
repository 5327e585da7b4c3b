import { useCallback, useEffect, useRef, useState } from 'react'
import type { ReactNode } from 'react'
import { Check, X } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { Icon } from './icon.tsx'
import { ToastContext } from './toast-context.ts'
import type { ToastWords } from './toast-context.ts'

const shownForMs = 6000

/** Holds the toasts of the application. They wait while the pointer or the focus is on one. */
export function ToastProvider({ children }: { children: ReactNode }) {
  const [toasts, setToasts] = useState<(ToastWords & { key: number })[]>([])
  const next = useRef(0)

  const say = useCallback((toast: ToastWords) => {
    next.current += 1
    const key = next.current
    setToasts((before) => [...before.slice(-2), { ...toast, key }])
  }, [])
  const drop = useCallback((key: number) => setToasts((all) => all.filter((toast) => toast.key !== key)), [])

  return (
    <ToastContext value={say}>
      <div className="toasts" role="status" aria-live="polite">
        {toasts.map((toast) => (
          <Toast key={toast.key} toast={toast} onGone={() => drop(toast.key)} />
        ))}
      </div>
      {children}
    </ToastContext>
  )
}

/** One toast, as it stands. Used by the provider, and by the page of parts. */
export function Toast({ toast, onGone }: { toast: ToastWords; onGone: () => void }) {
  const [held, setHeld] = useState(false)
  const gone = useRef(onGone)
  gone.current = onGone
  useEffect(() => {
    if (held) return
    const timer = setTimeout(() => gone.current(), shownForMs)
    return () => clearTimeout(timer)
  }, [held])
  return (
    <div
      className="toast"
      onMouseEnter={() => setHeld(true)}
      onMouseLeave={() => setHeld(false)}
      onFocus={() => setHeld(true)}
      onBlur={() => setHeld(false)}
    >
      <Icon of={Check} />
      <span>{toast.words}</span>
      {toast.act ? (
        <button
          type="button"
          onClick={() => {
            toast.act?.run()
            onGone()
          }}
        >
          {toast.act.words}
        </button>
      ) : null}
      <button type="button" aria-label={partWords.close} onClick={onGone}>
        <Icon of={X} />
      </button>
    </div>
  )
}
