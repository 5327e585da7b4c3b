import type { z } from 'zod'
import type { FieldProblem } from '../../../shared/contracts/problems.ts'

type Issue = z.core.$ZodIssue

/** Our own names for what a schema may find wrong, so that they stay when the library changes its own. */
const codes: Readonly<Record<Exclude<Issue['code'], 'invalid_union'>, string>> = {
  invalid_type: 'wrong-kind',
  too_small: 'too-small',
  too_big: 'too-large',
  invalid_format: 'wrong-format',
  not_multiple_of: 'not-a-multiple',
  unrecognized_keys: 'not-asked',
  invalid_value: 'not-an-option',
  invalid_key: 'name-not-usable',
  invalid_element: 'not-usable',
  custom: 'not-usable',
}

/** Of several shapes that would do: what is wrong with each of them, where they agree. */
function codeOf(issue: Issue, given: unknown): string {
  if (issue.code === 'invalid_union') {
    const each = issue.errors.flat().map((one) => codeOf(one, given))
    const [first] = each
    return first !== undefined && each.every((one) => one === first) ? first : 'not-an-option'
  }
  return issue.code !== 'unrecognized_keys' && given === undefined ? 'missing' : codes[issue.code]
}

const inside = (value: unknown, key: PropertyKey): unknown =>
  typeof value === 'object' && value !== null && Object.hasOwn(value, key)
    ? (value as Record<PropertyKey, unknown>)[key]
    : undefined

/** Names that no contract knows: more of them say nothing new, and would make an answer longer than the question. */
const mostUnknown = 20

/**
 * Every issue of a failed parse as a pointer, a stable code and a sentence, not only the first.
 *
 * @param given what was parsed: what is absent is told from what is wrong by it
 */
export function fieldProblems(error: z.ZodError, given: unknown, root = ''): FieldProblem[] {
  return error.issues.flatMap((issue): FieldProblem[] => {
    const pointer = [root, ...issue.path.map(String)].join('/')
    const code = codeOf(issue, issue.path.reduce(inside, given))
    if (issue.code === 'unrecognized_keys')
      return issue.keys
        .slice(0, mostUnknown)
        .map((key) => ({ pointer: `${pointer}/${key}`, detail: issue.message, code }))
    return [{ pointer, detail: issue.message, code }]
  })
}
