import { fileLimitMB } from '../domain/documents/file-limit.ts'
import { defineMessages } from './define-messages.ts'

/** Words about papers on file and about looking up a print. */
export const paperWords = defineMessages({
  none: 'No papers on file.',
  attach: 'Attach a paper',
  attachAct: 'Attach it',
  title: 'What it is called',
  kind: 'Kind of paper',
  file: 'File',
  fileHint: `PDF, picture, CSV or text, at most ${String(fileLimitMB)} MB.`,
  fileNeeded: 'Choose a file.',
  needed: 'Fill this in.',
  back: 'Not now',
  attached: 'The paper is on file.',
  line: (p: { kind: string; size: string; by: string; at: string }) =>
    `${p.kind}, ${p.size}, attached ${p.at} by ${p.by}`,
  voided: (p: { reason: string; by: string }) => `Voided by ${p.by}: ${p.reason}`,
  void: (p: { title: string }) => `Void ${p.title}`,
  voidShort: 'Void',
  voidQuestion: (p: { title: string }) => `Void “${p.title}”?`,
  voidBody: 'It stays readable, marked as voided.',
  voidReason: 'Why it does not belong here',
  voidAct: 'Void it',
  voidBack: 'Keep it',
})

/** Words of the page that looks up a fingerprint from paper. */
export const checkWords = defineMessages({
  title: 'Look up a print',
  source: 'The record check stands at the foot of every page that was printed here.',
  place: 'Record check',
  label: 'Record check on the paper',
  hint: 'At least the first 16 digits: 0 to 9 and A to F. Spaces do not matter.',
  look: 'Look it up',
  current: 'The record still stands as printed',
  changed: 'The record has changed since it was printed',
  superseded: 'A later version has taken its place',
  held: 'What was printed is held',
  discontinued: 'What was printed has been discontinued',
  void: 'What was printed no longer holds',
  broken: 'The signed record no longer matches its signature',
  unknown: 'This print is known, but nobody can say whether the record has changed',
  changedNow: (p: { then: string; now: string }) =>
    `It had ${p.then} entries when it was printed, and has ${p.now} now.`,
  versionNow: (p: { now: string }) => `Version now: ${p.now}.`,
  doNotUse: 'Do not act on the paper. Print the record again.',
  prints: 'Prints with this record check',
  document: 'Document',
  subject: 'About',
  version: 'Version',
  printedBy: 'Printed by',
  printedAt: 'Printed',
  fingerprint: 'Whole fingerprint',
  kinds: 'Kinds of document',
  'acquisition-history': 'Acquisition history',
  'treatment-order': 'Treatment order',
  'bath-sheet': 'Bath sheet',
  'order-label': 'Label',
  clearance: 'Clearance certificate',
})
