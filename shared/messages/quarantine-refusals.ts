import { counted, defineMessages } from './define-messages.ts'
import type { ObservationRefusal } from '../domain/observations/check-observation.ts'
import type { ProtocolRefusal } from '../domain/protocol/check-protocol.ts'

/** What happened this time and the next step, where the server refuses something about quarantine. */
export const quarantineRefusals = defineMessages({
  caseEnded: (p: { number: string }) =>
    `${p.number} has ended. What happened before its end can still be entered with its own time.`,
  alreadyClosed: (p: { number: string }) =>
    `The batch of ${p.number} is closed already. An animal that came in later is added as such and restarts the clock.`,
  alreadyInCase: (p: { accession: string; number: string }) =>
    `${p.accession} is in ${p.number}, which still runs.`,
  kindsDiffer: (p: { accession: string; kind: string; others: string }) =>
    `${p.accession} is of the kind ${p.kind}, the batch of the kind ${p.others}. Open a case of its own for it.`,
  noSuchAnimal: (p: { accession: string }) => `There is no animal or group ${p.accession}.`,
  notInTheHouse: (p: { accession: string }) =>
    `${p.accession} is in no enclosure. Let it arrive, or move it, first.`,
  noSuchProtocol: 'Choose one of the protocols offered.',
  noSuchEvent: 'There is no such event in this case.',
  noSuchStep: 'The protocol of this case has no such step.',
  noSuchTest: 'The protocol of this case has no such test.',
  noSuchCriterion: 'The protocol of this case has no such condition.',
  takenAfterReport: 'A sample can’t have been taken after its result was reported.',
  pathogenMissing: 'Say what was found, and whether it is listed.',
  pauseEndsBefore: 'The pause can’t end before it began.',
  notLocked: 'This lock or hold no longer stands.',
  notClearable: (p: { why: string }) => p.why,
  reasonNeeded: 'Conditions are not met. To clear against them, type the reason.',
  unmetChanged: 'What stands between the case and clearance has changed. Read it again, then sign.',
  discrepancies: 'Figures of this batch do not agree. Have them explained first.',
  shortfall: (p: { neededDays: number; requiredDays: number }) =>
    `The steps of this protocol take at least ${p.neededDays} days; ${p.requiredDays} are too few.`,
})

export const protocolRefusals = defineMessages({
  'window-reversed': 'The window of a step ends before it begins.',
  'step-key-twice': 'Two steps have the same key.',
  'criterion-without-name': 'Give each condition a name.',
  'test-without-name': 'Give each test a name.',
  'length-too-short': 'The length is shorter than its own steps need.',
} satisfies Record<ProtocolRefusal, string>)

export const observationRefusals = defineMessages({
  'nothing-said': 'Say one thing at least.',
  'count-reversed':
    'The second figure of an estimate can’t be smaller than the first; a count has one figure.',
  'urgent-without-words': 'Say what you see, in words or by a sign.',
  'more-named-than-found': 'More bodies are named than were found.',
} satisfies Record<ObservationRefusal, string>)

/** Refusals of observations that are not about their content. */
export const observationDetails = defineMessages({
  seenByAnother:
    'Whoever raised an urgent call has seen it already. Another veterinarian or technician has to say so; telephone if nobody does.',
  flagOnly:
    'You may flag something you saw, in words. A round is recorded by keepers, technicians and veterinarians.',
  noSuchEnclosure: 'There is no such enclosure.',
  notInThere: (p: { accession: string; code: string }) => `${p.accession} was not in ${p.code} at that time.`,
  oldForm: 'This entry was made with a form that is no longer taken. Enter it again with its own time.',
  moreThanBodies: (p: { left: number }) =>
    `Only ${counted(p.left, 'body has', 'bodies have')} no name in this observation. Name no more than that.`,
  restNeedsReason: 'Some of the bodies have no name yet. Name all of them, or say why that cannot be.',
  bodiesNamed: 'The bodies were named later',
  bodiesSigned: (p: { number: string }) =>
    `A veterinarian signed the cause of these deaths in ${p.number}. A veterinarian strikes that signature out there first, with a reason.`,
  noSuchAnimal: (p: { accession: string }) =>
    `There is no animal or group ${p.accession}. Choose one from the list.`,
  ownOrVet: 'An observation is struck out by who made it, or by a veterinarian.',
})
