import { defineMessages } from './define-messages.ts'

/** Why a question to the clock or to the map of waters has no answer. */
export const benchQuestionWords = defineMessages({
  unknownZone: 'There is no such time zone. Give its name, for example Europe/Lisbon.',
  duplicateEvent: 'Two events have this name. Give each its own, or leave the names out.',
  unknownEvent: 'No other event has this name. Check how it is spelled.',
  unknownPause: 'No pause of this name began. Check how it is spelled.',
  unknownCriterion: 'The policy has no criterion of this name. Check how it is spelled.',
  sampleTakenAfterReport: 'This result was reported before its sample was taken. Check the two times.',
  notUnderstood: 'This cannot be read. Compare it with the example in the description of the API.',
  duplicateName: 'This name is given twice. Give each its own.',
  unknownEnd: 'No body of water has this name. Check the ends of the connection.',
  unknownConnection: 'No connection has this name. Check the entry of the ledger.',
})
