import { counted, defineMessages } from './define-messages.ts'

/** Why a field is refused by its shape alone, for whoever typed it. */
export const shapeWords = defineMessages({
  needed: 'Fill this in.',
  number: 'Type a number.',
  text: 'Type this as text.',
  choice: 'Choose one of those offered.',
  yesOrNo: 'Choose yes or no.',
  list: 'Choose from the list.',
  date: 'Type a date: day, month and year.',
  time: 'Type a date and a time.',
  email: 'Type an e-mail address.',
  form: 'This is not written as it has to be. Look at the example.',
  other: 'This can’t be read. Type it again.',
  wholeNumber: 'Type a whole number.',
  least: (p: { least: string }) => `Type ${p.least} or more.`,
  above: (p: { least: string }) => `Type more than ${p.least}.`,
  most: (p: { most: string }) => `Type ${p.most} or less.`,
  below: (p: { most: string }) => `Type less than ${p.most}.`,
  shortest: (p: { least: number }) =>
    p.least <= 1 ? 'Fill this in.' : `Use at least ${counted(p.least, 'character', 'characters')}.`,
  longest: (p: { most: number }) => `Use at most ${counted(p.most, 'character', 'characters')}.`,
  fewest: (p: { least: number }) => `Choose at least ${String(p.least)}.`,
  mostOf: (p: { most: number }) => `Choose at most ${String(p.most)}.`,
})

/** What a schema found, as far as words depend on it. */
export interface RefusedShape {
  code?: string | undefined
  input?: unknown
  expected?: unknown
  format?: unknown
  origin?: unknown
  minimum?: unknown
  maximum?: unknown
  inclusive?: unknown
}

const byExpected: Readonly<Record<string, string>> = {
  number: shapeWords.number,
  int: shapeWords.wholeNumber,
  string: shapeWords.text,
  boolean: shapeWords.yesOrNo,
  array: shapeWords.list,
}
const byFormat: Readonly<Record<string, string>> = {
  date: shapeWords.date,
  datetime: shapeWords.time,
  email: shapeWords.email,
}

/** The sentence for a field whose shape is refused; undefined where the schema names the fault itself. */
export function sayShape(issue: RefusedShape): string | undefined {
  const { code, input } = issue
  if (code === 'unrecognized_keys' || code === 'custom') return undefined
  if (input === undefined || input === null) return shapeWords.needed
  if (code === 'invalid_type') return byExpected[String(issue.expected)] ?? shapeWords.other
  if (code === 'invalid_value') return shapeWords.choice
  if (code === 'invalid_format') return byFormat[String(issue.format)] ?? shapeWords.form
  if (code === 'too_small') return sayTooSmall(issue)
  if (code === 'too_big') return sayTooBig(issue)
  return shapeWords.other
}

function sayTooSmall({ origin, minimum, inclusive }: RefusedShape): string {
  if (origin === 'string') return shapeWords.shortest({ least: Number(minimum) })
  if (origin === 'array') return shapeWords.fewest({ least: Number(minimum) })
  const least = String(minimum)
  return inclusive === false ? shapeWords.above({ least }) : shapeWords.least({ least })
}

function sayTooBig({ origin, maximum, inclusive }: RefusedShape): string {
  if (origin === 'string') return shapeWords.longest({ most: Number(maximum) })
  if (origin === 'array') return shapeWords.mostOf({ most: Number(maximum) })
  const most = String(maximum)
  return inclusive === false ? shapeWords.below({ most }) : shapeWords.most({ most })
}
