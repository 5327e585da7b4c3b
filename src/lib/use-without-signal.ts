import { useEffect } from 'react'

const register = () => {
  // refused in private windows and on addresses without TLS; then a reload needs a signal, entries are kept all the same
  navigator.serviceWorker.register('/service-worker.js').catch(() => undefined)
}

/**
 * Lets this device open the application without a signal from now on: see src/service-worker.js. Everybody who is signed
 * in gets it, whichever sheet they open first, once that sheet is drawn.
 */
export function useWithoutSignal(): void {
  useEffect(() => {
    if (!import.meta.env.PROD || !('serviceWorker' in navigator)) return
    if ('requestIdleCallback' in window) {
      const waiting = window.requestIdleCallback(register, { timeout: 5000 })
      return () => window.cancelIdleCallback(waiting)
    }
    const waiting = setTimeout(register, 2000)
    return () => clearTimeout(waiting)
  }, [])
}
