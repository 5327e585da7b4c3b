import { defineMessages } from './define-messages.ts'

/** What a form says of a field before it asks the server. */
export const formWords = defineMessages({
  needed: 'Fill this in.',
  wholeNumber: 'Type a whole number.',
  number: 'Type a number, for example 44.62.',
  sending: 'Sending',
  leave: 'Leave without keeping it?',
  leaveBody: 'What you typed since it was last kept is lost.',
  leaveYes: 'Leave',
  leaveNo: 'Go on writing',
})
