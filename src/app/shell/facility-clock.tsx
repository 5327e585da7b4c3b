import { frameWords } from '../../../shared/messages/frame.ts'
import type { FacilityNow } from '../../lib/facility-time.ts'
import { longDay } from '../../ui/day-words.ts'

/** Facility time, which every time on a sheet is in. */
export function FacilityClock({ now }: { now: FacilityNow }) {
  return (
    <time className="facility-clock" dateTime={`${now.date}T${now.time}`} title={frameWords.facilityTime}>
      {now.time}
      <span>{longDay(now.date)}</span>
    </time>
  )
}
