import { defineMessages } from './define-messages.ts'

const counted = (count: number | bigint, one: string, several: string) =>
  `${String(count)} ${Number(count) === 1 ? one : several}`

/** What is wrong with one value that was sent or typed, and what to do about it. */
export const inputFaults = defineMessages({
  needed: 'Fill this in.',
  number: 'Type a number, for example 44.62.',
  wholeNumber: 'Type a whole number.',
  text: 'Write this as text.',
  yesOrNo: 'Answer this with yes or no.',
  list: 'Give a list here.',
  record: 'Give the fields that belong here.',
  otherKind: 'Something else belongs here.',
  tooShort: (p: { least: number | bigint }) => `Use at least ${counted(p.least, 'character', 'characters')}.`,
  tooLong: (p: { most: number | bigint }) => `Use at most ${counted(p.most, 'character', 'characters')}.`,
  chooseOne: 'Choose at least one.',
  tooFew: (p: { least: number | bigint }) => `Give at least ${String(p.least)}.`,
  tooMany: (p: { most: number | bigint }) => `Give at most ${String(p.most)}.`,
  least: (p: { least: number | bigint }) => `Type a number of ${String(p.least)} or more.`,
  moreThan: (p: { least: number | bigint }) => `Type a number above ${String(p.least)}.`,
  most: (p: { most: number | bigint }) => `Type a number of ${String(p.most)} or less.`,
  lessThan: (p: { most: number | bigint }) => `Type a number below ${String(p.most)}.`,
  multiple: (p: { of: number | bigint }) => `Type a multiple of ${String(p.of)}.`,
  email: 'Type an e-mail address, for example name@example.org.',
  recordId: 'This does not name a record. Open the sheet again and send it from there.',
  instant: 'Give date and time with their zone, for example 2026-05-14T15:20:00Z.',
  date: 'Give a day of the calendar, for example 2026-05-14.',
  form: 'This is not written as it is needed here.',
  unknownField: 'This field is not known here.',
  choice: 'Choose one of the values offered.',
  choiceOf: (p: { values: string }) => `Choose one of: ${p.values}.`,
  kind: 'Choose one of the kinds offered, and fill in what belongs to it.',
  together: 'This does not fit with the rest.',
})
