import { useEffect } from 'react'

/** Lets this device open the application without a signal from now on: see src/service-worker.js. */
export function useWithoutSignal(): void {
  useEffect(() => {
    if (!import.meta.env.PROD || !('serviceWorker' in navigator)) return
    // refused in private windows and on addresses without TLS; then a reload needs a signal, entries are kept all the same
    navigator.serviceWorker.register('/service-worker.js').catch(() => undefined)
  }, [])
}
