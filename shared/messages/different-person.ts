import { defineMessages } from './define-messages.ts'

/** Words for a page that was opened by one person while another is signed in now. */
export const differentPersonWords = defineMessages({
  detail: (p: { name: string }) =>
    `This was written by another person than ${p.name}, who is signed in now. Nothing of it was saved. Sign in as whoever wrote it and send it again.`,
  question: (p: { now: string }) => `${p.now} is signed in on this device now`,
  body: (p: { before: string; now: string }) =>
    `${p.before} opened this page. Nothing can be saved from it any more, so that nothing of it is recorded in the name of ${p.now}.`,
  keep: (p: { before: string }) =>
    `To keep what was typed here, let ${p.before} sign in in another window of this browser, then look again. Entries that wait on this device are sent when ${p.before} signs in.`,
  goOn: (p: { now: string }) => `Load the page for ${p.now}`,
  lookAgain: 'Look again',
})
