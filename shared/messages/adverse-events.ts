import { counted, defineMessages } from './define-messages.ts'

/** Words about what went wrong with animals under an order. */
export const adverseWords = defineMessages({
  heading: 'Adverse events',
  none: 'Nobody recorded one.',
  holds: 'No dose is given until a veterinarian has reviewed it.',
  seenAt: (p: { at: string; by: string }) => `Seen ${p.at}, written down by ${p.by}`,
  afterDose: (p: { key: string }) => `Dose ${p.key}`,
  affected: (p: { count: number }) => counted(p.count, 'animal affected', 'animals affected'),
  reviewed: (p: { by: string; at: string }) => `Reviewed by ${p.by}, ${p.at}`,
  record: 'Record an adverse event',
  seen: 'What was seen',
  seenHint: 'At least 3 letters. It stays on the record.',
  count: 'Animals affected',
  countHint: 'A whole number; leave it empty where nobody counted.',
  recordIt: 'Record it now',
  recorded: 'The adverse event is recorded. The order waits for a veterinarian.',
  finding: 'What was found, and what follows',
  review: 'Record the review',
  reviewedNow: 'The review is recorded',
})
