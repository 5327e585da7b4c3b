import { defineMessages } from './define-messages.ts'

/** What the server says about transactions that it cannot take as sent. */
export const registerSentences = defineMessages({
  'not-a-date':
    'Type a date, a month or a year that the calendar has, for example 2026-03-14, 2026-03 or 2026.',
  'time-needs-a-day': 'A time of day needs a whole date.',
  'not-a-time': 'Type a time of day, for example 13:25.',
  'in-the-future': 'This has not come yet. A plan is not a record.',
  partyNeeded: 'Name the other party.',
  partyOnce: 'Choose a party that is on file, or enter a new one, not both.',
  noParty: 'No other party has a part in this. Leave it empty.',
  noSuchParty: 'There is no such party on file.',
  openedBeforeSealed: 'The boxes were opened before they were sealed.',
  estimateAround: 'The number has to lie between the two figures of the estimate.',
  individualIsOne: 'An individual counts 1. Enter several as a group, or one line each.',
  afterArrival: 'This date lies after the day on which the animals came.',
  coordinatesInPairs: 'Give both latitude and longitude, or neither.',
  loanOnly: 'Only a loan has a last day.',
  withdrawalNotOver: (p: { accession: string; drug: string; order: string; until: string }) =>
    `${p.accession} may be eaten or set free, and was given ${p.drug} under ${p.order}. It waits until ${p.until}; nobody can override that.`,
  foodNotSaid: (p: { accession: string; drug: string; order: string; until: string }) =>
    `${p.accession} was given ${p.drug} under ${p.order}. If it may ever be eaten or set free it waits until ${p.until}: say so of it first.`,
  unknownLine: 'This permit is used for a line that is not in the form.',
  lineTwice: 'The same animal or group stands in two lines.',
  notAGroup: 'Animals can be added to a group only.',
  noSuchAnimal: 'There is no such animal or group.',
})
