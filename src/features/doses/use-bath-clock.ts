import { useEffect, useState } from 'react'
import { serverOffsetMs } from './timer-model.ts'

const tickMs = 250

/**
 * The server's time, going on by itself between its replies.
 *
 * @param serverNow  the server's time in its last reply
 * @param receivedMs when that reply came, by the device's clock
 */
export function useServerMs(serverNow: string, receivedMs: number): number {
  const offsetMs = serverOffsetMs(serverNow, receivedMs)
  const [deviceMs, setDeviceMs] = useState(() => Date.now())
  useEffect(() => {
    const timer = setInterval(() => setDeviceMs(Date.now()), tickMs)
    return () => clearInterval(timer)
  }, [])
  // a reply that came after the last tick must not turn the clock back
  return Math.max(deviceMs, receivedMs) + offsetMs
}

/** Keeps the screen lit while a bath runs, where the device allows it. It is given back when the sheet goes. */
export function useWakeLock(): void {
  useEffect(() => {
    let lock: WakeLockSentinel | null = null
    let isOver = false
    const ask = async () => {
      if (!('wakeLock' in navigator) || document.visibilityState !== 'visible') return
      try {
        const got = await navigator.wakeLock.request('screen')
        if (isOver) await got.release()
        else lock = got
      } catch {
        // low battery or a setting of the device; the timer does not depend on it
      }
    }
    const again = () => void ask()
    again()
    document.addEventListener('visibilitychange', again)
    return () => {
      isOver = true
      document.removeEventListener('visibilitychange', again)
      void lock?.release()
    }
  }, [])
}
