import { type Result, ok, refuse } from '../result.ts'
import type { ObservationSaid } from './observation.ts'

export type ObservationRefusal =
  'nothing-said' | 'count-reversed' | 'urgent-without-words' | 'more-named-than-found'

/** Whether one thing at least has been said, so that there is something to save. */
export function isSomethingSaid(said: ObservationSaid): boolean {
  const { lookedAt, feeding, breathing, skin, signs, words, count, foundDead, unwell, handled } = said
  return (
    lookedAt ||
    feeding !== null ||
    breathing !== null ||
    skin !== null ||
    signs.length > 0 ||
    (words ?? '').trim() !== '' ||
    count !== null ||
    foundDead !== null ||
    unwell !== null ||
    handled !== null
  )
}

/**
 * Whether an observation can be kept as it is. Facts are not judged here: three bodies where two animals are held is
 * kept all the same.
 *
 * @param namedDead bodies of which it was said whose they are
 * @refuses nothing-said | count-reversed | urgent-without-words (a call for help has to say what is seen: words or a
 * sign) | more-named-than-found
 */
export function checkObservation(
  said: ObservationSaid,
  namedDead: number,
): Result<ObservationSaid, ObservationRefusal> {
  if (!isSomethingSaid(said)) return refuse('nothing-said')
  const { count } = said
  if (count && count.basis !== 'not-counted') {
    if (count.high < count.low || (count.basis === 'counted' && count.high !== count.low))
      return refuse('count-reversed', 'count/high', { low: count.low, high: count.high })
  }
  if (said.urgent && (said.words ?? '').trim() === '' && said.signs.length === 0)
    return refuse('urgent-without-words', 'words')
  if (namedDead > (said.foundDead ?? 0))
    return refuse('more-named-than-found', 'deaths', { named: namedDead, found: said.foundDead ?? 0 })
  return ok(said)
}
