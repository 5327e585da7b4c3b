import { useEffect, useState } from 'react'
import { wallClockOf } from '../../shared/domain/time/facility-date.ts'
import type { Zone } from '../../shared/domain/time/instant.ts'

export interface FacilityNow {
  /** `YYYY-MM-DD` */
  date: string
  /** "14:20" */
  time: string
  /** Minutes after midnight. */
  minute: number
}

const checkEveryMs = 5_000

/** What the facility's wall clock shows at an instant. */
export function facilityNow(at: Date, zone: Zone): FacilityNow {
  const { date, time } = wallClockOf(at.toISOString(), zone)
  return { date, time: time.slice(0, 5), minute: Number(time.slice(0, 2)) * 60 + Number(time.slice(3, 5)) }
}

/** Facility time, to the minute, going on by itself. Draws again only when the minute changes. */
export function useFacilityNow(zone: Zone): FacilityNow {
  const [now, setNow] = useState(() => facilityNow(new Date(), zone))
  useEffect(() => {
    const look = () => {
      const next = facilityNow(new Date(), zone)
      setNow((before) => (before.time === next.time && before.date === next.date ? before : next))
    }
    look()
    const timer = setInterval(look, checkEveryMs)
    return () => clearInterval(timer)
  }, [zone])
  return now
}
