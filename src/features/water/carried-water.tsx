import { benchCarryWords as words } from '../../../shared/messages/bench-carry.ts'
import { saidHead, saidNote } from '../../lib/bench-carry.ts'
import type { CarryTo } from '../../lib/bench-carry.ts'
import { FromBench } from '../../ui/from-bench.tsx'

const isStated = ({ sheet }: CarryTo<'volume'>) => sheet.method === 'stated'

/** The note of a volume from the bench: a sheet of measures has its own working, a stated figure has none. */
export const noteOfCarried = (carried: CarryTo<'volume'>): string =>
  isStated(carried) ? saidNote(carried.said) : saidHead(carried.said)

/** What came from the bench into the form of a volume. */
export function CarriedVolume({ carried }: { carried: CarryTo<'volume'> }) {
  const { said } = carried
  return (
    <FromBench
      head={saidHead(said)}
      says={isStated(carried) ? words.inVolumeStated : words.inVolume}
      inputs={said.inputs}
      working={said.working}
    />
  )
}

/**
 * What came from the bench into the form of readings.
 *
 * @param isIn the figure stands in its field; otherwise its unit is none that the parameter is entered in
 */
export function CarriedReading({ carried, isIn }: { carried: CarryTo<'reading'>; isIn: boolean }) {
  const { said } = carried
  return (
    <FromBench
      head={saidHead(said)}
      says={isIn ? words.inReading : words.inReadingNot}
      inputs={said.inputs}
      working={said.working}
    />
  )
}
