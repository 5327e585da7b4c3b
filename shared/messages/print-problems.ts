import { defineMessages } from './define-messages.ts'

/** What to do when a document cannot be printed. */
export const printWords = defineMessages({
  busy: 'Try again in a moment. What is on the screen is not affected.',
  'missing-glyph':
    'It holds a character that cannot be drawn on paper. Work from the screen, and give the request number to whoever runs Pratique.',
  'does-not-fit':
    'A number would be parted from its unit. Work from the screen, and give the request number to whoever runs Pratique.',
  'bad-model':
    'The document is not complete. Work from the screen, and give the request number to whoever runs Pratique.',
})
