import type { History, HistoryEvent } from '../../../shared/contracts/exports.contract.ts'
import { historyWords as words } from '../../../shared/messages/history.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import {
  sayEventDetails,
  sayEventTitle,
  sayOrigin,
  sayPlace,
  sayWhen,
} from '../../../shared/messages/say-history-event.ts'

/** One port of the passage that an animal's custody is drawn as. */
export interface Port {
  key: string
  when: string
  title: string
  details: string[]
  /** `now` is where it is; `made` lies behind it; `struck` was entered wrongly. */
  state: 'now' | 'made' | 'struck'
  papers: HistoryEvent['documents']
  permits: HistoryEvent['permits']
  transaction: string | null
}

const none = { papers: [], permits: [], transaction: null }

/**
 * The custody of an animal as ports, the newest first: where it is now, everything that happened, and what is known of
 * the time before it came. What was counted on the way is no port; it stands in the ledger below.
 */
export function portsOf(history: History, zone: string): Port[] {
  const now: Port[] =
    history.place === null
      ? []
      : [
          {
            key: 'now',
            when: words.now,
            title: sayPlace(history.place) ?? words.outside,
            details: [words.countCounted({ ledger: history.count.ledger })],
            state: 'now',
            ...none,
          },
        ]
  const events = history.events
    .filter((event) => event.found === null)
    .map((event): Port => {
      return {
        key: event.eventId,
        when: sayWhen(event, zone),
        title: sayEventTitle(event),
        details: sayEventDetails(event),
        state: event.voided ? 'struck' : 'made',
        papers: event.documents,
        permits: event.permits,
        transaction: event.transaction,
      }
    })
    .reverse()
  const before = history.origins
    .map((origin, i): Port => {
      const { title, details } = sayOrigin(origin)
      return {
        key: `before-${String(i)}`,
        when: origin.on === null ? '' : sayDate(origin.on),
        title,
        details: details.length > 0 ? [details.join('; ')] : [],
        state: 'made',
        ...none,
      }
    })
    .reverse()
  return [...now, ...events, ...before]
}
