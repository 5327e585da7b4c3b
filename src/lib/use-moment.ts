import { useState } from 'react'
import { clientWords } from '../../shared/messages/client.ts'
import { sayInstantWithOffset } from '../../shared/messages/say-date.ts'
import { instantOfMoment, localMomentOf } from './local-moment.ts'
import { useMe } from './me.ts'

/**
 * The "when" of a form: opens on now, facility time, and gives the instant that is meant.
 *
 * @param now the instant that it opens on, where it is known better than by the device's clock
 */
export function useMoment(now?: string) {
  const { zone } = useMe().facility
  const [opened] = useState(() => now ?? new Date().toISOString())
  const [moment, setMoment] = useState(() => localMomentOf(opened, zone))
  // While the minute stands as it opened, the instant is the one of opening, seconds and all
  const instant = moment === localMomentOf(opened, zone) ? opened : instantOfMoment(moment, zone)
  return {
    zone,
    moment,
    setMoment,
    instant,
    missing: instant === null ? clientWords.typeTime : undefined,
    /** The moment in words: browsers write days and months in either order. */
    inWords: instant === null ? undefined : sayInstantWithOffset(instant, zone),
  }
}

export type Moment = ReturnType<typeof useMoment>
