import type { SourceMark } from '../domain/sources.ts'
import { counted, defineMessages } from './define-messages.ts'

/** Words of the sheets of the bench. */
export const benchSheetWords = defineMessages({
  title: 'Bench',
  source: 'Figures with their working and their sources. Nothing here is kept.',
  search: 'Find a calculator',
  weekly: 'Used every week',
  more: (p: { count: number }) => `More: ${counted(p.count, 'calculator', 'calculators')}`,
  noneFound: 'No calculator by these words.',
  missing: 'There is no calculator at this address.',
  forPrograms: 'For programs: the description of the API',
  back: 'All calculators',
  result: 'Result',
  notYet: 'No figure yet',
  unitOpen: (p: { field: string }) =>
    `Answer first which unit “${p.field}” is in. Until then the number counts in the unit that stands beside it.`,
  startHere: 'Fill in the fields; the figure follows as you type.',
  between: (p: { low: string; high: string }) => `${p.low} to ${p.high}, by the stated errors`,
  working: 'Working',
  schedule: 'Step by step',
  sources: (p: { count: number }) => `Sources (${String(p.count)})`,
  clear: 'Empty the fields',
  example: 'Fill in an example',
  decisionSupport:
    'Decision support for licensed professionals. It replaces no order, label or safety data sheet; local law applies.',
})

/** What the mark of a source says about how well it is known. */
export const sourceMarks = defineMessages({
  V: '(V: opened and read)',
  V2: '(V2: read in a restatement)',
  C: '(C: computed)',
  M: '(M: from memory; confirm before relying on it)',
  P: '(P: project default)',
} satisfies Record<SourceMark, string>)
