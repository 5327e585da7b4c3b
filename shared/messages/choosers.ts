import { defineMessages } from './define-messages.ts'

/** Hints under the fields that choose a record. */
export const chooserWords = defineMessages({
  taxonHint: 'By common or scientific name.',
  animalHint: 'At least 2 letters of its number, name, taxon or place.',
  partyHint: 'At least 2 letters of its name.',
  permitHint: 'By our number, the number on it, or its authority.',
})
