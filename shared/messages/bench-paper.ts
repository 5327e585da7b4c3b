import { defineMessages } from './define-messages.ts'

/** Words of a printed sheet of the bench. */
export const benchPaper = defineMessages({
  title: (p: { name: string }) => `Bench: ${p.name}`,
  source: 'Worked out from what was typed.',
  notice: 'A calculation. Not a treatment order, not signed.',
  notKept: 'Nothing of it is kept as a record.',
  asked: 'Asked',
  range: (p: { low: string; high: string }) => `${p.low} to ${p.high}, by the stated errors`,
  working: 'Working',
  schedule: 'Step by step',
  noSteps: 'No steps.',
  cautions: 'Cautions',
  sources: 'Sources',
  sourceLine: (p: { citation: string; mark: string }) => `${p.citation} ${p.mark}`,
  print: 'Print as PDF',
  printing: 'Printing…',
})
