import { defineMessages } from './define-messages.ts'

/** Words for when the server does not answer as agreed; everything it does answer brings its own. */
export const clientWords = defineMessages({
  noAnswer: 'The server did not answer',
  noAnswerDetail: 'Check the connection, then try again. What you typed is still here.',
  tooSlow: 'The server did not answer in time',
  notUnderstood: 'The answer could not be read',
  notUnderstoodDetail: 'A new version may have been put in place. Load the page again.',
  typeTime: 'Give the date and the time.',
})
