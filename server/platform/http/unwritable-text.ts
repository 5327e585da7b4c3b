import type { FieldProblem } from '../../../shared/contracts/problems.ts'

// control characters but tab and line breaks: the database keeps no NUL, and no print can show the others
const control = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]/

// with the flag, halves of a pair match only where they stand alone
const half = /[\ud800-\udfff]/u

/** No form nests deeper; what does would exhaust whoever walks through it. */
const mostDeep = 60
const tooDeep = 'This is nested too deep to be read. Send the form again from its page.'
const says = 'Take out the characters that cannot be written; type the words again rather than pasting them.'

const unwritable = (pointer: string): FieldProblem => ({
  pointer,
  code: 'character-not-writable',
  detail: says,
})

/**
 * Texts in a request that could be taken in and never be read again: half a character, or a control character. One such
 * record would break every list it stands in.
 */
export function findUnwritableText(value: unknown, pointer: string, depth = 0): FieldProblem[] {
  if (depth > mostDeep) return [{ pointer, code: 'nested-too-deep', detail: tooDeep }]
  if (typeof value === 'string') return control.test(value) || half.test(value) ? [unwritable(pointer)] : []
  if (typeof value !== 'object' || value === null) return []
  return Object.entries(value).flatMap(([key, each]) => [
    ...(findUnwritableText(key, pointer).length > 0 ? [unwritable(pointer)] : []),
    ...findUnwritableText(each, `${pointer}/${key}`, depth + 1),
  ])
}
