import { Problem } from './problem.ts'

/** What an engine refused, as an answer of the server: one field, its pointer, the words and the stable code. */
export function refusedInput(pointer: string, detail: string, code: string): Problem {
  return new Problem('bad-input', { detail, errors: [{ pointer, detail, code }] })
}
