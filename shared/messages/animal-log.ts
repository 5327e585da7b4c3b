import type { DiscrepancyKind, DiscrepancyOutcome } from '../domain/animals/discrepancy.ts'
import { counted, defineMessages } from './define-messages.ts'

const animals = (count: number) => counted(count, 'animal', 'animals')
const because = (reason: string) => (reason ? `: ${reason}` : '')

/** Sentences of the log of one animal. Every parameter is in words already; `''` stands for what nobody said. */
export const animalLogWords = defineMessages({
  weighed: (p: { weight: string; basis: string; method: string; kept: string }) =>
    `Weight ${p.weight}, ${p.basis}${p.method ? `, ${p.method}` : ''}.${p.kept ? ` Kept because ${p.kept}.` : ''}`,
  weighedTogether: (p: { weight: string; count: number; basis: string }) =>
    `${animals(p.count)} weighed together, ${p.weight}, ${p.basis}.`,
  arrived: (p: { to: string; reason: string }) => `Came into ${p.to}${because(p.reason)}.`,
  moved: (p: { from: string; to: string; reason: string }) =>
    `Moved from ${p.from} to ${p.to}${because(p.reason)}.`,
  left: (p: { from: string; reason: string }) => `Left ${p.from}${because(p.reason)}.`,
  transferred: (p: { from: string; to: string; words: string }) =>
    `Documented transfer from ${p.from} to ${p.to}: ${p.words}.`,
  movedAgainst: (p: { from: string; to: string; reason: string }) =>
    `Moved from ${p.from} to ${p.to} against the rule${because(p.reason)}.`,
  died: (p: { how: string; state: string; note: string }) =>
    `${p.how}${p.state ? `, ${p.state}` : ''}${because(p.note)}.`,
  diedMore: (p: { seen: number; posted: number; how: string }) =>
    `${String(p.seen)} ${p.how}; the ledger had ${String(p.posted)}.`,
  counted: (p: { change: string; delta: string; reason: string }) =>
    `${p.change}, ${p.delta}${because(p.reason)}.`,
  countedWith: (p: { change: string; delta: string; other: string }) =>
    `${p.change}, ${p.delta}, ${p.other}.`,
  statedCount: (p: { count: number }) => `Counted: ${animals(p.count)}.`,
  statedEstimate: (p: { low: number; high: number }) => `Estimated: ${String(p.low)} to ${animals(p.high)}.`,
  described: (p: { taxon: string; name: string; sex: string; stage: string; reason: string }) =>
    `Described as ${p.taxon}${p.name ? `, ${p.name}` : ''}, ${p.sex}, ${p.stage}${because(p.reason)}.`,
  mayBeFood: (p: { reason: string }) => `May be eaten or set free${because(p.reason)}.`,
  neverFood: (p: { reason: string }) => `Never eaten and never set free${because(p.reason)}.`,
  marked: (p: { mark: string; value: string; place: string }) =>
    `Mark recorded: ${p.mark} ${p.value}${p.place ? `, ${p.place}` : ''}.`,
  markEnded: (p: { mark: string; value: string; reason: string }) =>
    `${p.mark} ${p.value} no longer there: ${p.reason}.`,
  quarantined: (p: { source: string }) => `In quarantine: ${p.source}.`,
  heldStill: (p: { source: string; reason: string }) => `Held, no movement, ${p.source}: ${p.reason}.`,
  freed: (p: { source: string; reason: string }) => `Free to move again, ${p.source}: ${p.reason}.`,
  opened: (p: { what: string; role: string }) => `To be explained by a ${p.role}: ${p.what}`,
  resolved: (p: { outcome: string; reason: string }) => `Explained, ${p.outcome}: ${p.reason}.`,
  struck: (p: { reason: string }) => `Struck out: ${p.reason}`,
  today: 'Today',
})

/** What does not fit, in short. */
export const discrepancyNames = defineMessages({
  'more-than-counted': 'more than the ledger had.',
  'moved-under-lock': 'moved while it was held.',
  'moved-before-lock': 'a move before a hold, entered after it.',
  'crossed-boundary': 'moved over its quarantine boundary.',
  'place-contradicted': 'gone at a time at which later moves have it elsewhere.',
  'identifier-twice': 'one mark read on two animals.',
  'count-differs': 'a count that differs from the ledger.',
  'dose-amount-differs': 'another amount given than was signed and worked out.',
  'dose-of-other-product': 'another product given than was ordered.',
  'dosed-in-absence': 'a dose recorded while it was not in that water.',
  'dose-under-broken-order': 'a dose recorded under an order that is not what was signed.',
  'end-before-dose': 'an end of a bath recorded for a time before it began.',
  'left-before-withdrawal': 'left before its wait after a dose was over.',
  'died-elsewhere': 'found dead where it was not.',
} satisfies Record<DiscrepancyKind, string>)

export const outcomeNames = defineMessages({
  'count-corrected': 'the ledger corrected',
  'seen-wrongly': 'recorded by mistake',
  explained: 'as the reason says',
} satisfies Record<DiscrepancyOutcome, string>)

interface Facts {
  said: (key: string) => string
}

/** "Moved from QT-1 to RP-2"; without an end where it came into the house or left it. */
const moved = (p: Facts) =>
  [
    p.said('from') === '' && p.said('to') !== '' ? 'Came' : p.said('to') === '' ? 'Left the house' : 'Moved',
    ...(p.said('from') === '' ? [] : [`from ${p.said('from')}`]),
    ...(p.said('to') === '' ? [] : [`to ${p.said('to')}`]),
  ].join(' ')
/** The cases whose lock it was, where they are known. */
const by = (p: Facts) => (p.said('by') === '' ? '' : ` (${p.said('by')})`)

/** The whole story of a discrepancy, for whoever explains it. */
export const discrepancySentences = defineMessages({
  'more-than-counted': (p) => `${p.said('seen')} were seen, ${p.said('posted')} were in the ledger.`,
  'moved-under-lock': (p) => `${moved(p)} while it or the water was held${by(p)}: ${p.said('reason')}`,
  'moved-before-lock': (p) =>
    `${moved(p)}, before a hold began${by(p)}, but entered after it: ${p.said('reason')}`,
  'crossed-boundary': (p) => `${moved(p)}, over the quarantine boundary${by(p)}: ${p.said('reason')}`,
  'place-contradicted': () =>
    'The last of it left at a time at which later moves still have it in an enclosure.',
  'identifier-twice': (p) => `${p.said('value')} was also read on ${p.said('other')}: ${p.said('reason')}`,
  'count-differs': (p) =>
    p.said('low') === p.said('high')
      ? `${p.said('low')} were counted, ${p.said('ledger')} are in the ledger.`
      : `${p.said('low')} to ${p.said('high')} were estimated, ${p.said('ledger')} are in the ledger.`,
  'dose-amount-differs': (p) =>
    `Dose ${p.said('key')} of ${p.said('order')}: ${p.said('given')} was recorded as given. Signed: ${p.said('signed')}. Worked out for the water then: ${p.said('workedOut')}.`,
  'dose-of-other-product': (p) =>
    `Dose ${p.said('key')} of ${p.said('order')}: lot ${p.said('lot')} was recorded, which is ${p.said('product')} and not what was ordered.`,
  'dosed-in-absence': (p) =>
    `Dose ${p.said('key')} of ${p.said('order')} was recorded as given in ${p.said('enclosure')}; by the register no animal of the order was in that water then.`,
  'dose-under-broken-order': (p) =>
    `Dose ${p.said('key')} of ${p.said('order')}: ${p.said('given')} was recorded as given, and the signed order cannot be relied on: its text, or what is stored beside it, is not what was signed. Find out what was meant and what the animals were given.`,
  'end-before-dose': (p) =>
    `Dose ${p.said('key')} of ${p.said('order')}: an end was recorded for a time before the dose went in. It ends nothing. Find out when the animals were in the bath, and have the real end recorded.`,
  'left-before-withdrawal': (p) =>
    `Left (${p.said('cause')}) before ${p.said('until')}, until when it had to wait after ${p.said('drug')} of ${p.said('order')}. Find out whether it may have been eaten, and tell whoever has it.`,
  'died-elsewhere': (p) =>
    p.said('place') === ''
      ? `${p.said('seen')} found dead in ${p.said('enclosure')}; by the register it was in no enclosure of the house then. A move was not recorded, or the number is another animal’s.`
      : `${p.said('seen')} found dead in ${p.said('enclosure')}; by the register it was in ${p.said('place')} then. A move was not recorded, or the number is another animal’s.`,
} satisfies Record<DiscrepancyKind, (p: Facts) => string>)
