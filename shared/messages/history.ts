import type { BirthKind, IdentifierKind, LifeStage, Sex } from '../domain/animals/description.ts'
import type { History } from '../contracts/exports.contract.ts'
import { counted, defineMessages } from './define-messages.ts'
import { sayDate, sayInstant } from './say-date.ts'

export const sexNames = defineMessages({
  female: 'female',
  male: 'male',
  hermaphrodite: 'hermaphrodite',
  mixed: 'both sexes',
  unknown: 'sex not known',
} satisfies Record<Sex, string>)

export const lifeStageNames = defineMessages({
  egg: 'egg',
  larva: 'larva',
  fry: 'fry',
  juvenile: 'juvenile',
  subadult: 'subadult',
  adult: 'adult',
  mixed: 'several stages',
  unknown: 'stage not known',
} satisfies Record<LifeStage, string>)

export const birthKindNames = defineMessages({
  hatched: 'Hatched',
  born: 'Born',
  propagated: 'Propagated',
} satisfies Record<BirthKind, string>)

export const identifierKindNames = defineMessages({
  transponder: 'Transponder',
  ring: 'Ring or band',
  'flipper-tag': 'Flipper tag',
  'external-tag': 'External tag',
  'visible-implant': 'Visible implant',
  'fin-clip': 'Fin clip',
  'natural-marks': 'Natural marks',
  other: 'Other mark',
} satisfies Record<IdentifierKind, string>)

const animals = (count: number) => counted(count, 'animal', 'animals')
const degrees = (value: number, positive: string, negative: string) =>
  `${String(Math.abs(value))}°\u00a0${value < 0 ? negative : positive}`
const party = (name: string | null) => name ?? 'a party not named'

/** What a port of the passage says: one sentence for each kind of event. */
export const portTitles = defineMessages({
  'wild-collection': (p: { party: string | null }) =>
    p.party === null ? 'Collected and received here' : `Collected by ${p.party} and received here`,
  purchase: (p: { party: string | null }) => `Bought from ${party(p.party)}`,
  'donation-in': (p: { party: string | null }) => `Given by ${party(p.party)}`,
  'birth-or-hatch': () => 'Born or hatched here',
  propagation: () => 'Propagated here',
  'loan-in': (p: { party: string | null }) => `On loan from ${party(p.party)}`,
  'transfer-in': (p: { party: string | null }) => `Transferred from ${party(p.party)}`,
  rescue: (p: { party: string | null }) =>
    p.party === null
      ? 'Rescued or stranded, taken in'
      : `Rescued or stranded, brought by ${p.party}, taken in`,
  confiscation: (p: { party: string | null }) => `Confiscated, placed here by ${party(p.party)}`,
  'exchange-in': (p: { party: string | null }) => `Exchanged with ${party(p.party)}, received`,
  found: (p: { party: string | null }) =>
    p.party === null ? 'Found, origin not known' : `Found, brought by ${p.party}, origin not known`,
  'split-in': (p: { other: string | null }) => `Taken out of ${p.other ?? 'another group'}`,
  'merge-in': (p: { other: string | null }) => `Joined by ${p.other ?? 'another group'}`,
  'transfer-out': (p: { party: string | null }) => `Transferred to ${party(p.party)}`,
  'loan-out': (p: { party: string | null }) => `Lent to ${party(p.party)}`,
  'loan-returned': (p: { party: string | null }) => `Returned to ${party(p.party)}`,
  sale: (p: { party: string | null }) => `Sold to ${party(p.party)}`,
  'donation-out': (p: { party: string | null }) => `Given to ${party(p.party)}`,
  'exchange-out': (p: { party: string | null }) => `Exchanged with ${party(p.party)}, sent`,
  release: (p: { party: string | null }) =>
    p.party === null ? 'Released to the wild' : `Released to the wild with ${p.party}`,
  death: () => 'Death',
  euthanasia: () => 'Euthanasia',
  escape: () => 'Escaped',
  theft: () => 'Stolen',
  'lost-from-count': () => 'Lost from count',
  'split-out': (p: { other: string | null }) => `Taken out as ${p.other ?? 'another group'}`,
  'merge-out': (p: { other: string | null }) => `Joined to ${p.other ?? 'another group'}`,
  'count-adjustment': () => 'Count adjusted',
  move: (p: { from: string | null; to: string | null }) =>
    p.from === null
      ? `Came to ${p.to ?? 'a place not named'}`
      : p.to === null
        ? `Left ${p.from}`
        : `Moved from ${p.from} to ${p.to}`,
  counted: () => 'Counted',
  estimated: () => 'Estimated',
} satisfies Record<
  string,
  (p: { party: string | null; other: string | null; from: string | null; to: string | null }) => string
>)

/** Words of a history, on the screen and on the page alike. */
export const historyWords = defineMessages({
  title: 'Acquisition history',
  titled: (p: { accession: string }) => `Acquisition history of ${p.accession}`,
  heldAs: 'Held as',
  owned: 'owned',
  'loan-in': 'on loan in',
  'loan-out': 'on loan out',
  gone: 'no longer held',
  owner: 'Owner',
  ourselves: (p: { facility: string }) => p.facility,
  since: 'In the collection since',
  nothingYet: 'not yet',
  place: 'Place',
  outside: 'outside the house',
  count: 'Animals now',
  countCounted: (p: { ledger: number }) => animals(p.ledger),
  countEstimated: (p: { ledger: number; low: number; high: number }) =>
    `${p.low.toLocaleString('en-GB')} to ${p.high.toLocaleString('en-GB')}, estimated; ledger ${p.ledger.toLocaleString('en-GB')}`,
  period: 'Period',
  periodAll: 'from the beginning until now',
  periodFrom: (p: { from: string }) => `from ${sayDate(p.from)}`,
  periodUntil: (p: { until: string }) => `until ${sayDate(p.until)}`,
  periodBoth: (p: { from: string; until: string }) => `${sayDate(p.from)} to ${sayDate(p.until)}`,
  opening: 'Before the period',
  gained: 'Gained',
  lost: 'Lost',
  closing: 'At its end',
  entries: (p: { count: number }) => counted(p.count, 'entry', 'entries'),
  balance: 'Balance',
  balanceSentence: (p: { opening: number; gained: number; lost: number; closing: number }) =>
    `${String(p.opening)} + ${String(p.gained)} − ${String(p.lost)} = ${String(p.closing)}`,
  custody: 'Custody',
  before: 'Before it came',
  born: (p: { kind: string; on: string; approximate: boolean }) =>
    `${p.kind}${p.approximate ? ' about' : ''} ${sayDate(p.on)}`,
  collected: 'Collected',
  collectedOn: (p: { on: string }) => `Collected ${sayDate(p.on)}`,
  coordinates: (p: { latitude: number; longitude: number; uncertainty: number | null }) =>
    `${degrees(p.latitude, 'N', 'S')}, ${degrees(p.longitude, 'E', 'W')} (WGS\u00a084)${p.uncertainty === null ? '' : `, within ${String(p.uncertainty)}\u00a0m`}`,
  ledger: 'Count ledger',
  date: 'Date',
  event: 'What happened',
  change: 'Change',
  after: 'Count',
  sum: 'Sum of the period',
  byKind: 'Sums by kind',
  kind: 'Kind',
  lines: 'Lines',
  identifiers: 'Identifiers',
  identifier: 'Identifier',
  value: 'Value',
  validFrom: 'Valid from',
  validUntil: 'Valid to',
  inUse: 'in use',
  accessionNumber: 'Accession number',
  givenHere: 'given here',
  noIdentifiers: 'No marks on record.',
  permits: 'Permits',
  permit: 'Permit',
  authority: 'Authority',
  validity: 'Valid',
  animalsTaken: 'Animals',
  remarks: 'Remarks',
  covered: 'covers the use',
  noPermits: 'No permits used.',
  documents: 'Papers on file',
  paper: 'Paper',
  file: 'File',
  check: 'SHA-256 of the file, first 16 digits',
  noDocuments: 'No papers on file.',
  noPaper: 'no paper on file',
  noEvents: 'Nothing is on record in this period.',
  struck: (p: { reason: string }) => `Struck out: ${p.reason}`,
  struckTag: 'struck out',
  placedAt: (p: { place: string }) => `Into ${p.place}.`,
  leftFrom: (p: { place: string }) => `From ${p.place}.`,
  diedIn: (p: { place: string }) => `In ${p.place}.`,
  site: (p: { where: string }) => `At ${p.where}.`,
  ofAnimals: (p: { delta: number; after: number }) =>
    `${animals(Math.abs(p.delta))}, ${String(p.after)} after it.`,
  foundCounted: (p: { low: number }) => `${animals(p.low)} counted.`,
  foundEstimated: (p: { low: number; high: number }) =>
    `${p.low.toLocaleString('en-GB')} to ${p.high.toLocaleString('en-GB')} estimated.`,
  transaction: (p: { number: string }) => `Transaction ${p.number}.`,
  reference: (p: { reference: string }) => `Their paper ${p.reference}.`,
  theirNumber: (p: { number: string }) => `Their number ${p.number}.`,
  deadOnArrival: (p: { count: number }) => `${counted(p.count, 'dead', 'dead')} on arrival.`,
  source: (p: { source: string }) => `Source code ${p.source}.`,
  recorded: (p: { at: string; by: string }) => `Entered ${p.at} by ${p.by}.`,
  datesNote: 'Dates are calendar dates of the facility; a month or a year alone is all that is known.',
  fingerprint: 'Fingerprint of this history',
  lookUp: 'Look it up under /check to see whether the record has changed since.',
  now: 'Now',
  standing: 'What this page is',
  standingText:
    'Put together from the records of the facility at the time printed above. Compare it with the original permits ' +
    'and papers before relying on it; the law of the place decides what is needed to hold or move an animal.',
} satisfies Record<History['heldAs'], string> & Record<string, unknown>)

/** How animals travelled, in one sentence; null when nothing was written down. */
export function transportWords(
  given: {
    carrier: string | null
    waybill: string | null
    box_count: number | null
    sealed_at: Date | null
    opened_at: Date | null
    transport_note: string | null
  },
  zone: string,
): string | null {
  const parts = [
    given.carrier === null ? null : `Carrier ${given.carrier}`,
    given.waybill === null ? null : `waybill ${given.waybill}`,
    given.box_count === null ? null : counted(given.box_count, 'box', 'boxes'),
    given.sealed_at === null ? null : `sealed ${sayInstant(given.sealed_at.toISOString(), zone)}`,
    given.opened_at === null ? null : `opened ${sayInstant(given.opened_at.toISOString(), zone)}`,
  ].filter((part) => part !== null)
  const sentence = parts.length === 0 ? '' : `${parts.join(', ')}.`
  const all = [sentence, given.transport_note ?? ''].filter(Boolean).join(' ')
  return all === '' ? null : `${all.charAt(0).toUpperCase()}${all.slice(1)}`
}
