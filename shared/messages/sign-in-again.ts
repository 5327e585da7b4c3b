import { defineMessages } from './define-messages.ts'

/** Words for a page whose session has ended while it was open: signed out in another window, or after a long time. */
export const signInAgainWords = defineMessages({
  question: (p: { name: string }) => `${p.name}, you are signed out`,
  body: 'The session has ended, in another window or after a long time. Type your password to go on here: what you typed is still there.',
  goOn: 'Sign in and go on',
  somebodyElse: 'Leave this page and sign in anew',
  lost: 'Whoever leaves it loses what was typed here. Entries that wait on this device stay.',
})
