import { Problem } from '../../platform/http/problem.ts'

/** A question that has no answer, with the place in it that is at fault and what to do. */
export function refused(pointer: string, code: string, detail: string): Problem {
  return new Problem('not-computable', { errors: [{ pointer, code, detail }], detail })
}
