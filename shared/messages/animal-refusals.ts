import type { WeightDoubt } from '../domain/animals/judge-weight.ts'
import { counted, defineMessages } from './define-messages.ts'

const animals = (count: number) => counted(count, 'animal', 'animals')

/** What to do when something about an animal is refused: what happened, and the next step. */
export const animalRefusals = defineMessages({
  notInThatEnclosure: (p: { accession: string; said: string; actual: string; at: string }) =>
    `At ${p.at} ${p.accession} was in ${p.actual}, not in ${p.said}. Move it from ${p.actual}, or correct the time.`,
  notInTheHouse: (p: { accession: string; at: string }) =>
    `At ${p.at} ${p.accession} was not in the house. Correct the time, or record its arrival first.`,
  contradictsLaterMove: (p: { accession: string; at: string }) =>
    `A move of ${p.accession} that was recorded for after ${p.at} would no longer fit. Strike out the later move first, or correct the time.`,
  twoMovesAtOnce: 'Another move is recorded for the same moment. Give the time a minute earlier or later.',
  sameEnclosure: 'It is in this enclosure already. Choose another one.',
  enclosureClosed: (p: { code: string }) =>
    `${p.code} was taken out of use before that time. Choose another enclosure, or correct the time.`,
  noSuchGroup: 'There is no such group. Choose another one from the list.',
  noSuchTaxon: 'There is no such taxon. Choose one from the list, or enter it first.',
  noSuchEnclosure: 'There is no such enclosure. Choose one from the list.',
  movementLocked: (p: { accession: string; by: string }) =>
    `${p.accession} is held: ${p.by}. A veterinarian lifts the hold. If it was moved all the same, record it as already happened, with the reason.`,
  /** The name of an enclosure in place of that of an animal: "The water of QT-1". */
  waterOf: (p: { code: string }) => `The water of ${p.code}`,
  heldLater: (p: { accession: string; by: string }) =>
    `${p.accession} is held now: ${p.by}. The hold began after the time that you give. If it was moved before, record it as already happened, with the reason.`,
  arrivalHeld: (p: { code: string; by: string }) =>
    `The water of ${p.code} is held: ${p.by}. Choose another enclosure. If they are in it already, enter the transaction as already done.`,
  heldUnknown: 'nobody knew of the hold when it was moved',
  breachOpen: (p: { accession: string }) =>
    `${p.accession} was moved against a rule, and a veterinarian has not explained it yet. If it was moved again, record it as already happened, with the reason.`,
  documentedTransferNeeded: (p: { accession: string; by: string; from: string; to: string }) =>
    `${p.accession} is in quarantine (${p.by}) and ${p.to} is not inside the boundary of ${p.from}. A veterinarian may move it as a documented transfer. If it was moved all the same, record it as already happened, with the reason.`,
  openRequest: (p: { label: string; reason: string }) => `${p.label}: ${p.reason}`,
  groupsOnly: (p: { accession: string }) => `${p.accession} is one animal. Choose a group.`,
  individualsOnly: (p: { accession: string }) => `${p.accession} is a group. Split the animal out first.`,
  countTooSmall: (p: { accession: string; available: number; wanted: number }) =>
    `The ledger of ${p.accession} can give ${animals(p.available)}, not ${String(p.wanted)}. Count the group, and let the registrar adjust the ledger first.`,
  individualIsOne: 'An individual is one animal. Take out 1, or choose a group.',
  countRange: 'The highest figure has to be at least the lowest. For a full count both are the same.',
  discrepancyOpen: (p: { accession: string }) =>
    `The count of ${p.accession} does not fit what was seen, and the registrar has not explained it yet.`,
  taxaDiffer: (p: { from: string; into: string }) =>
    `${p.from} cannot become part of a group of ${p.into}: a group is of one taxon.`,
  notTogether: (p: { from: string; into: string }) =>
    `${p.from} and ${p.into} are not in one enclosure at that time. Move one to the other first.`,
  locksDiffer: (p: { from: string; into: string }) =>
    `${p.from} and ${p.into} are not in the same quarantine case. Merge them after clearance.`,
  markCarried: (p: { value: string; accession: string }) =>
    `${p.accession} carries the mark ${p.value}. Read it again; if both really carry it, say so with a reason.`,
  'transponder-length':
    'A transponder shows 15 digits; older ones 9 or 10 digits or letters A to F. Read it again.',
  'transponder-number-too-large': 'No transponder carries such a number. Read it again.',
  blankMark: 'Type the mark as read: letters or digits.',
  belongsToDeath: 'This line was written with a death. Strike out the death instead.',
  belongsToTransfer: 'This line is half of a split or merge. Merge the animals back instead.',
  bornAhead: 'This day has not come yet. Correct the date of birth.',
  bornAfterArrival: (p: { accession: string; on: string }) =>
    `${p.accession} came on ${p.on}. It was not born after that; correct the date of birth, or choose hatched if it came as an egg.`,
  restsOn: (p: { accession: string; what: string }) =>
    `More rests on ${p.accession} since it came: ${p.what}. Have it struck out of there first by a veterinarian, then void the transaction. What is signed stands: then the transaction stands too, and a further one says what is right.`,
  inCase: (p: { number: string }) => `the quarantine case ${p.number}`,
  inOrder: (p: { number: string }) => `the treatment order ${p.number}`,
  laterRecords: (p: { accession: string }) =>
    `More is recorded of ${p.accession} since it came. Strike that out first, then void the transaction.`,
  belongsToRegister:
    'This line was written with a transaction of the register. Strike out the transaction instead.',
  onlyMovesInside:
    'Arrivals and departures belong to the register. Only moves inside the house are struck out here.',
  strikeOwnWeight:
    'A weight is struck out by whoever recorded it, on the same day, or by a veterinarian: doses were worked out from it. Ask a veterinarian, or weigh again.',
  strikeOwnDeath:
    'A death is struck out by whoever recorded it, on the same day, or by a veterinarian. Ask a veterinarian, or write an observation.',
  strikeOwnMove:
    'A move is struck out by whoever recorded it, on the same day, by a veterinarian, or by the registrar where no rule stood against it. Ask one of them.',
  causeSigned: (p: { number: string }) =>
    `A veterinarian signed the cause of this death in ${p.number}. A veterinarian strikes that signature out there first, with a reason; then the death.`,
  strikeContradicts: 'Without it a later move would no longer fit. Strike out the later move first.',
  resolveByHand:
    'This cannot be corrected by itself. Adjust the count or strike out the record, then choose “explained”.',
  forAnotherRole: (p: { role: string }) => `This waits for a ${p.role}.`,
  bandReversed: 'The upper end has to be at least the lower end.',
})

/** A doubtful weight, asked back. */
export const weightDoubts = defineMessages({
  'far-below-band': (p) =>
    `${p.weight} is less than a fifth of what one ${p.taxon} weighs (${p.band}). Check the number and its unit. If it is right, say why.`,
  'far-above-band': (p) =>
    `${p.weight} is more than five times what one ${p.taxon} weighs (${p.band}). Check the number and its unit. If it is right, say why.`,
  'below-band': (p) =>
    `${p.weight} is less than one ${p.taxon} weighs (${p.band}). Check the number and its unit. If it is right, say why.`,
  'above-band': (p) =>
    `${p.weight} is more than one ${p.taxon} weighs (${p.band}). Check the number and its unit. If it is right, say why.`,
  'unlike-the-last': (p) =>
    `${p.weight} is very unlike the weight before, ${p.newest}. Check the number and its unit. If it is right, say why.`,
} satisfies Record<WeightDoubt, (p: WeightDoubtWords) => string>)

export interface WeightDoubtWords {
  /** "416 kg" */
  weight: string
  taxon: string
  /** "10 to 100 kg" */
  band: string
  /** "41.6 kg" */
  newest: string
}
