import { useEffect, useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { useMe } from '../../lib/me.ts'
import { usePreference } from '../../lib/preferences.ts'
import { todayQuery } from '../../lib/today-query.ts'
import type { dueItemsOf } from '../../features/today/index.ts'
import type { DueItem } from '../../ui/hour-ruler-geometry.ts'

/**
 * What stands on the hour ruler: the due items of the lanes chosen on Today, from the same answer that Today draws.
 * `null` while there is none yet; the ruler is then not drawn, because an empty one would say that nothing is due.
 *
 * The words for it come after the first screen, which they would make slow.
 */
export function useDueToday(): readonly DueItem[] | null {
  const me = useMe()
  const preferred = usePreference('todayLane')
  const { data } = useQuery({ ...todayQuery, enabled: !me.mustChangePassword })
  const [makeItems, setMakeItems] = useState<{ of: typeof dueItemsOf } | null>(null)
  useEffect(() => {
    let wanted = true
    import('../../features/today/index.ts').then(
      (feature) => {
        if (wanted) setMakeItems({ of: feature.dueItemsOf })
      },
      // without a signal the ruler stays away; the next load of the page tries again
      () => undefined,
    )
    return () => {
      wanted = false
    }
  }, [])
  if (!data || !makeItems) return null
  return makeItems.of(data, { zone: me.facility.zone, roles: me.roles, preferred })
}
