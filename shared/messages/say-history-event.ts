import type { History, HistoryEvent, HistoryOrigin } from '../contracts/exports.contract.ts'
import { isDeathKind } from '../domain/ledger/count-entry.ts'
import { birthKindNames, historyWords as words, portTitles } from './history.ts'
import { sourceCodeNames } from './register-kinds.ts'
import { sayDate, sayTime } from './say-date.ts'

/** An enclosure as people call it: `QT-3, Quarantine tank 3`. */
export function sayPlace(place: { code: string; name: string } | null): string | null {
  return place === null ? null : `${place.code}, ${place.name}`
}

/** When it happened, as exactly as it is known; with the time of day where that is. */
export function sayWhen(event: Pick<HistoryEvent, 'on' | 'at' | 'exact'>, zone: string): string {
  return event.exact ? `${sayDate(event.on)}, ${sayTime(event.at, zone)}` : sayDate(event.on)
}

/** What happened, in a few words: the name of a port of the passage. */
export function sayEventTitle(event: HistoryEvent): string {
  const title = portTitles[event.kind as keyof typeof portTitles]
  return title({
    party: event.counterparty,
    other: event.otherAccession,
    from: event.from?.code ?? null,
    to: event.to?.code ?? null,
  })
}

/** Everything else that is known of an event, one short sentence each. */
export function sayEventDetails(event: HistoryEvent): string[] {
  const { found, sourceCode } = event
  const isMove = event.kind === 'move'
  return [
    found === null
      ? null
      : event.kind === 'counted'
        ? words.foundCounted({ low: found.low })
        : words.foundEstimated(found),
    event.delta === 0 || event.voided
      ? null
      : words.ofAnimals({ delta: event.delta, after: event.countAfter }),
    event.from === null || isMove
      ? null
      : words[isDeathKind(event.kind) ? 'diedIn' : 'leftFrom']({ place: sayPlace(event.from) ?? '' }),
    event.to === null || isMove ? null : words.placedAt({ place: sayPlace(event.to) ?? '' }),
    sitePhrase(event.site),
    event.transaction === null ? null : words.transaction({ number: event.transaction }),
    event.reference === null ? null : words.reference({ reference: event.reference }),
    event.theirNumber === null ? null : words.theirNumber({ number: event.theirNumber }),
    event.transport,
    event.deadOnArrival === null ? null : words.deadOnArrival({ count: event.deadOnArrival }),
    sourceCode === null
      ? null
      : words.source({ source: sourceCodeNames[sourceCode as keyof typeof sourceCodeNames] }),
    event.note,
    event.voided === null ? null : words.struck({ reason: event.voided.reason }),
  ].filter((sentence) => sentence !== null)
}

/** Where animals were released, with the position where that is known. */
function sitePhrase(site: HistoryEvent['site']): string | null {
  if (!site) return null
  const { locality, latitude, longitude, uncertaintyMetres: uncertainty } = site
  const position =
    latitude === null || longitude === null ? null : words.coordinates({ latitude, longitude, uncertainty })
  return words.site({ where: [locality, position].filter((part) => part !== null).join(', ') })
}

/** What is known of the time before it was kept here. */
export function sayOrigin(origin: HistoryOrigin): { title: string; details: string[] } {
  const title =
    origin.kind === 'born'
      ? words.born({
          kind: origin.birthKind === null ? birthKindNames.born : birthKindNames[origin.birthKind],
          on: origin.on ?? '',
          approximate: origin.approximate,
        })
      : origin.on === null
        ? words.collected
        : words.collectedOn({ on: origin.on })
  const { latitude, longitude } = origin
  const details = [
    origin.locality,
    origin.method,
    latitude === null || longitude === null
      ? null
      : words.coordinates({ latitude, longitude, uncertainty: origin.uncertaintyMetres }),
  ]
  return { title, details: details.filter((detail) => detail !== null) }
}

/** The period that a history covers. */
export function sayPeriod({ from, until }: Pick<History, 'from' | 'until'>): string {
  if (from !== null && until !== null) return words.periodBoth({ from, until })
  if (from !== null) return words.periodFrom({ from })
  return until !== null ? words.periodUntil({ until }) : words.periodAll
}

/** How many there are now, as honestly as it is known. */
export function sayCount({ count }: Pick<History, 'count'>): string {
  return count.low === null || count.high === null
    ? words.countCounted(count)
    : words.countEstimated({ ledger: count.ledger, low: count.low, high: count.high })
}

/** A signed change of a count, with a true minus and a no-break space. */
export function sayChange(delta: number): string {
  return delta === 0 ? '' : `${delta < 0 ? '−' : '+'}\u00a0${Math.abs(delta).toLocaleString('en-GB')}`
}
