import { useEffect, useSyncExternalStore } from 'react'
import { useMe } from './me.ts'
import { outbox } from './outbox.ts'
import type { OutboxNow } from './outbox.ts'
import type { OutboxItem } from './outbox-store.ts'

export interface MyOutbox extends Pick<OutboxNow, 'downSince' | 'durable'> {
  /** Entries of the signed-in person that the server does not have. */
  waiting: readonly OutboxItem[]
  refused: readonly OutboxItem[]
  struck: readonly OutboxItem[]
  /** How many entries of other people wait on this device until those sign in. */
  ofOthers: number
}

/** What waits on this device for the signed-in person. */
export function useOutbox(): MyOutbox {
  const { id } = useMe()
  const { items, downSince, durable } = useSyncExternalStore(outbox.subscribe, outbox.now)
  const own = items.filter((item) => item.personId === id)
  const ofOthers = items.filter((item) => item.personId !== id && item.state !== 'struck').length
  const of = (state: OutboxItem['state']) => own.filter((item) => item.state === state)
  return {
    waiting: of('waiting'),
    refused: of('refused'),
    struck: of('struck'),
    ofOthers,
    downSince,
    durable,
  }
}

const tryEveryMs = 15_000

/** Sends what waits, for as long as the person is signed in: at the start, when the signal returns, and now and then. */
export function useOutboxSending(): void {
  const { id } = useMe()
  useEffect(() => {
    const send = () => void outbox.flush(id)
    const gone = () => outbox.signal(false)
    const back = () => {
      outbox.signal(true)
      send()
    }
    const shown = () => {
      if (document.visibilityState === 'visible') send()
    }
    if (!navigator.onLine) gone()
    send()
    window.addEventListener('online', back)
    window.addEventListener('offline', gone)
    document.addEventListener('visibilitychange', shown)
    const timer = setInterval(() => {
      if (outbox.now().items.some((item) => item.personId === id && item.state === 'waiting')) send()
    }, tryEveryMs)
    return () => {
      clearInterval(timer)
      window.removeEventListener('online', back)
      window.removeEventListener('offline', gone)
      document.removeEventListener('visibilitychange', shown)
    }
  }, [id])
}
