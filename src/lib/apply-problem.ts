import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form'
import type { ProblemError } from './problem-error.ts'

/**
 * Puts a refusal where it belongs: each field's fault at its field, and the focus on the first of them.
 *
 * @returns what is left to say above the form: the whole refusal when no field was named
 */
export function applyProblem<T extends FieldValues>(
  form: UseFormReturn<T>,
  problem: ProblemError,
): string | undefined {
  const known = problem.errors.filter(
    (error) => error.pointer.startsWith('/') && !/^\/(params|query)\//.test(error.pointer),
  )
  known.forEach((error, i) => {
    const name = error.pointer.slice(1).replaceAll('/', '.') as FieldPath<T>
    form.setError(name, { type: 'server', message: error.detail }, { shouldFocus: i === 0 })
  })
  return known.length === 0 ? problem.says : undefined
}
