import { defineMessages } from './define-messages.ts'

/** What is said about files that people send and fetch. */
export const fileWords = defineMessages({
  missing: 'Choose a file and send the form again.',
  empty: 'The file is empty. Choose the file with its content.',
  tooLarge: ({ limit }: { limit: string }) => `A file may have at most ${limit}.`,
  typeNotAllowed: ({ name }: { name: string }) =>
    `${name} is not a PDF, a PNG, JPEG or WebP picture, a CSV table or a plain text. What is inside decides, not its name.`,
  oneAtATime: 'Send one file at a time, in the field named for it.',
  brokenForm: 'The form arrived incomplete. Send it again.',
  gone: 'It is on record, but not on the disk of the server. Whoever runs Pratique can bring it back from a backup.',
  damaged:
    'Its content on the disk of the server was changed after it was kept, so it is not given out. Whoever runs Pratique can bring it back from a backup.',
  notKept: 'There is no such file.',
})
